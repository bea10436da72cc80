import { heightAbove } from '../acoustics/room/faces';
import type { Vec3 } from '../layout/schema';
import { normalOf, type RoomShape, type WallEdge } from './room-shape';

/** Thickness a cut wall is drawn with, and the height of what is left of a wall that stands in the way, metres. */
const WALL_M = 0.2;
const STUB_M = 0.09;
const GROUND_M = 0.12;

/** What the walls look like from one place: triangles as x, y, z of three corners, lines as pairs of ends. */
export interface CutWalls {
  /** Cut surfaces: the tops of the walls behind, what is left of those in front. */
  poche: Vec3[];
  /** Their sides, a little lighter. */
  pocheSides: Vec3[];
  /** Upper edges of what was taken away. */
  taken: Vec3[];
}

/** [face] 1 where the face is seen from its front. Where this does not change, neither do the cut walls. */
export function facesSeen(shape: RoomShape, eye: Vec3): Uint8Array {
  return Uint8Array.from({ length: shape.faces.count }, (_, face) =>
    shape.faces.twoSided[face] || heightAbove(shape.faces, face, eye[0], eye[1], eye[2]) > 0 ? 1 : 0,
  );
}

/** The walls as cut for a view: walls turned to the eye stand at full height, the others are cut low. */
export function cutWalls(shape: RoomShape, seen: Uint8Array): CutWalls {
  const cut: CutWalls = { poche: [], pocheSides: [], taken: [] };
  for (const edge of shape.wallEdges) {
    if (seen[edge.face]) addStanding(cut, shape, seen, edge);
    else addTaken(cut, shape, edge);
  }
  return cut;
}

function addStanding(cut: CutWalls, shape: RoomShape, seen: Uint8Array, edge: WallEdge): void {
  const { a, b } = edge;
  const straight = scaled(outwards(shape, edge.face), WALL_M);
  const corner = (end: 0 | 1): Vec3 => {
    const other = edge.neighbours[end].find((face) => turned(shape, edge.face, face));
    return other !== undefined && seen[other] ? mitre(shape, edge.face, other) : straight;
  };
  if (edge.side === 'top') addQuad(cut.poche, a, b, plus(b, corner(1)), plus(a, corner(0)));
  if (edge.side === 'end' && edge.neighbours.flat().some((face) => !seen[face] && turned(shape, edge.face, face))) {
    addQuad(cut.pocheSides, a, b, plus(b, straight), plus(a, straight));
  }
}

function addTaken(cut: CutWalls, shape: RoomShape, edge: WallEdge): void {
  const { a, b } = edge;
  if (edge.side === 'top') cut.taken.push(a, b);
  if (edge.side !== 'bottom') return;
  const straight = scaled(outwards(shape, edge.face), WALL_M);
  const corner = (end: 0 | 1): Vec3 => {
    const other = edge.neighbours[end].find((face) => turned(shape, edge.face, face));
    return other === undefined ? straight : mitre(shape, edge.face, other);
  };
  const [outA, outB] = [plus(a, corner(0)), plus(b, corner(1))];
  addQuad(cut.poche, raised(a, STUB_M), raised(b, STUB_M), raised(outB, STUB_M), raised(outA, STUB_M));
  addQuad(cut.pocheSides, raised(outA, STUB_M), raised(outB, STUB_M), raised(outB, -GROUND_M), raised(outA, -GROUND_M));
  addQuad(cut.pocheSides, a, b, raised(b, STUB_M), raised(a, STUB_M));
}

/** Level direction out of the room through a wall. */
function outwards(shape: RoomShape, face: number): Vec3 {
  const [x, y] = normalOf(shape.faces, face);
  const length = Math.hypot(x, y) || 1;
  return [-x / length, -y / length, 0];
}

/** True where two walls meet at an angle rather than go on in one plane. */
function turned(shape: RoomShape, face: number, other: number): boolean {
  const [a, b] = [outwards(shape, face), outwards(shape, other)];
  return a[0] * b[0] + a[1] * b[1] < 0.999;
}

/** From an inner to the outer corner of two walls of one thickness; very sharp corners are blunted. */
function mitre(shape: RoomShape, face: number, other: number): Vec3 {
  const [a, b] = [outwards(shape, face), outwards(shape, other)];
  const share = WALL_M / Math.max(0.3, 1 + a[0] * b[0] + a[1] * b[1]);
  return [(a[0] + b[0]) * share, (a[1] + b[1]) * share, 0];
}

function addQuad(triangles: Vec3[], a: Vec3, b: Vec3, c: Vec3, d: Vec3): void {
  triangles.push(a, b, c, a, c, d);
}

const plus = (a: Vec3, b: Vec3): Vec3 => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
const scaled = (a: Vec3, by: number): Vec3 => [a[0] * by, a[1] * by, a[2] * by];
const raised = (a: Vec3, by: number): Vec3 => [a[0], a[1], a[2] + by];
