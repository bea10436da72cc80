import { describe, expect, test } from 'vitest';
import { insideShell, openEdges, shellVolume } from '../../../src/acoustics/room/shell';
import type { Face, Vec3 } from '../../../src/layout/schema';
import { acousticFaces, box, lShape, panel, prism } from '../../support/layouts';
import { seededRandom } from '../../support/random';

const faces = (list: Face[]) => acousticFaces(list, 0.1);

/** The floor of a box in two halves, so that the other faces meet split edges. */
function splitBox(offM = 0): Face[] {
  const [floor, ...rest] = box(8, 6, 3);
  const half = (id: string, from: number, to: number): Face => ({
    ...floor,
    id,
    corners: [
      [from, offM, 0],
      [to, offM, 0],
      [to, 6, 0],
      [from, 6, 0],
    ],
  });
  return [half('west', 0, 3), half('east', 3, 8), ...rest];
}

describe('closedness', () => {
  test.each<[string, Face[]]>([
    ['a box', box(8, 6, 3)],
    ['an L', lShape()],
    ['a box whose floor is split', splitBox()],
    ['a box whose floor is split, 0.9 mm off', splitBox(0.0009)],
    ['a box with a panel in it', [...box(8, 6, 3), panel(3, 1, 4, 2)]],
    [
      'a room of seven walls',
      prism(
        Array.from({ length: 7 }, (_, i) => [4 * Math.cos((2 * Math.PI * i) / 7), 4 * Math.sin((2 * Math.PI * i) / 7)]),
        5,
      ),
    ],
  ])('%s is closed', (_, list) => {
    expect(openEdges(faces(list))).toEqual([]);
  });

  test('a missing wall opens its four edges, and they are where it was', () => {
    const open = openEdges(faces(box(8, 6, 3).filter(({ id }) => id !== 'wall2')));
    expect(open).toHaveLength(4);
    for (const { from, to } of open) expect([from[0], to[0]]).toEqual([8, 8]);
  });

  test.each<[string, Face[]]>([
    ['half a floor missing', splitBox().slice(1)],
    ['a floor 2 mm off', splitBox(0.002)],
    ['a face twice', [...box(8, 6, 3), { ...box(8, 6, 3)[0], id: 'again' }]],
    [
      'a face turned round',
      box(8, 6, 3).map((f, i) => (i === 0 ? { ...f, corners: [...f.corners].reverse() as Vec3[] } : f)),
    ],
    ['a free-standing floor', box(8, 6, 3).map((f, i) => (i === 0 ? { ...f, sides: 2 as const } : f))],
  ])('%s is open', (_, list) => {
    expect(openEdges(faces(list)).length).toBeGreaterThan(0);
  });
});

describe('volume', () => {
  test.each<[string, Face[], number]>([
    ['a box', box(8, 6, 3), 144],
    ['an L', lShape(), 81],
    ['a split box', splitBox(), 144],
    ['a panel adds nothing', [...box(8, 6, 3), panel(3, 1, 4, 2)], 144],
  ])('%s', (_, list, volumeM3) => {
    expect(shellVolume(faces(list))).toBeCloseTo(volumeM3, 9);
  });

  test('does not change far from the origin, and is negative inside out', () => {
    const far = lShape().map((f) => ({
      ...f,
      corners: f.corners.map(([x, y, z]): Vec3 => [x + 900, y - 700, z + 50]),
    }));
    expect(shellVolume(faces(far))).toBeCloseTo(81, 6);
    const turned = lShape().map((f) => ({ ...f, corners: [...f.corners].reverse() }));
    expect(shellVolume(faces(turned))).toBeCloseTo(-81, 9);
  });
});

test('inside and outside of an L agree with its outline (seed 5)', () => {
  const shell = faces([...lShape(), panel(1.5, 0.5, 2, 2)]);
  const random = seededRandom(5);
  let inside = 0;
  for (let i = 0; i < 500; i++) {
    const [x, y, z] = [-1 + 8 * random(), -1 + 8 * random(), -1 + 5 * random()];
    const expected = x > 0 && y > 0 && z > 0 && z < 3 && x < 6 && y < 6 && (x < 3 || y < 3);
    expect(insideShell(shell, x, y, z), `${x}, ${y}, ${z}`).toBe(expected);
    if (expected) inside++;
  }
  expect(inside).toBeGreaterThan(80);
});
