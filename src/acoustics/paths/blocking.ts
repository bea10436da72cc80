import { type Faces, heightAbove, insideOutline } from '../room/faces';

/** A crossing this near either end of a leg, measured along it, does not block, metres. */
const END_M = 0.01;

/** A point this near a face's plane lies on it, metres. */
export const ON_PLANE_M = 1e-6;

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
    // A leg that ends in the plane of a face, or lies in it, is not blocked by it; rounding must not decide that.
    if (Math.abs(from) <= ON_PLANE_M || Math.abs(to) <= ON_PLANE_M || from > 0 === to > 0) continue;
    const part = from / (from - to);
    if (part * lengthM <= END_M || (1 - part) * lengthM <= END_M) continue;
    if (insideOutline(faces, face, ax + part * (bx - ax), ay + part * (by - ay), az + part * (bz - az))) return true;
  }
  return false;
}
