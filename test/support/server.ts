import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import type { TestProject } from 'vitest/node';
import { servePage } from '../../src/cli/serve.mjs';
import { findChromium } from './chromium';

declare module 'vitest' {
  interface ProvidedContext {
    /** Address of the built page, with a slash at its end. */
    pageUrl: string;
    chromiumPath: string;
  }
}

const root = fileURLToPath(new URL('../..', import.meta.url));

/** Once for all browser tests: an up-to-date build, served on a free port, and a Chromium. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  buildPage();
  const chromiumPath = findChromium(root);
  const { url, close } = await servePage(root, 4300);
  project.provide('pageUrl', url);
  project.provide('chromiumPath', chromiumPath);
  return close;
}

/** In a process of its own, for vitest's NODE_ENV would give a development build. */
function buildPage(): void {
  const { NODE_ENV: _, ...env } = process.env;
  const run = spawnSync(process.execPath, ['src/cli/launch.mjs', 'build'], { cwd: root, env, stdio: ['ignore', 2, 2] });
  if (run.status !== 0) throw new Error('the page could not be built');
}
