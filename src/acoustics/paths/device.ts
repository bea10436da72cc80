import type { Pattern } from '../directivity/pattern';

/** A talker, loudspeaker, microphone or listener as paths see it. */
export interface Device {
  x: number;
  y: number;
  z: number;
  /** Its axes in room coordinates, see `deviceFrame`. */
  frame: Float64Array;
  /** null for a listener: the same from all sides. */
  pattern: Pattern | null;
  /** Directivity factors Q of seven bands. */
  directivityFactors: Float64Array;
  /** Index of the face it lies on, −1 for none. */
  host: number;
}

const ONES = new Float64Array(7).fill(1);

/** A listener's ear: no pattern, no host. */
export const createListener = (x: number, y: number, z: number): Device => ({
  x,
  y,
  z,
  frame: Float64Array.of(1, 0, 0, 0, 1, 0, 0, 0, 1),
  pattern: null,
  directivityFactors: ONES,
  host: -1,
});

/**
 * Writes D² of a device towards a direction given in room coordinates (not necessarily of unit length) into
 * out[at … at+6]. At zero length the direction is the aim.
 */
export function devicePowers(device: Device, x: number, y: number, z: number, out: Float64Array, at: number): void {
  const { frame, pattern } = device;
  if (pattern === null) {
    out.fill(1, at, at + 7);
    return;
  }
  const length = Math.sqrt(x * x + y * y + z * z);
  if (length === 0) {
    pattern.powers(1, 0, 0, out, at);
    return;
  }
  const u = (frame[0] * x + frame[1] * y + frame[2] * z) / length;
  const v = (frame[3] * x + frame[4] * y + frame[5] * z) / length;
  const w = (frame[6] * x + frame[7] * y + frame[8] * z) / length;
  pattern.powers(u, v, w, out, at);
}
