import type { Device } from '../../src/acoustics/paths/device';
import { createListener } from '../../src/acoustics/paths/device';
import { createPairPaths, createPathFinder, type PairPaths } from '../../src/acoustics/paths/finder';
import { type DecayModel, type RoomField, roomField } from '../../src/acoustics/room/decay';
import type { Faces } from '../../src/acoustics/room/faces';
import { createFaces } from '../../src/acoustics/room/faces';
import { flat } from './layouts';

/** Air without attenuation. */
export const NO_AIR = new Float64Array(7);

/** The speed of sound of the model at 20 °C. */
export const SOUND_SPEED = 343.2;

/** Surfaces of given area and absorption (one figure or seven) that enclose nothing: statistics only need their sums. */
export function surfaces(...parts: [areaM2: number, absorption: number | number[]][]): Faces {
  return createFaces(
    parts.map(([areaM2, absorption]) => ({
      corners: [
        [0, 0, 0],
        [areaM2, 0, 0],
        [areaM2, 1, 0],
        [0, 1, 0],
      ],
      absorption: typeof absorption === 'number' ? flat(absorption) : absorption,
      sides: 1,
    })),
  );
}

export const field = (faces: Faces, volumeM3: number, decay: DecayModel = { model: 'eyring' }): RoomField =>
  roomField(faces, volumeM3, NO_AIR, SOUND_SPEED, decay);

/** A diffuse field of a given room constant in which all directions look alike. */
export function fieldOfRoomConstant(roomConstantM2: number, meanAbsorption = 0.2): RoomField {
  const areaM2 = (roomConstantM2 * (1 - meanAbsorption)) / meanAbsorption;
  return field(surfaces([areaM2, meanAbsorption]), 1000);
}

/** A device that sends alike in all directions but has the directivity factor of one that does not: "on its axis". */
export const onAxis = (x: number, directivityFactor = 1): Device => ({
  ...createListener(x, 0, 0),
  directivityFactors: new Float64Array(7).fill(directivityFactor),
});

/** Paths of one pair with no face in the way and no image sources: direct sound and a diffuse field. */
export function pairInField(roomField: RoomField, source: Device, receiver: Device): PairPaths {
  const finder = createPathFinder({ faces: createFaces([]), field: roomField, airDbPerM: NO_AIR, reflectionOrder: 0 });
  const paths = createPairPaths();
  finder.find(finder.source(source), finder.receiver(receiver), paths);
  return paths;
}
