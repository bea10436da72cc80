import { describe, expect, test } from 'vitest';
import type { SeatBlock } from '../../src/layout/schema';
import { seatsOf } from '../../src/layout/seating';

const block = (more: Partial<SeatBlock> = {}): SeatBlock => ({
  id: 'A',
  label: '',
  kind: 'block',
  origin: [5, 2, 0.1],
  facing: 180,
  rows: 2,
  columns: 3,
  rowSpacing: 0.9,
  seatSpacing: 0.6,
  rise: 0.12,
  radius: null,
  earHeight: 1.2,
  omit: [],
  ...more,
});

const close = (found: readonly number[], expected: readonly number[]) =>
  found.forEach((value, i) => {
    expect(value).toBeCloseTo(expected[i], 9);
  });

describe('straight rows', () => {
  test('facing the platform: rows run away along +x, columns towards −y', () => {
    const seats = seatsOf([block()]);
    expect(seats.map(({ id }) => id)).toEqual(['A-1-1', 'A-1-2', 'A-1-3', 'A-2-1', 'A-2-2', 'A-2-3']);
    close(seats[0].floor, [5, 2, 0.1]);
    close(seats[2].floor, [5, 0.8, 0.1]);
    close(seats[4].floor, [5.9, 1.4, 0.22]);
    close(seats[4].ear, [5.9, 1.4, 1.42]);
    expect(seats.every(({ facingDeg }) => facingDeg === 180)).toBe(true);
  });

  test('facing 0: rows run away along −x, columns to the left, +y', () => {
    const seats = seatsOf([block({ facing: 0 })]);
    close(seats[1].floor, [5, 2.6, 0.1]);
    close(seats[3].floor, [4.1, 2, 0.22]);
  });

  test('facing 90: columns towards −x, rows towards −y', () => {
    const seats = seatsOf([block({ facing: 90 })]);
    close(seats[1].floor, [4.4, 2, 0.1]);
    close(seats[3].floor, [5, 1.1, 0.22]);
  });
});

describe('rows on arcs', () => {
  const arc = block({ rows: 3, columns: 5, radius: 6, facing: 180, rise: 0 });
  const seats = seatsOf([arc]);

  test('the origin is under seat 1 of row 1', () => {
    close(seats[0].floor, arc.origin);
  });

  test('all rows share one centre, a row spacing apart, seats a seat spacing apart along the arc', () => {
    // Centre by the format's own formula, f = (−1, 0), l = (0, −1).
    const d = (-2 * 0.6) / 6;
    const centre = [5 - 6 * Math.cos(d), 2 + 6 * Math.sin(d)];
    for (const [i, { floor }] of seats.entries()) {
      const row = Math.floor(i / 5);
      expect(Math.hypot(floor[0] - centre[0], floor[1] - centre[1])).toBeCloseTo(6 + 0.9 * row, 9);
    }
    for (let row = 0; row < 3; row++) {
      const [a, b] = [seats[5 * row], seats[5 * row + 1]].map(({ floor }) =>
        Math.atan2(floor[1] - centre[1], floor[0] - centre[0]),
      );
      expect((a - b) * (6 + 0.9 * row)).toBeCloseTo(0.6, 9);
    }
  });

  test('everyone looks at the centre', () => {
    const d = (-2 * 0.6) / 6;
    const centre = [5 - 6 * Math.cos(d), 2 + 6 * Math.sin(d)];
    for (const { floor, facingDeg } of seats) {
      const wanted = (Math.atan2(centre[1] - floor[1], centre[0] - floor[0]) * 180) / Math.PI;
      const turn = (((facingDeg - wanted) % 360) + 540) % 360;
      expect(turn - 180).toBeCloseTo(0, 9);
    }
  });

  test('a very large radius is a straight row', () => {
    const wide = seatsOf([block({ radius: 9999, columns: 3 })]);
    const straight = seatsOf([block({ columns: 3 })]);
    wide.forEach((seat, i) => {
      expect(Math.hypot(...seat.floor.map((c, axis) => c - straight[i].floor[axis]))).toBeLessThan(1e-3);
    });
  });
});

test('omitted seats are left out and the others keep their ids', () => {
  const ids = seatsOf([block({ omit: ['A-1-2', 'A-2-3'] })]).map(({ id }) => id);
  expect(ids).toEqual(['A-1-1', 'A-1-3', 'A-2-1', 'A-2-2']);
});

test('a listed seat may carry its own ear height, and parts follow one another in file order', () => {
  const seats = seatsOf([
    {
      id: 'C',
      label: '',
      kind: 'list',
      earHeight: 1.1,
      seats: [
        { id: 'C1', position: [1, 2, 0.3] },
        { id: 'C2', position: [2, 2, 0.3], earHeight: 1.6 },
      ],
    },
    block({ rows: 1, columns: 1 }),
  ]);
  expect(seats.map(({ id, seating }) => [id, seating])).toEqual([
    ['C1', 0],
    ['C2', 0],
    ['A-1-1', 1],
  ]);
  close(seats[0].ear, [1, 2, 1.4]);
  close(seats[1].ear, [2, 2, 1.9]);
});
