import { ShapeUtils, Vector2 } from 'three';

/**
 * Triangles of a planar polygon of any simple shape, as indices of its corners in threes, wound like the polygon.
 * @param corners x, y, z of each corner
 * @param flatAxis the axis to drop so that the polygon keeps its area: 0 x, 1 y, 2 z
 */
export function triangulate(corners: ArrayLike<number>, flatAxis: number): number[] {
  const first = flatAxis === 0 ? 1 : 0;
  const second = flatAxis === 2 ? 1 : 2;
  const count = corners.length / 3;
  const flat = Array.from({ length: count }, (_, i) => new Vector2(corners[3 * i + first], corners[3 * i + second]));
  const turns = Math.sign(ShapeUtils.area(flat));
  return ShapeUtils.triangulateShape(flat, []).flatMap(([a, b, c]) =>
    // Winding decides from which side a face is seen, so it is put right where the triangulation turned it.
    Math.sign(ShapeUtils.area([flat[a], flat[b], flat[c]])) === turns ? [a, b, c] : [a, c, b],
  );
}
