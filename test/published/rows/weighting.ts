import table from '../../../data/reference/a-weighting.json';
import speech from '../../../data/reference/speech-levels.json';
import { CENTRES_HZ } from '../../../src/acoustics/bands';
import { aWeightingDb, dbOfPower, powerOfDb } from '../../../src/acoustics/level';
import type { PublishedRow } from '../row';

const printed: PublishedRow[] = table.weightDb.map((value, column) => ({
  quantity: `A-weighting at ${table.bandsHz[column]} Hz, exact centre`,
  compute: () => aWeightingDb(1000 * 10 ** (0.3 * (column - 4))),
  value,
  tolerance: 0.05,
  unit: 'dB',
  source: table.origin,
}));

const exact: PublishedRow[] = table.analytic.atExactCentresDb.map((value, band) => ({
  quantity: `A-weighting at the exact centre ${CENTRES_HZ[band].toFixed(1)} Hz`,
  compute: () => aWeightingDb(CENTRES_HZ[band]),
  value,
  tolerance: 0.006,
  unit: 'dB',
  source: table.analytic.origin,
}));

const nominal: PublishedRow[] = table.analytic.atNominalHz.map((value, band) => ({
  quantity: `A-weighting at the nominal ${table.analytic.bandsHz[band]} Hz`,
  compute: () => aWeightingDb(table.analytic.bandsHz[band]),
  value,
  tolerance: 0.006,
  unit: 'dB',
  source: table.analytic.origin,
}));

/** A-weighted sums of published third-octave spectra. The printed dBA includes bands outside the eighteen thirds. */
const sums: PublishedRow[] = speech.thirdOctaves.efforts.flatMap(({ effort, dba, summedDba, spectrumLevelDb }) => {
  const compute = () => aWeightedThirdsDb(spectrumLevelDb);
  return [
    {
      quantity: `dBA of ${effort} speech, eighteen thirds against the printed total`,
      compute,
      value: dba,
      tolerance: 0.35,
      unit: 'dBA',
      source: speech.thirdOctaves.origin,
    },
    {
      quantity: `dBA of ${effort} speech, sum of eighteen thirds`,
      compute,
      value: summedDba,
      tolerance: 0.06,
      unit: 'dBA',
      source: 'recomputed from ANSI S3.5-1997, Table 3',
    },
  ];
});

export const rows: PublishedRow[] = [...printed, ...exact, ...nominal, ...sums];

function aWeightedThirdsDb(spectrumLevelDb: number[]): number {
  let power = 0;
  spectrumLevelDb.forEach((levelDb, third) => {
    const frequencyHz = 1000 * 10 ** (0.1 * (third - 8));
    const widthHz = frequencyHz * (10 ** 0.05 - 10 ** -0.05);
    power += widthHz * powerOfDb(levelDb + aWeightingDb(frequencyHz));
  });
  return dbOfPower(power);
}
