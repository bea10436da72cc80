import { imageTree } from '../../../src/acoustics/paths/images';
import { acousticFaces, box } from '../../support/layouts';
import type { PublishedRow } from '../row';

const SIZE: [number, number, number] = [7.1, 5.3, 3.2];
const SOURCE: [number, number, number] = [2.3, 1.7, 1.1];
const ORDERS: [order: number, images: number][] = [
  [1, 6],
  [2, 24],
  [3, 62],
];

/** Distinct image positions up to an order, the source left out. */
function images(order: number): number[][] {
  const tree = imageTree(acousticFaces(box(...SIZE), 0.1), ...SOURCE, -1, order);
  return Array.from(tree.twins.keys())
    .filter((image) => image > 0 && tree.twins[image] < 0)
    .map((image) => Array.from(tree.positions.subarray(3 * image, 3 * image + 3)));
}

/** Places of the images of a box with a corner at the origin: along each axis 2·i·L ± s, |2i| or |2i − 1| walls met. */
function lattice(order: number): number[][] {
  const along = (axis: number) =>
    [-2, -1, 0, 1, 2].flatMap((i) => [
      { at: 2 * i * SIZE[axis] + SOURCE[axis], walls: Math.abs(2 * i) },
      { at: 2 * i * SIZE[axis] - SOURCE[axis], walls: Math.abs(2 * i - 1) },
    ]);
  const found: number[][] = [];
  for (const x of along(0)) {
    for (const y of along(1)) {
      for (const z of along(2)) {
        const walls = x.walls + y.walls + z.walls;
        if (walls > 0 && walls <= order) found.push([x.at, y.at, z.at]);
      }
    }
  }
  return found;
}

/** Greatest distance from a place of the one list to the nearest of the other. */
function farthestApart(some: number[][], others: number[][]): number {
  const nearest = (p: number[]) => Math.min(...others.map((q) => Math.hypot(p[0] - q[0], p[1] - q[1], p[2] - q[2])));
  return Math.max(...some.map(nearest));
}

export const rows: PublishedRow[] = ORDERS.flatMap(([order, count]) => [
  {
    quantity: `image sources of a shoebox up to order ${order}`,
    compute: () => images(order).length,
    value: count,
    tolerance: 0,
    unit: '1',
    source: 'Kuttruff, Room Acoustics, 6th ed., eq. 9.23: (4N³ + 6N² + 8N)/3',
  },
  {
    quantity: `distance of the images up to order ${order} from the lattice`,
    compute: () => Math.max(farthestApart(images(order), lattice(order)), farthestApart(lattice(order), images(order))),
    value: 0,
    tolerance: 1e-9,
    unit: 'm',
    source: 'closed form: Allen & Berkley, J. Acoust. Soc. Am. 65, 943 (1979)',
  },
]);
