import { vec3 } from 'gl-matrix';
import type { Faces } from './faces';

/** Corners nearer than this are one corner, metres. */
const WELD_M = 1e-3;

/** An edge of the shell that is not met exactly once in each direction. */
export interface OpenEdge {
  /** Index of the face it belongs to. */
  face: number;
  from: [number, number, number];
  to: [number, number, number];
}

/**
 * Edges at which the shell (faces of one side) is open; none where it is closed. An edge is split at corners that lie
 * on it, corners are matched within 1 mm, and each piece must be met once in each direction.
 */
export function openEdges(faces: Faces): OpenEdge[] {
  const points = weldCorners(faces);
  const met = new Map<string, OpenEdge[]>();
  for (let face = 0; face < faces.count; face++) {
    if (faces.twoSided[face]) continue;
    for (const [a, b] of splitEdges(faces.corners[face], points)) {
      const key = `${a}>${b}`;
      met.set(key, [...(met.get(key) ?? []), { face, from: points[a], to: points[b] }]);
    }
  }
  const open: OpenEdge[] = [];
  for (const [key, edges] of met) {
    const [a, b] = key.split('>');
    const back = met.get(`${b}>${a}`)?.length ?? 0;
    if (edges.length !== 1 || back !== 1) open.push(edges[0]);
  }
  return open;
}

type Point = [number, number, number];

function weldCorners(faces: Faces): Point[] {
  const points: Point[] = [];
  for (let face = 0; face < faces.count; face++) {
    if (faces.twoSided[face]) continue;
    for (const corner of cornersOf(faces.corners[face])) {
      if (indexOf(points, corner) < 0) points.push(corner);
    }
  }
  return points;
}

function cornersOf(corners: Float64Array): Point[] {
  return Array.from({ length: corners.length / 3 }, (_, i) => [corners[3 * i], corners[3 * i + 1], corners[3 * i + 2]]);
}

const apart = (a: Point, b: Point): number => vec3.distance(a, b);

const indexOf = (points: readonly Point[], corner: Point): number =>
  points.findIndex((p) => apart(p, corner) <= WELD_M);

/** The outline of a face as pairs of welded points, its edges cut at every welded point that lies on them. */
function splitEdges(corners: Float64Array, points: readonly Point[]): [number, number][] {
  const outline = cornersOf(corners).map((corner) => indexOf(points, corner));
  const pieces: [number, number][] = [];
  outline.forEach((start, i) => {
    const end = outline[(i + 1) % outline.length];
    if (start === end) return;
    const between = points
      .map((point, index) => ({ index, along: alongEdge(points[start], points[end], point) }))
      .filter(({ index, along }) => index !== start && index !== end && along !== null)
      .sort((a, b) => (a.along as number) - (b.along as number))
      .map(({ index }) => index);
    const stops = [start, ...between, end];
    for (let k = 0; k + 1 < stops.length; k++) pieces.push([stops[k], stops[k + 1]]);
  });
  return pieces;
}

/** How far along the edge from a to b the point p lies (0…1), or null where it is off the edge. */
function alongEdge(a: Point, b: Point, p: Point): number | null {
  const length = apart(a, b);
  const along = [0, 1, 2].reduce((sum, i) => sum + ((b[i] - a[i]) / length) * (p[i] - a[i]), 0);
  if (along <= 0 || along >= length) return null;
  const off = Math.hypot(...[0, 1, 2].map((i) => p[i] - a[i] - (along * (b[i] - a[i])) / length));
  return off <= WELD_M ? along / length : null;
}

/**
 * Volume enclosed by the shell in m³, by the divergence theorem; negative for a shell whose corners run clockwise seen
 * from inside. Only meaningful where the shell is closed.
 */
export function shellVolume(faces: Faces): number {
  let sixfold = 0;
  eachTriangle(faces, (a, b, c) => {
    sixfold += vec3.dot(a, vec3.cross([0, 0, 0], b, c));
  });
  return -sixfold / 6;
}

/** True inside a closed shell: the faces then cover the whole sphere of directions (Van Oosterom & Strackee 1983). */
export function insideShell(faces: Faces, x: number, y: number, z: number): boolean {
  let solidAngle = 0;
  for (let face = 0; face < faces.count; face++) {
    if (faces.twoSided[face]) continue;
    const c = faces.corners[face];
    const [ax, ay, az] = [c[0] - x, c[1] - y, c[2] - z];
    const a = Math.sqrt(ax * ax + ay * ay + az * az);
    for (let i = 3; i + 5 < c.length; i += 3) {
      const bx = c[i] - x;
      const by = c[i + 1] - y;
      const bz = c[i + 2] - z;
      const cx = c[i + 3] - x;
      const cy = c[i + 4] - y;
      const cz = c[i + 5] - z;
      const b = Math.sqrt(bx * bx + by * by + bz * bz);
      const l = Math.sqrt(cx * cx + cy * cy + cz * cz);
      const triple = ax * (by * cz - bz * cy) + ay * (bz * cx - bx * cz) + az * (bx * cy - by * cx);
      const ab = ax * bx + ay * by + az * bz;
      const bc = bx * cx + by * cy + bz * cz;
      const ca = cx * ax + cy * ay + cz * az;
      solidAngle += 2 * Math.atan2(triple, a * b * l + ab * l + ca * b + bc * a);
    }
  }
  return Math.abs(solidAngle) > 2 * Math.PI;
}

/** The shell as fans of triangles. Fans of concave outlines overlap with opposite signs, which sums undo. */
function eachTriangle(faces: Faces, visit: (a: Point, b: Point, c: Point) => void): void {
  for (let face = 0; face < faces.count; face++) {
    if (faces.twoSided[face]) continue;
    const corners = cornersOf(faces.corners[face]);
    for (let i = 1; i + 1 < corners.length; i++) visit(corners[0], corners[i], corners[i + 1]);
  }
}
