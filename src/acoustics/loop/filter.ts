import { CENTRES_HZ } from '../bands';

/** Power response of the system's high-pass at the seven bands: second-order Butterworth, 1/(1 + (f_c/f)⁴); 1 for 0 Hz. */
export function highPassPowers(cornerHz: number): Float64Array {
  return Float64Array.from(CENTRES_HZ, (frequencyHz) => 1 / (1 + (cornerHz / frequencyHz) ** 4));
}
