import { expect, test } from 'vitest';
import { SEAT_COLUMNS } from '../../src/seats/columns';
import { rowsCsv, rowsTsv } from '../../src/seats/rows-text';
import { seatsFileName } from '../../src/seats/take-rows';
import { madeRows } from './made-rows';

const columns = (...ids: string[]) => SEAT_COLUMNS.filter((column) => ids.includes(column.id));

test('tab-separated rows have a head, plain minus signs, no plus, and nothing where there is no figure', () => {
  const text = rowsTsv(columns('seat', 'block', 'margin', 'distance-margin', 'arrival-gap', 'served-by'), madeRows());
  expect(text).toBe(
    [
      'Seat\tBlock\tMargin dB\tDistance only margin dB\tgap ms\tby',
      'M1\tMembers\t0.2\t-1.8\t5.0\tc1',
      'M2\tMembers\t-0.04\t-2.0\t20.5\tc2',
      'G-1-2\tG\t\t\t30.0\tc2',
      'G-1-12\tG\t0.0\t-2.0\t\t',
      '',
    ].join('\n'),
  );
});

test('every figure of a full copy is one a spreadsheet takes for a number', () => {
  const figures = SEAT_COLUMNS.filter((column) => column.kind === 'figure');
  const cells = rowsTsv(figures, madeRows())
    .replace(/\n$/, '')
    .split('\n')
    .slice(1)
    .flatMap((line) => line.split('\t'));
  expect(cells).toHaveLength(4 * figures.length);
  for (const cell of cells) expect(cell).toMatch(/^(-?\d+\.\d+)?$/);
});

test('names can neither start another cell nor a formula', () => {
  const rows = [{ ...madeRows()[0], id: 'a\tb\nc', block: '=1+1' }];
  expect(rowsTsv(columns('seat', 'block'), rows)).toBe("Seat\tBlock\na b c\t'=1+1\n");
});

test('CSV quotes what it must and says own seats in words', () => {
  const rows = madeRows('chair').map((row) => ({ ...row, block: 'North, east' }));
  expect(rowsCsv(columns('seat', 'block', 'margin'), rows.slice(0, 2))).toBe(
    'Seat,Block,Margin dB\r\nM1,"North, east",own seat\r\nM2,"North, east",-0.04\r\n',
  );
});

test('a saved file is named after the layout and the scheme', () => {
  expect(seatsFileName('Café “Zur Post”', 'A')).toBe('cafe-zur-post-a-seats.csv');
  expect(seatsFileName('', '')).toBe('untitled-seats.csv');
});
