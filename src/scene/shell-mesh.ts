import { mixOklab, type Rgb } from './colour-scale';
import { normalOf, type RoomShape } from './room-shape';
import type { ThemeColours } from './theme-colours';
import { triangulate } from './triangulate';

/** Triangles of the faces of one kind, nine numbers each, and the face each belongs to. */
export interface FaceTriangles {
  positions: Float32Array;
  /** [triangle] */
  faceOf: Uint32Array;
}

/** The faces of the shell, or those that stand free in the room. */
export function faceTriangles(shape: RoomShape, standing: boolean): FaceTriangles {
  const positions: number[] = [];
  const faceOf: number[] = [];
  for (let face = 0; face < shape.faces.count; face++) {
    if (Boolean(shape.faces.twoSided[face]) !== standing) continue;
    const corners = shape.faces.corners[face];
    triangulate(corners, shape.faces.flatAxis[face]).forEach((corner, i) => {
      positions.push(corners[3 * corner], corners[3 * corner + 1], corners[3 * corner + 2]);
      if (i % 3 === 0) faceOf.push(face);
    });
  }
  return { positions: new Float32Array(positions), faceOf: Uint32Array.from(faceOf) };
}

/** Colours of those triangles, nine numbers each. */
export function faceColours(shape: RoomShape, faceOf: Uint32Array, colours: ThemeColours): Float32Array {
  const painted = new Float32Array(faceOf.length * 9);
  faceOf.forEach((face, triangle) => {
    const colour = faceColour(shape, face, colours);
    for (let corner = 0; corner < 3; corner++) painted.set(colour, triangle * 9 + corner * 3);
  });
  return painted;
}

/** Paper tone of a face, with the light that falls on it from above and the left. */
function faceColour(shape: RoomShape, face: number, { linear }: ThemeColours): Rgb {
  const normal = normalOf(shape.faces, face);
  const shade = (tone: Rgb, share: number): Rgb => mixOklab(tone, linear['hair-2'], share);
  switch (shape.tones[face]) {
    case 'floor':
      return shade(linear['card-floor'], 0.12 * (1 - normal[2]));
    case 'timber':
      return shade(linear['card-timber'], 0.22 * (1 - Math.abs(normal[2])));
    case 'glass':
      return linear['card-glass'];
    case 'ceiling':
      return linear['card-a'];
    case 'wall-a':
      return shade(linear['card-a'], normal[0] < 0 ? 0.05 : 0);
    case 'wall-b':
      return shade(linear['card-b'], normal[1] > 0 ? 0.05 : 0);
  }
}
