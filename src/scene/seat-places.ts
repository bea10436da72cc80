import type { Vec3, Venue } from '../layout/schema';
import { type Seat, seatsOf } from '../layout/seating';

/** A seat and the way its chair is turned, radians as pan. */
export interface SeatPlace extends Seat {
  facingRad: number;
}

/** A seat nearer than this to a talker is the talker's own, metres. */
const OWN_SEAT_M = 0.5;
/** A desk at most this far from a seat is that seat's desk, metres. */
const DESK_REACH_M = 1.1;
/** Up to so many listed seats are taken to sit about something between them. */
const ROUND_AT_MOST = 24;

/**
 * All seats with a direction. Listed seats have none of their own: they face as the talker who sits there does, else
 * their desk, else the middle of their list where it is a small one, else the nearest talker.
 */
export function seatPlaces(venue: Pick<Venue, 'seating' | 'talkers' | 'faces'>): SeatPlace[] {
  const seats = seatsOf(venue.seating);
  const desks = deskTops(venue);
  const middles = venue.seating.map((_, index) => middleOf(seats.filter((seat) => seat.seating === index)));
  return seats.map((seat) => ({
    ...seat,
    facingRad: Number.isFinite(seat.facingDeg)
      ? (seat.facingDeg * Math.PI) / 180
      : listedFacing(seat, venue.talkers, desks, middles[seat.seating]),
  }));
}

function listedFacing(seat: Seat, talkers: Venue['talkers'], desks: readonly Vec3[][], middle: Middle): number {
  const own = talkers.find((talker) => flat(talker.position, seat.ear) < OWN_SEAT_M);
  if (own !== undefined) return (own.pan * Math.PI) / 180;
  const desk = nearestOf(
    seat.floor,
    desks.map((outline) => nearestOnOutline(seat.floor, outline)),
  );
  if (desk !== null && flat(desk, seat.floor) < DESK_REACH_M) return towards(seat.floor, desk);
  if (middle.count > 1 && middle.count <= ROUND_AT_MOST && flat(middle.point, seat.floor) > 0.3) {
    return towards(seat.floor, middle.point);
  }
  const talker = nearestOf(
    seat.floor,
    talkers.map(({ position }) => position),
  );
  return talker === null ? 0 : towards(seat.floor, talker);
}

interface Middle {
  count: number;
  point: Vec3;
}

function middleOf(seats: readonly Seat[]): Middle {
  const mean = (axis: number): number => seats.reduce((sum, seat) => sum + seat.floor[axis], 0) / (seats.length || 1);
  return { count: seats.length, point: [mean(0), mean(1), mean(2)] };
}

/** Outlines of level free-standing faces: tables and desks. */
function deskTops(venue: Pick<Venue, 'faces'>): Vec3[][] {
  return venue.faces
    .filter((face) => {
      const heights = face.corners.map((corner) => corner[2]);
      return face.sides === 2 && Math.max(...heights) - Math.min(...heights) < 0.2;
    })
    .map((face) => face.corners as Vec3[]);
}

function nearestOnOutline(point: Vec3, outline: readonly Vec3[]): Vec3 {
  let nearest = outline[0];
  outline.forEach((a, i) => {
    const b = outline[(i + 1) % outline.length];
    const [ex, ey] = [b[0] - a[0], b[1] - a[1]];
    const along = ((point[0] - a[0]) * ex + (point[1] - a[1]) * ey) / (ex * ex + ey * ey || 1);
    const share = Math.min(1, Math.max(0, along));
    const foot: Vec3 = [a[0] + share * ex, a[1] + share * ey, a[2]];
    if (flat(foot, point) < flat(nearest, point)) nearest = foot;
  });
  return nearest;
}

function nearestOf(point: Vec3, places: readonly Vec3[]): Vec3 | null {
  return places.reduce<Vec3 | null>(
    (best, place) => (best === null || flat(place, point) < flat(best, point) ? place : best),
    null,
  );
}

const flat = (a: readonly number[], b: readonly number[]): number => Math.hypot(a[0] - b[0], a[1] - b[1]);

const towards = (from: readonly number[], to: readonly number[]): number =>
  Math.atan2(to[1] - from[1], to[0] - from[0]);
