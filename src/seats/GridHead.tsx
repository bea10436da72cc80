import type { KeyboardEvent } from 'react';
import { AT_THE_SEAT } from './columns';
import { columnOf, type SeatGrid } from './seat-grid';

/** Rows of the head, and how high they are together. */
export const HEAD_ROWS = 2;
export const HEAD_PX = 39;

type Header = ReturnType<SeatGrid['getHeaderGroups']>[number]['headers'][number];

/** Groups of columns over the columns. A column's head sorts by it. */
export default function GridHead({ grid, toRows }: { grid: SeatGrid; toRows: () => void }) {
  const headers = grid.getHeaderGroups();
  const leaves = headers[headers.length - 1];
  // No group is left where no column of one is shown; the head keeps its height.
  const groups = headers.length > 1 ? headers[0].headers : leaves.headers;
  return (
    <thead>
      <tr aria-rowindex={1}>
        {groups.map((header, i) =>
          header.isPlaceholder || headers.length === 1 ? (
            <td key={header.id} className={i === 0 ? 'first' : undefined} />
          ) : (
            <th key={header.id} colSpan={header.colSpan} scope="colgroup" className="lead">
              {header.column.id}
              {header.column.id !== AT_THE_SEAT && ', dB'}
            </th>
          ),
        )}
      </tr>
      <tr aria-rowindex={2}>
        {leaves.headers.map((header, i) => (
          <ColumnHead
            key={header.id}
            header={header}
            sorts={grid.state.sorting.length}
            leads={i > 0 && columnOf(header.id).group !== columnOf(leaves.headers[i - 1].id).group}
            toRows={toRows}
          />
        ))}
      </tr>
    </thead>
  );
}

interface ColumnHeadProps {
  header: Header;
  /** How many columns the table is sorted by. */
  sorts: number;
  /** First of its group. */
  leads: boolean;
  toRows: () => void;
}

function ColumnHead({ header, sorts, leads, toRows }: ColumnHeadProps) {
  const column = columnOf(header.id);
  const sorted = header.column.getIsSorted();
  const place = header.column.getSortIndex();
  const press = (event: KeyboardEvent<HTMLElement>) => {
    if (event.key === 'Enter' || event.key === ' ') header.column.toggleSorting(undefined, event.shiftKey);
    else if (event.key === 'ArrowDown' || event.key === 'Escape') toRows();
    else if (!moveAlong(event)) return;
    event.preventDefault();
    event.stopPropagation();
  };
  const way = sorted === 'asc' ? 'ascending' : 'descending';
  return (
    <th
      scope="col"
      // Only the first key may say it is sorted by; the others say so in words.
      aria-sort={place === 0 ? way : undefined}
      data-sorted={sorted || undefined}
      className={[column.kind === 'text' ? 'name' : '', leads && column.group !== '' ? 'lead' : ''].join(' ')}
    >
      <button
        type="button"
        tabIndex={-1}
        title={`Sort by ${[column.group, column.label].filter((part) => part !== '').join(', ')}; with Shift, also by it`}
        onClick={(event) => header.column.toggleSorting(undefined, event.shiftKey)}
        onKeyDown={press}
      >
        {sorted !== false && sorts > 1 && <small aria-hidden="true">{place + 1}</small>}
        {column.label}
        {/* The rungs carry their unit in the head above. */}
        {column.unit !== '' && (column.group === '' || column.group === AT_THE_SEAT) && ` ${column.unit}`}
        {place > 0 && <span className="unseen">{`, then sorted ${way}`}</span>}
      </button>
    </th>
  );
}

/** Moves the focus among the heads; false where the key is not for that. */
function moveAlong(event: KeyboardEvent<HTMLElement>): boolean {
  const heads = [...(event.currentTarget.closest('tr')?.querySelectorAll('button') ?? [])];
  const at = heads.indexOf(event.currentTarget as HTMLButtonElement);
  const to = { ArrowLeft: at - 1, ArrowRight: at + 1, Home: 0, End: heads.length - 1 }[event.key];
  if (to === undefined) return false;
  heads[Math.min(Math.max(to, 0), heads.length - 1)].focus();
  return true;
}
