import { BAND_COUNT } from '../bands';

/** One planar face as given: corners counter-clockwise seen from the side it is looked at from (a shell: inside). */
export interface FaceInput {
  /** x, y, z of each corner in metres. */
  corners: readonly (readonly number[])[];
  /** Absorption coefficients of seven bands. */
  absorption: readonly number[];
  /** 1: part of the shell; 2: free-standing. */
  sides: 1 | 2;
}

/** Planar faces ready for paths. Normals point to the side from which the corners run counter-clockwise. */
export interface Faces {
  count: number;
  /** [face][corner·3 + axis], metres. */
  corners: Float64Array[];
  /** [face·3 + axis], unit. */
  normals: Float64Array;
  /** [face]: n·x of every point x of the plane, metres. */
  offsets: Float64Array;
  /** [face], m², one side. */
  areas: Float64Array;
  /** [face·7 + band]. */
  absorption: Float64Array;
  /** [face]: 1 where free-standing. */
  twoSided: Uint8Array;
  /** [face]: the axis dropped to see the face as a flat polygon. */
  flatAxis: Uint8Array;
  /** [face·6]: least and greatest x, y, z, metres. */
  bounds: Float64Array;
  /** [face]: planes through the edges, square to the face, x y z offset each, positive outwards; null where concave. */
  edgePlanes: (Float64Array | null)[];
}

/** Points this near an edge count as inside, metres. */
export const EDGE_M = 1e-6;

/** Planes by Newell's method (Sutherland et al., ACM Computing Surveys 6, 1974): exact for planar polygons of any shape. */
export function createFaces(inputs: readonly FaceInput[]): Faces {
  const count = inputs.length;
  const faces: Faces = {
    count,
    corners: inputs.map((input) => Float64Array.from(input.corners.flat())),
    normals: new Float64Array(3 * count),
    offsets: new Float64Array(count),
    areas: new Float64Array(count),
    absorption: new Float64Array(BAND_COUNT * count),
    twoSided: Uint8Array.from(inputs, (input) => (input.sides === 2 ? 1 : 0)),
    flatAxis: new Uint8Array(count),
    bounds: new Float64Array(6 * count),
    edgePlanes: [],
  };
  inputs.forEach((input, face) => {
    faces.absorption.set(input.absorption, face * BAND_COUNT);
    measureFace(faces, face);
    faces.edgePlanes.push(convexEdges(faces, face));
  });
  return faces;
}

function measureFace(faces: Faces, face: number): void {
  const corners = faces.corners[face];
  const normal = newellNormal(corners);
  const doubled = Math.hypot(normal[0], normal[1], normal[2]);
  faces.areas[face] = doubled / 2;
  const length = doubled || 1;
  const n = corners.length / 3;
  for (let axis = 0; axis < 3; axis++) {
    faces.normals[3 * face + axis] = normal[axis] / length;
    let [least, greatest] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
    for (let i = 0; i < n; i++) {
      const value = corners[3 * i + axis];
      faces.offsets[face] += ((normal[axis] / length) * value) / n;
      least = Math.min(least, value);
      greatest = Math.max(greatest, value);
    }
    faces.bounds[6 * face + 2 * axis] = least;
    faces.bounds[6 * face + 2 * axis + 1] = greatest;
  }
  const [x, y, z] = normal.map(Math.abs);
  faces.flatAxis[face] = x >= y && x >= z ? 0 : y >= z ? 1 : 2;
}

/** Twice the area along the normal of a closed polygon. */
export function newellNormal(corners: ArrayLike<number>): [number, number, number] {
  const normal: [number, number, number] = [0, 0, 0];
  const n = corners.length / 3;
  // Taken from the first corner, so that a room far from the origin loses no digits.
  const [ox, oy, oz] = [corners[0], corners[1], corners[2]];
  for (let i = 0; i < n; i++) {
    const j = (i + 1) % n;
    const [ax, ay, az] = [corners[3 * i] - ox, corners[3 * i + 1] - oy, corners[3 * i + 2] - oz];
    const [bx, by, bz] = [corners[3 * j] - ox, corners[3 * j + 1] - oy, corners[3 * j + 2] - oz];
    normal[0] += (ay - by) * (az + bz);
    normal[1] += (az - bz) * (ax + bx);
    normal[2] += (ax - bx) * (ay + by);
  }
  return normal;
}

/** Signed distance of a point from the plane of a face, metres; positive on the side its normal points to. */
export function heightAbove(faces: Faces, face: number, x: number, y: number, z: number): number {
  const n = faces.normals;
  return n[3 * face] * x + n[3 * face + 1] * y + n[3 * face + 2] * z - faces.offsets[face];
}

