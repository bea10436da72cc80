/**
 * The way in for people: node src/cli/launch.mjs COMMAND …. Plain JavaScript, for it runs before anything is installed.
 */
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureInstalled } from './install.mjs';

const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

/** @type {Record<string, (args: string[]) => Promise<number>>} */
const COMMANDS = {
  start: async (args) => (await import('./start.mjs')).start(root, args),
  build: async () => {
    const { ensureBuilt } = await import('./build.mjs');
    console.error((await ensureBuilt(root)) ? 'The page is in dist.' : 'dist is up to date.');
    return 0;
  },
  predict: (args) => runTypeScript('./predict.ts', args),
  bench: (args) => runTypeScript('./bench.ts', args),
};

const [name = '', ...args] = process.argv.slice(2);
const command = COMMANDS[name];
if (!command) {
  console.error(`"${name}" is not a command; there are ${Object.keys(COMMANDS).join(', ')}.`);
  process.exitCode = 2;
} else if (!ensureInstalled(root)) {
  console.error('The packages could not be installed; see npm above.');
  process.exitCode = 1;
} else {
  process.exitCode = await command(args);
}

/**
 * Runs a command written in TypeScript: a module with main(argv), which gives the exit status.
 * @param {string} path
 * @param {string[]} argv
 * @returns {Promise<number>}
 */
async function runTypeScript(path, argv) {
  const { tsImport } = await import('tsx/esm/api');
  const { main } = await tsImport(path, import.meta.url);
  return main(argv);
}
