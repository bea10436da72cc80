import { createFaces, type Faces } from '../acoustics/room/faces';
import type { Face, Venue } from './schema';

/** The venue's faces as the acoustics take them, each with the absorption of its finish (1 % where it is unknown). */
export function facesOf(venue: Pick<Venue, 'faces' | 'finishes'>): Faces {
  const finishes = new Map(venue.finishes.map((finish) => [finish.id, finish.absorption]));
  const unknown = [0.01, 0.01, 0.01, 0.01, 0.01, 0.01, 0.01];
  return createFaces(
    venue.faces.map((face: Face) => ({
      corners: face.corners,
      absorption: finishes.get(face.finish) ?? unknown,
      sides: face.sides,
    })),
  );
}
