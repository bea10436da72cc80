import { CENTRES_HZ } from '../bands';
import { dbOfPower, powerOfDb } from '../level';

/** Above this ratio of direct to scattered power a loop has no peaks worth a figure (our choice). */
const DIRECT_ONLY_RATIO = 5000;

/**
 * How far the highest in-phase peak of the loop stands above its band mean, in dB, at least 0: the x with
 * P(> x) = 1/n. The mean-normalised |H|² is Rician, P(> x) = Q₁(√(2K), √(2(1+K)x)); for K = 0 that is e^(−x), within
 * 0.2 dB of Schroeder's limit 10 log(log₁₀(BT/22)) + 3.8 (J. Acoust. Soc. Am. 36, 1964).
 * `ratio` is K ≥ 0, direct to scattered loop power (`directToScattered`), `chances` is n (`peakChances`).
 * Left out: the fixed comb of a few strong paths, which is not random. Throws RangeError for K < 0 or n not finite.
 */
export function peakAllowanceDb({ ratio, chances }: { ratio: number; chances: number }): number {
  if (!(ratio >= 0 && chances > 1 && chances < Number.POSITIVE_INFINITY)) {
    throw new RangeError(`No peak allowance for a ratio of ${ratio} and ${chances} chances`);
  }
  if (ratio > DIRECT_ONLY_RATIO) return 0;
  const rarity = 1 / chances;
  const isRarer = (x: number) => marcumQ1(Math.sqrt(2 * ratio), Math.sqrt(2 * (1 + ratio) * x)) < rarity;
  let low = 1;
  if (isRarer(low)) return 0;
  let high = 1.5;
  while (!isRarer(high)) {
    low = high;
    high *= 1.5;
  }
  for (let step = 0; step < 40; step++) {
    const middle = (low + high) / 2;
    if (isRarer(middle)) high = middle;
    else low = middle;
  }
  return dbOfPower((low + high) / 2);
}

/**
 * Marcum's Q₁(a, b): the chance that a Rician amplitude of unit spread and offset a exceeds b, to 1e-12 absolute.
 * Q₁ is the chance that a Poisson number of mean b²/2 is not above an independent one of mean a²/2 (from the series
 * Σ e^(−K) Kᵏ/k! · Γ(k+1, y)/k!, Shnidman, IEEE Trans. Inf. Theory 35, 1989); all terms are positive, and logarithms
 * keep them from underflowing. Valid for a, b ≥ 0 up to some hundreds.
 */
export function marcumQ1(a: number, b: number): number {
  const offset = (a * a) / 2;
  const bound = (b * b) / 2;
  if (bound === 0) return 1;
  if (offset === 0) return Math.exp(-bound);
  // Twelve deviations below the lesser mean nothing is left to add (e^−72).
  const lesser = Math.min(offset, bound);
  const first = lesser > 400 ? Math.floor(lesser - 12 * Math.sqrt(lesser)) : 0;
  let logOffset = logPoisson(first, offset);
  let logBound = logPoisson(first, bound);
  let atMost = 0;
  let sum = 0;
  for (let k = first; ; k++) {
    const chance = Math.exp(logOffset);
    atMost += Math.exp(logBound);
    sum += chance * atMost;
    if (k > offset && k > bound && chance < 1e-18) return Math.min(1, sum);
    logOffset += Math.log(offset / (k + 1));
    logBound += Math.log(bound / (k + 1));
  }
}

/** Natural logarithm of the Poisson chance of k = 0, or of a k large enough for Stirling's series (here above 150). */
function logPoisson(k: number, mean: number): number {
  if (k === 0) return -mean;
  const logFactorial = k * Math.log(k) - k + 0.5 * Math.log(2 * Math.PI * k) + 1 / (12 * k) - 1 / (360 * k ** 3);
  return k * Math.log(mean) - mean - logFactorial;
}

/** K: direct over scattered loop power from Perron roots of the whole loop and of its direct paths; ∞ with no scatter. */
export function directToScattered(rho: number, rhoDirect: number): number {
  return rho > rhoDirect ? rhoDirect / (rho - rhoDirect) : Number.POSITIVE_INFINITY;
}

/**
 * n: independent chances for a peak that is also in phase, Σ B·T/22 over the bands whose loop power is within 3 dB of
 * the worst, B = f/√2 the octave's width, at least 2 (22 from Schroeder 1964). Arrays of seven; some ρ must be > 0.
 */
export function peakChances(decayS: ArrayLike<number>, rhoPowers: ArrayLike<number>): number {
  let worst = 0;
  for (let b = 0; b < CENTRES_HZ.length; b++) worst = Math.max(worst, rhoPowers[b]);
  const least = worst * powerOfDb(-3) * (1 - 1e-9);
  let chances = 0;
  for (let b = 0; b < CENTRES_HZ.length; b++) {
    if (rhoPowers[b] >= least) chances += ((CENTRES_HZ[b] / Math.SQRT2) * decayS[b]) / 22;
  }
  return Math.max(2, chances);
}
