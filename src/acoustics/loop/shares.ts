import { BAND_COUNT } from '../bands';

/** What the shares of the microphones depend on. */
export interface ShareInput {
  microphones: number;
  /** [microphone]: 1 where open. */
  open: ArrayLike<number>;
  /** [microphone]: 1 where open and taking part in gain sharing; all 0 with sharing off. */
  sharing: ArrayLike<number>;
  /** [microphone]: speech power it hears; any common factor cancels. Zero for pauses. */
  speech: ArrayLike<number>;
  /** [microphone]: noise power it hears, same factor. */
  noise: ArrayLike<number>;
}

/**
 * Share w of each microphone: 1 where open; under gain sharing in proportion to what it hears, so that the shares of
 * those that take part sum to 1 and the system counts as one open microphone (common practice).
 */
export function shares(input: ShareInput): Float64Array {
  const { microphones, open, sharing, speech, noise } = input;
  const result = new Float64Array(microphones);
  let heard = 0;
  for (let m = 0; m < microphones; m++) if (sharing[m]) heard += speech[m] + noise[m];
  for (let m = 0; m < microphones; m++) {
    if (sharing[m]) result[m] = heard > 0 ? (speech[m] + noise[m]) / heard : 0;
    else if (open[m]) result[m] = 1;
  }
  return result;
}

/** Speech and noise power a microphone hears, A-weighted: [microphone] each. */
export function heardPowers(
  talkerPowers: ArrayLike<number>,
  talkerGains: Float64Array,
  noisePowers: ArrayLike<number>,
  directivityFactors: readonly Float64Array[],
  weights: Float64Array,
): { speech: Float64Array; noise: Float64Array } {
  const count = directivityFactors.length;
  const speech = new Float64Array(count);
  const noise = new Float64Array(count);
  for (let m = 0; m < count; m++) {
    for (let b = 0; b < BAND_COUNT; b++) {
      speech[m] += weights[b] * talkerPowers[b] * talkerGains[m * BAND_COUNT + b];
      noise[m] += (weights[b] * noisePowers[b]) / directivityFactors[m][b];
    }
  }
  return { speech, noise };
}
