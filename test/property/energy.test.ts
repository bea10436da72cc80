import { describe, expect, test } from 'vitest';
import { createListener } from '../../src/acoustics/paths/device';
import { createPairPaths, createPathFinder } from '../../src/acoustics/paths/finder';
import { acousticFaces, box } from '../support/layouts';
import { seededRandom } from '../support/random';
import { field, NO_AIR } from '../support/rooms';

const SIZE = [9, 7, 5] as const;
const PAIRS = 60;

/** Mean reflected and diffuse power gain of many pairs of points in a box, with image sources up to an order, in dB. */
function reverberantDb(absorption: number | number[], order: number): number {
  const faces = acousticFaces(box(...SIZE), absorption);
  const finder = createPathFinder({
    faces,
    field: field(faces, SIZE[0] * SIZE[1] * SIZE[2]),
    airDbPerM: NO_AIR,
    reflectionOrder: order,
  });
  const random = seededRandom(61);
  const place = () =>
    createListener(...(SIZE.map((size) => size * (0.1 + 0.8 * random())) as [number, number, number]));
  const paths = createPairPaths();
  let sum = 0;
  for (let i = 0; i < PAIRS; i++) {
    finder.find(finder.source(place()), finder.receiver(place()), paths);
    sum += paths.total[3] - paths.direct[3];
  }
  return 10 * Math.log10(sum / PAIRS);
}

describe('image sources and the remainder together conserve the energy of the diffuse field', () => {
  // Hopkins & Stryker's field is what order 0 gives; the model states its remainder to about 2 dB in uneven rooms.
  test.each([0.1, 0.2, 0.35, 0.5])('in an even room of absorption %s, at every order', (absorption) => {
    const diffuse = reverberantDb(absorption, 0);
    for (const order of [1, 2, 3]) expect(Math.abs(reverberantDb(absorption, order) - diffuse)).toBeLessThan(1);
  });

  test('the more images are taken out the less remains, and images never exceed the whole', () => {
    const faces = acousticFaces(box(...SIZE), 0.2);
    const remainders = [1, 2, 3].map((order) => {
      const roomField = field(faces, 315);
      const finder = createPathFinder({ faces, field: roomField, airDbPerM: NO_AIR, reflectionOrder: order });
      const paths = createPairPaths();
      finder.find(finder.source(createListener(2, 3, 1.5)), finder.receiver(createListener(6, 4, 1.2)), paths);
      return paths.diffuse[3];
    });
    expect(remainders[1] / remainders[0]).toBeCloseTo(0.8, 9);
    expect(remainders[2] / remainders[1]).toBeCloseTo(0.8, 9);
  });
});
