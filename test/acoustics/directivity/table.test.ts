import { describe, expect, test } from 'vitest';
import type { Pattern } from '../../../src/acoustics/directivity/pattern';
import { createTable } from '../../../src/acoustics/directivity/table';
import { dbOfPower } from '../../../src/acoustics/level';

const RAD = Math.PI / 180;

describe('full tables', () => {
  const rows = [
    [0, 0, 0, 0],
    [-2, -4, -6, -8],
    [-10, -12, -16, -40],
  ];
  const table = createTable({ theta: [0, 30, 90], phi: [-30, 60, 150, 250], levels: alike(rows) });

  test.each([
    ['on a row and a column', 30, 60, -4],
    ['half-way in θ, in dB', 15, 60, -2],
    ['half-way in φ, in dB', 30, 105, -5],
    ['half-way in both', 60, 105, -9.5],
    ['from the last column on to the first', 30, 290, -5],
    ['across φ = 0', 30, 0, -2 - 2 / 3],
    ['held beyond the last row', 170, 60, -12],
    ['floored', 90, 250, -25],
    ['floored after interpolation, −28 dB', 90, 200, -25],
    ['floored after interpolation, −24 dB', 30 + (60 * 16) / 32, 250, -24],
  ])('%s', (_name, theta, phi, expected) => {
    expect(levelDb(table, theta, phi)).toBeCloseTo(expected, 9);
  });

  test('a column repeated at 360° and columns out of order change nothing', () => {
    const order = [2, 0, 3, 1];
    const shuffled = createTable({
      theta: [90, 0, 30],
      phi: [...order.map((i) => [-30, 60, 150, 250][i]), 330],
      levels: alike([rows[2], rows[0], rows[1]].map((row) => [...order.map((i) => row[i]), row[0]])),
    });
    for (let phi = 0; phi < 360; phi += 17) expect(levelDb(shuffled, 47, phi)).toBeCloseTo(levelDb(table, 47, phi), 12);
  });

  test('each band has levels of its own', () => {
    const levels = [0, 1, 2, 3, 4, 5, 6].map((band) => [[0], [-band]]);
    const pattern = createTable({ theta: [0, 90], phi: [0], levels });
    for (let band = 0; band < 7; band++) expect(levelDb(pattern, 90, 12, band)).toBeCloseTo(-band, 12);
    expect(pattern.axisymmetric).toBe(true);
  });

  test('levels above the axis stay above it', () => {
    expect(levelDb(createTable({ theta: [0, 90], phi: [0], levels: alike([[0], [4]]) }), 45, 0)).toBeCloseTo(2, 12);
  });
});

describe('tables in planes', () => {
  const planes = createTable({
    theta: [0, 60, 180],
    phi: [0, 90, -90],
    planes: true,
    levels: alike([
      [0, 0, 0],
      [-6, -9, -3],
      [-12, -15, -20],
    ]),
  });

  test.each([
    ['left', 0, -6],
    ['up', 90, -9],
    ['right mirrors left', 180, -6],
    ['down', 270, -3],
    ['between left and up, half each', 45, -7.5],
    ['between right and down, by cos² and sin²', 210, -6 * 0.75 - 3 * 0.25],
    ['between right and up', 150, -6 * 0.75 - 9 * 0.25],
  ])('%s', (_name, phi, expected) => {
    expect(levelDb(planes, 60, phi)).toBeCloseTo(expected, 9);
  });

  test('one half of either kind is enough', () => {
    const levels = alike([
      [0, 0],
      [-10, -4],
    ]);
    const pattern = createTable({ theta: [0, 90], phi: [180, 270], planes: true, levels });
    expect(levelDb(pattern, 90, 0)).toBeCloseTo(-10, 9);
    expect(levelDb(pattern, 90, 90)).toBeCloseTo(-4, 9);
  });

  test('without a vertical half-plane it is refused', () => {
    expect(() => createTable({ theta: [0], phi: [0, 180], planes: true, levels: alike([[0, 0]]) })).toThrow(RangeError);
  });
});

/** The same rows in every band. */
function alike(rows: number[][]): number[][][] {
  return new Array<number[][]>(7).fill(rows);
}

function levelDb(pattern: Pattern, thetaDeg: number, phiDeg: number, band = 3): number {
  const out = new Float64Array(10);
  const sine = Math.sin(thetaDeg * RAD);
  pattern.powers(Math.cos(thetaDeg * RAD), sine * Math.cos(phiDeg * RAD), sine * Math.sin(phiDeg * RAD), out, 3);
  return dbOfPower(out[3 + band]);
}
