import { isBuiltin } from 'node:module';
import { posix } from 'node:path';
import { COMPUTED, importsOf } from './imports';

/** An import goes to the same folder or to one of a lower rank. Folders of one rank do not know each other. */
const RANKS: Record<string, number> = {
  acoustics: 0,
  layout: 1,
  formats: 2,
  predict: 3,
  report: 4,
  session: 5,
  controls: 5,
  scene: 6,
  seats: 6,
  panels: 6,
  cli: 6,
  app: 7,
};

/** What a lower rank alone would allow. */
const APART: Record<string, string[]> = { controls: ['layout'] };

/** JSON files outside src, and who may read them. */
const DATA: { folder: string; readers: string[] }[] = [
  { folder: 'data/catalogue', readers: ['layout'] },
  { folder: 'data/layouts', readers: ['session', 'app'] },
];

/** Folders that must run in a worker, in Node and in a test without a page. */
const PAGELESS = ['layout', 'predict', 'formats', 'report', 'cli'];
const PAGE_PACKAGES = /^(react|preact|three|zustand|@tanstack\/|@fontsource)/;
const THREE_PACKAGES = /^(three|@react-three\/)/;

const LINES_AT_MOST = 400;

export interface Packages {
  dependencies: Record<string, string>;
  devDependencies: Record<string, string>;
}

/**
 * What is wrong with one source file, each as 'file:line what and why'.
 * @param path from the top of the project, as in 'src/layout/schema.ts'
 */
export function problemsOf(path: string, source: string, packages: Packages): string[] {
  const folder = path.split('/')[1];
  if (!(folder in RANKS)) return [`${path}:1 lies in no known folder of src`];
  const problems = importsOf(path, source).flatMap(({ specifier, line }) => {
    const reason = objection(path, folder, specifier, packages);
    return reason ? [`${path}:${line} imports '${specifier}': ${reason}`] : [];
  });
  const lines = source.replace(/\n$/, '').split('\n').length;
  if (lines > LINES_AT_MOST) problems.push(`${path}:${lines} is longer than ${LINES_AT_MOST} lines`);
  if (/(^|\/)utils?(\.|\/|$)/i.test(path)) problems.push(`${path}:1 is named after nothing: say what it does`);
  return problems;
}

function objection(path: string, folder: string, specifier: string, packages: Packages): string | undefined {
  if (specifier === COMPUTED) return 'a module is named in a string';
  if (!specifier.startsWith('.')) return packageObjection(folder, specifier, packages);
  const target = posix.join(posix.dirname(path), specifier);
  return target.startsWith('src/') ? folderObjection(folder, target.split('/')[1]) : dataObjection(folder, target);
}

function folderObjection(from: string, to: string): string | undefined {
  if (from === to) return undefined;
  if (!(to in RANKS)) return `${to} is no known folder of src`;
  if (APART[from]?.includes(to)) return `${from} may not know ${to}`;
  if (RANKS[to] === RANKS[from]) return `${from} and ${to} may not know each other`;
  return RANKS[to] < RANKS[from] ? undefined : `${to} stands above ${from}`;
}

function dataObjection(folder: string, target: string): string | undefined {
  const known = DATA.find((entry) => target.startsWith(`${entry.folder}/`) && target.endsWith('.json'));
  if (!known) return 'it lies outside src';
  return known.readers.includes(folder) ? undefined : `only ${known.readers.join(' and ')} may read ${known.folder}`;
}

function packageObjection(folder: string, specifier: string, packages: Packages): string | undefined {
  if (isBuiltin(specifier)) return folder === 'cli' ? undefined : 'only cli may use Node';
  const name = specifier.split('/', specifier.startsWith('@') ? 2 : 1).join('/');
  const declared = name in packages.dependencies || (folder === 'cli' && name in packages.devDependencies);
  if (!declared) return 'it is not among the dependencies of package.json';
  if (folder === 'acoustics' && name !== 'gl-matrix') return 'acoustics uses gl-matrix and nothing else';
  if (folder !== 'scene' && THREE_PACKAGES.test(specifier)) return 'only scene may use three';
  if (PAGELESS.includes(folder) && PAGE_PACKAGES.test(specifier)) return `${folder} must work without a page`;
  return undefined;
}
