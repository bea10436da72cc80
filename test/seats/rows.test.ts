import { describe, expect, test } from 'vitest';
import { figure } from '../../src/report/figures';
import { columnWidths, fullLabel, SEAT_COLUMNS, type SeatColumn } from '../../src/seats/columns';
import { inOrder } from '../../src/seats/order';
import { seatRows } from '../../src/seats/rows';
import { madeLayout, madePrediction, madeRows } from './made-rows';

const column = (id: string): SeatColumn => {
  const found = SEAT_COLUMNS.find((one) => one.id === id);
  if (found === undefined) throw new Error(`no column ${id}`);
  return found;
};
const shown = (id: string, rows = madeRows()) => rows.map(column(id).text);

describe('rows of the worst talker', () => {
  test('each seat is shown for its own worst talker, by name, or by id where there is none', () => {
    expect(shown('talker')).toEqual(['clerk', 'The Chair', 'The Chair', 'clerk']);
    expect(shown('block')).toEqual(['Members', 'Members', 'G', 'G']);
  });

  test('figures are those of the talker shown; what is missing is a dash', () => {
    expect(shown('margin')).toEqual(['+0.2', '−0.04', '–', '0.0']);
    expect(shown('room-margin')).toEqual(['0.2', '−0.04', '–', '0.0']);
    expect(shown('distance-margin')).toEqual(['−1.8', '−2.0', '–', '−2.0']);
    expect(shown('directivity-potential')).toEqual(['11.2', '11.0', '–', '11.0']);
    expect(shown('level')).toEqual(['65.0', '66.0', '67.0', '68.0']);
    expect(shown('sti')).toEqual(['0.55', '0.60', '0.65', '0.70']);
    expect(shown('arrival-gap')).toEqual(['5.0', '20.5', '30.0', '–']);
    expect(shown('served-by')).toEqual(['c1', 'c2', 'c2', '–']);
  });

  test('a seat falls short below zero, and where it is not reached at all; zero is served', () => {
    expect(madeRows().map((row) => row.short)).toEqual([false, true, true, false]);
  });
});

describe('rows of one talker', () => {
  test("the talker's own seat is shown with its figures, but is not judged", () => {
    const [own] = madeRows('chair');
    expect([own.own, own.judged, own.short]).toEqual([true, false, false]);
    expect(column('margin').text(own)).toBe('own seat');
    expect(column('room-margin').text(own)).toBe('−3.0');
  });

  test('a talker who is not in the prediction leaves every seat without figures, and none judged', () => {
    const rows = madeRows('nobody');
    expect(rows.every((row) => row.figures === null && !row.own && !row.judged)).toBe(true);
    expect(new Set(SEAT_COLUMNS.slice(2).flatMap((one) => rows.map(one.text)))).toEqual(new Set([figure(null)]));
  });

  test('a seat that is judged for nobody because the only talker sits there shows that talker', () => {
    const prediction = madePrediction();
    const [scheme] = prediction.schemes;
    scheme.talkers.pop();
    scheme.worstTalker = Int16Array.from([-1, 0, 0, 0]);
    const [own] = seatRows(madeLayout(), prediction, scheme, null);
    expect([own.talker, own.own, own.judged]).toEqual(['The Chair', true, false]);
  });
});

describe('order', () => {
  const order = (id: string, rows = madeRows(), desc = false) => inOrder(rows, [{ id, desc }]).map((row) => row.id);

  test('a margin without a figure is the worst', () => {
    expect(order('margin')).toEqual(['G-1-2', 'M2', 'G-1-12', 'M1']);
  });

  test('an own seat and a missing figure come after everything', () => {
    expect(order('margin', madeRows('chair'))).toEqual(['G-1-2', 'M2', 'G-1-12', 'M1']);
    expect(order('direct-to-reverberant')).toEqual(['G-1-2', 'M2', 'M1', 'G-1-12']);
    expect(order('served-by').at(-1)).toBe('G-1-12');
    expect(order('margin', madeRows('chair'), true)).toEqual(['G-1-12', 'M2', 'G-1-2', 'M1']);
    expect(order('direct-to-reverberant', madeRows(), true)).toEqual(['M1', 'M2', 'G-1-2', 'G-1-12']);
  });

  test('what is even in the first column is sorted by the next, then left in seat order', () => {
    const ids = (...by: [string, boolean][]) =>
      inOrder(
        madeRows(),
        by.map(([id, desc]) => ({ id, desc })),
      ).map((row) => row.id);
    expect(ids(['block', true], ['margin', true])).toEqual(['M1', 'M2', 'G-1-12', 'G-1-2']);
    expect(ids(['block', false])).toEqual(['G-1-2', 'G-1-12', 'M1', 'M2']);
    expect(ids()).toEqual(['M1', 'M2', 'G-1-2', 'G-1-12']);
  });

  test('numbers inside ids count as numbers', () => {
    expect(order('seat')).toEqual(['G-1-2', 'G-1-12', 'M1', 'M2']);
  });
});

test('every column has a head and filter names of its own', () => {
  const names = SEAT_COLUMNS.flatMap((one) => one.names);
  expect(new Set(names).size).toBe(names.length);
  const heads = SEAT_COLUMNS.map(fullLabel);
  expect(new Set(heads).size).toBe(heads.length);
  expect(heads).toContain('With directivity potential dB');
  expect(heads).toContain('gap ms');
});

test('a column of names is as wide as its longest name, within reason; figures keep their width', () => {
  const [block, sti] = [column('block'), column('sti')];
  const rows = madeRows().map((row, i) => ({ ...row, block: i === 1 ? 'Chair and witness' : 'M' }));
  const [blockPx, stiPx] = columnWidths([block, sti], rows);
  expect(blockPx).toBeGreaterThan(block.width);
  expect(stiPx).toBe(sti.width);
  expect(columnWidths([block], [{ ...rows[0], block: 'x'.repeat(500) }])[0]).toBeLessThan(200);
});
