import { readdirSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { formatLayout, parseLayout } from '../../src/formats/layout-json';
import { checkLayout } from '../../src/layout/check';
import { predict } from '../../src/predict/run';
import { summarise } from '../../src/report/quantities';
import { projectPath, projectText } from '../support/files';

const folder = 'data/layouts';
const files = readdirSync(projectPath(folder)).filter((file) => file.endsWith('.layout.json'));

test('there are three worked venues', () => {
  expect(files).toEqual(['council-chamber.layout.json', 'meeting-room.layout.json', 'recital-hall.layout.json']);
});

describe.each(files)('worked venue %s', (file) => {
  const text = projectText(`${folder}/${file}`);
  const outcome = parseLayout(text);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.problems));
  const layout = outcome.value;
  const prediction = predict(layout);

  test('has nothing to complain of and is written as the program writes', () => {
    expect([...outcome.problems, ...checkLayout(layout)]).toEqual([]);
    expect(formatLayout(layout)).toBe(text);
  });

  test('has two or three schemes: the first serves every seat, another falls short', () => {
    const short = prediction.schemes.map((scheme) => summarise(scheme, null).short);
    expect(short.length).toBeGreaterThanOrEqual(2);
    expect(short[0]).toBe(0);
    expect(Math.max(...short.slice(1))).toBeGreaterThan(0);
  });

  test('is believable: decay, intelligibility and margins a practitioner would expect', () => {
    // Common practice for speech rooms: 0.4…1.3 s at 500 Hz; margins of a good design are small, not tens of dB.
    const { decayS } = prediction.venue;
    expect(decayS[2]).toBeGreaterThan(0.4);
    expect(decayS[2]).toBeLessThan(1.3);
    const { worstMarginDb, stiFrom } = summarise(prediction.schemes[0], null);
    expect(worstMarginDb).toBeGreaterThanOrEqual(0);
    expect(worstMarginDb).toBeLessThan(4);
    expect(stiFrom).toBeGreaterThan(0.55);
  });
});
