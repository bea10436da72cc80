import type { Vec3 } from '../layout/schema';

/** Ways of looking that every room has, and those that hang on something in it. */
export type ViewKind = 'orbit' | 'plan' | 'long-section' | 'cross-section' | 'seat' | 'aim' | 'saved';

/** The view asked for; another object asks again. */
export interface ViewChoice {
  kind: ViewKind;
  /** Seat, device or saved view. */
  id: string;
}

/** Where the camera stands. */
export interface Shot {
  projection: 'perspective' | 'parallel';
  eye: Vec3;
  target: Vec3;
  /** Upright angle of view of a perspective, degrees. */
  fovDeg: number;
  /** Metres one pixel shows in a parallel projection. */
  metresPerPixel: number;
}

/** The part of the drawing that is free of legend and call-outs, pixels of the canvas. */
export interface FreeArea {
  widthPx: number;
  heightPx: number;
  rightPx: number;
  bottomPx: number;
}

export interface Bounds {
  least: Vec3;
  greatest: Vec3;
}

export const FOV_DEG = 32;
const AZIMUTH_DEG = 57;
const ELEVATION_DEG = 33;
/** Room for what stands round the model: bubbles and pins above, dimension strings below, pixels. */
const PADDING = { topPx: 36, bottomPx: 12, leftPx: 20, rightPx: 20 };
/** Dimension strings stand this far off the walls, metres. */
const SURROUND_M = 0.95;

/** From above one corner, the whole room in the free area. */
export function orbitShot(bounds: Bounds, area: FreeArea): Shot {
  const [azimuth, elevation] = [(AZIMUTH_DEG * Math.PI) / 180, (ELEVATION_DEG * Math.PI) / 180];
  return fitted(
    bounds,
    area,
    [Math.cos(azimuth) * Math.cos(elevation), Math.sin(azimuth) * Math.cos(elevation), Math.sin(elevation)],
    'perspective',
  );
}

/** From straight above, north up. */
export const planShot = (bounds: Bounds, area: FreeArea): Shot => fitted(bounds, area, [0, -1e-4, 1], 'parallel');

/** Level, across the longer or the shorter side of the room; the cross section looks from the rear to the front. */
export function sectionShot(bounds: Bounds, area: FreeArea, which: 'long' | 'cross'): Shot {
  const lengthwise = bounds.greatest[0] - bounds.least[0] >= bounds.greatest[1] - bounds.least[1];
  const alongX: Vec3 = [1, 0, 0];
  const alongY: Vec3 = [0, -1, 0];
  return fitted(bounds, area, (which === 'long') === lengthwise ? alongY : alongX, 'parallel');
}

/** From a point in a direction; the camera turns about itself. */
export function standingShot(eye: Vec3, direction: Vec3): Shot {
  // A camera cannot look exactly along its own upright.
  const upright = Math.hypot(direction[0], direction[1]) < 1e-3;
  const d: Vec3 = upright ? [1e-3, 0, direction[2]] : direction;
  const length = Math.hypot(...d) || 1;
  return {
    projection: 'perspective',
    eye,
    target: [eye[0] + (0.1 * d[0]) / length, eye[1] + (0.1 * d[1]) / length, eye[2] + (0.1 * d[2]) / length],
    fovDeg: 62,
    metresPerPixel: 0,
  };
}

export const savedShot = (eye: Vec3, target: Vec3): Shot => ({
  projection: 'perspective',
  eye,
  target,
  fovDeg: 50,
  metresPerPixel: 0,
});

