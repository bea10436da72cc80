import type { Faces } from '../acoustics/room/faces';
import { type Aimed, aimDirection, aimMeets, alongAim } from '../layout/aim';
import type { Vec3 } from '../layout/schema';

/** A device that points somewhere, and the face it lies on. */
export interface Pointing extends Aimed {
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
  const forward = aimDirection(device);
  const hit = aimMeets(faces, device, faceIds.indexOf(device.host ?? ''));
  const farthestM = hit?.distanceM ?? Number.POSITIVE_INFINITY;
  const seat = firstEar(device.position, forward, seats, farthestM);
  const met =
    seat ?? (hit === null ? null : { kind: 'face' as const, id: faceIds[hit.face], distanceM: hit.distanceM });
  if (met === null) return null;
  const to = alongAim(device, met.distanceM);
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
