/**
 * Bessel function J₁(x) for any real x, absolute error below 1e-10.
 * Ascending series (Abramowitz & Stegun 9.1.10) below 16, where its largest term is 1e5 so that five digits are lost;
 * Hankel's asymptotic expansion (9.2.5, 9.2.9, 9.2.10) above, whose smallest term there is about e^(−32).
 */
export function besselJ1(x: number): number {
  if (x < 0) return -besselJ1(-x);
  return x < 16 ? ascendingSeries(x) : asymptoticExpansion(x);
}

function ascendingSeries(x: number): number {
  const quarter = (x * x) / 4;
  let term = x / 2;
  let sum = term;
  for (let k = 1; Math.abs(term) > 1e-17 * Math.abs(sum); k++) {
    term *= -quarter / (k * (k + 1));
    sum += term;
  }
  return sum;
}

function asymptoticExpansion(x: number): number {
  // a_k = (4ν² − 1²)(4ν² − 3²)…(4ν² − (2k − 1)²) / (k! (8x)^k), ν = 1; P takes the even ones, Q the odd ones.
  const mu = 4;
  let term = 1;
  let even = 1;
  let odd = 0;
  for (let k = 1; k < 30; k++) {
    const next = (term * (mu - (2 * k - 1) ** 2)) / (k * 8 * x);
    if (Math.abs(next) >= Math.abs(term) && k > 1) break;
    term = next;
    const sign = k % 4 < 2 ? 1 : -1;
    if (k % 2 === 0) even += sign * term;
    else odd += sign * term;
  }
  const phase = x - 0.75 * Math.PI;
  return Math.sqrt(2 / (Math.PI * x)) * (even * Math.cos(phase) - odd * Math.sin(phase));
}
