import { BAND_COUNT } from '../bands';
import type { Columns } from './table-columns';

/**
 * The four half-planes at 0, 90, 180 and 270° of a table measured in planes; a missing one mirrors its opposite.
 * The table has columns at multiples of 90°, at least one of 0 and 180 and at least one of 90 and 270.
 */
export function halfPlanes(columns: Columns): Columns {
  const { thetaDeg, phiDeg } = columns;
  const sources = HALVES_DEG.map((deg) => {
    const own = columnNear(phiDeg, deg);
    return own >= 0 ? own : columnNear(phiDeg, (deg + 180) % 360);
  });
  if (sources.includes(-1)) throw new RangeError('a table in planes needs a horizontal and a vertical half-plane');
  const levelsDb = new Float64Array(thetaDeg.length * HALVES_DEG.length * BAND_COUNT);
  let at = 0;
  for (let row = 0; row < thetaDeg.length; row++) {
    for (const source of sources) {
      const from = (row * phiDeg.length + source) * BAND_COUNT;
      levelsDb.set(columns.levelsDb.subarray(from, from + BAND_COUNT), at);
      at += BAND_COUNT;
    }
  }
  return { thetaDeg, phiDeg: Float64Array.from(HALVES_DEG), levelsDb };
}

const HALVES_DEG = [0, 90, 180, 270];

function columnNear(phiDeg: Float64Array, deg: number): number {
  return phiDeg.findIndex((phi) => Math.abs(phi - deg) < 0.01);
}
