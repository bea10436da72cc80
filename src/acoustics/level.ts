import { BAND_COUNT, CENTRES_HZ } from './bands';

/** Power ratio of a level difference in dB. */
export const powerOfDb = (levelDb: number): number => 10 ** (levelDb / 10);

/** Level in dB of a power ratio; −Infinity for 0. */
export const dbOfPower = (power: number): number => 10 * Math.log10(power);

/** 10 log₁₀ e: decibels of one neper of power. */
export const DB_PER_POWER_NEPER = 10 * Math.LOG10E;

/** A-weighting in dB at frequency f (IEC 61672-1:2013, E.4.2, poles at 20.6, 107.7, 737.9 and 12194 Hz). */
export function aWeightingDb(frequencyHz: number): number {
  return response(frequencyHz) - response(1000);
}

function response(frequencyHz: number): number {
  const f2 = frequencyHz * frequencyHz;
  const low = 20.598997 ** 2;
  const second = 107.65265 ** 2;
  const third = 737.86223 ** 2;
  const high = 12194.217 ** 2;
  const gain = (high * f2 * f2) / ((f2 + low) * Math.sqrt((f2 + second) * (f2 + third)) * (f2 + high));
  return 20 * Math.log10(gain);
}

/** A-weights of the seven bands, as power factors at the exact centres. */
export const A_WEIGHTS: Float64Array = Float64Array.from(CENTRES_HZ, (f) => powerOfDb(aWeightingDb(f)));

/** Energy sum of seven band powers after A-weighting (power). */
export function aWeightedPower(powers: ArrayLike<number>, at = 0): number {
  let sum = 0;
  for (let b = 0; b < BAND_COUNT; b++) sum += A_WEIGHTS[b] * powers[at + b];
  return sum;
}

/** dBA of seven band levels in dB. */
export function aWeightedDb(levelsDb: ArrayLike<number>): number {
  let sum = 0;
  for (let b = 0; b < BAND_COUNT; b++) sum += A_WEIGHTS[b] * powerOfDb(levelsDb[b]);
  return dbOfPower(sum);
}
