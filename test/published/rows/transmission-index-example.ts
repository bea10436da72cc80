import table from '../../../data/reference/transmission-index.json';
import { NOMINAL_HZ } from '../../../src/acoustics/bands';
import { dbOfPower, powerOfDb } from '../../../src/acoustics/level';
import {
  auditoryPowers,
  maskingDb,
  transmissionIndexOfModulations,
} from '../../../src/acoustics/speech/transmission-index';
import type { PublishedRow } from '../row';

/**
 * The standard's worked example, step by step: a matrix measured in little noise is freed of noise, masking and
 * threshold (step 2), then given those of the operating condition (step 3), and summed.
 */
const example = table.workedExample;
const powers = (levelsDb: readonly number[]) => Float64Array.from(levelsDb, powerOfDb);

const measuredSpeech = powers(example.measuredSpeechDb);
const measuredNoise = powers(example.measuredNoiseDb);
const speech = powers(example.measuredSpeechDb.map((levelDb) => levelDb + example.operationalSpeechGainDb));
const noise = powers(example.operationalNoiseDb);

const rowsOf = (
  quantity: string,
  values: readonly number[],
  compute: (band: number) => number,
  tolerance: number,
  unit: string,
  source = example.origin,
): PublishedRow[] =>
  values.map((value, i) => {
    const band = i + NOMINAL_HZ.length - values.length;
    return {
      quantity: `${quantity}, ${NOMINAL_HZ[band]} Hz`,
      compute: () => compute(band),
      value,
      tolerance,
      unit,
      source,
    };
  });

// Tolerances are half the last printed digit, and a tenth more because inputs are printed rounded too;
// an adjusted m carries the rounding of the measured m as well as its own.
const HALF_TENTH_DB = 0.055;
const HALF_THOUSANDTH = 0.00055;
const TWO_ROUNDINGS = 0.0011;

export const rows: PublishedRow[] = [
  ...rowsOf(
    'worked example, masking while measuring',
    example.measuredMaskingDb,
    (band) => maskingDb(dbOfPower(measuredSpeech[band - 1] + measuredNoise[band - 1])),
    HALF_TENTH_DB,
    'dB',
  ),
  ...rowsOf(
    'worked example, divisor of the measurement',
    example.measuredDivisor,
    (band) => 1 / speechShare(measuredSpeech, measuredNoise, band),
    HALF_THOUSANDTH,
    '1',
  ),
  ...rowsOf(
    'worked example, masking in operation',
    example.operationalMaskingDb,
    (band) => maskingDb(dbOfPower(speech[band - 1] + noise[band - 1])),
    HALF_TENTH_DB,
    'dB',
  ),
  ...rowsOf(
    'worked example, factor of operation',
    example.operationalFactor,
    (band) => speechShare(speech, noise, band),
    HALF_THOUSANDTH,
    '1',
  ),
  ...rowsOf('worked example, m at 0.63 Hz', example.adjustedFirstRow, (b) => adjusted()[b * 14], TWO_ROUNDINGS, '1'),
  ...rowsOf(
    'worked example, m at 12.5 Hz',
    example.adjustedLastRow,
    (b) => adjusted()[b * 14 + 13],
    TWO_ROUNDINGS,
    '1',
  ),
  ...rowsOf(
    'worked example, MTI',
    example.mti,
    (band) => transmissionIndexOfModulations(adjusted()).mti[band],
    0.0055,
    'MTI',
  ),
  ...rowsOf(
    'worked example, MTI to three figures',
    example.recomputed.mti,
    (band) => transmissionIndexOfModulations(adjusted()).mti[band],
    HALF_THOUSANDTH,
    'MTI',
    example.recomputed.origin,
  ),
  {
    quantity: 'worked example, STI',
    compute: () => transmissionIndexOfModulations(adjusted()).sti,
    value: example.sti,
    tolerance: 0.005,
    unit: 'STI',
    source: example.origin,
  },
  {
    quantity: 'worked example, STI to four figures',
    compute: () => transmissionIndexOfModulations(adjusted()).sti,
    value: example.recomputed.sti,
    tolerance: 0.0001,
    unit: 'STI',
    source: example.recomputed.origin,
  },
  {
    quantity: 'worked example, STI of the measured matrix as it stands',
    compute: () => transmissionIndexOfModulations(measured()).sti,
    value: example.recomputed.uncorrectedSti,
    tolerance: 0.0001,
    unit: 'STI',
    source: example.recomputed.origin,
  },
];

/** The printed matrix has a row a modulation frequency; the program has [band][frequency]. */
function measured(): number[] {
  return NOMINAL_HZ.flatMap((_, band) => example.modulations.map((row) => row[band]));
}

function adjusted(): number[] {
  return measured().map((m, cell) => {
    const band = Math.floor(cell / 14);
    const alone = Math.min(1, m / speechShare(measuredSpeech, measuredNoise, band));
    return alone * speechShare(speech, noise, band);
  });
}

/** Speech over all that is heard in a band. */
function speechShare(speechPowers: Float64Array, noisePowers: Float64Array, band: number): number {
  const heard = new Float64Array(7);
  auditoryPowers(speechPowers, noisePowers, heard);
  return speechPowers[band] / heard[band];
}
