import { spawnSync } from 'node:child_process';
import { accessSync, constants, existsSync, mkdirSync, writeFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { npm } from '../../src/cli/install.mjs';

const NAMES = ['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable', 'chrome'];
const PLACES = [
  '/usr/bin',
  '/usr/local/bin',
  '/snap/bin',
  '/Applications/Chromium.app/Contents/MacOS',
  '/Applications/Google Chrome.app/Contents/MacOS',
];
/** A Chromium inside an npm package, for those who cannot install one of their system's packages. */
const PACKAGED = '@sparticuz/chromium@147.0.0';

/**
 * A Chromium to test with: GAINWRIGHT_CHROMIUM, else one of the system, else Debian's package (root only), else one
 * from an npm package, kept under node_modules/.cache. Says which one it is.
 */
export function findChromium(root: string): string {
  const named = process.env.GAINWRIGHT_CHROMIUM;
  if (named && !isExecutable(named)) throw new Error(`GAINWRIGHT_CHROMIUM is ${named}, which cannot be run`);
  const path = named || onSystem() || fromDebian() || fromNpm(root);
  console.log(`Chromium: ${path}`);
  return path;
}

/**
 * Software WebGL has to be asked for by name in new versions; the rest keeps the browser from calling its maker.
 * @param disable3d no WebGL at all, as on some remote desktops
 */
export function chromiumFlags(disable3d: boolean): string[] {
  return [
    '--headless',
    '--no-sandbox',
    '--disable-quic',
    '--no-first-run',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
    ...(disable3d ? ['--disable-3d-apis'] : ['--use-angle=swiftshader', '--enable-unsafe-swiftshader']),
  ];
}

function onSystem(): string | undefined {
  const folders = [...(process.env.PATH ?? '').split(delimiter), ...PLACES].filter((folder) => folder !== '');
  const names = [...NAMES, 'Chromium', 'Google Chrome', 'chrome.exe'];
  return folders.flatMap((folder) => names.map((name) => join(folder, name))).find(isExecutable);
}

function fromDebian(): string | undefined {
  if (process.getuid?.() !== 0 || !onPath('apt-get')) return undefined;
  console.log('No Chromium found: installing the Debian package chromium …');
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  for (const args of [
    ['update', '-q'],
    ['install', '-q', '-y', 'chromium'],
  ]) {
    spawnSync('apt-get', args, { env, stdio: ['ignore', 2, 2] });
  }
  return onSystem();
}

function fromNpm(root: string): string {
  const folder = join(root, 'node_modules', '.cache', 'chromium');
  const launcher = join(folder, 'chromium.sh');
  if (existsSync(launcher)) return launcher;
  console.log(`No Chromium found: unpacking the npm package ${PACKAGED} …`);
  const unpacked = join(folder, 'unpacked');
  mkdirSync(unpacked, { recursive: true });
  writeFileSync(join(folder, 'package.json'), '{ "private": true }\n');
  if (npm(folder, ['install', '--no-save', '--no-audit', '--no-fund', PACKAGED]) !== 0) {
    throw new Error(`No Chromium: ${PACKAGED} could not be installed. Install Chromium, or set GAINWRIGHT_CHROMIUM.`);
  }
  // The package unpacks itself into the folder for temporary files. It brings libraries that a bare system lacks, but
  // unpacks them only where this variable says that it runs on the system it was made for.
  const env = { ...process.env, TMPDIR: unpacked, AWS_EXECUTION_ENV: 'AWS_Lambda_nodejs20.x' };
  const script = "import('@sparticuz/chromium').then((module) => module.default.executablePath())";
  const run = spawnSync(process.execPath, ['-e', script], { cwd: folder, env, stdio: ['ignore', 2, 2] });
  const binary = join(unpacked, 'chromium');
  if (run.status !== 0 || !isExecutable(binary)) throw new Error(`No Chromium: ${PACKAGED} did not unpack`);
  const libraries = `${join(unpacked, 'al2023', 'lib')}:${unpacked}`;
  const fonts = `[ -d /etc/fonts ] || export FONTCONFIG_PATH='${join(unpacked, 'fonts')}'`;
  const lines = ['#!/bin/sh', fonts, `LD_LIBRARY_PATH='${libraries}' exec '${binary}' "$@"`, ''];
  writeFileSync(launcher, lines.join('\n'), { mode: 0o755 });
  return launcher;
}

function onPath(name: string): boolean {
  return (process.env.PATH ?? '').split(delimiter).some((folder) => isExecutable(join(folder, name)));
}

function isExecutable(path: string): boolean {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}
