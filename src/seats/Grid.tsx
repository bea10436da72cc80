import { useVirtualizer } from '@tanstack/react-virtual';
import {
  type KeyboardEvent,
  type MouseEvent,
  type ReactNode,
  useEffect,
  useId,
  useMemo,
  useRef,
  useState,
} from 'react';
import { useSession } from '../session/session';
import { columnWidths, type SeatColumn } from './columns';
import GridHead, { HEAD_PX, HEAD_ROWS } from './GridHead';
import GridRow from './GridRow';
import type { SeatRow } from './rows';
import type { SeatGrid } from './seat-grid';
import type { Marks } from './use-marks';

/** Height of a row, as the token --row says. */
const ROW_PX = 22;

interface GridProps {
  grid: SeatGrid;
  rows: readonly SeatRow[];
  columns: readonly SeatColumn[];
  marks: Marks;
  /** What to say in place of rows; null where there are some. */
  empty: ReactNode;
  all: readonly SeatRow[];
  onCopy: () => void;
}

/**
 * The table itself. Only rows in view are in the page; the keyboard has one stop here, and moves an active row that
 * need not be in the page to be remembered.
 */
export default function Grid({ grid, rows, columns, marks, empty, all, onCopy }: GridProps) {
  const box = useRef<HTMLDivElement>(null);
  const table = useRef<HTMLTableElement>(null);
  const [prefix, hintId] = [useId(), useId()];
  const selected = useSession((session) => (session.selection?.kind === 'seat' ? session.selection.id : null));
  const { select } = useSession.getState();
  const [active, setActive] = useState<string | null>(selected);
  const placeOf = (id: string | null) => (id === null ? -1 : rows.findIndex((row) => row.id === id));
  const widths = useMemo(() => columnWidths(columns, all), [columns, all]);
  const virtualizer = useVirtualizer({
    count: rows.length,
    getScrollElement: () => box.current,
    estimateSize: () => ROW_PX,
    overscan: 8,
    useFlushSync: false,
  });

  // A seat selected elsewhere comes into view, also when a filter that hid it is taken away.
  // biome-ignore lint/correctness/useExhaustiveDependencies: it is looked for again where the rows are others
  const place = useMemo(() => placeOf(selected), [selected, rows]);
  const latestPlace = useRef(place);
  latestPlace.current = place;
  const isShown = place >= 0;
  useEffect(() => {
    if (!isShown) return;
    setActive(selected);
    reveal(box.current, latestPlace.current);
  }, [selected, isShown]);

  const move = (event: KeyboardEvent) => {
    if (event.target !== table.current || event.altKey) return;
    const mod = event.ctrlKey || event.metaKey;
    const from = placeOf(active);
    const page = Math.max(1, Math.floor(((box.current?.clientHeight ?? 0) - HEAD_PX) / ROW_PX) - 1);
    const steps: Record<string, number> = {
      ArrowUp: from - 1,
      ArrowDown: from + 1,
      PageUp: from - page,
      PageDown: from + page,
      Home: 0,
      End: rows.length - 1,
    };
    if (event.key in steps && !mod) {
      event.preventDefault();
      if (event.key === 'ArrowUp' && from <= 0 && !event.shiftKey) focusHead(table.current);
      else goTo(Math.min(Math.max(steps[event.key], 0), rows.length - 1), event.shiftKey);
    } else if (event.key === 'Enter' && active !== null && from >= 0) {
      marks.startAt(active);
      select({ kind: 'seat', id: active });
    } else if (event.key === ' ' && active !== null && from >= 0) {
      event.preventDefault();
      marks.toggle(active, null);
    } else if (event.key === 'Escape' && marks.ids.size > 0) marks.startAt(active);
    else if (mod && event.key.toLowerCase() === 'a') {
      event.preventDefault();
      marks.all(rows);
    } else if (mod && event.key.toLowerCase() === 'c' && getSelection()?.isCollapsed !== false) {
      event.preventDefault();
      onCopy();
    }
  };
  const goTo = (index: number, extend: boolean) => {
    const id = rows[index]?.id;
    if (id === undefined) return;
    if (extend) {
      if (marks.ids.size === 0) marks.startAt(active ?? id);
      marks.extendTo(id, rows);
    } else {
      marks.startAt(id);
      select({ kind: 'seat', id });
    }
    setActive(id);
    reveal(box.current, index, 'nearest');
  };
  const click = (event: MouseEvent) => {
    const id = seatAt(event);
    if (id === null) return;
    if (event.shiftKey) marks.extendTo(id, rows);
    else if (event.ctrlKey || event.metaKey) marks.toggle(id, selected);
    else {
      marks.startAt(id);
      select({ kind: 'seat', id });
    }
    setActive(id);
  };

  const items = virtualizer.getVirtualItems();
  const [first, last] = [items[0]?.start ?? 0, items[items.length - 1]?.end ?? 0];
  const activeShown = active !== null && items.some((item) => rows[item.index].id === active);
  return (
    <div
      className="seats-box"
      ref={box}
      onPointerLeave={() => hover(null)}
      // What lies under the first column, which stays, is parted from it by a line.
      onScroll={({ currentTarget }) => currentTarget.toggleAttribute('data-aside', currentTarget.scrollLeft > 0)}
    >
      <table
        ref={table}
        // biome-ignore lint/a11y/noNoninteractiveElementToInteractiveRole: a grid is a table one moves in
        role="grid"
        aria-label="Seats"
        aria-describedby={hintId}
        aria-multiselectable="true"
        aria-rowcount={rows.length + HEAD_ROWS}
        aria-activedescendant={activeShown ? prefix + active : undefined}
        tabIndex={0}
        style={{ minWidth: widths.reduce((sum, width) => sum + width, 0) }}
        onKeyDown={move}
      >
        <colgroup>
          {columns.map((column, i) => (
            <col key={column.id} style={{ width: widths[i] }} />
          ))}
        </colgroup>
        <GridHead grid={grid} toRows={() => table.current?.focus()} />
        {/* biome-ignore lint/a11y/useKeyWithClickEvents: keys are the grid's */}
        <tbody
          onClick={click}
          onMouseDown={(event) => event.shiftKey && event.preventDefault()}
          onPointerOver={(event) => hover(seatAt(event))}
        >
          <Spacer height={first} columns={columns.length} />
          {items.map(({ index }) => {
            const row = rows[index];
            const isMarked = marks.ids.has(row.id);
            return (
              <GridRow
                key={row.id}
                domId={prefix + row.id}
                row={row}
                rowIndex={index + HEAD_ROWS + 1}
                columns={columns}
                current={row.id === selected}
                chosen={marks.ids.size === 0 ? row.id === selected : isMarked}
                active={row.id === active}
              />
            );
          })}
          <Spacer height={virtualizer.getTotalSize() - last} columns={columns.length} />
        </tbody>
      </table>
      {empty !== null && <div className="seats-empty">{empty}</div>}
      <p className="unseen" id={hintId}>
        Arrow keys move and select; with Shift they mark several rows. Up from the first row are the column heads: Enter
        sorts by one, with Shift also by another.
      </p>
    </div>
  );
}

