import { BAND_COUNT } from '../bands';
import { DB_PER_POWER_NEPER } from '../level';
import type { Faces } from './faces';

/** How the decay time of a room is found. */
export type DecayModel = { model: 'eyring' } | { model: 'sabine' } | { model: 'given'; seconds: readonly number[] };

/** The room as its diffuse field sees it. Bands of seven. */
export interface RoomField {
  volumeM3: number;
  /** Total face area, both sides of free-standing faces, m². */
  surfaceM2: number;
  /** ᾱ, limited to 0.01…0.99. */
  meanAbsorption: Float64Array;
  /** A = S ᾱ + 4 m V, m². */
  absorptionAreaM2: Float64Array;
  /** A / (1 − ᾱ), m². */
  roomConstantM2: Float64Array;
  decayS: Float64Array;
  /** Absorption of each face as the diffuse field sees it, at most 0.99: [face·7 + band]. */
  seenAbsorption: Float64Array;
}

const LEAST_ABSORPTION = 0.01;
const MOST_ABSORPTION = 0.99;

/** 24 ln 10: decay time is this times V over c times the absorption area (Sabine; Bies 5e eq. 6.43). */
const DECAY_FACTOR = 55.26;

/** Mean absorption, room constant and decay of a room of given volume; air attenuation in dB/m, speed of sound in m/s. */
export function roomField(
  faces: Faces,
  volumeM3: number,
  airDbPerM: Float64Array,
  soundSpeedMS: number,
  decay: DecayModel,
): RoomField {
  let surfaceM2 = 0;
  const absorbing = new Float64Array(BAND_COUNT);
  for (let face = 0; face < faces.count; face++) {
    const areaM2 = faces.areas[face] * (faces.twoSided[face] ? 2 : 1);
    surfaceM2 += areaM2;
    for (let b = 0; b < BAND_COUNT; b++) absorbing[b] += areaM2 * faces.absorption[face * BAND_COUNT + b];
  }
  const limited = absorbing.map((area) => limit(surfaceM2 > 0 ? area / surfaceM2 : 0));
  const airAreaM2 = airDbPerM.map((attenuation) => (4 * attenuation * volumeM3) / DB_PER_POWER_NEPER);
  const perSecond = (DECAY_FACTOR * volumeM3) / soundSpeedMS;

  const meanAbsorption =
    decay.model === 'given'
      ? limited.map((_, b) => limit(1 - Math.exp(-(perSecond / decay.seconds[b] - airAreaM2[b]) / surfaceM2)))
      : limited;
  const decayS = meanAbsorption.map((mean, b) => {
    if (decay.model === 'given') return decay.seconds[b];
    const walls = decay.model === 'sabine' ? surfaceM2 * mean : -surfaceM2 * Math.log(1 - mean);
    return perSecond / (walls + airAreaM2[b]);
  });
  const absorptionAreaM2 = meanAbsorption.map((mean, b) => surfaceM2 * mean + airAreaM2[b]);
  return {
    volumeM3,
    surfaceM2,
    meanAbsorption,
    absorptionAreaM2,
    roomConstantM2: absorptionAreaM2.map((area, b) => area / (1 - meanAbsorption[b])),
    decayS,
    seenAbsorption: faces.absorption.map((value, i) => {
      const b = i % BAND_COUNT;
      return Math.min(MOST_ABSORPTION, (value * meanAbsorption[b]) / limited[b]);
    }),
  };
}

const limit = (absorption: number): number => Math.min(MOST_ABSORPTION, Math.max(LEAST_ABSORPTION, absorption));
