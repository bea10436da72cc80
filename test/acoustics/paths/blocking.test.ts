import { describe, expect, test } from 'vitest';
import { isBlocked } from '../../../src/acoustics/paths/blocking';
import { acousticFaces, lShape, panel } from '../../support/layouts';

type Point = [number, number, number];

const board = acousticFaces([panel(2, 0, 2, 2)], 0.1);
const blocked = (from: Point, to: Point, faces = board) => isBlocked(faces, ...from, ...to, -1, -1);

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
  expect(isBlocked(board, 1, 1, 1, 3, 1, 1, 0, -1)).toBe(false);
  expect(isBlocked(board, 1, 1, 1, 3, 1, 1, -1, 0)).toBe(false);
});