/** Stands for the rows out of view. */
function Spacer({ height, columns }: { height: number; columns: number }) {
  if (height <= 0) return null;
  return (
    // biome-ignore lint/a11y/noInteractiveElementToNoninteractiveRole: it is no row, it only takes up room
    <tr role="presentation" className="seats-spacer">
      <td role="presentation" colSpan={columns} style={{ height }} />
    </tr>
  );
}

function hover(id: string | null): void {
  const { hoveredSeat, hoverSeat } = useSession.getState();
  if (hoveredSeat !== id) hoverSeat(id);
}

/** Scrolls a row into view: by as little as can be, or to the middle where it was not in view. */
function reveal(box: HTMLElement | null, index: number, how: 'nearest' | 'middle' = 'middle'): void {
  if (box === null) return;
  const view = box.clientHeight - HEAD_PX;
  const top = index * ROW_PX;
  const [above, below] = [top < box.scrollTop, top + ROW_PX > box.scrollTop + view];
  if (!above && !below) return;
  if (how === 'middle') box.scrollTop = top - (view - ROW_PX) / 2;
  else box.scrollTop = above ? top : top + ROW_PX - view;
}

const seatAt = (event: { target: EventTarget }): string | null =>
  event.target instanceof Element ? (event.target.closest<HTMLElement>('[data-seat]')?.dataset.seat ?? null) : null;

const focusHead = (table: HTMLTableElement | null): void =>
  (
    table?.querySelector<HTMLElement>('th[aria-sort] button') ?? table?.querySelector<HTMLElement>('thead button')
  )?.focus();
