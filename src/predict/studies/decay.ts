import { BAND_COUNT } from '../../acoustics/bands';
import type { RoomField } from '../../acoustics/room/decay';
import type { Faces } from '../../acoustics/room/faces';
import { facesOf } from '../../layout/geometry';
import type { Layout, Venue } from '../../layout/schema';
import { fieldOf } from '../prepare';

/** What one finish, or the air, takes out of the room. Seven bands. */
export interface Contribution {
  /** Finish id; null for the air. */
  finish: string | null;
  label: string;
  /** Area it covers, both sides of free-standing faces, m². */
  areaM2: number;
  /** Its part of the absorption area, m². */
  absorptionM2: Float64Array;
  /** Its part of the whole, 0…1. */
  share: Float64Array;
}

/** What would happen to the decay if one face were covered with a good absorber. */
export interface Treatment {
  face: string;
  areaM2: number;
  decayS: Float64Array;
}

export interface DecayStudy {
  contributions: Contribution[];
  /** Faces by how much covering each would shorten the decay at the octave asked for, the most first. */
  treatments: Treatment[];
}

/** Absorption of a good porous absorber, every octave: what a treatment is taken to bring. Our choice. */
export const GOOD_ABSORBER = 0.9;

/** Who absorbs how much, and which face would shorten the decay most if it were covered (band 2 is 500 Hz). */
export function studyDecay(layout: Layout, band = 2): DecayStudy {
  const { venue } = layout;
  const faces = facesOf(venue);
  const field = fieldOf(venue, faces);
  const areaOf = (face: number) => faces.areas[face] * (faces.twoSided[face] ? 2 : 1);

  const contributions: Contribution[] = venue.finishes.map((finish) => {
    const areaM2 = venue.faces.reduce((sum, face, i) => (face.finish === finish.id ? sum + areaOf(i) : sum), 0);
    const absorptionM2 = Float64Array.from(finish.absorption, (absorption) => absorption * areaM2);
    return {
      finish: finish.id,
      label: finish.label || finish.id,
      areaM2,
      absorptionM2,
      share: new Float64Array(BAND_COUNT),
    };
  });
  const walls = sumOf(contributions);
  const air = field.absorptionAreaM2.map((area, b) => area - field.surfaceM2 * field.meanAbsorption[b]);
  contributions.push({ finish: null, label: 'Air', areaM2: 0, absorptionM2: air, share: new Float64Array(BAND_COUNT) });
  for (const { absorptionM2, share } of contributions) {
    share.set(absorptionM2.map((area, b) => area / (walls[b] + air[b])));
  }
  const treatments =
    venue.decay.model === 'given'
      ? []
      : venue.faces
          .map((face, i) => ({ face: face.id, areaM2: areaOf(i), decayS: fieldCovering(venue, faces, i).decayS }))
          .sort((a, b) => a.decayS[band] - b.decayS[band]);
  contributions.sort((a, b) => b.share[band] - a.share[band]);
  return { contributions, treatments };
}

/** The room's field with one face covered with a good absorber where it absorbs less. */
function fieldCovering(venue: Venue, faces: Faces, covered: number): RoomField {
  const absorption = faces.absorption.slice();
  for (let i = covered * BAND_COUNT; i < (covered + 1) * BAND_COUNT; i++) {
    absorption[i] = Math.max(absorption[i], GOOD_ABSORBER);
  }
  return fieldOf(venue, { ...faces, absorption });
}

function sumOf(contributions: readonly Contribution[]): Float64Array {
  const sum = new Float64Array(BAND_COUNT);
  for (const { absorptionM2 } of contributions) for (let b = 0; b < BAND_COUNT; b++) sum[b] += absorptionM2[b];
  return sum;
}
