import { type Faces, firstHit, heightAbove, insideOutline } from '../acoustics/room/faces';
import { facesOf } from '../layout/geometry';
import type { Vec3, Venue } from '../layout/schema';

/** How a face of the card model is drawn. */
export type FaceTone = 'floor' | 'wall-a' | 'wall-b' | 'glass' | 'ceiling' | 'timber';

/** Lines that tell a finish from another on a wall. */
export type FaceHatch = 'none' | 'panels' | 'folds' | 'panes';

/** An edge of a wall that could be cut. */
export interface WallEdge {
  face: number;
  a: Vec3;
  b: Vec3;
  /** Where it lies on its wall. */
  side: 'top' | 'bottom' | 'end';
  /** Walls that share an end of this edge, itself left out: [at a, at b]. */
  neighbours: [number[], number[]];
}

/** The room as something to be drawn. */
export interface RoomShape {
  faces: Faces;
  ids: readonly string[];
  tones: readonly FaceTone[];
  hatches: readonly FaceHatch[];
  /** [face] 1 where it is a wall between the room and the outside, which is cut when it stands in the way. */
  walls: Uint8Array;
  /** Outer edges of those walls. */
  wallEdges: readonly WallEdge[];
  least: Vec3;
  greatest: Vec3;
}

/** Reads the faces of a venue for drawing. A venue without faces has bounds of 1 m about the origin. */
export function roomShape(venue: Pick<Venue, 'faces' | 'finishes'>): RoomShape {
  const faces = facesOf(venue);
  const names = new Map(venue.finishes.map((finish) => [finish.id, `${finish.id} ${finish.label}`]));
  const finishOf = (face: number): string => names.get(venue.faces[face].finish) ?? venue.faces[face].finish;
  const every = venue.faces.map((_, face) => face);
  const walls = Uint8Array.from(every, (face) => (isOuterWall(faces, face) ? 1 : 0));
  return {
    faces,
    ids: venue.faces.map((face) => face.id),
    tones: every.map((face) => toneOf(faces, face, finishOf(face))),
    hatches: every.map((face) => hatchOf(faces, face, finishOf(face))),
    walls,
    wallEdges: wallEdges(faces, walls),
    ...boundsOf(faces),
  };
}

function toneOf(faces: Faces, face: number, finish: string): FaceTone {
  const [x, y, z] = normalOf(faces, face);
  if (faces.twoSided[face]) return 'timber';
  if (z > 0.5) return /wood|timber/i.test(finish) ? 'timber' : 'floor';
  if (z < -0.5) return 'ceiling';
  if (/glass|glaz|window/i.test(finish)) return 'glass';
  return Math.abs(x) > Math.abs(y) ? 'wall-a' : 'wall-b';
}

function hatchOf(faces: Faces, face: number, finish: string): FaceHatch {
  if (faces.twoSided[face] || Math.abs(faces.normals[3 * face + 2]) > 0.1) return 'none';
  if (/glass|glaz|window/i.test(finish)) return 'panes';
  if (/curtain|drap|velour|hanging/i.test(finish)) return 'folds';
  return /panel|slat|batten|board on/i.test(finish) ? 'panels' : 'none';
}

/** Behind a wall lies nothing; behind the riser of a step or the front of a stage lies the solid under a floor. */
function isOuterWall(faces: Faces, face: number): boolean {
  const normal = normalOf(faces, face);
  if (faces.twoSided[face] || Math.abs(normal[2]) > 0.5) return false;
  const behind = centreOf(faces, face).map((value, axis) => value - 0.05 * normal[axis]);
  const above = firstHit(faces, behind, [0, 0, 1], 1e-3, face);
  return above === null || faces.normals[3 * above.face + 2] < 0.5;
}

function wallEdges(faces: Faces, walls: Uint8Array): WallEdge[] {
  const edges: WallEdge[] = [];
  for (let face = 0; face < faces.count; face++) {
    if (!walls[face]) continue;
    const normal = normalOf(faces, face);
    const corners = cornersOf(faces, face);
    corners.forEach((a, i) => {
      const b = corners[(i + 1) % corners.length];
      const along = [b[0] - a[0], b[1] - a[1], b[2] - a[2]];
      // Corners run counter-clockwise about the normal, so that along × normal leads out of the face.
      const out = cross(along, normal);
      const rise = out[2] / (Math.hypot(...out) || 1);
      const side = rise > 0.5 ? 'top' : rise < -0.5 ? 'bottom' : 'end';
      const beyond = a.map((value, axis) => (value + b[axis]) / 2 + (0.02 * out[axis]) / (Math.hypot(...out) || 1));
      if (!continues(faces, walls, face, beyond)) edges.push({ face, a, b, side, neighbours: [[], []] });
    });
  }
  for (const edge of edges) {
    edge.neighbours = [edge.a, edge.b].map((end) =>
      edges
        .filter((other) => other.face !== edge.face && (meets(other.a, end) || meets(other.b, end)))
        .map((other) => other.face),
    ) as [number[], number[]];
  }
  return edges;
}

/** True where another wall goes on in the plane of this one. */
function continues(faces: Faces, walls: Uint8Array, face: number, point: readonly number[]): boolean {
  for (let other = 0; other < faces.count; other++) {
    if (other === face || !walls[other]) continue;
    if (Math.abs(heightAbove(faces, other, point[0], point[1], point[2])) > 0.01) continue;
    if (insideOutline(faces, other, point[0], point[1], point[2])) return true;
  }
  return false;
}

function boundsOf(faces: Faces): { least: Vec3; greatest: Vec3 } {
  if (faces.count === 0) return { least: [-1, -1, 0], greatest: [1, 1, 2] };
  const of = (offset: number, pick: (...values: number[]) => number): Vec3 =>
    [0, 1, 2].map((axis) =>
      Array.from({ length: faces.count }, (_, face) => faces.bounds[6 * face + 2 * axis + offset]).reduce((a, b) =>
        pick(a, b),
      ),
    ) as Vec3;
  return { least: of(0, Math.min), greatest: of(1, Math.max) };
}

export const normalOf = (faces: Faces, face: number): Vec3 => [
  faces.normals[3 * face],
  faces.normals[3 * face + 1],
  faces.normals[3 * face + 2],
];

export function cornersOf(faces: Faces, face: number): Vec3[] {
  const corners = faces.corners[face];
  return Array.from({ length: corners.length / 3 }, (_, i) => [corners[3 * i], corners[3 * i + 1], corners[3 * i + 2]]);
}

export function centreOf(faces: Faces, face: number): Vec3 {
  const corners = cornersOf(faces, face);
  return [0, 1, 2].map((axis) => corners.reduce((sum, corner) => sum + corner[axis], 0) / corners.length) as Vec3;
}

const cross = (a: readonly number[], b: readonly number[]): Vec3 => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];

const meets = (a: Vec3, b: Vec3): boolean => Math.hypot(a[0] - b[0], a[1] - b[1], a[2] - b[2]) < 0.002;
