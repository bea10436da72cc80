import curves from '../../../data/reference/noise-curves.json';
import levels from '../../../data/reference/speech-levels.json';
import table from '../../../data/reference/transmission-index.json';
import { NOMINAL_HZ } from '../../../src/acoustics/bands';
import { powerOfDb } from '../../../src/acoustics/level';
import {
  createTransmissionIndex,
  MODULATION_HZ,
  maskingDb,
  OCTAVE_WEIGHTS,
  RECEPTION_THRESHOLDS_DB,
  REDUNDANCY_CORRECTIONS,
  transmissionIndexOfModulations,
} from '../../../src/acoustics/speech/transmission-index';
import type { PublishedRow } from '../row';

/** The same m at all fourteen frequencies of a band. */
const modulationsOfBands = (perBand: number[]) => perBand.flatMap((m) => Array<number>(14).fill(m));
const uniform = (m: number) => modulationsOfBands(Array<number>(7).fill(m));
const powers = (levelsDb: readonly number[]) => Float64Array.from(levelsDb, powerOfDb);
const stiOf = (m: ArrayLike<number>) => transmissionIndexOfModulations(m).sti;

/** One row a printed value, all of one source and tolerance. */
function list(
  quantity: (index: number) => string,
  values: readonly number[],
  compute: (index: number) => number,
  tolerance: number,
  source: string,
  unit = 'STI',
): PublishedRow[] {
  return values.map((value, index) => ({
    quantity: quantity(index),
    compute: () => compute(index),
    value,
    tolerance,
    unit,
    source,
  }));
}

const { constants, masking } = table;
const band = (index: number) => `${NOMINAL_HZ[index]} Hz`;
const constantRows: PublishedRow[] = [
  ...list(
    (i) => `α ${band(i)}`,
    constants.octaveWeights,
    (i) => OCTAVE_WEIGHTS[i],
    0,
    constants.origin,
    '1',
  ),
  ...list(
    (i) => `β ${band(i)}`,
    constants.redundancyCorrections,
    (i) => REDUNDANCY_CORRECTIONS[i],
    0,
    constants.origin,
    '1',
  ),
  ...list(
    (i) => `reception threshold ${band(i)}`,
    constants.receptionThresholdsDb,
    (i) => RECEPTION_THRESHOLDS_DB[i],
    0,
    constants.origin,
    'dB',
  ),
  // Preferred numbers are rounded from the exact series by up to 1 %.
  ...table.modulationFrequencies.hz.map((value, i) => ({
    quantity: `modulation frequency ${i + 1} of 14`,
    compute: () => MODULATION_HZ[i],
    value,
    tolerance: 0.01 * value,
    unit: 'Hz',
    source: table.modulationFrequencies.origin,
  })),
  ...list(
    (i) => `masking by a band of ${masking.levelDb[i]} dB`,
    masking.maskingDb,
    (i) => maskingDb(masking.levelDb[i]),
    1e-9,
    masking.origin,
    'dB',
  ),
];

const weightRows = list(
  (i) => `STI with only ${band(i)} and ${band(i + 1)} transmitted`,
  table.adjacentBands.sti,
  (i) => stiOf(modulationsOfBands(NOMINAL_HZ.map((_, b) => (b === i || b === i + 1 ? 1 : 0)))),
  0.001,
  table.adjacentBands.origin,
);

