import { BAND_COUNT } from '../bands';

/** Measured levels in dB relative to on-axis. Angles in degrees; `levels` is [band][theta][phi]. */
export interface DirectivityTable {
  theta: readonly number[];
  phi: readonly number[];
  levels: readonly (readonly (readonly number[])[])[];
  /** The columns are half-planes at multiples of 90°, to be blended. */
  planes?: boolean | undefined;
}

/** A table made ready for look-up: θ rising; φ rising from 0 to below 360, each once; levels [theta][phi][band]. */
export interface Columns {
  readonly thetaDeg: Float64Array;
  readonly phiDeg: Float64Array;
  readonly levelsDb: Float64Array;
}

/** Sorts rows and columns, brings φ into 0 … 360 and drops a repeated angle (as 0 and 360), keeping the first. */
export function columnsOf(table: DirectivityTable): Columns {
  const thetas = sortedOnce(table.theta);
  const phis = sortedOnce(table.phi.map(wrapped));
  const levelsDb = new Float64Array(thetas.length * phis.length * BAND_COUNT);
  let at = 0;
  for (const theta of thetas) {
    for (const phi of phis) {
      for (let b = 0; b < BAND_COUNT; b++) levelsDb[at++] = table.levels[b][theta.index][phi.index];
    }
  }
  return {
    thetaDeg: Float64Array.from(thetas, (theta) => theta.deg),
    phiDeg: Float64Array.from(phis, (phi) => phi.deg),
    levelsDb,
  };
}

const SAME_ANGLE_DEG = 1e-6;

/** Into 0 … 360; within rounding of 360 is 0. */
function wrapped(deg: number): number {
  const turn = ((deg % 360) + 360) % 360;
  return turn > 360 - SAME_ANGLE_DEG ? 0 : turn;
}

function sortedOnce(angles: readonly number[]): { deg: number; index: number }[] {
  const sorted = angles.map((deg, index) => ({ deg, index })).sort((a, b) => a.deg - b.deg || a.index - b.index);
  return sorted.filter((angle, i) => i === 0 || angle.deg - sorted[i - 1].deg > SAME_ANGLE_DEG);
}
