import type { SeatBlock, Seating, SeatList } from './schema';

/** One seat of the venue. */
export interface Seat {
  id: string;
  /** Index of its block or list in `venue.seating`. */
  seating: number;
  /** Floor point under the seat, metres. */
  floor: [number, number, number];
  /** Ear position, metres. */
  ear: [number, number, number];
  /** Direction its occupant looks, degrees as pan. */
  facingDeg: number;
}

/** All seats of a venue in file order: rows of a block front to back, its columns from the origin end. */
export function seatsOf(seating: readonly Seating[]): Seat[] {
  return seating.flatMap((part, index) => (part.kind === 'block' ? blockSeats(part, index) : listSeats(part, index)));
}

function blockSeats(block: SeatBlock, seating: number): Seat[] {
  const omitted = new Set(block.omit);
  const seats: Seat[] = [];
  for (let row = 1; row <= block.rows; row++) {
    for (let column = 1; column <= block.columns; column++) {
      const id = `${block.id}-${row}-${column}`;
      if (omitted.has(id)) continue;
      const { floor, facingDeg } =
        block.radius === null ? straight(block, row, column) : arc(block, block.radius, row, column);
      seats.push({ id, seating, floor, ear: [floor[0], floor[1], floor[2] + block.earHeight], facingDeg });
    }
  }
  return seats;
}

type Place = Pick<Seat, 'floor' | 'facingDeg'>;

function axes(facingDeg: number): { f: [number, number]; l: [number, number] } {
  const facing = (facingDeg * Math.PI) / 180;
  const f: [number, number] = [Math.cos(facing), Math.sin(facing)];
  return { f, l: [-f[1], f[0]] };
}

/** Rows step away from the facing direction; columns step to the left of someone facing that way. */
function straight(block: SeatBlock, row: number, column: number): Place {
  const { f, l } = axes(block.facing);
  const back = (row - 1) * block.rowSpacing;
  const left = (column - 1) * block.seatSpacing;
  return {
    floor: [
      block.origin[0] - back * f[0] + left * l[0],
      block.origin[1] - back * f[1] + left * l[1],
      block.origin[2] + (row - 1) * block.rise,
    ],
    facingDeg: block.facing,
  };
}

/** Rows are arcs about one centre in front, placed so that the origin stays under seat 1 of row 1. */
function arc(block: SeatBlock, radius: number, row: number, column: number): Place {
  const { f, l } = axes(block.facing);
  const first = (-(block.columns - 1) / 2) * (block.seatSpacing / radius);
  const centre = [0, 1].map((i) => block.origin[i] + radius * (Math.cos(first) * f[i] - Math.sin(first) * l[i]));
  const rowRadius = radius + (row - 1) * block.rowSpacing;
  const turn = ((column - 1 - (block.columns - 1) / 2) * block.seatSpacing) / rowRadius;
  return {
    floor: [
      centre[0] - rowRadius * (Math.cos(turn) * f[0] - Math.sin(turn) * l[0]),
      centre[1] - rowRadius * (Math.cos(turn) * f[1] - Math.sin(turn) * l[1]),
      block.origin[2] + (row - 1) * block.rise,
    ],
    // Someone `turn` to the left of the middle looks at the centre: turned clockwise by as much.
    facingDeg: block.facing - (turn * 180) / Math.PI,
  };
}

function listSeats(list: SeatList, seating: number): Seat[] {
  return list.seats.map(({ id, position, earHeight }) => ({
    id,
    seating,
    floor: [...position],
    ear: [position[0], position[1], position[2] + (earHeight ?? list.earHeight)],
    facingDeg: Number.NaN,
  }));
}
