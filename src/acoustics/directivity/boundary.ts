import { BAND_COUNT } from '../bands';
import type { Pattern } from './pattern';
import { BEHIND_COSINE } from './sampled-pattern';

/** A microphone lying on a surface, its aim the surface's normal: D² = 1 in front (cos θ ≥ −1e-9), 0 behind. */
export function createBoundary(): Pattern {
  return {
    axisymmetric: true,
    powers(u, _v, _w, out, at) {
      out.fill(u < BEHIND_COSINE ? 0 : 1, at, at + BAND_COUNT);
    },
  };
}
