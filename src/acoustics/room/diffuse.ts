import { BAND_COUNT } from '../bands';
import type { Device } from '../paths/device';
import type { RoomField } from './decay';
import { type Faces, firstHit } from './faces';

/** Directions over which the faces a device sees first are weighted. */
const DIRECTIONS = 500;
/** Hits nearer than this are the device's own surface, metres. */
const LEAST_HIT_M = 1e-6;

/**
 * Mean absorption of the faces a device sees first, weighted by its own D² over 500 directions spread evenly on the
 * sphere (Hopkins & Stryker 1948; the trade's architectural modifier). Its own host is left out; a direction that hits
 * nothing counts the mean absorption. Seven bands.
 */
export function firstAbsorption(device: Device, faces: Faces, field: RoomField): Float64Array {
  const weighted = new Float64Array(BAND_COUNT);
  const weights = new Float64Array(BAND_COUNT);
  const powers = new Float64Array(BAND_COUNT).fill(1);
  const direction = new Float64Array(3);
  const { frame } = device;
  for (let i = 0; i < DIRECTIONS; i++) {
    const cosine = 1 - (2 * i + 1) / DIRECTIONS;
    const sine = Math.sqrt(1 - cosine * cosine);
    const clock = i * Math.PI * (3 - Math.sqrt(5));
    const [v, w] = [sine * Math.cos(clock), sine * Math.sin(clock)];
    device.pattern?.powers(cosine, v, w, powers, 0);
    if (powers.every((power) => power === 0)) continue;
    for (let axis = 0; axis < 3; axis++) {
      direction[axis] = cosine * frame[axis] + v * frame[3 + axis] + w * frame[6 + axis];
    }
    const hit = firstHit(faces, [device.x, device.y, device.z], direction, LEAST_HIT_M, device.host);
    for (let b = 0; b < BAND_COUNT; b++) {
      const absorption = hit === null ? field.meanAbsorption[b] : field.seenAbsorption[hit.face * BAND_COUNT + b];
      weighted[b] += powers[b] * absorption;
      weights[b] += powers[b];
    }
  }
  return weighted.map((sum, b) => (weights[b] > 0 ? sum / weights[b] : field.meanAbsorption[b]));
}

/** What the diffuse field needs to know of either end of a path. */
interface End {
  device: Device;
  /** Absorption of the faces it sees first, seven bands. */
  absorption: Float64Array;
}

/**
 * Power gain of the diffuse remainder between two ends, after image sources up to `order` are taken out: seven bands,
 * written to `out`.
 */
export function diffuseGains(field: RoomField, order: number, from: End, to: End, out: Float64Array): void {
  // Without faces nothing comes back.
  if (field.surfaceM2 === 0) {
    out.fill(0);
    return;
  }
  for (let b = 0; b < BAND_COUNT; b++) {
    const source = 1 - from.absorption[b];
    const receiver = 1 - to.absorption[b];
    const rest = source * receiver * (1 - field.meanAbsorption[b]) ** (order - 1);
    // Without images nothing has been lost before the first face on one side.
    const left = order === 0 ? Math.min(rest, Math.max(source, receiver)) : rest;
    const factors = from.device.directivityFactors[b] * to.device.directivityFactors[b];
    out[b] = ((16 * Math.PI) / field.absorptionAreaM2[b]) * (left / factors);
  }
}
