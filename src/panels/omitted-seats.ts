import type { SeatBlock } from '../layout/schema';
import { seatsOf } from '../layout/seating';

export type Omitted = { ok: true; ids: string[] } | { ok: false; why: string };

/** Seats to leave out of a block from a typed list, parted by commas or spaces; a seat may be written as row-column. */
export function readOmitted(block: SeatBlock, text: string): Omitted {
  const possible = new Set(seatsOf([{ ...block, omit: [] }]).map((seat) => seat.id));
  // Some of those left out now may not be seats of the block any more: they stay as they are until taken out.
  const kept = new Set(block.omit);
  const ids: string[] = [];
  for (const word of text.split(/[,;\s]+/).filter(Boolean)) {
    const id = [word, `${block.id}-${word}`].find((candidate) => possible.has(candidate) || kept.has(candidate));
    if (id === undefined) {
      return { ok: false, why: `“${word}” is no seat of this block: row and column, such as 1-1, are accepted.` };
    }
    if (!ids.includes(id)) ids.push(id);
  }
  return { ok: true, ids };
}

/** Seats left out of a block as row-column, parted by commas. */
export function sayOmitted(block: SeatBlock): string {
  const start = `${block.id}-`;
  return block.omit.map((id) => (id.startsWith(start) ? id.slice(start.length) : id)).join(', ');
}
