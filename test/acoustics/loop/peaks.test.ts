import { describe, expect, test } from 'vitest';
import { directToScattered, marcumQ1, peakAllowanceDb, peakChances } from '../../../src/acoustics/loop/peaks';

describe('Marcum Q₁', () => {
  test.each([
    [0.3, 1],
    [1, 0.5],
    [2, 4],
    [6, 3],
    [10, 12],
    [30, 31],
    [100, 99],
    [100, 103],
  ])('Q₁(%d, %d) is the integral of the Rician density', (a, b) => {
    expect(Math.abs(marcumQ1(a, b) - integrated(a, b))).toBeLessThan(1e-9);
  });

  test('Q₁(a, b) + Q₁(b, a) = 1 + e^(−(a²+b²)/2) I₀(ab)', () => {
    const a = 3;
    const b = 4.5;
    const product = Math.exp(-((a - b) ** 2) / 2) * scaledI0(a * b);
    expect(marcumQ1(a, b) + marcumQ1(b, a)).toBeCloseTo(1 + product, 9);
  });

  test('ends: certain at 0, never above 1, gone far out', () => {
    expect(marcumQ1(3, 0)).toBe(1);
    expect(marcumQ1(100, 20)).toBeCloseTo(1, 12);
    expect(marcumQ1(5, 60)).toBeLessThan(1e-12);
    expect(marcumQ1(100, 300)).toBeLessThan(1e-12);
  });

  test('falls steadily across the switch to a late start of the series', () => {
    for (const a of [28, 28.28, 28.29, 29]) {
      for (let b = 26; b < 32; b += 0.25) expect(marcumQ1(a, b + 0.25)).toBeLessThan(marcumQ1(a, b));
    }
    expect(marcumQ1(28.284, 29)).toBeCloseTo(marcumQ1(28.285, 29.001), 3);
  });
});

describe('peak allowance', () => {
  test('a diffuse loop peaks at 10 log(ln n)', () => {
    for (const chances of [3, 20, 500]) {
      expect(peakAllowanceDb({ ratio: 0, chances })).toBeCloseTo(10 * Math.log10(Math.log(chances)), 8);
    }
  });

  test.each([0.1, 1, 10, 100, 1000, 5000])('K = %d: the chance of more than the allowance is 1/n', (ratio) => {
    const chances = 200;
    const x = 10 ** (peakAllowanceDb({ ratio, chances }) / 10);
    const chance = integrated(Math.sqrt(2 * ratio), Math.sqrt(2 * (1 + ratio) * x));
    expect(chance * chances).toBeCloseTo(1, 4);
  });

  test('falls as the loop becomes direct, and is 0 above K = 5000', () => {
    const allowances = [0, 0.1, 1, 10, 100, 1000, 5000].map((ratio) => peakAllowanceDb({ ratio, chances: 100 }));
    for (let i = 1; i < allowances.length; i++) expect(allowances[i]).toBeLessThan(allowances[i - 1]);
    expect(allowances[6]).toBeGreaterThan(0);
    expect(allowances[6]).toBeLessThan(0.25);
    expect(peakAllowanceDb({ ratio: 5001, chances: 100 })).toBe(0);
    expect(peakAllowanceDb({ ratio: Number.POSITIVE_INFINITY, chances: 100 })).toBe(0);
  });

  test('is never below 0', () => {
    expect(peakAllowanceDb({ ratio: 0, chances: 2 })).toBe(0);
    expect(peakAllowanceDb({ ratio: 2, chances: 2 })).toBe(0);
  });

  test('refuses what is not a ratio or a number of chances', () => {
    expect(() => peakAllowanceDb({ ratio: -1, chances: 10 })).toThrow(RangeError);
    expect(() => peakAllowanceDb({ ratio: Number.NaN, chances: 10 })).toThrow(RangeError);
    expect(() => peakAllowanceDb({ ratio: 1, chances: Number.POSITIVE_INFINITY })).toThrow(RangeError);
  });
});

describe('direct to scattered', () => {
  test('is infinite where nothing scatters', () => {
    expect(directToScattered(3, 1)).toBe(0.5);
    expect(directToScattered(2, 0)).toBe(0);
    expect(directToScattered(2, 2)).toBe(Number.POSITIVE_INFINITY);
  });
});

describe('chances', () => {
  const decayS = new Float64Array(7).fill(1.1);

  test('count the worst band alone when the others are more than 3 dB below', () => {
    const n = peakChances(decayS, [0, 0, 0, 1, 0.5, 0, 0]);
    expect(n).toBeCloseTo(((1000 / Math.SQRT2) * 1.1) / 22, 10);
  });

  test('count every band within 3 dB, each with its own decay', () => {
    const n = peakChances([1, 1, 1, 2, 0.5, 1, 1], [0, 0, 0, 1, 0.502, 0, 0]);
    expect(n).toBeCloseTo((1000 * 2 + 1995.262315 * 0.5) / Math.SQRT2 / 22, 6);
  });

  test('a band exactly 3 dB below counts', () => {
    expect(peakChances(decayS, [0, 0, 0, 0, 10, 10 * 10 ** -0.3, 0])).toBeGreaterThan(200);
  });

  test('are at least two', () => {
    expect(peakChances(new Float64Array(7).fill(0.1), [1, 0, 0, 0, 0, 0, 0])).toBe(2);
  });
});

/** ∫ from b of r e^(−(r²+a²)/2) I₀(ar) dr by Simpson's rule. */
function integrated(a: number, b: number): number {
  const end = Math.max(a, b) + 12;
  const steps = 40_000;
  const width = (end - b) / steps;
  let sum = 0;
  for (let i = 0; i <= steps; i++) {
    const r = b + i * width;
    const density = r * Math.exp(-((r - a) ** 2) / 2) * scaledI0(a * r);
    sum += density * (i === 0 || i === steps ? 1 : i % 2 ? 4 : 2);
  }
  return (sum * width) / 3;
}

/** e^(−x) I₀(x): the mean of e^(x(cos θ − 1)) over equally spaced angles, exact to rounding for enough of them. */
function scaledI0(x: number): number {
  if (x > 700) {
    // Asymptotic series, relative error below 1e-10 here.
    const y = 1 / (8 * x);
    return (1 + y + 4.5 * y ** 2 + 37.5 * y ** 3) / Math.sqrt(2 * Math.PI * x);
  }
  const count = 200;
  let sum = 0;
  for (let i = 0; i < count; i++) sum += Math.exp(x * (Math.cos((2 * Math.PI * i) / count) - 1));
  return sum / count;
}
