import { aimAngles, deviceFrame } from '../acoustics/frame';
import { distanceToFace, type Faces, firstHit, heightAbove, insideOutline } from '../acoustics/room/faces';
import type { Vec3 } from './schema';

/** What turns: where it stands, degrees. */
export interface Aimed {
  position: Vec3;
  pan: number;
  tilt: number;
  roll?: number;
}

export interface AimPoint {
  /** Index of the face met. */
  face: number;
  distanceM: number;
  point: Vec3;
}

/** A device's own face is not what it aims at: nothing is met nearer than this, metres. */
const LEAST_M = 0.02;

const radians = (degrees: number): number => (degrees * Math.PI) / 180;
/** Angles and places from a calculation are kept to what anyone could set out: 0.001° and 0.1 mm. */
const kept = (value: number, digits: number): number => Number(value.toFixed(digits)) + 0;

/** Angles of a device in degrees, as a layout gives them. */
export type Turn = Pick<Aimed, 'pan' | 'tilt' | 'roll'>;

/** The nine numbers of a device's own axes: forward, left, up. */
export const frameOf = ({ pan, tilt, roll = 0 }: Turn): Float64Array =>
  deviceFrame(radians(pan), radians(tilt), radians(roll));

/** Unit vector along the aim. */
export function aimDirection(turn: Turn): Vec3 {
  const frame = frameOf(turn);
  return [frame[0], frame[1], frame[2]];
}

/** Where the aim meets a face first; null where it meets none. */
export function aimMeets(faces: Faces, device: Aimed, hostFace = -1): AimPoint | null {
  const direction = aimDirection(device);
  const hit = firstHit(faces, device.position, direction, LEAST_M, hostFace);
  return hit === null ? null : { ...hit, point: along(device.position, direction, hit.distanceM) };
}

/** The point some distance along the aim. */
export function alongAim(device: Aimed, distanceM: number): Vec3 {
  return along(device.position, aimDirection(device), distanceM);
}

function along(from: Vec3, direction: Vec3, distanceM: number): Vec3 {
  return [0, 1, 2].map((axis) => from[axis] + distanceM * direction[axis]) as Vec3;
}

/** Pan and tilt in degrees that aim a device at a point; its own where the point is the device. */
export function turnTo(device: Aimed, target: Vec3): { pan: number; tilt: number } {
  const [x, y, z] = [0, 1, 2].map((axis) => target[axis] - device.position[axis]);
  if (Math.hypot(x, y, z) < 1e-6) return { pan: device.pan, tilt: device.tilt };
  const { panRad, tiltRad } = aimAngles(x, y, z, radians(device.pan));
  return { pan: kept((panRad * 180) / Math.PI, 3), tilt: kept((tiltRad * 180) / Math.PI, 3) };
}

/** True where a device is turned to a point as well as its angles are kept. */
export function aimsThrough(device: Aimed, target: Vec3): boolean {
  const [x, y, z] = [0, 1, 2].map((axis) => target[axis] - device.position[axis]);
  const length = Math.hypot(x, y, z);
  if (length < 1e-6) return false;
  const [u, v, w] = aimDirection(device);
  // The sine of the angle between them, which unlike the cosine tells small angles apart; 0.002° is twice the step kept.
  const sine = Math.hypot(v * z - w * y, w * x - u * z, u * y - v * x) / length;
  return u * x + v * y + w * z > 0 && sine < radians(0.002);
}

/** Index of the face nearest to a point, −1 where there is none. */
export function nearestFace(faces: Faces, [x, y, z]: Vec3): number {
  let [nearest, leastM] = [-1, Number.POSITIVE_INFINITY];
  for (let face = 0; face < faces.count; face++) {
    const distanceM = distanceToFace(faces, face, x, y, z);
    if (distanceM < leastM) [nearest, leastM] = [face, distanceM];
  }
  return nearest;
}

/** Place and turn of a device laid on a face: at the face's nearest point, aimed along the normal on its own side. */
export function layOn(faces: Faces, face: number, device: Aimed): Pick<Aimed, 'position' | 'pan' | 'tilt'> {
  const height = heightAbove(faces, face, ...device.position);
  const side = faces.twoSided[face] && height < 0 ? -1 : 1;
  const normal = [0, 1, 2].map((axis) => faces.normals[3 * face + axis]) as Vec3;
  const position = nearestPoint(faces, face, along(device.position, normal, -height)).map((c) => kept(c, 4)) as Vec3;
  const target = along(position, normal, side);
  return { position, ...turnTo({ ...device, position }, target) };
}

/** The point of a face nearest to a point of its plane. */
function nearestPoint(faces: Faces, face: number, foot: Vec3): Vec3 {
  if (insideOutline(faces, face, ...foot)) return foot;
  const corners = faces.corners[face];
  const count = corners.length / 3;
  let [best, leastM] = [foot, Number.POSITIVE_INFINITY];
  for (let i = 0; i < count; i++) {
    const a = cornerAt(corners, i);
    const b = cornerAt(corners, (i + 1) % count);
    const edge = [0, 1, 2].map((axis) => b[axis] - a[axis]);
    const dot = [0, 1, 2].reduce((sum, axis) => sum + edge[axis] * (foot[axis] - a[axis]), 0);
    const length2 = edge.reduce((sum, c) => sum + c * c, 0) || 1;
    const point = along(a, edge as Vec3, Math.min(1, Math.max(0, dot / length2)));
    const distanceM = Math.hypot(...[0, 1, 2].map((axis) => foot[axis] - point[axis]));
    if (distanceM < leastM) [best, leastM] = [point, distanceM];
  }
  return best;
}

const cornerAt = (corners: Float64Array, i: number): Vec3 => [corners[3 * i], corners[3 * i + 1], corners[3 * i + 2]];
