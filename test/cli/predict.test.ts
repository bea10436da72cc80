import { spawnSync } from 'node:child_process';
import { linkSync, mkdirSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test, vi } from 'vitest';
import { main } from '../../src/cli/predict';
import { formatLayout } from '../../src/formats/layout-json';
import type { Layout } from '../../src/layout/schema';
import { runPredict } from '../support/command-line';
import { projectPath } from '../support/files';
import { scheme, smallLayout } from '../support/layouts';

let folder = '';
const at = (name: string) => join(folder, name);
const put = (name: string, layout: Layout) => writeFileSync(at(name), formatLayout(layout));

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'predict-'));
  const two = smallLayout();
  two.schemes.push(scheme('B', { label: 'Other' }));
  put('good.layout.json', two);
  put('short.layout.json', { ...smallLayout(), need: { kind: 'noise', signalToNoise: 70 } });
});
afterAll(() => rmSync(folder, { recursive: true }));

/** The command run in this process: what it would exit with and print. */
async function run(...argv: string[]): Promise<{ status: number; out: string; err: string }> {
  const [out, err]: [string[], string[]] = [[], []];
  const stdout = vi.spyOn(process.stdout, 'write').mockImplementation((text) => out.push(String(text)) > 0);
  const stderr = vi.spyOn(process.stderr, 'write').mockImplementation((text) => err.push(String(text)) > 0);
  vi.stubEnv('INIT_CWD', folder);
  try {
    return { status: await main(argv), out: out.join(''), err: err.join('') };
  } finally {
    stdout.mockRestore();
    stderr.mockRestore();
    vi.unstubAllEnvs();
  }
}

describe('exit status', () => {
  test('0 when predicted, whether or not a seat falls short', async () => {
    expect((await run('good.layout.json')).status).toBe(0);
    expect((await run('short.layout.json')).status).toBe(0);
  });

  test('1 with --check and a seat short, 0 with --check and none', async () => {
    expect((await run('short.layout.json', '--check')).status).toBe(1);
    expect((await run('good.layout.json', '--check')).status).toBe(0);
  });

  test('2 for a layout with an error, with its place and nothing on standard output', async () => {
    const bad = smallLayout();
    bad.venue.faces[3].corners.splice(2);
    put('bad.layout.json', bad);
    const { status, out, err } = await run('bad.layout.json');
    expect([status, out]).toEqual([2, '']);
    expect(err).toBe(
      `${at('bad.layout.json')}:\n  venue.faces[3].corners: fewer than three corners; expected three or more corners, in order round the face.\n`,
    );
  });

  test('2 for what the checks find', async () => {
    const bad = smallLayout();
    bad.venue.talkers[0].position = [20, 0, 1];
    put('outside.layout.json', bad);
    const { status, err } = await run('outside.layout.json');
    expect(status).toBe(2);
    expect(err).toMatch(/\n {2}venue\.talkers\[0\]\.position: t is outside the room;/);
  });

  test.each<[string, string[], RegExp]>([
    ['a file that is not there', ['none.json'], /none\.json: cannot be read \(ENOENT\); name a file that exists\.\n$/],
    ['a folder', ['.'], /cannot be read \(EISDIR\)/],
    ['no file', [], /^Name one layout file, found 0\.\n\nUsage: /],
    ['two files', ['a.json', 'b.json'], /^Name one layout file, found 2\./],
    ['an unknown option', ['good.layout.json', '--fast'], /--fast[\s\S]*\n\nUsage: /],
    ['an option without its value', ['good.layout.json', '--out'], /--out[\s\S]*\n\nUsage: /],
    ['an unknown form', ['good.layout.json', '--as', 'pdf'], /^--as: "pdf" is not known; one of text, json, csv/],
    [
      'an unknown scheme',
      ['good.layout.json', '--scheme', 'C'],
      /^--scheme: "C" is not a scheme of .*; there are: A, B\.\n$/,
    ],
    [
      'a place that cannot be written',
      ['good.layout.json', '--out', 'no/where.txt'],
      /^--out: .* cannot be written \(ENOENT\)\.\n$/,
    ],
  ])('2 for %s', async (_, argv, message) => {
    const { status, out, err } = await run(...argv);
    expect([status, out]).toEqual([2, '']);
    expect(err).toMatch(message);
  });

  test('0 and the usage for --help', async () => {
    const { status, out } = await run('--help');
    expect(status).toBe(0);
    expect(out).toMatch(/^Usage: npm run --silent predict -- FILE/);
  });
});

describe('what is printed', () => {
  test('one scheme, where one is asked for', async () => {
    const { out } = await run('good.layout.json', '--scheme', 'B', '--as', 'json');
    expect(JSON.parse(out).schemes.map(({ id }: { id: string }) => id)).toEqual(['B']);
  });

  test('a row a seat and scheme as csv', async () => {
    const { out } = await run('good.layout.json', '--as', 'csv');
    expect(out.trim().split('\r\n')).toHaveLength(1 + 2 * 6);
  });

  test('a file with --out holds what would have been printed', async () => {
    const { out } = await run('good.layout.json', '--as', 'json');
    const written = await run('good.layout.json', '--as', 'json', '--out', 'out.json');
    expect(written).toEqual({ status: 0, out: '', err: '' });
    expect(readFileSync(at('out.json'), 'utf8')).toBe(out);
  });
});

describe('the input is never written over', () => {
  test.each<[string, () => string]>([
    ['by its own name', () => 'input.json'],
    ['by another spelling of its path', () => join('sub', '..', '.', 'input.json')],
    ['by its absolute path', () => at('input.json')],
    [
      'through a symbolic link',
      () => {
        symlinkSync(at('input.json'), at('link.json'));
        return 'link.json';
      },
    ],
    [
      'through a linked folder',
      () => {
        symlinkSync(folder, at('linked'));
        return join('linked', 'input.json');
      },
    ],
    [
      'through a hard link',
      () => {
        linkSync(at('input.json'), at('hard.json'));
        return 'hard.json';
      },
    ],
  ])('%s', async (_, name) => {
    put('input.json', smallLayout());
    mkdirSync(at('sub'), { recursive: true });
    const before = readFileSync(at('input.json'), 'utf8');
    const { status, err } = await run('input.json', '--out', name());
    expect(status).toBe(2);
    expect(err).toMatch(/^--out: this is the layout itself, which is never written over; name another file\.\n$/);
    expect(readFileSync(at('input.json'), 'utf8')).toBe(before);
  });

  test('nor when the layout itself is named through a link', async () => {
    put('input2.json', smallLayout());
    symlinkSync(at('input2.json'), at('link2.json'));
    expect((await run('link2.json', '--out', 'input2.json')).status).toBe(2);
  });
});

test.skipIf(process.platform === 'win32')(
  'a reader that closes the pipe early is no error',
  { timeout: 60_000 },
  () => {
    const launch = projectPath('src/cli/launch.mjs');
    const layout = projectPath('data/reference/examples/committee.layout.json');
    const command = `"${process.execPath}" "${launch}" predict "${layout}" --as json | head -c 1`;
    const { stdout, stderr } = spawnSync('sh', ['-c', command], { encoding: 'utf8' });
    expect([stdout, stderr]).toEqual(['{', '']);
  },
);

test('the launcher passes the exit status on', { timeout: 60_000 }, () => {
  expect(runPredict(['short.layout.json', '--check', '--as', 'csv'], folder).status).toBe(1);
  const { status, stdout, stderr } = runPredict(['none.json'], folder);
  expect([status, stdout]).toEqual([2, '']);
  expect(stderr).toMatch(/none\.json: cannot be read/);
});
