import {
  type ColumnDef,
  columnVisibilityFeature,
  type ReactTable,
  rowSortingFeature,
  tableFeatures,
  useTable,
} from '@tanstack/react-table';
import { useMemo, useState } from 'react';
import { SEAT_COLUMNS, type SeatColumn, sortKey } from './columns';
import { keptHiddenColumns } from './kept-columns';
import { inOrder } from './order';
import type { SeatRow } from './rows';

const features = tableFeatures({
  columnVisibilityFeature,
  rowSortingFeature,
});
type Features = typeof features;
export type SeatGrid = ReactTable<Features, SeatRow>;

const leaf = (column: SeatColumn): ColumnDef<Features, SeatRow> => ({
  id: column.id,
  header: column.label,
  accessorFn: (row) => sortKey(column, row),
});
const groups = [...new Set(SEAT_COLUMNS.map((column) => column.group))];
const columns = groups.flatMap((group): ColumnDef<Features, SeatRow>[] => {
  const leaves = SEAT_COLUMNS.filter((column) => column.group === group).map(leaf);
  return group === '' ? leaves : [{ id: group, header: group, columns: leaves }];
});

const BY_ID = new Map(SEAT_COLUMNS.map((column) => [column.id, column]));

/** The column shown under this id. */
export function columnOf(id: string): SeatColumn {
  const column = BY_ID.get(id);
  if (column === undefined) throw new Error(`No seat column ${id}`);
  return column;
}

/** Choice of columns over the rows given, and the rows in the order wanted: the worst margin first until told otherwise. */
export function useSeatGrid(rows: readonly SeatRow[]): { grid: SeatGrid; sorted: readonly SeatRow[] } {
  const [sorting, setSorting] = useState([{ id: 'margin', desc: false }]);
  const [columnVisibility, setColumnVisibility] = useState<Record<string, boolean>>(() =>
    Object.fromEntries(keptHiddenColumns().map((id) => [id, false])),
  );
  const sorted = useMemo(() => inOrder(rows, sorting), [rows, sorting]);
  const grid = useTable({
    features,
    columns,
    data: sorted,
    getRowId: (row) => row.id,
    state: { sorting, columnVisibility },
    onSortingChange: setSorting,
    onColumnVisibilityChange: setColumnVisibility,
    // Sorted above, many times faster than a comparison that looks its values up.
    manualSorting: true,
    enableSortingRemoval: false,
    sortDescFirst: false,
  });
  return { grid, sorted };
}
