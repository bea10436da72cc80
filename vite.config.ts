import react from '@vitejs/plugin-react';
import type { Plugin } from 'vite';
import { defineConfig } from 'vitest/config';

const CONTENT_SECURITY_POLICY = [
  "default-src 'self'",
  "img-src 'self' blob: data:",
  "style-src 'self' 'unsafe-inline'",
  "worker-src 'self' blob:",
  "connect-src 'self'",
].join('; ');

export default defineConfig({
  base: './',
  plugins: [react(), contentSecurityPolicy()],
  // The policy has no data: for fonts, so that nothing may be folded into the style sheet as a data address.
  build: { target: 'es2022', assetsInlineLimit: 0 },
  worker: { format: 'es' },
  server: { host: '127.0.0.1' },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'checks',
          environment: 'node',
          include: ['test/**/*.test.{ts,tsx}'],
          exclude: ['test/browser/**'],
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          environment: 'node',
          include: ['test/browser/**/*.spec.ts'],
          globalSetup: 'test/support/server.ts',
          fileParallelism: false,
          testTimeout: 90_000,
          // A machine without a GPU draws on the same cores that compute.
          expect: { poll: { timeout: 15_000 } },
          hookTimeout: 90_000,
        },
      },
    ],
  },
});

/** Only in the built page: the development server puts scripts of its own into the page. */
function contentSecurityPolicy(): Plugin {
  return {
    name: 'content-security-policy',
    apply: 'build',
    transformIndexHtml: () => [
      {
        tag: 'meta',
        attrs: { 'http-equiv': 'Content-Security-Policy', content: CONTENT_SECURITY_POLICY },
        injectTo: 'head-prepend',
      },
    ],
  };
}
