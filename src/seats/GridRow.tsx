import { memo } from 'react';
import { useSession } from '../session/session';
import type { SeatColumn } from './columns';
import type { SeatRow } from './rows';
import SeatMark from './SeatMark';

interface GridRowProps {
  domId: string;
  row: SeatRow;
  /** Place in the whole table, its head included, from 1. */
  rowIndex: number;
  columns: readonly SeatColumn[];
  /** The one seat selected in the page. */
  current: boolean;
  /** Among those selected in the table. */
  chosen: boolean;
  /** Where the keyboard is. */
  active: boolean;
}

export default memo(function GridRow({ domId, row, rowIndex, columns, current, chosen, active }: GridRowProps) {
  const hovered = useSession((session) => session.hoveredSeat === row.id);
  return (
    <tr
      id={domId}
      data-seat={row.id}
      aria-rowindex={rowIndex}
      aria-selected={chosen}
      aria-current={current || undefined}
      data-active={active || undefined}
      data-hovered={hovered || undefined}
      data-own={row.own || undefined}
    >
      {columns.map((column, i) => {
        const shown = column.text(row);
        if (i === 0) {
          return (
            <th key={column.id} scope="row" title={shown}>
              {shown}
            </th>
          );
        }
        const lead = column.group !== columns[i - 1].group && column.group !== '' ? ' lead' : '';
        if (column.kind === 'text') {
          return (
            <td key={column.id} className={`name${lead}`} title={shown}>
              {shown}
            </td>
          );
        }
        if (column.id !== 'margin') {
          return (
            <td key={column.id} className={lead}>
              {shown}
            </td>
          );
        }
        return (
          <td key={column.id} className="standing">
            {row.judged && <SeatMark marginDb={column.value(row)} />}
            {shown}
          </td>
        );
      })}
    </tr>
  );
});
