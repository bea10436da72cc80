import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** What the built page is made of. */
const SOURCES = ['index.html', 'vite.config.ts', 'package-lock.json', 'src', 'data', 'public'];

/**
 * Builds the page into dist, unless dist was built from exactly the present sources. The stamp lies in dist, so that
 * whatever empties dist also takes the stamp away.
 * @param {string} root folder of package.json
 * @returns {Promise<boolean>} whether it had to be built
 */
export async function ensureBuilt(root) {
  const stamp = join(root, 'dist', '.sources');
  const sources = fingerprint(root);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === sources) return false;
  console.error('Building the page …');
  process.env.NODE_ENV = 'production';
  const { build } = await import('vite');
  await build({ root, logLevel: 'warn' });
  writeFileSync(stamp, sources);
  return true;
}

/** @param {string} root */
function fingerprint(root) {
  const hash = createHash('sha256');
  for (const path of SOURCES.flatMap((source) => filesOf(root, source))) {
    hash
      .update(`${path}\0`)
      .update(readFileSync(join(root, path)))
      .update('\0');
  }
  return hash.digest('hex');
}

/**
 * Paths of the files in or at a path, in a settled order.
 * @param {string} root
 * @param {string} path
 * @returns {string[]}
 */
function filesOf(root, path) {
  if (path === 'src/cli' || !existsSync(join(root, path))) return [];
  if (!statSync(join(root, path)).isDirectory()) return [path];
  const names = readdirSync(join(root, path)).sort();
  return names.flatMap((name) => filesOf(root, `${path}/${name}`));
}
