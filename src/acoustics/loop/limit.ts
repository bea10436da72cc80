import { dbOfPower } from '../level';
import { perron, spectralRadius } from './perron';

/** The loop of a scheme on one rung, before shares are known. */
export interface LoopInput {
  microphones: number;
  loudspeakers: number;
  /** Seven, or 1 for the pseudo-band of the `distance` rung. */
  bands: number;
  /** A: loudspeaker → microphone power gain, [microphone][loudspeaker][band]. */
  returns: Float64Array;
  /** κ: routing power gain, [loudspeaker][microphone][band]; 0 where not sent. */
  routing: Float64Array;
  /** h: system filter, [band], power. */
  filter: Float64Array;
}

/** How far a loop may be raised. Levels in dB; null where there is no finite number. */
export interface LoopLimit {
  /** ρ, the mean-square loop gain at unit gain, [band]. */
  radii: Float64Array;
  /** Index of the band that rings first; −1 where nothing is looped. */
  limitingBand: number;
  /** Greatest stable power gain in dB. */
  limitDb: number | null;
  /** Limit of each band on its own in dB, NaN where a band is not looped: [band]. */
  bandLimitsDb: Float64Array;
  openMicrophoneCostDb: number | null;
  /** Share of the loop carried by each crosspoint in the limiting band, [microphone][loudspeaker]; null without a loop. */
  crosspoints: Float64Array | null;
}

/** Two radii closer than this (relative) are equal; the lower band is taken. */
const TIE = 1e-9;

/** Limit of a loop whose microphones have the shares w. */
export function loopLimit(loop: LoopInput, share: Float64Array): LoopLimit {
  const { radii, band, limitDb } = worstLoop(loop, share);
  const bandLimitsDb = radii.map((radius) => (radius > 0 ? -dbOfPower(radius) : Number.NaN));
  const looped = band >= 0;
  return {
    radii,
    limitingBand: band,
    limitDb,
    bandLimitsDb,
    openMicrophoneCostDb: looped ? openMicrophoneCost(loop, share, band, radii[band]) : null,
    crosspoints: looped ? crosspointShares(loop, share, band) : null,
  };
}

/** Only the limit in dB of a loop, null where there is none. */
export const limitAlone = (loop: LoopInput, share: Float64Array): number | null => worstLoop(loop, share).limitDb;

function worstLoop(
  loop: LoopInput,
  share: Float64Array,
): { radii: Float64Array; band: number; limitDb: number | null } {
  const radii = new Float64Array(loop.bands);
  for (let b = 0; b < loop.bands; b++) radii[b] = spectralRadius(loopMatrix(loop, share, b), loop.microphones);
  const band = worstBand(radii);
  return { radii, band, limitDb: band < 0 ? null : -dbOfPower(radii[band]) };
}

/** W[m][m′] = h Σ_l A[m][l] κ[l][m′] w[m′] of one band. */
export function loopMatrix(loop: LoopInput, share: Float64Array, band: number): Float64Array {
  const { microphones: M, loudspeakers: L, bands: B } = loop;
  const matrix = new Float64Array(M * M);
  for (let m = 0; m < M; m++) {
    for (let l = 0; l < L; l++) {
      const back = loop.filter[band] * loop.returns[(m * L + l) * B + band];
      if (back === 0) continue;
      for (let n = 0; n < M; n++) matrix[m * M + n] += back * loop.routing[(l * M + n) * B + band] * share[n];
    }
  }
  return matrix;
}

function worstBand(radii: Float64Array): number {
  let worst = -1;
  radii.forEach((radius, b) => {
    if (radius > 0 && (worst < 0 || radius > radii[worst] * (1 + TIE))) worst = b;
  });
  return worst;
}

/** 10 log(ρ / max_m W[m][m]/w[m]): what the other open microphones cost, 10 log N for N equal ones (common practice). */
function openMicrophoneCost(loop: LoopInput, share: Float64Array, band: number, radius: number): number | null {
  const { microphones: M, loudspeakers: L, bands: B } = loop;
  let worst = 0;
  for (let m = 0; m < M; m++) {
    if (share[m] === 0) continue;
    let alone = 0;
    for (let l = 0; l < L; l++) alone += loop.returns[(m * L + l) * B + band] * loop.routing[(l * M + m) * B + band];
    worst = Math.max(worst, loop.filter[band] * alone);
  }
  return worst > 0 ? dbOfPower(radius / worst) : null;
}

/** Crosspoint (m, l) carries y_m A[m][l] h Σ_m′ κ[l][m′] w[m′] x_m′ of the loop, scaled to a sum of 1. */
function crosspointShares(loop: LoopInput, share: Float64Array, band: number): Float64Array {
  const { microphones: M, loudspeakers: L, bands: B } = loop;
  const { left, right } = perron(loopMatrix(loop, share, band), M);
  const carried = new Float64Array(M * L);
  for (let l = 0; l < L; l++) {
    let fed = 0;
    for (let n = 0; n < M; n++) fed += loop.routing[(l * M + n) * B + band] * share[n] * right[n];
    for (let m = 0; m < M; m++)
      carried[m * L + l] = left[m] * loop.returns[(m * L + l) * B + band] * loop.filter[band] * fed;
  }
  const sum = carried.reduce((a, b) => a + b, 0);
  return carried.map((value) => value / sum);
}
