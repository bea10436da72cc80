/** What a scheme makes of one talker's voice before a seat is known. */
export interface FeedInput {
  microphones: number;
  loudspeakers: number;
  bands: number;
  /** T: talker → microphone, [microphone][band]. */
  talkerToMicrophone: Float64Array;
  /** κ: [loudspeaker][microphone][band]. */
  routing: Float64Array;
  /** w: [microphone]. */
  share: Float64Array;
  /** h: [band]. */
  filter: Float64Array;
}

/** h Σ_m T[m] κ[l][m] w[m]: what each loudspeaker is fed, [loudspeaker][band], per unit of talker power and G². */
export function loudspeakerFeeds(input: FeedInput): Float64Array {
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
