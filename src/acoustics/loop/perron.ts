/** Spectral radius of a non-negative matrix with its Perron vectors, both normalised to sum 1. */
export interface Perron {
  radius: number;
  /** Right vector x, W x = ρ x. */
  right: Float64Array;
  /** Left vector y, yᵀ W = ρ yᵀ. */
  left: Float64Array;
}

/** Squarings after which any matrix of doubles has settled: 2^60 powers. */
const MOST_SQUARINGS = 60;

/**
 * Spectral radius of a non-negative square matrix, row by row in `matrix` [row][column], by Gelfand's formula
 * ρ = lim ‖Wⁿ‖^(1/n) over n = 2^k (repeated squaring). Products of non-negative numbers lose no digits to cancellation,
 * so this needs no special case for reducible, periodic or nilpotent loops, where power iteration stalls or swings.
 * Relative error below 1e-12.
 */
export function spectralRadius(matrix: Float64Array, size: number): number {
  return squareUp(matrix, size).radius;
}

/**
 * Radius and vectors of W + 1e-9·max(W)/size in every element: the small constant makes the matrix positive, so that
 * both vectors exist and are unique. The radius returned is that of the perturbed matrix.
 */
export function perron(matrix: Float64Array, size: number): Perron {
  const most = greatest(matrix);
  const lifted = matrix.map((value) => value + (1e-9 * most) / size);
  const { radius, power } = squareUp(lifted, size);
  const right = new Float64Array(size);
  const left = new Float64Array(size);
  for (let row = 0; row < size; row++) {
    for (let column = 0; column < size; column++) {
      right[row] += power[row * size + column];
      left[column] += power[row * size + column];
    }
  }
  return { radius, right: normalised(right), left: normalised(left) };
}

/** W^(2^k) scaled to a greatest element of 1, and the radius its growth shows. */
function squareUp(matrix: Float64Array, size: number): { radius: number; power: Float64Array } {
  let power: Float64Array = matrix.slice();
  let logRadius = 0;
  for (let k = 0; k <= MOST_SQUARINGS; k++) {
    const most = greatest(power);
    if (most === 0) return { radius: 0, power };
    for (let i = 0; i < power.length; i++) power[i] /= most;
    const step = Math.log(most) / 2 ** k;
    logRadius += step;
    const next = square(power, size);
    // A settled power reproduces itself up to its scale; then ‖P²‖ = ρ'‖P‖ holds for good and the sum is a geometric one.
    const scale = greatest(next);
    if (scale > 0 && sameUpTo(power, next, scale)) {
      return { radius: Math.exp(logRadius + Math.log(scale) / 2 ** k), power };
    }
    power = next;
  }
  return { radius: Math.exp(logRadius), power };
}

function greatest(values: Float64Array): number {
  let most = 0;
  for (let i = 0; i < values.length; i++) if (values[i] > most) most = values[i];
  return most;
}

function square(a: Float64Array, size: number): Float64Array {
  const result = new Float64Array(size * size);
  for (let i = 0; i < size; i++) {
    for (let k = 0; k < size; k++) {
      const value = a[i * size + k];
      if (value === 0) continue;
      for (let j = 0; j < size; j++) result[i * size + j] += value * a[k * size + j];
    }
  }
  return result;
}

function sameUpTo(a: Float64Array, b: Float64Array, scale: number): boolean {
  for (let i = 0; i < a.length; i++) if (Math.abs(a[i] - b[i] / scale) > 1e-13) return false;
  return true;
}

function normalised(vector: Float64Array): Float64Array {
  const sum = vector.reduce((a, b) => a + b, 0);
  return vector.map((value) => value / sum);
}
