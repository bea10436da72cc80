import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { type Browser, type BrowserContext, chromium, type Page } from 'playwright-core';
import { afterAll, inject, onTestFinished } from 'vitest';
import { chromiumFlags } from './chromium';

const FAILURES = fileURLToPath(new URL('../browser/failures', import.meta.url));

/** The only warning a page may give unasked: fiber 9 still uses a clock that three has replaced. */
const ALLOWED = /Clock: This module has been deprecated\. Please use THREE\.Timer instead/;

/** One browser with and one without WebGL for a spec file: starting one costs more than many a test. */
const browsers = new Map<boolean, Browser>();
afterAll(async () => {
  await Promise.all([...browsers.values()].map((browser) => browser.close()));
});

export interface OpenPageOptions {
  /** Relative to the served page ('?renderer=painter'), or a full address. */
  url?: string;
  viewport?: { width: number; height: number };
  /** What the system asks for; the page follows it. */
  theme?: 'light' | 'dark';
  reducedMotion?: boolean;
  /** No WebGL at all. */
  disable3d?: boolean;
  /** Console lines, as 'type: text', that this very test means to cause. */
  declared?: RegExp[];
}

export interface OpenedPage {
  page: Page;
  browser: Browser;
  /** Every console line of every page of this context, as 'type: text'. */
  consoleLines: string[];
  /** Throws on any console warning or error, uncaught error, or request that leaves this machine, so far. */
  assertQuiet(): void;
  /** Writes the page as it is to test/browser/failures/. */
  keepPicture(name: string): Promise<void>;
  /** Closes the page and all else in its context, then asserts that it was quiet. The second call does nothing. */
  close(): Promise<void>;
}

/**
 * Opens the built page in a context of its own (storage, settings, further tabs). Inside a test it closes itself when the test ends, fails the test if
 * the page was not quiet, and keeps a picture if the test failed. From beforeAll, call close() in afterAll.
 */
export async function openPage(options: OpenPageOptions = {}): Promise<OpenedPage> {
  const browser = await browserWith(options.disable3d ?? false);
  const context = await browser.newContext({
    viewport: options.viewport ?? { width: 1280, height: 800 },
    colorScheme: options.theme ?? 'light',
    reducedMotion: options.reducedMotion ? 'reduce' : 'no-preference',
    acceptDownloads: true,
  });
  const { consoleLines, complaints } = listen(context, [ALLOWED, ...(options.declared ?? [])]);
  const page = await context.newPage();

  const assertQuiet = () => {
    if (complaints.length > 0) throw new Error(`the page was not quiet:\n  ${complaints.join('\n  ')}`);
  };
  const keepPicture = async (name: string) => {
    mkdirSync(FAILURES, { recursive: true });
    await page.screenshot({ path: join(FAILURES, `${fileName(name)}.png`) });
  };
  let closed = false;
  const close = async () => {
    if (closed) return;
    closed = true;
    await context.close();
    assertQuiet();
  };
  closeWithTest(async (testName, failed) => {
    if (closed) return;
    // A page that has crashed gives no picture; the reason why the test failed matters more.
    if (failed || complaints.length > 0) await keepPicture(testName).catch(() => undefined);
    await close();
  });

  await page.goto(new URL(options.url ?? '', inject('pageUrl')).href);
  return { page, browser, consoleLines, assertQuiet, keepPicture, close };
}

async function browserWith(disable3d: boolean): Promise<Browser> {
  const running = browsers.get(disable3d);
  if (running?.isConnected()) return running;
  const browser = await chromium.launch({ executablePath: inject('chromiumPath'), args: chromiumFlags(disable3d) });
  browsers.set(disable3d, browser);
  return browser;
}

function listen(context: BrowserContext, allowed: RegExp[]): { consoleLines: string[]; complaints: string[] } {
  const consoleLines: string[] = [];
  const complaints: string[] = [];
  context.on('console', (message) => {
    const line = `${message.type()}: ${message.text()}`;
    consoleLines.push(line);
    const bad = ['warning', 'error', 'assert'].includes(message.type());
    if (bad && !allowed.some((pattern) => pattern.test(line))) complaints.push(line);
  });
  context.on('weberror', (webError) => {
    complaints.push(`uncaught: ${webError.error().stack ?? webError.error().message}`);
  });
  context.on('request', (request) => {
    const { protocol, hostname } = new URL(request.url());
    const stays = ['blob:', 'data:', 'about:'].includes(protocol) || ['127.0.0.1', 'localhost'].includes(hostname);
    if (!stays) complaints.push(`request to another machine: ${request.url()}`);
  });
  return { consoleLines, complaints };
}

function closeWithTest(end: (testName: string, failed: boolean) => Promise<void>): void {
  try {
    onTestFinished(({ task }) => end(task.name, task.result?.state === 'fail'));
  } catch {
    // Not inside a test: whoever opened the page closes it.
  }
}

function fileName(name: string): string {
  return name
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, 80);
}
