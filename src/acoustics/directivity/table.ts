import { BAND_COUNT } from '../bands';
import { FLOOR_POWER, type Pattern } from './pattern';
import { type Columns, columnsOf, type DirectivityTable } from './table-columns';
import { halfPlanes } from './table-planes';

const NEPERS_PER_DB = Math.LN10 / 10;
const DEG_PER_RAD = 180 / Math.PI;

/**
 * Measured or imported pattern: linear in dB in θ, periodic and linear in dB in φ, or half-planes blended by
 * cos²φ and sin²φ; beyond the last θ row that row is held; one φ column is axisymmetric. Floored after interpolation.
 */
export function createTable(table: DirectivityTable): Pattern {
  if (table.phi.length === 1) return axisymmetricTable(columnsOf(table));
  return table.planes === true ? blendedTable(halfPlanes(columnsOf(table))) : fullTable(columnsOf(table));
}

function axisymmetricTable(columns: Columns): Pattern {
  const levelsDb = new Float64Array(BAND_COUNT);
  return {
    axisymmetric: true,
    powers(u, v, w, out, at) {
      const row = rowAt(columns.thetaDeg, Math.atan2(Math.hypot(v, w), u) * DEG_PER_RAD);
      levelsDb.fill(0);
      addLevels(columns, row, 0, 1, levelsDb);
      writePowers(levelsDb, out, at);
    },
  };
}

function fullTable(columns: Columns): Pattern {
  const { phiDeg } = columns;
  const levelsDb = new Float64Array(BAND_COUNT);
  return {
    axisymmetric: false,
    powers(u, v, w, out, at) {
      const sine = Math.hypot(v, w);
      const row = rowAt(columns.thetaDeg, Math.atan2(sine, u) * DEG_PER_RAD);
      const clockDeg = sine < 1e-9 ? 0 : Math.atan2(w, v) * DEG_PER_RAD;
      const turn = clockDeg < 0 ? clockDeg + 360 : clockDeg;
      // Columns rise from 0 to below 360: before the first one the last one's interval goes on across 0.
      const left = turn < phiDeg[0] ? phiDeg.length - 1 : intervalOf(phiDeg, turn);
      const right = left + 1 < phiDeg.length ? left + 1 : 0;
      const width = right === 0 ? phiDeg[0] + 360 - phiDeg[left] : phiDeg[right] - phiDeg[left];
      const share = (turn < phiDeg[left] ? turn + 360 - phiDeg[left] : turn - phiDeg[left]) / width;
      levelsDb.fill(0);
      addLevels(columns, row, left, 1 - share, levelsDb);
      addLevels(columns, row, right, share, levelsDb);
      writePowers(levelsDb, out, at);
    },
  };
}

/** Columns are the half-planes at 0, 90, 180 and 270°. */
function blendedTable(columns: Columns): Pattern {
  const levelsDb = new Float64Array(BAND_COUNT);
  return {
    axisymmetric: false,
    powers(u, v, w, out, at) {
      const sine = Math.hypot(v, w);
      const row = rowAt(columns.thetaDeg, Math.atan2(sine, u) * DEG_PER_RAD);
      const cosClock = sine < 1e-9 ? 1 : v / sine;
      const sinClock = sine < 1e-9 ? 0 : w / sine;
      levelsDb.fill(0);
      addLevels(columns, row, cosClock >= 0 ? 0 : 2, cosClock * cosClock, levelsDb);
      addLevels(columns, row, sinClock >= 0 ? 1 : 3, sinClock * sinClock, levelsDb);
      writePowers(levelsDb, out, at);
    },
  };
}

/** Place among the θ rows as a whole part and a fraction, held at the last row. */
function rowAt(thetaDeg: Float64Array, angleDeg: number): number {
  const last = thetaDeg.length - 1;
  if (angleDeg >= thetaDeg[last]) return last;
  const row = intervalOf(thetaDeg, angleDeg);
  return row + (angleDeg - thetaDeg[row]) / (thetaDeg[row + 1] - thetaDeg[row]);
}

/** Index of the last entry not above x, at least 0. */
function intervalOf(rising: Float64Array, x: number): number {
  let low = 0;
  let high = rising.length;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (rising[middle] <= x) low = middle;
    else high = middle;
  }
  return low;
}

/** Adds weight times the levels of one column at a fractional row. */
function addLevels(columns: Columns, row: number, column: number, weight: number, levelsDb: Float64Array): void {
  const whole = Math.floor(row);
  const fraction = row - whole;
  const stride = columns.phiDeg.length * BAND_COUNT;
  const near = whole * stride + column * BAND_COUNT;
  const far = fraction === 0 ? near : near + stride;
  for (let b = 0; b < BAND_COUNT; b++) {
    const level = columns.levelsDb[near + b] * (1 - fraction) + columns.levelsDb[far + b] * fraction;
    levelsDb[b] += weight * level;
  }
}

function writePowers(levelsDb: Float64Array, out: Float64Array, at: number): void {
  for (let b = 0; b < BAND_COUNT; b++) {
    out[at + b] = Math.max(FLOOR_POWER, Math.exp(NEPERS_PER_DB * levelsDb[b]));
  }
}
