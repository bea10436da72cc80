import { BAND_COUNT } from '../bands';
import { DB_PER_POWER_NEPER } from '../level';

/** Distance between entries of the table, metres. */
const STEP_M = 0.25;
/** Longer paths are computed outright, metres. */
const MOST_M = 500;

/**
 * Multiplies seven band powers by what a path of some length loses in air, 10^(−a r/10). Looked up every 0.25 m and
 * interpolated: the error is at most (a·0.25 m)²/8 in nepers, below 1e-4 dB up to 0.25 dB/m.
 */
export function createAirLoss(airDbPerM: Float64Array): (lengthM: number, powers: Float64Array) => void {
  const nepers = airDbPerM.map((attenuation) => attenuation / DB_PER_POWER_NEPER);
  const entries = MOST_M / STEP_M + 2;
  const table = new Float64Array(entries * BAND_COUNT);
  for (let i = 0; i < entries; i++) {
    for (let b = 0; b < BAND_COUNT; b++) table[i * BAND_COUNT + b] = Math.exp(-nepers[b] * i * STEP_M);
  }
  return (lengthM, powers) => {
    if (lengthM >= MOST_M) {
      for (let b = 0; b < BAND_COUNT; b++) powers[b] *= Math.exp(-nepers[b] * lengthM);
      return;
    }
    const place = lengthM / STEP_M;
    const entry = Math.floor(place);
    const part = place - entry;
    const at = entry * BAND_COUNT;
    for (let b = 0; b < BAND_COUNT; b++) {
      powers[b] *= table[at + b] + part * (table[at + BAND_COUNT + b] - table[at + b]);
    }
  };
}
