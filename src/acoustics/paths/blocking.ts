import { type Faces, heightAbove, insideOutline } from '../room/faces';

/** A crossing this near either end of a leg, measured along it, does not block, metres. */
const END_M = 0.01;

/**
 * True where a face lies across the straight leg between two points. Faces block from both sides and at every
 * frequency; diffraction round edges is left out. `skipA` and `skipB` are faces that never block this leg (−1 for none).
 */
export function isBlocked(
  faces: Faces,
  ax: number,
  ay: number,
  az: number,
  bx: number,
  by: number,
  bz: number,
  skipA: number,
  skipB: number,
): boolean {
  const lengthM = Math.sqrt((bx - ax) ** 2 + (by - ay) ** 2 + (bz - az) ** 2);
  for (let face = 0; face < faces.count; face++) {
    if (face === skipA || face === skipB) continue;
    const from = heightAbove(faces, face, ax, ay, az);
    const to = heightAbove(faces, face, bx, by, bz);
    if (from > 0 === to > 0 && from !== 0 && to !== 0) continue;
    if (from === to) continue;
    const part = from / (from - to);
    if (part < 0 || part > 1) continue;
    if (part * lengthM <= END_M || (1 - part) * lengthM <= END_M) continue;
    if (insideOutline(faces, face, ax + part * (bx - ax), ay + part * (by - ay), az + part * (bz - az))) return true;
  }
  return false;
}
