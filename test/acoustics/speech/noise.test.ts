import { expect, test } from 'vitest';
import { noiseLevelsOfNr } from '../../../src/acoustics/speech/noise';

test('a noise rating curve passes through its number at 1 kHz and falls with frequency', () => {
  for (const nr of [0, 20, 25, 35.5, 60]) {
    const levelsDb = noiseLevelsOfNr(nr);
    expect(levelsDb).toHaveLength(7);
    expect(levelsDb[3]).toBe(nr);
    for (let b = 1; b < 7; b++) expect(levelsDb[b]).toBeLessThan(levelsDb[b - 1]);
  }
});

test('curves flatten as they rise', () => {
  const slope = (nr: number) => noiseLevelsOfNr(nr)[0] - noiseLevelsOfNr(nr)[6];
  expect(slope(60)).toBeLessThan(slope(20));
  expect(slope(25)).toBeCloseTo(22 + 8 - 25 * 0.16, 10);
});