/** Planes through the edges of a convex face, null for a concave one. */
function convexEdges(faces: Faces, face: number): Float64Array | null {
  const corners = faces.corners[face];
  const n = corners.length / 3;
  const [nx, ny, nz] = faces.normals.subarray(3 * face, 3 * face + 3);
  const planes = new Float64Array(4 * n);
  for (let i = 0; i < n; i++) {
    const [a, b] = [3 * i, 3 * ((i + 1) % n)];
    const [ex, ey, ez] = [corners[b] - corners[a], corners[b + 1] - corners[a + 1], corners[b + 2] - corners[a + 2]];
    const length = Math.hypot(ex, ey, ez) || 1;
    // Corners run counter-clockwise about the normal, so edge × normal points out of the face.
    const out = [(ey * nz - ez * ny) / length, (ez * nx - ex * nz) / length, (ex * ny - ey * nx) / length];
    const offset = out[0] * corners[a] + out[1] * corners[a + 1] + out[2] * corners[a + 2];
    planes.set([...out, offset], 4 * i);
    for (let k = 0; k < n; k++) {
      const beyond = out[0] * corners[3 * k] + out[1] * corners[3 * k + 1] + out[2] * corners[3 * k + 2] - offset;
      if (beyond > EDGE_M) return null;
    }
  }
  return planes;
}

/** True where a point of the face's plane lies inside its outline or within 1 µm of an edge. */
export function insideOutline(faces: Faces, face: number, x: number, y: number, z: number): boolean {
  const planes = faces.edgePlanes[face];
  if (planes === null) return insideConcave(faces, face, x, y, z);
  for (let i = 0; i < planes.length; i += 4) {
    if (planes[i] * x + planes[i + 1] * y + planes[i + 2] * z - planes[i + 3] > EDGE_M) return false;
  }
  return true;
}

/** Even-odd rule in the two axes that show the face best (Shimrat, Algorithm 112, CACM 5, 1962). */
function insideConcave(faces: Faces, face: number, x: number, y: number, z: number): boolean {
  const corners = faces.corners[face];
  const drop = faces.flatAxis[face];
  const first = drop === 0 ? 1 : 0;
  const second = drop === 2 ? 1 : 2;
  const px = first === 0 ? x : y;
  const py = second === 1 ? y : z;
  let inside = false;
  const n = corners.length / 3;
  for (let i = 0, j = n - 1; i < n; j = i++) {
    const ax = corners[3 * i + first];
    const ay = corners[3 * i + second];
    const bx = corners[3 * j + first];
    const by = corners[3 * j + second];
    if (ay > py !== by > py && px < ((bx - ax) * (py - ay)) / (by - ay) + ax) inside = !inside;
    // Only an edge whose box holds the point can lie this near it.
    if (px < Math.min(ax, bx) - EDGE_M || px > Math.max(ax, bx) + EDGE_M) continue;
    if (py < Math.min(ay, by) - EDGE_M || py > Math.max(ay, by) + EDGE_M) continue;
    if (distanceToSegment(corners, 3 * i, 3 * j, x, y, z) <= EDGE_M) return true;
  }
  return inside;
}

function distanceToSegment(c: Float64Array, a: number, b: number, x: number, y: number, z: number): number {
  const [ex, ey, ez] = [c[b] - c[a], c[b + 1] - c[a + 1], c[b + 2] - c[a + 2]];
  const [dx, dy, dz] = [x - c[a], y - c[a + 1], z - c[a + 2]];
  const along = Math.min(1, Math.max(0, (dx * ex + dy * ey + dz * ez) / (ex * ex + ey * ey + ez * ez || 1)));
  return Math.hypot(dx - along * ex, dy - along * ey, dz - along * ez);
}

/** Distance of a point from a face as a bounded piece of surface, metres. */
export function distanceToFace(faces: Faces, face: number, x: number, y: number, z: number): number {
  const height = heightAbove(faces, face, x, y, z);
  const n = faces.normals;
  const foot = [0, 1, 2].map((axis) => [x, y, z][axis] - height * n[3 * face + axis]);
  if (insideOutline(faces, face, foot[0], foot[1], foot[2])) return Math.abs(height);
  const corners = faces.corners[face];
  let least = Number.POSITIVE_INFINITY;
  const count = corners.length / 3;
  for (let i = 0; i < count; i++) {
    least = Math.min(least, distanceToSegment(corners, 3 * i, 3 * ((i + 1) % count), x, y, z));
  }
  return least;
}

/** Faces met this near each other (relative) are met together; the first of them is taken. */
const TIE = 1e-9;

/** The first face met along a ray, and how far, beyond `leastM`; null where nothing is hit. */
export function firstHit(
  faces: Faces,
  origin: ArrayLike<number>,
  direction: ArrayLike<number>,
  leastM: number,
  excluded: number,
): { face: number; distanceM: number } | null {
  let hit: { face: number; distanceM: number } | null = null;
  const n = faces.normals;
  for (let face = 0; face < faces.count; face++) {
    if (face === excluded) continue;
    const slope = n[3 * face] * direction[0] + n[3 * face + 1] * direction[1] + n[3 * face + 2] * direction[2];
    if (Math.abs(slope) < 1e-12) continue;
    const distanceM = -heightAbove(faces, face, origin[0], origin[1], origin[2]) / slope;
    if (distanceM < leastM || (hit !== null && distanceM >= hit.distanceM * (1 - TIE))) continue;
    const x = origin[0] + distanceM * direction[0];
    const y = origin[1] + distanceM * direction[1];
    const z = origin[2] + distanceM * direction[2];
    if (insideOutline(faces, face, x, y, z)) hit = { face, distanceM };
  }
  return hit;
}
