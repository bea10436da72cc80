import { BAND_COUNT } from '../bands';
import type { RoomField } from '../room/decay';
import { diffuseGains, firstAbsorption } from '../room/diffuse';
import type { Faces } from '../room/faces';
import { createAirLoss } from './air-loss';
import { createBlockers, isBlocked } from './blocking';
import { type Device, devicePowers } from './device';
import { createReflection, type ImageTree, imageTree, traceImage } from './images';

/** No distance is taken below this, metres: inside a device's own body the inverse-square law says nothing. */
export const LEAST_DISTANCE_M = 0.02;

/** A device with what its paths need of the room. */
export interface Terminal {
  device: Device;
  /** Absorption of the faces it sees first, seven bands. */
  absorption: Float64Array;
  /** It lies in front of all outer faces, so that none of them can block a leg to another such place. */
  inner: boolean;
}

export interface Source extends Terminal {
  images: ImageTree;
}

/** All paths of one pair. Power gains of seven bands; reused from pair to pair. */
export interface PairPaths {
  /** Geometric length of the direct path in metres, whether blocked or not. */
  lengthM: number;
  /** r⁻²: the direct path by distance alone. */
  distanceGain: number;
  blocked: boolean;
  /** Direct path with directivity, air and blocking. */
  direct: Float64Array;
  /** Reflected paths found. */
  reflections: number;
  /** [reflection], metres. */
  reflectionLengthsM: Float64Array;
  /** [reflection·7 + band]. */
  reflected: Float64Array;
  diffuse: Float64Array;
  /** Direct, reflected and diffuse together. */
  total: Float64Array;
}

export function createPairPaths(): PairPaths {
  return {
    lengthM: 0,
    distanceGain: 0,
    blocked: false,
    direct: new Float64Array(BAND_COUNT),
    reflections: 0,
    reflectionLengthsM: new Float64Array(16),
    reflected: new Float64Array(16 * BAND_COUNT),
    diffuse: new Float64Array(BAND_COUNT),
    total: new Float64Array(BAND_COUNT),
  };
}

/** The room in which paths are found. */
export interface PathRoom {
  faces: Faces;
  field: RoomField;
  /** Attenuation of air, seven bands. */
  airDbPerM: Float64Array;
  /** Highest order of image sources, 0…3. */
  reflectionOrder: number;
}

/** Finds the paths between devices in one room. Holds scratch space only: any number of rooms and runs may coexist. */
export interface PathFinder {
  source(device: Device): Source;
  receiver(device: Device): Terminal;
  /** Paths from a source to a receiver, written over whatever `out` held. */
  find(source: Source, receiver: Terminal, out: PairPaths): void;
}

export function createPathFinder(room: PathRoom): PathFinder {
  const { faces, field, airDbPerM, reflectionOrder } = room;
  const airLoss = createAirLoss(airDbPerM);
  const there = new Float64Array(3);
  const back = new Float64Array(3);
  const blockers = createBlockers(faces);
  const received = new Float64Array(BAND_COUNT);
  const reflection = createReflection();
  let valid = new Uint8Array(64);

  const absorptionOf = (device: Device): Float64Array =>
    device.pattern === null ? field.meanAbsorption : firstAbsorption(device, faces, field);

  /** D_S² · D_X² · r⁻² · 10^(−a r/10), the directions being those in which the path leaves each device. */
  function gainsAlong(
    source: Device,
    departure: Float64Array,
    receiver: Device,
    arrival: Float64Array,
    lengthM: number,
    out: Float64Array,
    at: number,
  ): void {
    const r = Math.max(lengthM, LEAST_DISTANCE_M);
    devicePowers(source, departure[0], departure[1], departure[2], out, at);
    devicePowers(receiver, arrival[0], arrival[1], arrival[2], received, 0);
    airLoss(r, received);
    const spread = 1 / (r * r);
    for (let b = 0; b < BAND_COUNT; b++) out[at + b] *= received[b] * spread;
  }

  function findDirect(source: Device, receiver: Device, among: Int32Array, out: PairPaths): void {
    there[0] = receiver.x - source.x;
    there[1] = receiver.y - source.y;
    there[2] = receiver.z - source.z;
    for (let axis = 0; axis < 3; axis++) back[axis] = -there[axis];
    out.lengthM = Math.sqrt(there[0] * there[0] + there[1] * there[1] + there[2] * there[2]);
    out.distanceGain = 1 / Math.max(out.lengthM, LEAST_DISTANCE_M) ** 2;
    out.blocked = isBlocked(faces, among, source.x, source.y, source.z, receiver.x, receiver.y, receiver.z, -1, -1);
    if (out.blocked) out.direct.fill(0);
    else gainsAlong(source, there, receiver, back, out.lengthM, out.direct, 0);
  }

  function findReflected(source: Source, receiver: Device, among: Int32Array, out: PairPaths): void {
    const { images } = source;
    out.reflections = 0;
    if (valid.length < images.count) valid = new Uint8Array(2 * images.count);
    valid.fill(0, 0, images.count);
    valid[0] = out.blocked ? 0 : 1;
    for (let image = 1; image < images.count; image++) {
      if (twinCounted(images, valid, image)) continue;
      if (!traceImage(faces, images, image, receiver.x, receiver.y, receiver.z, receiver.host, among, reflection))
        continue;
      valid[image] = 1;
      if (out.reflections === out.reflectionLengthsM.length) grow(out);
      const at = out.reflections * BAND_COUNT;
      const { departure, arrival, lengthM } = reflection;
      gainsAlong(source.device, departure, receiver, arrival, lengthM, out.reflected, at);
      for (let b = 0; b < BAND_COUNT; b++) out.reflected[at + b] *= images.reflected[image * BAND_COUNT + b];
      out.reflectionLengthsM[out.reflections++] = lengthM;
    }
  }

  return {
    source: (device) => ({
      device,
      absorption: absorptionOf(device),
      inner: blockers.isInner(device.x, device.y, device.z),
      images: imageTree(faces, device.x, device.y, device.z, device.host, reflectionOrder),
    }),
    receiver: (device) => ({
      device,
      absorption: absorptionOf(device),
      inner: blockers.isInner(device.x, device.y, device.z),
    }),
    find(source, receiver, out) {
      const among = source.inner && receiver.inner ? blockers.inner : blockers.every;
      findDirect(source.device, receiver.device, among, out);
      findReflected(source, receiver.device, among, out);
      diffuseGains(field, reflectionOrder, source, receiver, out.diffuse);
      for (let b = 0; b < BAND_COUNT; b++) {
        let sum = out.direct[b] + out.diffuse[b];
        for (let i = 0; i < out.reflections; i++) sum += out.reflected[i * BAND_COUNT + b];
        out.total[b] = sum;
      }
    },
  };
}

/** Paths whose images coincide count once, the first valid one. */
function twinCounted(images: ImageTree, valid: Uint8Array, image: number): boolean {
  for (let twin = images.twins[image]; twin >= 0; twin = images.twins[twin]) if (valid[twin]) return true;
  return false;
}

function grow(paths: PairPaths): void {
  const { reflectionLengthsM, reflected } = paths;
  paths.reflectionLengthsM = new Float64Array(2 * reflectionLengthsM.length);
  paths.reflectionLengthsM.set(reflectionLengthsM);
  paths.reflected = new Float64Array(2 * reflected.length);
  paths.reflected.set(reflected);
}
