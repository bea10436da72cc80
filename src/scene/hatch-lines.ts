import type { Vec3 } from '../layout/schema';
import { cornersOf, type FaceHatch, normalOf, type RoomShape } from './room-shape';

/** Metres between the upright lines of a finish. */
const SPACING_M: Record<FaceHatch, number> = { none: 0, panels: 0.6, folds: 0.22, panes: 1.44 };
const MOST_LINES = 120;

/** Upright lines that tell a finish on a wall, as pairs of ends; none for plain finishes. */
export function hatchLines(shape: RoomShape, face: number): Vec3[] {
  const hatch = shape.hatches[face];
  if (hatch === 'none') return [];
  const normal = normalOf(shape.faces, face);
  const length = Math.hypot(normal[0], normal[1]) || 1;
  const along = [-normal[1] / length, normal[0] / length];
  const corners = cornersOf(shape.faces, face);
  const origin = corners[0];
  const flat = corners.map((corner): [number, number] => [
    (corner[0] - origin[0]) * along[0] + (corner[1] - origin[1]) * along[1],
    corner[2],
  ]);
  const from = Math.min(...flat.map(([s]) => s));
  const to = Math.max(...flat.map(([s]) => s));
  const count = Math.min(MOST_LINES, Math.max(1, Math.round((to - from) / SPACING_M[hatch])));
  const lines: Vec3[] = [];
  for (let i = 1; i < count; i++) {
    // Folds of cloth do not hang evenly.
    const waver = hatch === 'folds' ? 0.25 * Math.sin(i * 2.4) : 0;
    const s = from + ((to - from) * (i + waver)) / count;
    for (const z of crossings(flat, s)) lines.push([origin[0] + s * along[0], origin[1] + s * along[1], z]);
  }
  return lines;
}

/** Heights at which an upright line enters and leaves an outline, in order, so that pairs lie inside. */
function crossings(outline: readonly [number, number][], s: number): number[] {
  const heights: number[] = [];
  outline.forEach(([sa, za], i) => {
    const [sb, zb] = outline[(i + 1) % outline.length];
    if (sa > s !== sb > s) heights.push(za + ((zb - za) * (s - sa)) / (sb - sa));
  });
  return heights.sort((a, b) => a - b);
}
