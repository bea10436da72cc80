import { expect, test } from 'vitest';
import { predict } from '../../src/predict/run';
import { csvCell, seatsCsv } from '../../src/report/seats-csv';
import { smallLayout } from '../support/layouts';

test.each([
  ['plain', 'plain'],
  ['a,b', '"a,b"'],
  ['say "no"', '"say ""no"""'],
  ['two\nlines', '"two\nlines"'],
  ['=SUM(A1)', "'=SUM(A1)"],
  ['+1', "'+1"],
  ['@x', "'@x"],
  ['\tx', "'\tx"],
  ['-x', "'-x"],
  ["-2+3+cmd|' /C calc'!A0", "'-2+3+cmd|' /C calc'!A0"],
  ['-2.5', '-2.5'],
  ['-12', '-12'],
  ['=A1,"B"', '"\'=A1,""B"""'],
])('a cell of %j', (value, cell) => {
  expect(csvCell(value)).toBe(cell);
});

test('a row a seat, talker and scheme, each of as many cells as the head', () => {
  const layout = smallLayout();
  layout.venue.seating[0].label = '=1+1';
  const prediction = predict(layout);
  const lines = seatsCsv(layout, prediction).split('\r\n');
  expect(lines.pop()).toBe('');
  expect(lines).toHaveLength(1 + 6);
  const [head, ...rows] = lines.map((line) => line.split(','));
  expect(new Set(rows.map((row) => row.length))).toEqual(new Set([head.length]));
  expect(rows[1].slice(0, 5)).toEqual(['A', 'A-1-2', "'=1+1", 't', '']);
  const margin = Number(rows[1][head.indexOf('room_margin_dB')]);
  expect(margin).toBeCloseTo(prediction.schemes[0].talkers[0].seats.room.marginDb[1], 4);
  expect(rows[1].at(-1)).toBe('l');
});

test('no finite number is an empty cell', () => {
  const layout = smallLayout();
  layout.schemes[0].microphones[0].open = false;
  const [head, row] = seatsCsv(layout, predict(layout))
    .split('\r\n')
    .map((line) => line.split(','));
  expect(row[head.indexOf('room_margin_dB')]).toBe('');
  expect(row[head.indexOf('served_by')]).toBe('');
});
