import { describe, expect, test } from 'vitest';
import { perron, spectralRadius } from '../../../src/acoustics/loop/perron';
import { seededRandom } from '../../support/random';

const product = (matrix: Float64Array, x: Float64Array) =>
  x.map((_, row) => x.reduce((sum, value, column) => sum + matrix[row * x.length + column] * value, 0));
const transposed = (matrix: Float64Array, n: number) => matrix.map((_, i) => matrix[(i % n) * n + Math.floor(i / n)]);

describe('Perron vectors', () => {
  test.each([1, 2, 5, 12, 60])('of a full %d × %d matrix are eigenvectors of sum 1 (seed 9)', (size) => {
    const random = seededRandom(9);
    const matrix = Float64Array.from({ length: size * size }, () => random());
    const { radius, right, left } = perron(matrix, size);
    const most = Math.max(...matrix);
    product(matrix, right).forEach((value, i) => {
      expect(Math.abs(value - radius * right[i])).toBeLessThan(1e-8 * most);
    });
    product(transposed(matrix, size), left).forEach((value, i) => {
      expect(Math.abs(value - radius * left[i])).toBeLessThan(1e-8 * most);
    });
    for (const vector of [right, left]) {
      expect(vector.reduce((a, b) => a + b)).toBeCloseTo(1, 12);
      expect(Math.min(...vector)).toBeGreaterThan(0);
    }
  });

  test('exist, positive, for a periodic and for a reducible loop too', () => {
    for (const matrix of [Float64Array.of(0, 2, 3, 0), Float64Array.of(1, 0, 0, 2), Float64Array.of(0, 1, 0, 0)]) {
      const { right, left } = perron(matrix, 2);
      expect([...right, ...left].every((value) => value > 0)).toBe(true);
    }
  });

  test('of two loops that do not hear each other are those of the louder', () => {
    const { right, left } = perron(Float64Array.of(1, 0, 0, 2), 2);
    expect(right[1]).toBeGreaterThan(0.999);
    expect(left[1]).toBeGreaterThan(0.999);
  });
});

test('the radius grows with every element and is the same for the transpose (seed 3)', () => {
  const random = seededRandom(3);
  for (let round = 0; round < 20; round++) {
    const size = 1 + Math.floor(8 * random());
    const matrix = Float64Array.from({ length: size * size }, () => (random() < 0.5 ? 0 : random()));
    const radius = spectralRadius(matrix, size);
    expect(spectralRadius(transposed(matrix, size), size)).toBeCloseTo(radius, 10);
    const louder = matrix.slice();
    louder[Math.floor(matrix.length * random())] += 0.5;
    expect(spectralRadius(louder, size)).toBeGreaterThanOrEqual(radius * (1 - 1e-12));
  }
});

test('the matrix given is left as it was', () => {
  const matrix = Float64Array.of(1, 2, 3, 4);
  spectralRadius(matrix, 2);
  perron(matrix, 2);
  expect(Array.from(matrix)).toEqual([1, 2, 3, 4]);
});
