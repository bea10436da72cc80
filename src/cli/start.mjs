import { spawn } from 'node:child_process';
import { parseArgs } from 'node:util';
import { ensureBuilt } from './build.mjs';
import { servePage } from './serve.mjs';

const USAGE = `Usage: npm start -- [--port N] [--open]
  --port N   first port to try (4173 unless given; the next free one is taken when it is in use)
  --open     open the page in the system's browser`;

/**
 * Builds the page if its sources have changed, serves it and prints its address. Runs until it is stopped.
 * @param {string} root folder of package.json
 * @param {string[]} args
 * @returns {Promise<number>} exit status
 */
export async function start(root, args) {
  const options = optionsOf(args);
  if (typeof options === 'string') {
    console.error(options);
    return 2;
  }
  if (options.help) {
    console.log(USAGE);
    return 0;
  }
  await ensureBuilt(root);
  const { url } = await servePage(root, options.port);
  console.log(`Gainwright is at ${url}`);
  if (options.open) openInBrowser(url);
  return 0;
}

/**
 * @param {string[]} args
 * @returns {{ port: number, open: boolean, help: boolean } | string} the options, or what is wrong with them
 */
function optionsOf(args) {
  try {
    const { values } = parseArgs({
      args,
      options: {
        port: { type: 'string', default: '4173' },
        open: { type: 'boolean', default: false },
        help: { type: 'boolean', short: 'h', default: false },
      },
    });
    const port = Number(values.port);
    if (!Number.isInteger(port) || port < 1 || port > 65_535) {
      return `--port ${values.port}: a whole number from 1 to 65535 is expected\n${USAGE}`;
    }
    return { port, open: values.open, help: values.help };
  } catch (error) {
    return `${error instanceof Error ? error.message : error}\n${USAGE}`;
  }
}

/** @param {string} url */
function openInBrowser(url) {
  const [command, ...args] =
    process.platform === 'darwin'
      ? ['open', url]
      : process.platform === 'win32'
        ? ['cmd', '/c', 'start', '', url]
        : ['xdg-open', url];
  const opener = spawn(command, args, { detached: true, stdio: 'ignore' });
  opener.on('error', () => console.error(`No browser could be opened; open ${url} yourself.`));
  opener.unref();
}
