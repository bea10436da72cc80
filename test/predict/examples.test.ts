import { readdirSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { parseLayout } from '../../src/formats/layout-json';
import { checkLayout } from '../../src/layout/check';
import { predictionJson } from '../../src/predict/prediction-json';
import { predict } from '../../src/predict/run';
import { runPredict } from '../support/command-line';
import { projectPath, projectText } from '../support/files';
import { predictionDifferences } from '../support/prediction-differences';

const folder = 'data/reference/examples';

/** The whole way from a file's text to the JSON contract, as it leaves the program. */
function predictFile(path: string): unknown {
  const outcome = parseLayout(projectText(path));
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.problems));
  expect(outcome.problems).toEqual([]);
  expect(checkLayout(outcome.value).filter(({ severity }) => severity === 'error')).toEqual([]);
  return JSON.parse(JSON.stringify(predictionJson(outcome.value, predict(outcome.value))));
}

/** Every layout of the folder has its prediction beside it. */
const names = readdirSync(projectPath(folder))
  .filter((file) => file.endsWith('.layout.json'))
  .map((file) => file.replace('.layout.json', ''));

test('the folder holds the worked examples', () => {
  expect(names.length).toBeGreaterThanOrEqual(8);
});

describe.each(names)('worked example %s', { timeout: 60_000 }, (name) => {
  const path = `${folder}/${name}.layout.json`;

  test('agrees with the independent implementation in every figure of all three rungs', () => {
    const reference = JSON.parse(projectText(`${folder}/${name}.prediction.json`));
    const differences = predictionDifferences(predictFile(path), reference);
    expect(differences, differences.slice(0, 10).join('\n')).toEqual([]);
  });

  test('the command line prints the very same figures', () => {
    const { status, stdout, stderr } = runPredict([path, '--as', 'json']);
    expect({ status, stderr }).toEqual({ status: 0, stderr: '' });
    expect(JSON.parse(stdout)).toEqual(predictFile(path));
  });
});

test('the comparison itself notices a figure out of tolerance, a missing one and a missing object', () => {
  const reference = {
    seats: [
      { id: 'a', margin_dB: 1, sti: 0.5 },
      { id: 'b', margin_dB: null },
    ],
  };
  const found = { seats: [{ id: 'a', margin_dB: 1.051, sti: 0.5049 }] };
  expect(predictionDifferences({ seats: [found.seats[0], { id: 'b', margin_dB: 2 }] }, reference)).toHaveLength(2);
  expect(predictionDifferences({ seats: [found.seats[0], { id: 'c', margin_dB: null }] }, reference)).toHaveLength(2);
  expect(predictionDifferences(found, reference)).toEqual(['.seats: lists differ in length']);
});
