import { expect, test } from 'vitest';
import reference from '../../../data/reference/special-functions.json';
import { besselJ1 } from '../../../src/acoustics/directivity/bessel-j1';
import { legendrePolynomials } from '../../../src/acoustics/directivity/legendre';
import { sphericalDerivatives } from '../../../src/acoustics/directivity/spherical-hankel';

test.each(reference.besselJ1)(`J₁($x) as by ${reference.origin}`, ({ x, value }) => {
  expect(Math.abs(besselJ1(x) - value)).toBeLessThan(1e-10);
  expect(besselJ1(-x)).toBe(-besselJ1(x));
});

test.each(reference.legendre)(`P($n, $x) as by ${reference.origin}`, ({ x, n, value }) => {
  const out = new Float64Array(n + 1);
  legendrePolynomials(x, n, out);
  expect(Math.abs(out[n] - value)).toBeLessThan(1e-12);
});

test.each(reference.sphericalDerivatives)(`spherical derivatives, order $n at $x, as by ${reference.origin}`, (row) => {
  const found = sphericalDerivatives(row.x, row.n);
  expect(found.j.length).toBe(row.n + 1);
  expect(Math.abs(found.j[row.n] / row.j - 1)).toBeLessThan(1e-10);
  expect(Math.abs(found.y[row.n] / row.y - 1)).toBeLessThan(1e-10);
});

test.each([1e-3, 0.7, Math.PI, 20, 200])('no overflow far above the argument %f', (x) => {
  const found = sphericalDerivatives(x, 1000);
  expect(found.j.length).toBeGreaterThan(x + 11);
  expect([...found.j, ...found.y].every(Number.isFinite)).toBe(true);
});
