import { BAND_COUNT } from '../bands';
import { FLOOR_POWER, type Pattern } from './pattern';

/**
 * First-order microphone D = α + (1 − α) cos θ (Olson, Elements of Acoustical Engineering), floored.
 *
 * @param alpha share of the pressure part, 0 (bidirectional) … 1 (omnidirectional): one, or one per band
 */
export function createFirstOrder(alpha: number | readonly number[]): Pattern {
  const alphas = typeof alpha === 'number' ? new Array<number>(BAND_COUNT).fill(alpha) : alpha;
  const perBand = Float64Array.from(alphas);
  return {
    axisymmetric: true,
    powers(u, _v, _w, out, at) {
      for (let b = 0; b < BAND_COUNT; b++) {
        const d = firstOrderPressure(perBand[b], u);
        out[at + b] = Math.max(FLOOR_POWER, d * d);
      }
    },
  };
}

/** D, signed, without the floor. */
export function firstOrderPressure(alpha: number, cosTheta: number): number {
  return alpha + (1 - alpha) * cosTheta;
}
