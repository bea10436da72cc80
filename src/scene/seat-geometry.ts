import { mixOklab, type Rgb } from './colour-scale';
import type { SeatPlace } from './seat-places';

/**
 * All seats as one merged mesh: of each, a pan and a back of two triangles, eight vertices. A seat that falls short is
 * a wedge without a back, its unused vertices folded together, so that recolouring never rebuilds the mesh.
 */
export interface SeatGeometry {
  /** [seat·24]: x, y, z of eight vertices. */
  positions: Float32Array;
  /** [seat·24], linear light. */
  colours: Float32Array;
  indices: Uint32Array;
  /** [seat·42]: ends of seven edges, folded together where a wedge has fewer. */
  edges: Float32Array;
  edgeColours: Float32Array;
}

export const TRIANGLES_A_SEAT = 4;
const VERTICES = 8;
const EDGES = 7;

const HALF_M = 0.235;
const PAN_M = 0.45;
const BACK_M = 0.86;
/** A back stands against the light. */
const BACK_SHADE = 0.86;

/** Arrays for so many seats, still empty. */
export function createSeatGeometry(count: number): SeatGeometry {
  const indices = new Uint32Array(count * TRIANGLES_A_SEAT * 3);
  for (let seat = 0; seat < count; seat++) {
    const v = seat * VERTICES;
    indices.set([v, v + 1, v + 2, v, v + 2, v + 3, v + 4, v + 5, v + 6, v + 4, v + 6, v + 7], seat * 12);
  }
  return {
    positions: new Float32Array(count * VERTICES * 3),
    colours: new Float32Array(count * VERTICES * 3),
    indices,
    edges: new Float32Array(count * EDGES * 6),
    edgeColours: new Float32Array(count * EDGES * 6),
  };
}

/** How one seat is drawn. */
export interface SeatLook {
  short: boolean;
  fill: Rgb;
  edge: Rgb;
}

/** Writes one seat into the arrays. */
export function writeSeat(geometry: SeatGeometry, index: number, seat: SeatPlace, look: SeatLook): void {
  const points = look.short ? wedge(seat) : chair(seat);
  points.forEach((point, i) => {
    geometry.positions.set(point, (index * VERTICES + i) * 3);
    const shade = i < 4 ? 1 : BACK_SHADE;
    geometry.colours.set(
      look.fill.map((channel) => channel * shade),
      (index * VERTICES + i) * 3,
    );
  });
  const [p0, p1, p2, p3, b0, b1, b2, b3] = points;
  const lines = look.short
    ? [p0, p1, p1, p2, p2, p0, p0, p0, p0, p0, p0, p0, p0, p0]
    : [p0, p1, p1, p2, p2, p3, p3, p0, b1, b2, b2, b3, b3, b0];
  lines.forEach((point, i) => {
    geometry.edges.set(point, (index * EDGES * 2 + i) * 3);
    geometry.edgeColours.set(look.edge, (index * EDGES * 2 + i) * 3);
  });
}

/** Edge of a served seat: half way from its fill to the ink. */
export const servedEdge = (fill: Rgb, ink: Rgb): Rgb => mixOklab(fill, ink, 0.45);

type Point = [number, number, number];

function placer(seat: SeatPlace): (forwardM: number, leftM: number, upM: number) => Point {
  const [c, s] = [Math.cos(seat.facingRad), Math.sin(seat.facingRad)];
  const [x, y, z] = seat.floor;
  return (forwardM, leftM, upM) => [x + forwardM * c - leftM * s, y + forwardM * s + leftM * c, z + upM];
}

function chair(seat: SeatPlace): Point[] {
  const at = placer(seat);
  return [
    at(-HALF_M, -HALF_M, PAN_M),
    at(HALF_M, -HALF_M, PAN_M),
    at(HALF_M, HALF_M, PAN_M),
    at(-HALF_M, HALF_M, PAN_M),
    at(-HALF_M, -HALF_M, PAN_M),
    at(-HALF_M, HALF_M, PAN_M),
    at(-HALF_M, HALF_M, BACK_M),
    at(-HALF_M, -HALF_M, BACK_M),
  ];
}

function wedge(seat: SeatPlace): Point[] {
  const [a, b, c] = wedgeOutline(seat);
  return [a, b, c, c, a, a, a, a];
}

/** Corners of the wedge of a short seat: two at its back, one in front. */
export function wedgeOutline(seat: SeatPlace): [Point, Point, Point] {
  const at = placer(seat);
  return [at(-0.26, -0.25, PAN_M), at(0.32, 0, PAN_M), at(-0.26, 0.25, PAN_M)];
}

/** The outline to draw round a seat that is selected or pointed at, as line ends in pairs. */
export function seatOutline(seat: SeatPlace, short: boolean): Point[] {
  const [p0, p1, p2, p3, , , b2, b3] = short ? wedge(seat) : chair(seat);
  return short ? [p0, p1, p1, p2, p2, p0] : [p0, p1, p1, p2, p2, p3, p3, p0, p3, b2, b2, b3, b3, p0];
}

/** Where a pin stands: its foot on the seat and its head above a standing person. */
export function pinOf(seat: SeatPlace, heightM: number): [Point, Point] {
  const at = placer(seat);
  return [at(0, 0, PAN_M + 0.05), at(0, 0, heightM)];
}

/** Points on the pan of a seat, short or served: its middle first, then towards its edges. */
export function seatPoints(seat: SeatPlace): Point[] {
  const at = placer(seat);
  return [at(0, 0, PAN_M), at(-0.18, 0, PAN_M), at(0.12, 0, PAN_M), at(-0.14, 0.12, PAN_M), at(-0.14, -0.12, PAN_M)];
}
