import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { spectralRadius } from '../../../src/acoustics/loop/perron';
import { seededRandom } from '../../support/random';
import type { PublishedRow } from '../row';

type Entry = (row: number, column: number, random: () => number) => number;

const MATRICES: { name: string; size: number; entry: Entry }[] = [
  { name: 'full', size: 1, entry: (_r, _c, random) => random() },
  { name: 'full', size: 2, entry: (_r, _c, random) => random() },
  { name: 'full', size: 7, entry: (_r, _c, random) => random() },
  { name: 'full', size: 60, entry: (_r, _c, random) => random() },
  { name: 'over twelve decades', size: 9, entry: (_r, _c, random) => 10 ** (-12 * random()) },
  { name: 'mostly zero', size: 12, entry: (_r, _c, random) => (random() < 0.15 ? random() : 0) },
  { name: 'mostly zero', size: 60, entry: (_r, _c, random) => (random() < 0.03 ? random() : 0) },
  // Reducible: two loops that do not hear each other, and one that hears the other but is not heard.
  { name: 'of two blocks', size: 8, entry: (r, c, random) => (r < 4 === c < 4 ? random() : 0) },
  { name: 'upper block triangular', size: 8, entry: (r, c, random) => (r < 4 || c >= 4 ? random() : 0) },
  { name: 'triangular', size: 10, entry: (r, c, random) => (r <= c ? random() : 0) },
  // Periodic: power iteration swings for ever.
  { name: 'a weighted ring', size: 6, entry: (r, c, random) => (c === (r + 1) % 6 ? 0.1 + random() : 0) },
  { name: 'of period two', size: 6, entry: (r, c, random) => (r % 2 !== c % 2 ? random() : 0) },
];

function matrixOf({ size, entry }: (typeof MATRICES)[number], seed: number): Float64Array {
  const random = seededRandom(seed);
  return Float64Array.from({ length: size * size }, (_, i) => entry(Math.floor(i / size), i % size, random));
}

function referenceRadius(matrix: Float64Array, size: number): number {
  const rows = Array.from({ length: size }, (_, r) => Array.from(matrix.subarray(r * size, (r + 1) * size)));
  const { realEigenvalues, imaginaryEigenvalues } = new EigenvalueDecomposition(new Matrix(rows));
  return Math.max(...realEigenvalues.map((real, i) => Math.hypot(real, imaginaryEigenvalues[i])));
}

const againstLibrary: PublishedRow[] = MATRICES.flatMap((kind, k) =>
  [1, 2].map((round) => {
    const seed = 100 * k + round;
    const matrix = matrixOf(kind, seed);
    const value = referenceRadius(matrix, kind.size);
    return {
      quantity: `spectral radius, ${kind.size} × ${kind.size} ${kind.name} (seed ${seed})`,
      compute: () => spectralRadius(matrix, kind.size),
      value,
      tolerance: 1e-9 * value,
      unit: '1',
      source: 'numerical library: ml-matrix, eigenvalue decomposition',
    };
  }),
);

const ring = (n: number, weight: (i: number) => number): Float64Array =>
  Float64Array.from({ length: n * n }, (_, i) =>
    i % n === (Math.floor(i / n) + 1) % n ? weight(Math.floor(i / n)) : 0,
  );

const closed: PublishedRow[] = [
  {
    quantity: 'spectral radius of a nilpotent 5 × 5 matrix',
    compute: () =>
      spectralRadius(
        ring(5, (i) => (i === 4 ? 0 : 3)),
        5,
      ),
    value: 0,
    tolerance: 0,
    unit: '1',
    source: 'closed form: Wⁿ = 0',
  },
  {
    quantity: 'spectral radius of nothing',
    compute: () => spectralRadius(new Float64Array(9), 3),
    value: 0,
    tolerance: 0,
    unit: '1',
    source: 'closed form',
  },
  {
    quantity: 'spectral radius of a ring of weights 1 … 7',
    compute: () =>
      spectralRadius(
        ring(7, (i) => i + 1),
        7,
      ),
    value: 5040 ** (1 / 7),
    tolerance: 1e-12,
    unit: '1',
    source: 'closed form: geometric mean of the weights',
  },
  {
    quantity: 'spectral radius of a Jordan block of 0.7',
    compute: () => spectralRadius(Float64Array.of(0.7, 1, 0, 0, 0.7, 1, 0, 0, 0.7), 3),
    value: 0.7,
    tolerance: 1e-12,
    unit: '1',
    source: 'closed form',
  },
  {
    quantity: 'spectral radius of u vᵀ',
    compute: () => spectralRadius(Float64Array.of(2, 6, 4, 1, 3, 2, 5, 15, 10), 3),
    value: 15,
    tolerance: 1e-12,
    unit: '1',
    source: 'closed form: u · v',
  },
  ...[1e-150, 1e150].map((scale) => ({
    quantity: `spectral radius of ${scale} · (1 2; 3 4)`,
    compute: () => spectralRadius(Float64Array.of(scale, 2 * scale, 3 * scale, 4 * scale), 2) / scale,
    value: (5 + Math.sqrt(33)) / 2,
    tolerance: 1e-11,
    unit: '1',
    source: 'closed form: quadratic equation',
  })),
];

export const rows: PublishedRow[] = [...againstLibrary, ...closed];
