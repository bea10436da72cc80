import { BAND_COUNT } from '../bands';
import { type Faces, heightAbove, insideOutline } from '../room/faces';
import { isBlocked, ON_PLANE_M } from './blocking';

/** Images of one source this near each other are one, metres. */
const SAME_IMAGE_M = 1e-5;

/**
 * Image sources of one point up to an order (Allen & Berkley 1979; Borish 1984 for polyhedra). Image 0 is the source
 * itself; the rest stand by rising order, within one order by the faces met. They depend on the source and the faces
 * alone, so they are found once and serve every receiver.
 */
export interface ImageTree {
  count: number;
  /** [image·3 + axis], metres. */
  positions: Float64Array;
  /** Image it is the reflection of, [image]; −1 for the source. */
  parents: Int32Array;
  /** Face it is reflected in, [image]; −1 for the source. */
  faces: Int32Array;
  /** Π(1 − α) over the faces met: [image·7 + band]. */
  reflected: Float64Array;
  /** An earlier image at the same place, [image]; −1 for none. Chains lead through all of them. */
  twins: Int32Array;
}

/** All images that some receiver could see; those behind a face of the shell are left out. `host` −1 for none. */
export function imageTree(faces: Faces, x: number, y: number, z: number, host: number, order: number): ImageTree {
  const positions = [x, y, z];
  const parents = [-1];
  const met = [-1];
  const reflected = [1, 1, 1, 1, 1, 1, 1];
  let [from, to] = [0, 1];
  for (let depth = 1; depth <= order; depth++) {
    for (let parent = from; parent < to; parent++) {
      for (let face = 0; face < faces.count; face++) {
        if (face === met[parent] || (parent === 0 && face === host)) continue;
        const [px, py, pz] = [positions[3 * parent], positions[3 * parent + 1], positions[3 * parent + 2]];
        const height = heightAbove(faces, face, px, py, pz);
        if (Math.abs(height) <= ON_PLANE_M || (height < 0 && !faces.twoSided[face])) continue;
        if (parent > 0 && !isLit(faces, met[parent], px, py, pz, face)) continue;
        for (let axis = 0; axis < 3; axis++) {
          positions.push(positions[3 * parent + axis] - 2 * height * faces.normals[3 * face + axis]);
        }
        for (let b = 0; b < BAND_COUNT; b++) {
          reflected.push(reflected[parent * BAND_COUNT + b] * (1 - faces.absorption[face * BAND_COUNT + b]));
        }
        parents.push(parent);
        met.push(face);
      }
    }
    [from, to] = [to, parents.length];
  }
  const all = Float64Array.from(positions);
  return {
    count: parents.length,
    positions: all,
    parents: Int32Array.from(parents),
    faces: Int32Array.from(met),
    reflected: Float64Array.from(reflected),
    twins: findTwins(all),
  };
}

/** A face this far outside the beam is dark, metres: far more than a point may lie outside an outline. */
const DARK_M = 1e-4;

/**
 * False where no ray from an image, through the face it was mirrored in, can reach another face (Borish's proximity
 * and visibility tests as one beam): that face lies wholly behind the mirror or wholly beyond one of its edges.
 * Dropping it loses no path; it keeps the tree from growing with every face at every order.
 */
function isLit(faces: Faces, mirror: number, x: number, y: number, z: number, face: number): boolean {
  const target = faces.corners[face];
  const front = heightAbove(faces, mirror, x, y, z) < 0 ? 1 : -1;
  let ahead = false;
  for (let i = 0; i < target.length && !ahead; i += 3) {
    // A face that only touches the mirror's plane may still be met in the edge they share.
    ahead = front * heightAbove(faces, mirror, target[i], target[i + 1], target[i + 2]) >= -ON_PLANE_M;
  }
  if (!ahead) return false;
  // The beam of a concave mirror is not bounded by the planes through its edges.
  if (faces.edgePlanes[mirror] === null) return true;
  const edge = faces.corners[mirror];
  const n = edge.length / 3;
  for (let i = 0; i < n; i++) {
    const [a, b, inner] = [3 * i, 3 * ((i + 1) % n), 3 * ((i + 2) % n)];
    const [ax, ay, az] = [edge[a] - x, edge[a + 1] - y, edge[a + 2] - z];
    const [bx, by, bz] = [edge[b] - x, edge[b + 1] - y, edge[b + 2] - z];
    const [nx, ny, nz] = [ay * bz - az * by, az * bx - ax * bz, ax * by - ay * bx];
    const inside = nx * (edge[inner] - x) + ny * (edge[inner + 1] - y) + nz * (edge[inner + 2] - z);
    const length = Math.hypot(nx, ny, nz);
    // Three corners in line, or an image in the edge's own line, bound nothing.
    if (Math.abs(inside) <= DARK_M * length) continue;
    const limit = -DARK_M * length;
    let dark = true;
    for (let k = 0; k < target.length && dark; k += 3) {
      const beyond = nx * (target[k] - x) + ny * (target[k + 1] - y) + nz * (target[k + 2] - z);
      dark = Math.sign(inside) * beyond < limit;
    }
    if (dark) return false;
  }
  return true;
}

