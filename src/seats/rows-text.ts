import { NO_FIGURE } from '../report/figures';
import { csvCell } from '../report/seats-csv';
import { fullLabel, type SeatColumn } from './columns';
import type { SeatRow } from './rows';

/** Rows for a spreadsheet: tab-separated, a head row first, plain minus signs, nothing where there is no figure. */
export const rowsTsv = (columns: readonly SeatColumn[], rows: readonly SeatRow[]): string =>
  tableText(columns, rows, '\t', tsvCell, '\n');

/** The same as CSV (RFC 4180). */
export const rowsCsv = (columns: readonly SeatColumn[], rows: readonly SeatRow[]): string =>
  tableText(columns, rows, ',', csvCell, '\r\n');

function tableText(
  columns: readonly SeatColumn[],
  rows: readonly SeatRow[],
  between: string,
  cell: (value: string) => string,
  end: string,
): string {
  const line = (values: string[]) => values.map(cell).join(between) + end;
  const head = line(columns.map(fullLabel));
  return head + rows.map((row) => line(columns.map((column) => plain(column, row)))).join('');
}

function plain(column: SeatColumn, row: SeatRow): string {
  const shown = column.text(row);
  if (shown === NO_FIGURE) return '';
  return column.kind === 'text' ? shown : shown.replace('−', '-').replace('+', '');
}

/** Tabs and line ends would start another cell; guarded against formulas as in CSV, without its quotes. */
function tsvCell(value: string): string {
  const flat = value.replace(/[\t\r\n]+/g, ' ');
  return /^[=+\-@]/.test(flat) && !/^-?\d+(\.\d+)?$/.test(flat) ? `'${flat}` : flat;
}
