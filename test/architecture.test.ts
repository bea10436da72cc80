import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import { type Packages, problemsOf } from './support/import-rules';

const root = fileURLToPath(new URL('..', import.meta.url));
const packages: Packages = JSON.parse(readFileSync(`${root}/package.json`, 'utf8'));
const paths = readdirSync(`${root}/src`, { recursive: true, encoding: 'utf8' })
  .map((path) => `src/${path.replaceAll('\\', '/')}`)
  .filter((path) => /\.(ts|tsx|mjs)$/.test(path));

test('src keeps to the map: imports run one way, files are short and well named', () => {
  expect(paths).toContain('src/cli/launch.mjs');
  const problems = paths.flatMap((path) => problemsOf(path, readFileSync(`${root}/${path}`, 'utf8'), packages));
  expect(problems, `\n${problems.join('\n')}\n`).toEqual([]);
});

describe('the check itself', () => {
  test('finds every way of naming a module that stands above', () => {
    const source = [
      "import { run } from './run';",
      "import type { Report } from '../report/page';",
      "export * from '../app/main';",
      "export { seats } from '../seats/table';",
      "type Plan = import('../panels/plan').Plan;",
      "const later = () => import('../scene/view');",
      "const worker = new Worker(new URL('../session/worker.ts', import.meta.url));",
      "const all = import.meta.glob(['../controls/*.tsx']);",
      'const some = (name: string) => import(name);',
      "// import '../app/comment';",
      `const text = "import '../app/text'";`,
      "import '../layout/schema';",
    ].join('\n');
    expect(problemsOf('src/predict/made-up.ts', source, packages).sort()).toEqual([
      "src/predict/made-up.ts:2 imports '../report/page': report stands above predict",
      "src/predict/made-up.ts:3 imports '../app/main': app stands above predict",
      "src/predict/made-up.ts:4 imports '../seats/table': seats stands above predict",
      "src/predict/made-up.ts:5 imports '../panels/plan': panels stands above predict",
      "src/predict/made-up.ts:6 imports '../scene/view': scene stands above predict",
      "src/predict/made-up.ts:7 imports '../session/worker.ts': session stands above predict",
      "src/predict/made-up.ts:8 imports '../controls/*.tsx': controls stands above predict",
      "src/predict/made-up.ts:9 imports '(computed)': a module is named in a string",
    ]);
  });

  test.each([
    ['src/scene/view.tsx', 'scene and seats may not know each other', "import { Table } from '../seats/table';"],
    ['src/layout/read.ts', 'formats stands above layout', "import { readCsv } from '../formats/csv';"],
    ['src/controls/field.tsx', 'controls may not know layout', "import { schema } from '../layout/schema';"],
    ['src/session/store.ts', 'may not know each other', "import { Field } from '../controls/field';"],
    ['src/acoustics/paths/direct.ts', 'gl-matrix and nothing else', "import * as v from 'valibot';"],
    ['src/predict/run.ts', 'only cli may use Node', "import { readFileSync } from 'node:fs';"],
    ['src/predict/run.ts', 'only cli may use Node', "import { readFileSync } from 'fs';"],
    ['src/panels/item.tsx', 'only scene may use three', "import { Vector3 } from 'three';"],
    ['src/report/page.tsx', 'must work without a page', "import { renderToString } from 'react-dom/server';"],
    ['src/app/main.tsx', 'not among the dependencies', "import lodash from 'lodash';"],
    ['src/app/main.tsx', 'outside src', "import { page } from '../../test/support/page';"],
    ['src/app/main.tsx', 'only layout may read', "import finishes from '../../data/catalogue/finishes.json';"],
    ['src/wild/thing.ts', 'no known folder', ''],
    ['src/layout/utils/read.ts', 'named after nothing', ''],
    ['src/layout/long.ts', 'longer than 400 lines', '//\n'.repeat(401)],
  ])('%s: %s', (path, reason, source) => {
    const problems = problemsOf(path, source, packages);
    expect(problems).toHaveLength(1);
    expect(problems[0]).toContain(reason);
  });

  test.each([
    ['src/formats/csv.ts', "import { schema } from '../layout/schema';"],
    ['src/predict/run.ts', "import { bands } from '../acoustics/bands';\nimport { read } from '../formats/csv';"],
    ['src/layout/catalogue.ts', "import finishes from '../../data/catalogue/finishes.json';"],
    ['src/scene/view.tsx', "import { Canvas } from '@react-three/fiber';\nimport { Vector3 } from 'three';"],
    ['src/app/main.tsx', "import demo from '../../data/layouts/hall.json';\nimport './main.css';"],
    ['src/cli/start.mjs', "import { build } from 'vite';\nimport { join } from 'node:path';"],
    ['src/layout/short.ts', '//\n'.repeat(400)],
  ])('lets %s be', (path, source) => {
    expect(problemsOf(path, source, packages)).toEqual([]);
  });
});
