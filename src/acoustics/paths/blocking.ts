import { type Faces, heightAbove, insideOutline } from '../room/faces';

/** A crossing this near either end of a leg, measured along it, does not block, metres. */
const END_M = 0.01;

/** A point this near a face's plane lies on it, metres. */
export const ON_PLANE_M = 1e-6;

/** Which faces can block at all. */
export interface Blockers {
  every: Int32Array;
  /**
   * Faces that could block a leg between points on the inner side of all others: without those that have the whole
   * room on their front, such as the outer walls of most rooms.
   */
  inner: Int32Array;
  /** True where a point lies in front of every face left out of `inner`. */
  isInner(x: number, y: number, z: number): boolean;
}

/** Far below the distance at which a point counts as on a plane, so that leaving faces out changes no answer, metres. */
const EXACT_M = 1e-9;

export function createBlockers(faces: Faces): Blockers {
  const every = Int32Array.from({ length: faces.count }, (_, face) => face);
  const outer = every.filter((face) =>
    faces.corners.every((corners) => {
      for (let i = 0; i < corners.length; i += 3) {
        if (heightAbove(faces, face, corners[i], corners[i + 1], corners[i + 2]) < -EXACT_M) return false;
      }
      return true;
    }),
  );
  return {
    every,
    inner: every.filter((face) => !outer.includes(face)),
    isInner: (x, y, z) => outer.every((face) => heightAbove(faces, face, x, y, z) >= -EXACT_M),
  };
}

/**
 * True where a face lies across the straight leg between two points. Faces block from both sides and at every
 * frequency; diffraction round edges is left out. Only the faces of `among` are asked; `skipA` and `skipB` are faces that
 * never block this leg (−1 for none).
 */
export function isBlocked(
  faces: Faces,
  among: Int32Array,
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
  for (let i = 0; i < among.length; i++) {
    const face = among[i];
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
