import { describe, expect, test } from 'vitest';
import { createListener } from '../../../src/acoustics/paths/device';
import { createPairPaths, createPathFinder } from '../../../src/acoustics/paths/finder';
import type { Face, Vec3 } from '../../../src/layout/schema';
import { acousticFaces, box, lShape, panel } from '../../support/layouts';
import { seededRandom } from '../../support/random';
import { field, NO_AIR } from '../../support/rooms';
import { slowReflections } from '../../support/slow-reflections';

const ABSORPTION = [0.1, 0.2, 0.3, 0.15, 0.25, 0.35, 0.05, 0.4, 0.45, 0.5];

/** Length and energy of every reflected path the program finds. */
function found(faces: readonly Face[], from: Vec3, to: Vec3, order: number): [lengthM: number, gain: number][] {
  const acoustic = acousticFaces(faces, ABSORPTION);
  const finder = createPathFinder({
    faces: acoustic,
    field: field(acoustic, 81),
    airDbPerM: NO_AIR,
    reflectionOrder: order,
  });
  const paths = createPairPaths();
  finder.find(finder.source(createListener(...from)), finder.receiver(createListener(...to)), paths);
  return Array.from({ length: paths.reflections }, (_, i) => [paths.reflectionLengthsM[i], paths.reflected[7 * i + 3]]);
}

function expected(faces: readonly Face[], from: Vec3, to: Vec3, order: number): [lengthM: number, gain: number][] {
  return slowReflections(faces, from, to, order).map(({ lengthM, faces: met }) => [
    lengthM,
    met.reduce((gain, face) => gain * (1 - ABSORPTION[face]), 1) / lengthM ** 2,
  ]);
}

const byLength = (paths: [number, number][]) => paths.sort((a, b) => a[0] - b[0] || a[1] - b[1]);

const slanted: Face = {
  id: 'slanted',
  finish: 'wall',
  sides: 2,
  corners: [
    [1, 4, 1],
    [2, 3.5, 1],
    [2.2, 3.8, 2.4],
    [1.2, 4.3, 2.4],
  ],
};

const ROOMS: [name: string, faces: Face[]][] = [
  ['a box', box(5, 4, 3)],
  ['an L', lShape()],
  ['an L with an upright panel', [...lShape(), panel(1.7, 0.4, 2.1, 1.9)]],
  ['an L with an upright and a slanted panel', [...lShape(), panel(4.1, 0.2, 2.4, 2.2), slanted]],
];

describe.each(ROOMS)('image sources agree with unfolding every path by hand in %s', { timeout: 60_000 }, (_, faces) => {
  test.each([1, 2, 3])('order %d (seeds from 1)', (order) => {
    const runs = order === 3 ? 2 : 12;
    for (let seed = 1; seed <= runs; seed++) {
      const random = seededRandom(seed);
      // In either arm of the L, so that many pairs do not see each other.
      const place = (arm: number): Vec3 =>
        arm < 0.5
          ? [0.2 + 4.6 * random(), 0.2 + 2.6 * random(), 0.2 + 2.6 * random()]
          : [0.2 + 2.6 * random(), 0.2 + 3.6 * random(), 0.2 + 2.6 * random()];
      const [from, to] = [place(random()), place(random())];
      const [ours, slow] = [byLength(found(faces, from, to, order)), byLength(expected(faces, from, to, order))];
      expect(ours.length, `seed ${seed}`).toBe(slow.length);
      ours.forEach(([lengthM, gain], i) => {
        expect(lengthM).toBeCloseTo(slow[i][0], 9);
        expect(gain / slow[i][1]).toBeCloseTo(1, 9);
      });
    }
  });
});

describe('by hand', () => {
  test.each([
    [1, 6],
    [2, 24],
    [3, 62],
  ])('a shoebox has all its images heard everywhere, order %d', (order, count) => {
    expect(found(box(5, 4, 3), [1.1, 2.3, 1.3], [4.2, 0.7, 1.9], order)).toHaveLength(count);
  });

  test('a reflector gives one path from either side, and none to one who stands behind it', () => {
    const board = [panel(2, 0, 2, 2)];
    expect(found(board, [1, 1, 1], [1, 1.5, 1], 1).map(([length]) => length)).toEqual([Math.hypot(2, 0.5)]);
    expect(found(board, [3, 1, 1], [3, 1.5, 1], 1).map(([length]) => length)).toEqual([Math.hypot(2, 0.5)]);
    expect(found(board, [1, 1, 1], [3, 1.5, 1], 1)).toEqual([]);
  });

  test('a reflection whose point misses the face is not heard', () => {
    expect(found([panel(2, 0, 2, 2)], [1, 1, 1], [1, 4, 1], 1)).toEqual([]);
  });

  test('an upright panel between hides the reflection in the wall behind it', () => {
    const wall = { ...panel(4, 0, 4, 4), sides: 2 as const };
    expect(found([wall], [1, 1, 1], [1, 2, 1], 1)).toHaveLength(1);
    const blocked = found([wall, panel(3, 0, 4, 4)], [1, 1, 1], [1, 2, 1], 1);
    expect(blocked.map(([length]) => length)).toEqual([Math.hypot(4, 1)]);
  });

  test('two faces of one plane that share the reflection point count once', () => {
    const halves = [panel(2, 0, 1, 2), { ...panel(2, 1, 2, 2), id: 'other' }];
    // The reflection point lies on the edge they share: the first face's absorption is met.
    const [[lengthM, gain], ...others] = found(halves, [1, 0.5, 1], [1, 1.5, 1], 1);
    expect(others).toEqual([]);
    expect(lengthM).toBeCloseTo(Math.hypot(2, 1), 12);
    expect(gain).toBeCloseTo(0.9 / 5, 12);
  });
});

describe('a device on a face makes no image of its own in it', () => {
  const room = box(5, 4, 3);
  const on: Vec3 = [2, 1, 0];
  const off: Vec3 = [3, 2, 1.5];

  test('neither as a source nor as a receiver', () => {
    expect(found(room, on, off, 1)).toHaveLength(5);
    expect(found(room, off, on, 1)).toHaveLength(5);
    expect(found(room, [2, 1, 0.001], off, 1)).toHaveLength(6);
  });

  test('a hosted device a little off its face skips it as well', () => {
    const faces = acousticFaces(room, 0.2);
    const finder = createPathFinder({ faces, field: field(faces, 60), airDbPerM: NO_AIR, reflectionOrder: 1 });
    const hosted = { ...createListener(2, 1, 0.004), host: 0 };
    const paths = createPairPaths();
    finder.find(finder.source(hosted), finder.receiver(createListener(...off)), paths);
    expect(paths.reflections).toBe(5);
    finder.find(finder.source(createListener(...off)), finder.receiver(hosted), paths);
    expect(paths.reflections).toBe(5);
  });

  test('but the second bounce may come from it', () => {
    // 24 images of a box, less those whose first bounce is the floor and whose image no other run reaches.
    const all = found(room, [2, 1, 0.5], off, 2).length;
    expect(all).toBe(24);
    const without = found(room, on, off, 2);
    // The images of a source on the floor coincide in pairs, above and below: 5 + 13 remain.
    expect(without).toHaveLength(18);
  });
});