function findTwins(positions: Float64Array): Int32Array {
  const count = positions.length / 3;
  const byX = Array.from({ length: count }, (_, i) => i).sort((a, b) => positions[3 * a] - positions[3 * b]);
  const twins = new Int32Array(count).fill(-1);
  byX.forEach((image, place) => {
    for (let k = place - 1; k >= 0 && positions[3 * image] - positions[3 * byX[k]] <= SAME_IMAGE_M; k--)
      join(image, byX[k]);
  });
  return twins;

  function join(a: number, b: number): void {
    const [dx, dy, dz] = [0, 1, 2].map((axis) => positions[3 * a + axis] - positions[3 * b + axis]);
    if (Math.hypot(dx, dy, dz) > SAME_IMAGE_M) return;
    const [later, earlier] = a > b ? [a, b] : [b, a];
    twins[later] = Math.max(twins[later], earlier);
  }
}

/** Where a path leaves its source and arrives at its receiver, and how long it is. */
export interface Reflection {
  lengthM: number;
  /** From the source to the first reflection point, metres. */
  departure: Float64Array;
  /** From the receiver to the last reflection point, metres. */
  arrival: Float64Array;
}

export const createReflection = (): Reflection => ({
  lengthM: 0,
  departure: new Float64Array(3),
  arrival: new Float64Array(3),
});

/**
 * Follows the path from a receiver back to the source through one image (not image 0). False where a reflection point
 * misses its face, the receiver lies behind the last face or on it, or another face of `among` blocks a leg; else
 * `out` is filled.
 */
export function traceImage(
  faces: Faces,
  tree: ImageTree,
  image: number,
  x: number,
  y: number,
  z: number,
  receiverHost: number,
  among: Int32Array,
  out: Reflection,
): boolean {
  const last = tree.faces[image];
  if (last === receiverHost) return false;
  const height = heightAbove(faces, last, x, y, z);
  if (Math.abs(height) <= ON_PLANE_M || (height < 0 && !faces.twoSided[last])) return false;
  const p = tree.positions;
  let tx = x;
  let ty = y;
  let tz = z;
  let previous = -1;
  for (let at = image; at !== 0; at = tree.parents[at]) {
    const face = tree.faces[at];
    const from = heightAbove(faces, face, tx, ty, tz);
    const to = heightAbove(faces, face, p[3 * at], p[3 * at + 1], p[3 * at + 2]);
    if (from === to) return false;
    // Two reflections on the edge their faces share are one place; rounding must not put the second behind its face.
    const part = previous >= 0 && Math.abs(from) <= ON_PLANE_M ? 0 : from / (from - to);
    if (!(part >= 0 && part <= 1)) return false;
    const hx = tx + part * (p[3 * at] - tx);
    const hy = ty + part * (p[3 * at + 1] - ty);
    const hz = tz + part * (p[3 * at + 2] - tz);
    if (!insideOutline(faces, face, hx, hy, hz)) return false;
    if (isBlocked(faces, among, tx, ty, tz, hx, hy, hz, face, previous)) return false;
    if (at === image) {
      out.arrival[0] = hx - x;
      out.arrival[1] = hy - y;
      out.arrival[2] = hz - z;
    }
    tx = hx;
    ty = hy;
    tz = hz;
    previous = face;
  }
  if (isBlocked(faces, among, tx, ty, tz, p[0], p[1], p[2], previous, -1)) return false;
  out.departure[0] = tx - p[0];
  out.departure[1] = ty - p[1];
  out.departure[2] = tz - p[2];
  out.lengthM = Math.sqrt((p[3 * image] - x) ** 2 + (p[3 * image + 1] - y) ** 2 + (p[3 * image + 2] - z) ** 2);
  return true;
}
