/** What a scheme delivers to seats per unit of power gain G², for one talker. */
export interface SystemInput {
  microphones: number;
  loudspeakers: number;
  seats: number;
  bands: number;
  /** T: talker → microphone, [microphone][band]. */
  talkerToMicrophone: Float64Array;
  /** κ: [loudspeaker][microphone][band]. */
  routing: Float64Array;
  /** w: [microphone]. */
  share: Float64Array;
  /** h: [band]. */
  filter: Float64Array;
  /** B: loudspeaker → seat, [loudspeaker][seat][band]. */
  loudspeakerToSeat: Float64Array;
}

/** h Σ_m T[m] κ[l][m] w[m]: what each loudspeaker is fed, [loudspeaker][band], per unit of talker power and G². */
export function loudspeakerFeeds(input: Omit<SystemInput, 'seats' | 'loudspeakerToSeat'>): Float64Array {
  const { microphones: M, loudspeakers: L, bands: B } = input;
  const feeds = new Float64Array(L * B);
  for (let l = 0; l < L; l++) {
    for (let m = 0; m < M; m++) {
      if (input.share[m] === 0) continue;
      for (let b = 0; b < B; b++) {
        feeds[l * B + b] +=
          input.filter[b] * input.talkerToMicrophone[m * B + b] * input.routing[(l * M + m) * B + b] * input.share[m];
      }
    }
  }
  return feeds;
}

/** h Σ_m Σ_l T κ w B: power gain talker → seat through the system at G² = 1, [seat][band]. */
export function systemGains(input: SystemInput): Float64Array {
  const { loudspeakers: L, seats: S, bands: B } = input;
  const feeds = loudspeakerFeeds(input);
  const gains = new Float64Array(S * B);
  for (let l = 0; l < L; l++) {
    const from = l * S * B;
    for (let s = 0; s < S; s++) {
      for (let b = 0; b < B; b++) gains[s * B + b] += feeds[l * B + b] * input.loudspeakerToSeat[from + s * B + b];
    }
  }
  return gains;
}

/** Power of a spectrum after gains, weighted and summed, for each seat: Σ_b weights[b] · spectrum[b] · gains[seat][band]. */
export function weightedSeatPowers(
  gains: Float64Array,
  spectrum: ArrayLike<number>,
  weights: ArrayLike<number>,
): Float64Array {
  const bands = spectrum.length;
  const result = new Float64Array(gains.length / bands);
  for (let s = 0; s < result.length; s++) {
    for (let b = 0; b < bands; b++) result[s] += weights[b] * spectrum[b] * gains[s * bands + b];
  }
  return result;
}
