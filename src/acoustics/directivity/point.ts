import { BAND_COUNT } from '../bands';
import type { Pattern } from './pattern';

/** Sends alike in every direction: D² = 1. */
export function createPoint(): Pattern {
  return {
    axisymmetric: true,
    powers(_u, _v, _w, out, at) {
      out.fill(1, at, at + BAND_COUNT);
    },
  };
}
