import { describe, expect, test } from 'vitest';
import { createBlockers, isBlocked } from '../../../src/acoustics/paths/blocking';
import { acousticFaces, box, lShape, panel } from '../../support/layouts';
import { seededRandom } from '../../support/random';

type Point = [number, number, number];
type Leg = [...Point, ...Point];

const board = acousticFaces([panel(2, 0, 2, 2)], 0.1);
const blocked = (from: Point, to: Point, faces = board) =>
  isBlocked(faces, createBlockers(faces).every, ...from, ...to, -1, -1);

test('a face blocks from both sides', () => {
  expect(blocked([1, 1, 1], [3, 1, 1])).toBe(true);
  expect(blocked([3, 1, 1], [1, 1, 1])).toBe(true);
});

test('a face of the shell blocks from both sides too', () => {
  const shell = acousticFaces([{ ...panel(2, 0, 2, 2), sides: 1 }], 0.1);
  expect(blocked([1, 1, 1], [3, 1, 1], shell)).toBe(true);
  expect(blocked([3, 1, 1], [1, 1, 1], shell)).toBe(true);
});

test('a leg past the face, short of it or along it is free', () => {
  expect(blocked([1, 3, 1], [3, 3, 1])).toBe(false);
  expect(blocked([1, 1, 1], [1.9, 1, 1])).toBe(false);
  expect(blocked([1, 1, 2.5], [3, 1, 2.5])).toBe(false);
  expect(blocked([2, 0.5, 1], [2, 1.5, 1])).toBe(false);
});

describe('an edge', () => {
  test('counts as inside, to 1 µm beyond', () => {
    expect(blocked([1, 1, 2], [3, 1, 2])).toBe(true);
    expect(blocked([1, 1, 2 + 0.9e-6], [3, 1, 2 + 0.9e-6])).toBe(true);
    expect(blocked([1, 1, 2 + 1.1e-6], [3, 1, 2 + 1.1e-6])).toBe(false);
  });

  test('of a concave face counts the same, its notch is free', () => {
    const floor = acousticFaces([lShape()[0]], 0.1);
    const down = (x: number, y: number) => blocked([x, y, 1], [x, y, -1], floor);
    expect(down(2, 2)).toBe(true);
    expect(down(4, 4)).toBe(false);
    expect(down(3, 4)).toBe(true);
    expect(down(3 + 0.9e-6, 4)).toBe(true);
    expect(down(3 + 1.1e-6, 4)).toBe(false);
    expect(down(3, 3)).toBe(true);
  });
});

describe('a crossing within 1 cm of either end, along the leg, does not count', () => {
  test.each([
    [0.0099, false],
    [0.0101, true],
  ])('%d m before the end', (distanceM, isCrossed) => {
    expect(blocked([1, 1, 1], [2 + distanceM, 1, 1])).toBe(isCrossed);
    expect(blocked([2 + distanceM, 1, 1], [1, 1, 1])).toBe(isCrossed);
  });

  test('a slanted leg is measured along itself', () => {
    // The end is 7 mm behind the face, but 9.9 mm along the leg: free; 7.2 mm and 10.18 mm: crossed.
    expect(blocked([1, 0.5, 1], [2.007, 1.507, 1])).toBe(false);
    expect(blocked([1, 0.5, 1], [2.0072, 1.5072, 1])).toBe(true);
  });
});

test('faces named as the leg’s own never block it', () => {
  expect(isBlocked(board, createBlockers(board).every, 1, 1, 1, 3, 1, 1, 0, -1)).toBe(false);
  expect(isBlocked(board, createBlockers(board).every, 1, 1, 1, 3, 1, 1, -1, 0)).toBe(false);
});

describe('the faces that can block at all', () => {
  const empty = acousticFaces(box(6, 5, 3), 0.1);
  const screened = acousticFaces([...box(6, 5, 3), panel(3, 1, 4, 2)], 0.1);

  test('are those that do not have the whole room on their front', () => {
    expect(Array.from(createBlockers(empty).inner)).toEqual([]);
    expect(Array.from(createBlockers(screened).inner)).toEqual([6]);
  });

  test('a point outside an outer face is not inner, one on it is', () => {
    const blockers = createBlockers(empty);
    expect(blockers.isInner(3, 2, 3)).toBe(true);
    expect(blockers.isInner(3, 2, 3.005)).toBe(false);
  });

  test('asking only them gives the same answer for places in the room (seed 31)', () => {
    const { every, inner } = createBlockers(screened);
    const random = seededRandom(31);
    for (let i = 0; i < 2000; i++) {
      const leg = [6, 5, 3, 6, 5, 3].map((size) => size * random()) as Leg;
      expect(isBlocked(screened, inner, ...leg, -1, -1)).toBe(isBlocked(screened, every, ...leg, -1, -1));
    }
  });
});
