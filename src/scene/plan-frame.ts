import type { Vec3 } from '../layout/schema';
import type { Bounds } from './views';

/** From metres of the plan to pixels of the drawing, y upwards. */
export interface PlanFrame {
  pixelsPerM: number;
  at: (point: Vec3 | readonly [number, number]) => [number, number];
  /** Points as SVG writes them. */
  points: (outline: readonly (Vec3 | readonly [number, number])[]) => string;
}

const PADDING = { topPx: 34, bottomPx: 58, leftPx: 58, rightPx: 30 };

/** The whole room as large as the part of the drawing allows that is not covered. */
export function planFrame({ least, greatest }: Bounds, widthPx: number, heightPx: number, rightPx: number): PlanFrame {
  const free = {
    width: Math.max(60, widthPx - rightPx - PADDING.leftPx - PADDING.rightPx),
    height: Math.max(60, heightPx - PADDING.topPx - PADDING.bottomPx),
  };
  const pixelsPerM = Math.min(free.width / (greatest[0] - least[0] || 1), free.height / (greatest[1] - least[1] || 1));
  const x0 = PADDING.leftPx + free.width / 2 - (pixelsPerM * (least[0] + greatest[0])) / 2;
  const y0 = PADDING.topPx + free.height / 2 + (pixelsPerM * (least[1] + greatest[1])) / 2;
  const at: PlanFrame['at'] = ([x, y]) => [x0 + pixelsPerM * x, y0 - pixelsPerM * y];
  const points: PlanFrame['points'] = (outline) =>
    outline
      .map((point) =>
        at(point)
          .map((value) => value.toFixed(1))
          .join(','),
      )
      .join(' ');
  return { pixelsPerM, at, points };
}