function fitted(bounds: Bounds, area: FreeArea, towardsEye: Vec3, projection: Shot['projection']): Shot {
  const back = scaled(towardsEye, 1 / Math.hypot(...towardsEye));
  const right: Vec3 = scaled([-back[1], back[0], 0], 1 / (Math.hypot(back[0], back[1]) || 1));
  const up = cross(back, right);
  const corners = cornersAround(bounds);
  const free = {
    widthPx: Math.max(60, area.widthPx - area.rightPx - PADDING.leftPx - PADDING.rightPx),
    heightPx: Math.max(60, area.heightPx - area.bottomPx - PADDING.topPx - PADDING.bottomPx),
  };
  let target: Vec3 = scaled(plus(bounds.least, bounds.greatest), 0.5);
  const size = Math.hypot(...plus(bounds.greatest, scaled(bounds.least, -1)));
  const pixelsPerTangent = area.heightPx / 2 / Math.tan((FOV_DEG * Math.PI) / 360);
  let distanceM = 2 * size;
  let metresPerPixel = 1;
  // Each turn centres the picture and sets its size; perspective couples the two, so that it takes a few.
  for (let turn = 0; turn < 14; turn++) {
    const eye = plus(target, scaled(back, distanceM));
    const seen = corners.map((corner) => {
      const from = plus(corner, scaled(eye, -1));
      const depth = projection === 'parallel' ? 1 : Math.max(0.1, -dot(from, back));
      return [dot(from, right) / depth, dot(from, up) / depth];
    });
    const [x, y] = [0, 1].map((axis) => {
      const values = seen.map((point) => point[axis]);
      return { least: Math.min(...values), greatest: Math.max(...values) };
    });
    const depth = projection === 'parallel' ? 1 : distanceM;
    // Padding above and below differs: the middle of the free area is not the middle of what is fitted.
    const perPixel = projection === 'parallel' ? metresPerPixel : 1 / pixelsPerTangent;
    const lift = ((PADDING.topPx - PADDING.bottomPx) / 2) * perPixel;
    target = plus(target, scaled(right, ((x.least + x.greatest) / 2) * depth));
    target = plus(target, scaled(up, ((y.least + y.greatest) / 2 + lift) * depth));
    const [width, height] = [x.greatest - x.least, y.greatest - y.least];
    metresPerPixel = Math.max(width / free.widthPx, height / free.heightPx);
    if (projection === 'perspective') distanceM *= metresPerPixel * pixelsPerTangent;
  }
  const awayM = projection === 'parallel' ? 2 * size : distanceM;
  return { projection, eye: plus(target, scaled(back, awayM)), target, fovDeg: FOV_DEG, metresPerPixel };
}

function cornersAround({ least, greatest }: Bounds): Vec3[] {
  const corners: Vec3[] = [];
  for (const x of [least[0] - SURROUND_M, greatest[0] + SURROUND_M]) {
    for (const y of [least[1] - SURROUND_M, greatest[1] + SURROUND_M]) corners.push([x, y, least[2]]);
  }
  for (const x of [least[0], greatest[0]]) {
    for (const y of [least[1], greatest[1]]) corners.push([x, y, greatest[2]]);
  }
  return corners;
}

/** The eye turned about its target: a positive azimuth to the left, a positive elevation upwards, radians. */
export function orbited(eye: Vec3, target: Vec3, azimuthRad: number, elevationRad: number): Vec3 {
  const from = plus(eye, scaled(target, -1));
  const radius = Math.hypot(...from);
  const azimuth = Math.atan2(from[1], from[0]) + azimuthRad;
  const limit = Math.PI / 2 - 0.01;
  const elevation = Math.min(limit, Math.max(-limit, Math.asin(from[2] / radius) + elevationRad));
  return plus(target, [
    radius * Math.cos(elevation) * Math.cos(azimuth),
    radius * Math.cos(elevation) * Math.sin(azimuth),
    radius * Math.sin(elevation),
  ]);
}

const plus = (a: Vec3, b: Vec3): Vec3 => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
const scaled = (a: Vec3, by: number): Vec3 => [a[0] * by, a[1] * by, a[2] * by];
const dot = (a: Vec3, b: Vec3): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const cross = (a: Vec3, b: Vec3): Vec3 => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
