import { type Faces, heightAbove } from '../acoustics/room/faces';
import { openEdges, shellVolume } from '../acoustics/room/shell';
import { errorAt, type Problem } from './problem';
import type { Venue } from './schema';

/** Corners may lie this far off the plane of their face, metres. */
const PLANAR_M = 0.01;

/** Faces that are not flat or cross themselves, and a shell that has no volume. */
export function checkFaces(venue: Venue, faces: Faces): Problem[] {
  const each = venue.faces.flatMap((_, face) => checkFace(faces, face));
  return each.length > 0 ? each : checkShell(venue, faces);
}

function checkFace(faces: Faces, face: number): Problem[] {
  const path = `venue.faces[${face}].corners`;
  const corners = faces.corners[face];
  const n = corners.length / 3;
  if (faces.areas[face] < 1e-9) {
    return [errorAt(path, 'the corners enclose no area', 'corners in order round the face', 'move or remove a corner')];
  }
  for (let i = 0; i < n; i++) {
    const j = (i + 1) % n;
    if (Math.hypot(...[0, 1, 2].map((axis) => corners[3 * i + axis] - corners[3 * j + axis])) < 1e-6) {
      return [
        errorAt(
          `venue.faces[${face}].corners[${j}]`,
          'the same point as the corner before',
          'each corner once',
          'remove it',
        ),
      ];
    }
  }
  const off = Array.from({ length: n }, (_, i) =>
    Math.abs(heightAbove(faces, face, corners[3 * i], corners[3 * i + 1], corners[3 * i + 2])),
  );
  const worst = Math.max(...off);
  if (worst > PLANAR_M) {
    const at = off.indexOf(worst);
    return [
      errorAt(
        `venue.faces[${face}].corners[${at}]`,
        `not planar: this corner lies ${Math.round(worst * 1000)} mm off the face`,
        'all corners within 10 mm of one plane',
        'move it or split the face into triangles',
      ),
    ];
  }
  const crossing = selfCrossing(corners, faces.flatAxis[face]);
  if (crossing !== null) {
    const [i, j] = crossing;
    const found = `the edges after corners ${i} and ${j} cross`;
    return [errorAt(path, found, 'an outline that does not cross itself', 'put the corners in order round the face')];
  }
  return [];
}

/** Indices of two edges that cross, or null. Edges that share a corner do not count. */
function selfCrossing(corners: Float64Array, drop: number): [number, number] | null {
  const n = corners.length / 3;
  const [first, second] = drop === 0 ? [1, 2] : drop === 1 ? [0, 2] : [0, 1];
  const at = (i: number): [number, number] => [corners[3 * (i % n) + first], corners[3 * (i % n) + second]];
  const side = (a: number[], b: number[], p: number[]) => (b[0] - a[0]) * (p[1] - a[1]) - (b[1] - a[1]) * (p[0] - a[0]);
  for (let i = 0; i < n; i++) {
    for (let j = i + 2; j < n; j++) {
      if (i === 0 && j === n - 1) continue;
      const [a, b, c, d] = [at(i), at(i + 1), at(j), at(j + 1)];
      if (side(a, b, c) * side(a, b, d) < 0 && side(c, d, a) * side(c, d, b) < 0) return [i, j];
    }
  }
  return null;
}

function checkShell(venue: Venue, faces: Faces): Problem[] {
  if (faces.count === 0) {
    const expected = 'the faces that close the room, sides: 1';
    return [
      errorAt(
        'venue.faces',
        'there are no faces',
        expected,
        'add them; open air is one wide ground and a given "volume"',
      ),
    ];
  }
  const shellFaces = venue.faces.filter((face) => face.sides === 1).length;
  if (shellFaces === 0) {
    if (venue.volume !== null) return [];
    return [
      errorAt(
        'venue.faces',
        'no face belongs to the shell',
        'the faces that close the room, sides: 1',
        'add them or give "volume"',
      ),
    ];
  }
  const open = openEdges(faces);
  if (open.length > 0) {
    if (venue.volume !== null) return [];
    const { face, from, to } = open[0];
    const say = (point: number[]) => `[${point.map((c) => Math.round(c * 1000) / 1000).join(', ')}]`;
    return [
      errorAt(
        `venue.faces[${face}]`,
        `the shell is open along the edge from ${say(from)} to ${say(to)}${open.length > 1 ? ` and ${open.length - 1} more` : ''}`,
        'every edge is met once in each direction',
        'close the shell or give "volume" in m³',
      ),
    ];
  }
  if (shellVolume(faces) <= 0) {
    return [
      errorAt(
        'venue.faces',
        'the shell is inside out',
        'corners counter-clockwise seen from inside',
        'reverse the corners of each face',
      ),
    ];
  }
  return [];
}
