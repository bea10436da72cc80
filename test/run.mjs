/**
 * npm test: installs what is missing, then runs every step, whatever became of the one before it, and ends with one
 * line 'N passed, N failed'. With --quick only the steps that need no build and no browser.
 */
import { spawnSync } from 'node:child_process';
import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureInstalled } from '../src/cli/install.mjs';

/** @typedef {{ passed: number, failed: number }} Count */

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const reports = join(root, 'node_modules', '.cache', 'test-reports');

/** @type {{ title: string, slow?: boolean, run: () => Count }[]} */
const STEPS = [
  { title: 'types', run: () => check('typescript/bin/tsc', ['-p', 'tsconfig.json']) },
  { title: 'types of acoustics, without a page', run: () => check('typescript/bin/tsc', ['-p', 'src/acoustics']) },
  { title: 'lint and format', run: () => check('@biomejs/biome/bin/biome', ['ci']) },
  { title: 'checks', run: () => vitest('checks') },
  { title: 'build', slow: true, run: () => count(node(['src/cli/launch.mjs', 'build'])) },
  { title: 'browser', slow: true, run: () => vitest('browser') },
];

process.exitCode = main(process.argv.includes('--quick'));

/** @param {boolean} quick */
function main(quick) {
  const total = { passed: 0, failed: 0 };
  if (!ensureInstalled(root)) {
    console.error('The packages could not be installed; see npm above.');
    total.failed = 1;
  } else {
    for (const step of STEPS.filter(({ slow }) => !(quick && slow))) {
      console.log(`\n=== ${step.title} ===`);
      const { passed, failed } = step.run();
      console.log(`${step.title}: ${passed} passed, ${failed} failed`);
      total.passed += passed;
      total.failed += failed;
    }
  }
  console.log(`\n${total.passed} passed, ${total.failed} failed`);
  return total.failed === 0 ? 0 : 1;
}

/**
 * A tool that as a whole passes or fails.
 * @param {string} tool below node_modules
 * @param {string[]} args
 */
function check(tool, args) {
  return count(node([join('node_modules', tool), ...args]));
}

/** @param {boolean} good */
function count(good) {
  return good ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 };
}

/**
 * @param {string} project
 * @returns {Count}
 */
function vitest(project) {
  const report = join(reports, `${project}.json`);
  mkdirSync(reports, { recursive: true });
  rmSync(report, { force: true });
  const good = node([
    'node_modules/vitest/vitest.mjs',
    'run',
    `--project=${project}`,
    '--passWithNoTests',
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ]);
  const counted = countReport(report);
  // It may also fail outside any test: in the global setup, by an unhandled error, by a crash.
  if (!good && counted.failed === 0) counted.failed = 1;
  return counted;
}

/**
 * @param {string} report
 * @returns {Count}
 */
function countReport(report) {
  try {
    const { numPassedTests, numFailedTests, testResults } = JSON.parse(readFileSync(report, 'utf8'));
    const broken = testResults.filter(
      (/** @type {{ status: string, assertionResults: { status: string }[] }} */ file) =>
        file.status === 'failed' && !file.assertionResults.some(({ status }) => status === 'failed'),
    );
    return { passed: numPassedTests, failed: numFailedTests + broken.length };
  } catch {
    return { passed: 0, failed: 0 };
  }
}

/**
 * @param {string[]} args
 * @returns {boolean} whether it ended well
 */
function node(args) {
  // Some tools colour what they write to a file or a build log too, which makes it hard to read there.
  const env = process.stdout.isTTY ? process.env : { ...process.env, NO_COLOR: '1' };
  return spawnSync(process.execPath, args, { cwd: root, env, stdio: ['ignore', 'inherit', 'inherit'] }).status === 0;
}
