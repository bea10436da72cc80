/**
 * Legendre polynomials P₀(x) … P_last(x) for −1 ≤ x ≤ 1, written into out[0 … last].
 * Upward recurrence (n + 1)P₍ₙ₊₁₎ = (2n + 1)xPₙ − nP₍ₙ₋₁₎ (Abramowitz & Stegun 8.5.3), stable on this interval.
 */
export function legendrePolynomials(x: number, last: number, out: Float64Array): void {
  out[0] = 1;
  if (last > 0) out[1] = x;
  for (let n = 1; n < last; n++) out[n + 1] = ((2 * n + 1) * x * out[n] - n * out[n - 1]) / (n + 1);
}
