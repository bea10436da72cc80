/** Derivatives j′ₙ(x) and y′ₙ(x), n = 0 … length − 1; h⁽²⁾′ₙ = j′ₙ − i·y′ₙ. */
export interface SphericalDerivatives {
  readonly j: Float64Array;
  readonly y: Float64Array;
}

/** Beyond this size of yₙ the term 1/hₙ′ of a series is nothing beside its first ones, and yₙ soon overflows. */
const LARGEST_Y = 1e60;

/**
 * Derivatives of the spherical Bessel functions at x > 0 for orders 0 … last, or fewer where yₙ has passed 1e60.
 * yₙ by upward recurrence, jₙ by downward recurrence from far above (Miller), scaled by j₀ or j₁; derivatives by
 * fₙ′ = f₍ₙ₋₁₎ − (n + 1)fₙ/x (Abramowitz & Stegun 10.1.19, 10.1.21, 10.5).
 */
export function sphericalDerivatives(x: number, last: number): SphericalDerivatives {
  const y = upwardY(x, last + 1);
  const orders = Math.min(last + 1, y.length - 1);
  const j = downwardJ(x, orders);
  return { j: derivatives(j, x, orders), y: derivatives(y, x, orders) };
}

/** yₙ(x) for n = 0 … last, cut off after the first one beyond LARGEST_Y (at least two are kept). */
function upwardY(x: number, last: number): Float64Array {
  const y = new Float64Array(last + 1);
  y[0] = -Math.cos(x) / x;
  y[1] = (y[0] - Math.sin(x)) / x;
  for (let n = 1; n < last; n++) {
    if (Math.abs(y[n]) > LARGEST_Y) return y.subarray(0, n + 1);
    y[n + 1] = ((2 * n + 1) / x) * y[n] - y[n - 1];
  }
  return y;
}

/** jₙ(x) for n = 0 … last. */
function downwardJ(x: number, last: number): Float64Array {
  const j = new Float64Array(last + 1);
  const start = Math.max(last, Math.ceil(x)) + 30 + Math.ceil(4 * Math.cbrt(x));
  let above = 0;
  let here = 1e-300;
  for (let n = start; n >= 0; n--) {
    if (n <= last) j[n] = here;
    const below = ((2 * n + 1) / x) * here - above;
    above = here;
    here = below;
    if (Math.abs(here) > 1e100) {
      here *= 1e-200;
      above *= 1e-200;
      for (let m = Math.max(n, 0); m <= last; m++) j[m] *= 1e-200;
    }
  }
  // After the last step `above` is j₀ and `here` is j₋₁ = cos x / x, both to the unknown scale: the larger is the safer.
  const j0 = Math.sin(x) / x;
  const jMinus1 = Math.cos(x) / x;
  const scale = Math.abs(j0) > Math.abs(jMinus1) ? j0 / above : jMinus1 / here;
  for (let n = 0; n <= last; n++) j[n] *= scale;
  return j;
}

function derivatives(f: Float64Array, x: number, count: number): Float64Array {
  const derivative = new Float64Array(count);
  derivative[0] = -f[1];
  for (let n = 1; n < count; n++) derivative[n] = f[n - 1] - ((n + 1) / x) * f[n];
  return derivative;
}
