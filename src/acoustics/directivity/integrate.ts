import { BAND_COUNT } from '../bands';
import type { Pattern } from './pattern';

/** Seven integrals have settled when doubling a count moves none of them by more than this (0.002 dB). */
const SETTLED = 10 ** (0.002 / 10) - 1;
/** Cells between the poles. Always even, so that an edge at θ = 90° lies between cells. */
const FIRST_RINGS = 128;
const MOST_RINGS = 4096;
const FIRST_SPOKES = 24;
const MOST_SPOKES = 1536;
/** Gauss–Legendre abscissae and weights of three points on −1 … 1 (Abramowitz & Stegun, table 25.4). */
const NODES = [-Math.sqrt(0.6), 0, Math.sqrt(0.6)];
const WEIGHTS = [5 / 9, 8 / 9, 5 / 9];

/**
 * Directivity factors Q = 4π/∮D²dΩ of the seven bands, of the floored D², to 0.01 dB.
 * Three Gauss points in every ring between the poles, equal steps around them; rings and spokes are doubled,
 * each on its own, until that changes nothing.
 */
export function directivityFactors(pattern: Pattern): Float64Array {
  let rings = FIRST_RINGS;
  let spokes = pattern.axisymmetric ? 1 : FIRST_SPOKES;
  let mean = meanPowers(pattern, rings, spokes);
  let settled = false;
  while (!settled && rings < MOST_RINGS) {
    rings *= 2;
    const finer = meanPowers(pattern, rings, spokes);
    settled = agree(mean, finer);
    mean = finer;
  }
  settled = pattern.axisymmetric;
  while (!settled && spokes < MOST_SPOKES) {
    spokes *= 2;
    const finer = meanPowers(pattern, rings, spokes);
    settled = agree(mean, finer);
    mean = finer;
  }
  return mean.map((power) => 1 / power);
}

/** Mean of D² over the sphere, by band. */
function meanPowers(pattern: Pattern, rings: number, spokes: number): Float64Array {
  const sums = new Float64Array(BAND_COUNT);
  const powers = new Float64Array(BAND_COUNT);
  const cell = Math.PI / rings;
  for (let ring = 0; ring < rings; ring++) {
    for (let node = 0; node < NODES.length; node++) {
      const polarRad = (ring + 0.5 + NODES[node] / 2) * cell;
      const cosine = Math.cos(polarRad);
      const sine = Math.sin(polarRad);
      const weight = (WEIGHTS[node] * cell * sine) / (4 * spokes);
      for (let spoke = 0; spoke < spokes; spoke++) {
        const turn = (2 * Math.PI * (spoke + 0.5)) / spokes;
        const across = sine * Math.cos(turn);
        const along = sine * Math.sin(turn);
        if (pattern.ringsAbout === 'up') pattern.powers(across, along, cosine, powers, 0);
        else pattern.powers(cosine, across, along, powers, 0);
        for (let b = 0; b < BAND_COUNT; b++) sums[b] += weight * powers[b];
      }
    }
  }
  return sums;
}

function agree(coarse: Float64Array, fine: Float64Array): boolean {
  return coarse.every((power, b) => Math.abs(power - fine[b]) <= SETTLED * fine[b]);
}
