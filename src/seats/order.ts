import { SEAT_COLUMNS, sortKey } from './columns';
import type { SeatRow } from './rows';

/** Column to sort by, and which way. */
export interface SortBy {
  id: string;
  desc: boolean;
}

/**
 * Rows by the first column given, where that is even by the next, and at last in seat order. What has no figure goes
 * last whichever way. Keys are made once a row rather than once a comparison: a large venue is sorted while one looks.
 */
export function inOrder(rows: readonly SeatRow[], sorting: readonly SortBy[]): SeatRow[] {
  const keys = sorting.flatMap(({ id, desc }) => {
    const column = SEAT_COLUMNS.find((one) => one.id === id);
    return column === undefined ? [] : [{ of: rows.map((row) => sortKey(column, row)), sign: desc ? -1 : 1 }];
  });
  const order = rows.map((_, index) => index);
  order.sort((a, b) => {
    for (const { of, sign } of keys) {
      const x = of[a];
      const y = of[b];
      if (x === y) continue;
      if (x === undefined) return 1;
      if (y === undefined) return -1;
      return x < y ? -sign : sign;
    }
    return a - b;
  });
  return order.map((index) => rows[index]);
}
