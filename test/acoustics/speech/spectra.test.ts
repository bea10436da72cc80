import { expect, test } from 'vitest';
import { aWeightedDb } from '../../../src/acoustics/level';
import { SPEECH_SPECTRUM_DB, talkerLevelsDb, VOCAL_EFFORT_DBA } from '../../../src/acoustics/speech/spectra';

test.each(Object.entries(VOCAL_EFFORT_DBA))('%s speech has exactly %d dBA at 1 m', (_, levelDba) => {
  expect(aWeightedDb(talkerLevelsDb(levelDba))).toBeCloseTo(levelDba, 10);
});

test('the level shifts all bands alike', () => {
  const low = talkerLevelsDb(50);
  const high = talkerLevelsDb(73.5);
  low.forEach((levelDb, band) => {
    expect(high[band] - levelDb).toBeCloseTo(23.5, 10);
    expect(levelDb - low[2]).toBeCloseTo(SPEECH_SPECTRUM_DB[band], 10);
  });
});

test('efforts are 6 dB apart', () => {
  expect(Object.values(VOCAL_EFFORT_DBA)).toEqual([54, 60, 66, 72, 78]);
});
