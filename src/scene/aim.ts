import { deviceFrame } from '../acoustics/frame';
import { type Faces, firstHit } from '../acoustics/room/faces';
import type { Vec3 } from '../layout/schema';

/** Something that points somewhere; angles in degrees as in the layout. */
export interface Pointing {
  position: Vec3;
  pan: number;
  tilt: number;
  roll?: number;
  host?: string | null;
}

/** What an aim meets. */
export interface Aim {
  from: Vec3;
  to: Vec3;
  distanceM: number;
  met: { kind: 'seat' | 'face'; id: string };
}

/** An ear this near to the line counts as aimed at, metres. */
const EAR_M = 0.4;
/** The device's own face and what it stands in are not what it aims at, metres. */
const LEAST_M = 0.02;

/** The nine numbers of a device's own axes: forward, left, up. */
export function frameOf({ pan, tilt, roll = 0 }: Pointing): Float64Array {
  const [panRad, tiltRad, rollRad] = [pan, tilt, roll].map((degrees) => (degrees * Math.PI) / 180);
  return deviceFrame(panRad, tiltRad, rollRad);
}

export function forwardOf(device: Pointing): Vec3 {
  const frame = frameOf(device);
  return [frame[0], frame[1], frame[2]];
}

/**
 * What a device aims at along its forward axis: the first face other than its host, or a seat whose ear lies within
 * 0.4 m of the line nearer than that. Null where it aims out of the room.
 */
export function aimOf(
  device: Pointing,
  faces: Faces,
  faceIds: readonly string[],
  seats: readonly { id: string; ear: Vec3 }[],
): Aim | null {
  const forward = forwardOf(device);
  const hit = firstHit(faces, device.position, forward, LEAST_M, faceIds.indexOf(device.host ?? ''));
  const farthestM = hit?.distanceM ?? Number.POSITIVE_INFINITY;
  const seat = firstEar(device.position, forward, seats, farthestM);
  const met =
    seat ?? (hit === null ? null : { kind: 'face' as const, id: faceIds[hit.face], distanceM: hit.distanceM });
  if (met === null) return null;
  const to = device.position.map((value, axis) => value + met.distanceM * forward[axis]) as Vec3;
  return { from: device.position, to, distanceM: met.distanceM, met: { kind: met.kind, id: met.id } };
}

function firstEar(
  from: Vec3,
  forward: Vec3,
  seats: readonly { id: string; ear: Vec3 }[],
  farthestM: number,
): { kind: 'seat'; id: string; distanceM: number } | null {
  let first: { kind: 'seat'; id: string; distanceM: number } | null = null;
  for (const { id, ear } of seats) {
    const [x, y, z] = [ear[0] - from[0], ear[1] - from[1], ear[2] - from[2]];
    const alongM = x * forward[0] + y * forward[1] + z * forward[2];
    if (alongM < EAR_M || alongM > farthestM || (first !== null && alongM >= first.distanceM)) continue;
    const asideM = Math.sqrt(Math.max(0, x * x + y * y + z * z - alongM * alongM));
    if (asideM <= EAR_M) first = { kind: 'seat', id, distanceM: alongM };
  }
  return first;
}
