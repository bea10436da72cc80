import { RUNGS, type Rung, type TalkerPrediction } from '../predict/prediction';
import { figure, marginFigure, NO_FIGURE } from '../report/figures';
import { RUNG_LABELS } from '../report/quantities';
import type { SeatRow } from './rows';

/** A column of the seat table: what it says, sorts by and is called in a filter. */
export type SeatColumn = TextColumn | FigureColumn;

interface ColumnHead {
  id: string;
  /** As in its head, without the unit. */
  label: string;
  unit: string;
  /** Head over several columns; empty for none. */
  group: string;
  /** What a filter may call it, in lower case; the first is the one that is listed. */
  names: readonly string[];
  /** Least width, px. */
  width: number;
  /** What stands in its cell. */
  text: (row: SeatRow) => string;
}

export interface TextColumn extends ColumnHead {
  kind: 'text';
  value: (row: SeatRow) => string;
  /** Another name the same thing goes by. */
  alias: (row: SeatRow) => string;
}

export interface FigureColumn extends ColumnHead {
  kind: 'figure';
  /** NaN where there is none. */
  value: (row: SeatRow) => number;
  /** A margin without a finite figure is the worst there is; other figures are then only missing. */
  margin: boolean;
}

export const OWN_SEAT = 'own seat';
export const AT_THE_SEAT = 'At the seat';

const text = (
  id: string,
  label: string,
  width: number,
  value: TextColumn['value'],
  alias: TextColumn['alias'] = value,
  group = '',
): TextColumn => ({
  kind: 'text',
  id,
  label,
  unit: '',
  group,
  names: [label.toLowerCase()],
  width,
  value,
  alias,
  text: (row) => value(row) || NO_FIGURE,
});

const plainMargin = (marginDb: number): string => marginFigure(marginDb).replace('+', '');

const rungColumns = (rung: Rung): FigureColumn[] =>
  (['potential', 'needed', 'margin'] as const).map((part) => {
    const value = ({ figures, seat }: SeatRow) => figures?.seats[rung][`${part}Db`][seat] ?? Number.NaN;
    const full = `${RUNG_LABELS[rung].toLowerCase()} ${part}`;
    return {
      kind: 'figure',
      id: `${rung}-${part}`,
      label: part,
      unit: 'dB',
      group: RUNG_LABELS[rung],
      // The room rung is the one that counts, so its short name will do; "margin" is the verdict's own column.
      names: rung === 'room' && part !== 'margin' ? [part, full] : [full],
      width: part === 'potential' ? 52 : 48,
      value,
      margin: part === 'margin',
      text: part === 'margin' ? (row) => plainMargin(value(row)) : (row) => figure(value(row)),
    };
  });

type AtSeat = Pick<FigureColumn, 'id' | 'label' | 'unit' | 'width'> & {
  name: string;
  digits?: number;
  of: (room: TalkerPrediction['room']) => Float64Array;
};

const atSeat = ({ name, digits = 1, of, ...head }: AtSeat): FigureColumn => {
  const value = ({ figures, seat }: SeatRow) => (figures === null ? Number.NaN : of(figures.room)[seat]);
  return {
    ...head,
    kind: 'figure',
    group: AT_THE_SEAT,
    names: [head.label.toLowerCase(), name],
    value,
    margin: false,
    text: (row) => figure(value(row), digits),
  };
};

const margin = (row: SeatRow) => (row.judged ? (row.figures?.seats.room.marginDb[row.seat] ?? Number.NaN) : Number.NaN);

/** Everything the table can show, in its order. */
export const SEAT_COLUMNS: readonly SeatColumn[] = [
  text('seat', 'Seat', 50, (row) => row.id),
  text(
    'block',
    'Block',
    66,
    (row) => row.block,
    (row) => row.blockId,
  ),
  text(
    'talker',
    'Talker',
    60,
    (row) => row.talker,
    (row) => row.talkerId,
  ),
  {
    kind: 'figure',
    id: 'margin',
    label: 'Margin',
    unit: 'dB',
    group: '',
    names: ['margin'],
    width: 72,
    value: margin,
    margin: true,
    text: (row) => (row.own ? OWN_SEAT : marginFigure(margin(row))),
  },
  ...RUNGS.flatMap(rungColumns),
  atSeat({ id: 'level', label: 'dBA', unit: '', name: 'level', width: 44, of: (room) => room.totalDba }),
  atSeat({
    id: 'signal-to-noise',
    label: 'S/N',
    unit: 'dB',
    name: 'signal to noise',
    width: 48,
    of: (room) => room.signalToNoiseDb,
  }),
  atSeat({
    id: 'sti',
    label: 'STI',
    unit: '',
    name: 'speech transmission index',
    digits: 2,
    width: 40,
    of: (room) => room.sti,
  }),
  atSeat({
    id: 'direct-to-reverberant',
    label: 'D/R',
    unit: 'dB',
    name: 'direct to reverberant',
    width: 48,
    of: (room) => room.directToReverberantDb,
  }),
  atSeat({
    id: 'arrival-gap',
    label: 'gap',
    unit: 'ms',
    name: 'arrival gap',
    width: 48,
    of: (room) => room.arrivalGapMs,
  }),
  text(
    'served-by',
    'by',
    34,
    (row) => row.servedBy,
    (row) => row.servedBy,
    AT_THE_SEAT,
  ),
];

/** Head of a column where its group is not above it. */
export function fullLabel({ group, label, unit }: SeatColumn): string {
  return [group === AT_THE_SEAT ? '' : group, label, unit].filter((part) => part !== '').join(' ');
}

/** Widths of columns, px: those of names are wide enough for the names in them, within reason. */
export const columnWidths = (columns: readonly SeatColumn[], rows: readonly SeatRow[]): number[] =>
  columns.map((column) => {
    if (column.kind === 'figure') return column.width;
    const longest = rows.reduce((name, row) => {
      const other = column.value(row);
      return other.length > name.length ? other : name;
    }, '');
    return Math.min(Math.max(column.width, CELL_PADDING_PX + nameWidth(longest)), WIDEST_NAME_PX);
  });

const CELL_PADDING_PX = 14;
const WIDEST_NAME_PX = 130;

/** About as wide as the lettering face sets a name at the size of a table, px. */
function nameWidth(name: string): number {
  const narrow = name.match(/[\sfijlrt.,'I|()[\]-]/g)?.length ?? 0;
  const wide = name.match(/[MWmw@]/g)?.length ?? 0;
  return 3.6 * narrow + 9.2 * wide + 6.1 * (name.length - narrow - wide);
}

/** What a column is sorted by; undefined goes last, whichever way it is sorted. */
export function sortKey(column: SeatColumn, row: SeatRow): number | string | undefined {
  if (column.kind === 'text') {
    const value = column.value(row);
    return value === '' ? undefined : naturalKey(value);
  }
  const value = column.value(row);
  if (Number.isFinite(value)) return value;
  return column.margin && row.judged ? Number.NEGATIVE_INFINITY : undefined;
}

/** A text whose plain order is the order people expect: G-6-2 before G-6-12, whatever the case and accents. */
const naturalKey = (value: string): string =>
  value
    .normalize('NFD')
    .toLowerCase()
    .replace(/\d+/g, (digits) => digits.padStart(8, '0'));