const { uniformModulation, uniformModulationCoarse, uniformNoise, pureDecay } = table;
const modulationRows: PublishedRow[] = [
  ...list(
    (i) => `STI of m = ${uniformModulation.m[i]} throughout`,
    uniformModulation.sti,
    (i) => stiOf(uniform(uniformModulation.m[i])),
    // The standard accepts 0.01; its m are printed for these very indices.
    0.001,
    uniformModulation.origin,
  ),
  ...list(
    (i) => `STI of m = ${uniformModulationCoarse.m[i]}, two-figure table`,
    uniformModulationCoarse.sti,
    (i) => stiOf(uniform(uniformModulationCoarse.m[i])),
    0.01,
    uniformModulationCoarse.origin,
  ),
  {
    quantity: 'STI limited to 1 (all m = 1 but 250 Hz m = 0, raw 1.036)',
    compute: () => stiOf(modulationsOfBands([1, 0, 1, 1, 1, 1, 1])),
    value: 1,
    tolerance: 0,
    unit: 'STI',
    source: 'IEC 60268-16:2020, note to Table A.3',
  },
  ...list(
    (i) => `STI at a signal-to-noise ratio of ${uniformNoise.signalToNoiseDb[i]} dB in all bands`,
    uniformNoise.sti,
    (i) => stiOf(uniform(1 / (1 + powerOfDb(-uniformNoise.signalToNoiseDb[i])))),
    0.0001,
    uniformNoise.origin,
  ),
  ...list(
    (i) => `STI of a pure decay of ${pureDecay.decayS[i]} s, no noise or hearing`,
    pureDecay.sti,
    (i) => stiOf(quietModulations(0, 1, pureDecay.decayS[i])),
    // 13.8 there is 13.8155 here: up to 0.0003.
    0.0005,
    pureDecay.origin,
  ),
];

const twoSlopeRows = table.directAndReverberant.cases.flatMap(({ volumeM3, decayS, q, distanceM, sti }) =>
  list(
    (i) => `STI of direct and reverberant sound, ${volumeM3} m³, T ${decayS} s, Q ${q}, ${distanceM[i]} m`,
    sti,
    (i) => {
      const criticalM = 0.057 * Math.sqrt(volumeM3 / decayS);
      return stiOf(quietModulations(q / distanceM[i] ** 2, 1 / criticalM ** 2, decayS));
    },
    0.0005,
    table.directAndReverberant.origin,
  ),
);

const nc35 = curves.noiseCriterion35.levelDb.slice(1);
const hearingRows = table.hearing.spectra.flatMap(({ edition, quietSti, noisy60Sti, noisy70Sti }) => {
  const spectrumDb = edition === 4 ? levels.maleSpectrumFourthEdition.reAWeightedDb : levels.maleSpectrum.reBand500Db;
  const { origin, quietDba, decayS } = table.hearing;
  const name = `edition ${edition} spectrum`;
  return [
    ...list(
      (i) => `STI of ${quietDba[i]} dBA in quiet, ${name}`,
      quietSti,
      (i) => heardSti(spectrumDb, quietDba[i], 0, null),
      0.0001,
      origin,
    ),
    ...list(
      (i) => `STI of 60 dBA, T ${decayS[i]} s, NC-35, ${name}`,
      noisy60Sti,
      (i) => heardSti(spectrumDb, 60, decayS[i], nc35),
      0.0005,
      origin,
    ),
    ...list(
      (i) => `STI of 70 dBA, T ${decayS[i]} s, NC-35, ${name}`,
      noisy70Sti,
      (i) => heardSti(spectrumDb, 70, decayS[i], nc35),
      0.0005,
      origin,
    ),
  ];
});

export const rows: PublishedRow[] = [
  ...constantRows,
  ...weightRows,
  ...modulationRows,
  ...twoSlopeRows,
  ...hearingRows,
];

/** Modulation left by a direct impulse and a decay that starts with it, alike in all bands. */
function quietModulations(direct: number, diffuse: number, decayS: number): Float64Array {
  const index = createTransmissionIndex();
  index.add(0, new Float64Array(7).fill(direct), 0);
  index.addDiffuse(0, new Float64Array(7).fill(diffuse), 0, new Float64Array(7).fill(decayS));
  return index.modulationsInQuiet();
}

/** Speech that decays in `decayS`, with noise, masking and threshold. */
function heardSti(spectrumDb: number[], levelDba: number, decayS: number, noiseDb: number[] | null): number {
  const index = createTransmissionIndex();
  const speech = powers(spectrumDb.map((relativeDb) => relativeDb + levelDba));
  index.addDiffuse(0, speech, 0, new Float64Array(7).fill(decayS));
  return index.finish(noiseDb ? powers(noiseDb) : new Float64Array(7));
}
