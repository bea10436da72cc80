import { describe, expect, test } from 'vitest';
import { createBlockers, isBlocked } from '../../../src/acoustics/paths/blocking';
import { createReflection, imageTree, traceImage } from '../../../src/acoustics/paths/images';
import { createFaces, firstHit } from '../../../src/acoustics/room/faces';

/** A box turned about z, so that nothing in its walls comes out of the arithmetic as an exact zero. */
const SIZE = [8, 6, 3] as const;
const TURNS = [0, 0.3, 0.5, 0.9, 1.1, 1.7, 2.26, 2.3, 3.0, 4.4, 5.2];

const turned = (angleRad: number, x: number, y: number, z: number): [number, number, number] => [
  x * Math.cos(angleRad) - y * Math.sin(angleRad),
  x * Math.sin(angleRad) + y * Math.cos(angleRad),
  z,
];

function box(angleRad: number, extra: number[][][] = []) {
  const [X, Y, Z] = SIZE;
  const walls = [
    [
      [0, 0, 0],
      [X, 0, 0],
      [X, Y, 0],
      [0, Y, 0],
    ],
    [
      [0, Y, Z],
      [X, Y, Z],
      [X, 0, Z],
      [0, 0, Z],
    ],
    [
      [X, 0, 0],
      [0, 0, 0],
      [0, 0, Z],
      [X, 0, Z],
    ],
    [
      [0, Y, 0],
      [X, Y, 0],
      [X, Y, Z],
      [0, Y, Z],
    ],
    [
      [0, 0, 0],
      [0, Y, 0],
      [0, Y, Z],
      [0, 0, Z],
    ],
    [
      [X, Y, 0],
      [X, 0, 0],
      [X, 0, Z],
      [X, Y, Z],
    ],
  ];
  return createFaces(
    [...extra, ...walls].map((corners, i) => ({
      corners: corners.map(([x, y, z]) => turned(angleRad, x, y, z)),
      absorption: [0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1],
      sides: i < extra.length ? 2 : 1,
    })),
  );
}

describe.each(TURNS)('in a box turned by %s rad', (angleRad) => {
  test('a leg between two points of one wall is not blocked by that wall', () => {
    const faces = box(angleRad);
    for (const along of [1, 2.2, 3.7, 5.1, 6.9]) {
      const a = turned(angleRad, 0.5, 0, 1.1);
      const b = turned(angleRad, along + 0.9, 0, 2.3);
      expect(isBlocked(faces, createBlockers(faces).every, ...a, ...b, -1, -1)).toBe(false);
    }
  });

  test('of two faces in one plane the first in file order is met', () => {
    const board = [
      [2, 0, 0.5],
      [5, 0, 0.5],
      [5, 0, 2.5],
      [2, 0, 2.5],
    ];
    const faces = box(angleRad, [board]);
    const direction = turned(angleRad, 0, -1, 0);
    expect(firstHit(faces, turned(angleRad, 3.3, 4, 1.4), direction, 1e-6, -1)?.face).toBe(0);
  });

  test('a second-order path over the edge of two walls is found once for each order of the walls', () => {
    // Source and receiver on the diagonal of a corner: both bounces are in its edge.
    const faces = box(angleRad);
    const from = turned(angleRad, 2, 2, 1.5);
    const to = turned(angleRad, 1, 1, 1.5);
    const tree = imageTree(faces, ...from, -1, 2);
    const corner = Array.from({ length: tree.count }, (_, image) => image).filter((image) => {
      const first = tree.parents[image];
      if (first <= 0) return false;
      return [tree.faces[image], tree.faces[first]].sort().join() === '2,4';
    });
    expect(corner).toHaveLength(2);
    const found = corner.filter((image) =>
      traceImage(faces, tree, image, ...to, -1, createBlockers(faces).every, createReflection()),
    );
    expect(found).toHaveLength(2);
  });
});
