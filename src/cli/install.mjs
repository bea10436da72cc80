import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/**
 * Installs what the lock file says, unless that is what is installed already. All output goes to standard error, so
 * that a command's standard output holds nothing but its result.
 * @param {string} root folder of package.json
 * @returns {boolean} false when the installation failed (npm has said why)
 */
export function ensureInstalled(root) {
  if (isInstalled(root)) return true;
  console.error('Installing the packages of package-lock.json …');
  return npm(root, ['ci', '--include=dev', '--ignore-scripts', '--no-audit', '--no-fund', '--loglevel=warn']) === 0;
}

/**
 * npm writes node_modules/.package-lock.json when an installation is complete: it is the stamp. It is compared package
 * by package, because it leaves out the optional packages of other systems, and because an installation made by hand
 * must not be thrown away.
 * @param {string} root
 */
function isInstalled(root) {
  const installed = packagesOf(join(root, 'node_modules', '.package-lock.json'));
  const locked = packagesOf(join(root, 'package-lock.json'));
  if (!installed || !locked) return false;
  return Object.entries(locked).every(([path, wanted]) => {
    if (path === '') return true;
    const found = installed[path];
    return found ? found.version === wanted.version && found.integrity === wanted.integrity : wanted.optional === true;
  });
}

/**
 * @param {string} path of a lock file
 * @returns {Record<string, { version: string, integrity?: string, optional?: boolean }> | undefined}
 */
function packagesOf(path) {
  try {
    return JSON.parse(readFileSync(path, 'utf8')).packages;
  } catch {
    return undefined;
  }
}

/**
 * Runs npm with its output on standard error; gives its exit status.
 * @param {string} cwd
 * @param {string[]} args
 */
export function npm(cwd, args) {
  const itself = process.env.npm_execpath;
  const byNode = itself !== undefined && /npm-cli\.[cm]?js$/.test(itself);
  const run = byNode
    ? spawnSync(process.execPath, [itself, ...args], { cwd, stdio: ['ignore', 2, 2] })
    : spawnSync('npm', args, { cwd, stdio: ['ignore', 2, 2], shell: process.platform === 'win32' });
  if (run.error) console.error(`npm could not be started: ${run.error.message}`);
  return run.status ?? 1;
}
