import type { Face } from '../../src/layout/schema';

/**
 * Reflected paths found the long way round, by other means than the program's: every ordered run of faces is unfolded
 * anew for each receiver, and points are placed inside outlines by the angle the outline turns about them.
 */

type Point = readonly number[];

interface Plane {
  corners: readonly Point[];
  normal: Point;
  twoSided: boolean;
}

export interface SlowPath {
  lengthM: number;
  /** Indices of the faces met, from the source on; none for the direct path. */
  faces: number[];
  /** From the source to the first point, and from the receiver to the last. */
  departure: Point;
  arrival: Point;
}

/** Faces (by index) that either end lies on: they make no image of it. */
export interface Hosts {
  source: number;
  receiver: number;
}

export const slowReflections = (faces: readonly Face[], source: Point, receiver: Point, order: number): SlowPath[] =>
  slowPaths(faces, source, receiver, order).filter(({ faces: met }) => met.length > 0);

/** All paths up to an order, the direct one first where it is free. */
export function slowPaths(
  faces: readonly Face[],
  source: Point,
  receiver: Point,
  order: number,
  hosts: Hosts = { source: -1, receiver: -1 },
): SlowPath[] {
  const planes = faces.map(({ corners, sides }) => ({ corners, normal: normalOf(corners), twoSided: sides === 2 }));
  const touches = (face: number, p: Point) => Math.abs(height(planes[face], p)) <= 1e-6;
  const found: { image: Point; path: SlowPath }[] = [];
  for (let bounces = 0; bounces <= order; bounces++) {
    for (const run of runs(faces.length, bounces)) {
      const [first, last] = [run[0], run[bounces - 1]];
      if (bounces > 0 && (first === hosts.source || last === hosts.receiver)) continue;
      if (bounces > 0 && (touches(first, source) || touches(last, receiver))) continue;
      const images = imagesAlong(planes, run, source);
      const image = images[bounces];
      if (found.some((other) => apart(other.image, image) <= 1e-5)) continue;
      const stops = stopsAlong(planes, run, images, receiver);
      if (stops === null) continue;
      const [departure, arrival] = [minus(stops[1], source), minus(stops[bounces], receiver)];
      found.push({ image, path: { lengthM: apart(image, receiver), faces: run, departure, arrival } });
    }
  }
  return found.map(({ path }) => path);
}

/** The source, its image in the first face, the image of that in the second, and on. */
function imagesAlong(planes: Plane[], run: number[], source: Point): Point[] {
  const images = [source];
  for (const face of run) images.push(mirrored(planes[face], images[images.length - 1]));
  return images;
}

/** All ordered runs of so many faces, none twice in succession. */
function runs(faces: number, length: number): number[][] {
  if (length === 0) return [[]];
  return runs(faces, length - 1).flatMap((run) =>
    Array.from({ length: faces }, (_, face) => face)
      .filter((face) => face !== run.at(-1))
      .map((face) => [...run, face]),
  );
}

/** Source, reflection points and receiver of a run of faces; null where there is no such path. */
function stopsAlong(planes: Plane[], run: number[], images: Point[], receiver: Point): Point[] | null {
  // From the receiver back to the source.
  const stops: Point[] = [receiver];
  for (let bounce = run.length; bounce >= 1; bounce--) {
    const plane = planes[run[bounce - 1]];
    const hit = crossing(plane, stops[0], images[bounce]);
    if (hit === null || !isInside(plane, hit)) return null;
    stops.unshift(hit);
  }
  stops.unshift(images[0]);
  for (let bounce = 1; bounce <= run.length; bounce++) {
    const plane = planes[run[bounce - 1]];
    const [before, after] = [stops[bounce - 1], stops[bounce + 1]].map((p) => height(plane, p));
    // Both legs on the side looked at; of a free-standing face on the same side, whichever.
    if (plane.twoSided ? before * after <= 0 : before <= 0 || after <= 0) return null;
  }
  return stops.slice(1).every((stop, i) => !crossed(planes, stops[i], stop, [run[i - 1], run[i]])) ? stops : null;
}

/** True where a face not among `own` lies across a leg, farther than 1 cm from both its ends. */
function crossed(planes: Plane[], from: Point, to: Point, own: (number | undefined)[]): boolean {
  return planes.some((plane, face) => {
    if (own.includes(face)) return false;
    const hit = crossing(plane, from, to);
    return hit !== null && apart(hit, from) > 0.01 && apart(hit, to) > 0.01 && isInside(plane, hit);
  });
}

const minus = (a: Point, b: Point): Point => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
const dot = (a: Point, b: Point): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const cross = (a: Point, b: Point): Point => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
const apart = (a: Point, b: Point): number => Math.sqrt(dot(minus(a, b), minus(a, b)));

function normalOf(corners: readonly Point[]): Point {
  const sum = corners
    .map((corner, i) => cross(corner, corners[(i + 1) % corners.length]))
    .reduce((a, b) => [a[0] + b[0], a[1] + b[1], a[2] + b[2]]);
  const length = Math.sqrt(dot(sum, sum));
  return sum.map((part) => part / length);
}

const height = (plane: Plane, p: Point): number => dot(plane.normal, minus(p, plane.corners[0]));

function mirrored(plane: Plane, p: Point): Point {
  const twice = 2 * height(plane, p);
  return p.map((part, axis) => part - twice * plane.normal[axis]);
}

function crossing(plane: Plane, from: Point, to: Point): Point | null {
  const [a, b] = [height(plane, from), height(plane, to)];
  if (a * b > 0 || a === b) return null;
  return from.map((part, axis) => part + (a / (a - b)) * (to[axis] - part));
}

/** The angle under which the outline is seen goes once round from inside, and cancels from outside. */
function isInside(plane: Plane, p: Point): boolean {
  const turned = plane.corners
    .map((corner, i) => {
      const [a, b] = [minus(corner, p), minus(plane.corners[(i + 1) % plane.corners.length], p)];
      return Math.atan2(dot(plane.normal, cross(a, b)), dot(a, b));
    })
    .reduce((sum, angle) => sum + angle, 0);
  return Math.abs(turned) > Math.PI;
}
