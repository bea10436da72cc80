import { describe, expect, test } from 'vitest';
import { newellNormal } from '../../src/acoustics/room/faces';
import { triangulate } from '../../src/scene/triangulate';

type Point = readonly [number, number, number];

/** Areas along the normal of the polygon: equal to its own only if the triangles cover it once, wound as it is. */
function areasOf(corners: readonly Point[], flatAxis: number) {
  const flat = corners.flat();
  const indices = triangulate(flat, flatAxis);
  const whole = newellNormal(flat);
  const size = Math.hypot(...whole);
  const along = (normal: readonly number[]) =>
    normal.reduce((sum, value, axis) => sum + value * (whole[axis] / size), 0) / 2;
  const pieces = Array.from({ length: indices.length / 3 }, (_, i) =>
    along(newellNormal(indices.slice(3 * i, 3 * i + 3).flatMap((corner) => [...corners[corner]]))),
  );
  return { pieces, total: pieces.reduce((a, b) => a + b, 0), expected: size / 2, indices };
}

const SHAPES: [string, Point[], number][] = [
  [
    'a square floor',
    [
      [0, 0, 0],
      [4, 0, 0],
      [4, 4, 0],
      [0, 4, 0],
    ],
    2,
  ],
  [
    'an L, concave',
    [
      [0, 0, 1],
      [6, 0, 1],
      [6, 2, 1],
      [2, 2, 1],
      [2, 5, 1],
      [0, 5, 1],
    ],
    2,
  ],
  [
    'a wall with a door cut out of its foot, across x',
    [
      [8, 6, 0],
      [8, 3, 0],
      [8, 3, 2.2],
      [8, 2, 2.2],
      [8, 2, 0],
      [8, 0, 0],
      [8, 0, 3],
      [8, 6, 3],
    ],
    0,
  ],
  [
    'a ceiling, looked at from below',
    [
      [0, 4, 3],
      [4, 4, 3],
      [4, 0, 3],
      [0, 0, 3],
    ],
    2,
  ],
  [
    'a raked floor',
    [
      [5, -3, 0],
      [21, -3, 2.5],
      [21, 3, 2.5],
      [5, 3, 0],
    ],
    2,
  ],
];

describe('triangles of a face', () => {
  test.each(SHAPES)('cover %s once and face as it does', (_, corners, flatAxis) => {
    const { pieces, total, expected, indices } = areasOf(corners, flatAxis);
    expect(indices).toHaveLength(3 * (corners.length - 2));
    for (const piece of pieces) expect(piece).toBeGreaterThan(0);
    expect(total).toBeCloseTo(expected, 9);
  });
});
