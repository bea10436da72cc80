import { describe, expect, test } from 'vitest';
import { KNOWN_NAMES, parseFilter, SHORT_FILTER } from '../../src/seats/filter';
import { madeRows } from './made-rows';

function shownBy(text: string, rows = madeRows()): string[] {
  const filter = parseFilter(text);
  if (!filter.ok) throw new Error(filter.problem);
  return rows.filter(filter.shows).map((row) => row.id);
}

describe('a filter shows', () => {
  test.each([
    ['', ['M1', 'M2', 'G-1-2', 'G-1-12']],
    ['  , and ,', ['M1', 'M2', 'G-1-2', 'G-1-12']],
    ['margin < 0', ['M2', 'G-1-2']],
    ['Margin<0', ['M2', 'G-1-2']],
    ['margin dB < 0 dB', ['M2', 'G-1-2']],
    ['margin >= 0', ['M1', 'G-1-12']],
    ['margin ≥ 0', ['M1', 'G-1-12']],
    ['margin < −0.03', ['M2', 'G-1-2']],
    ['in this room margin < 0', ['M2', 'G-1-2']],
    ['distance only margin > -1.9', ['M1']],
    ['with  directivity potential = 11', ['M1', 'M2', 'G-1-12']],
    ['with directivity potential = 11.2', ['M1']],
    ['potential > 10', ['M1']],
    ['needed = 10', ['M1', 'M2', 'G-1-2', 'G-1-12']],
    ['sti >= 0.6', ['M2', 'G-1-2', 'G-1-12']],
    ['sti >= 0,65', ['G-1-2', 'G-1-12']],
    ['sti = 0.70', ['G-1-12']],
    ['sti != 0.70', ['M1', 'M2', 'G-1-2']],
    ['gap > 20', ['M2', 'G-1-2']],
    ['gap > 20 ms', ['M2', 'G-1-2']],
    ['arrival gap < 1000', ['M1', 'M2', 'G-1-2']],
    ['s/n > 21', ['G-1-2', 'G-1-12']],
    ['d/r < -5.5', ['M2', 'G-1-2']],
    ['dba = 65.0', ['M1']],
    ['block = Members', ['M1', 'M2']],
    ['block = m', ['M1', 'M2']],
    ['block != members', ['G-1-2', 'G-1-12']],
    ['talker = the chair', ['M2', 'G-1-2']],
    ['talker = chair', ['M2', 'G-1-2']],
    ['by = c2', ['M2', 'G-1-2']],
    ['seat = g-1-2', ['G-1-2']],
    ['by = c2 and gap > 25', ['G-1-2']],
    ['by = c2, gap > 25', ['G-1-2']],
    ['by = c2 AND gap > 25,margin<0', ['G-1-2']],
    ['g-1', ['G-1-2', 'G-1-12']],
    ['g-1 and served', ['G-1-12']],
    ['chair', ['M2', 'G-1-2']],
    ['"The Chair"', ['M2', 'G-1-2']],
    [SHORT_FILTER, ['M2', 'G-1-2']],
    ['served', ['M1', 'G-1-12']],
    ['nothing like it', []],
  ])('%s', (text, ids) => {
    expect(shownBy(text)).toEqual(ids);
  });

  test('own seats are not judged by a margin, but by their figures', () => {
    const rows = madeRows('chair');
    expect(shownBy('margin < 0', rows)).toEqual(['M2', 'G-1-2']);
    expect(shownBy('in this room margin < -1', rows)).toEqual(['M1', 'G-1-2']);
    expect(shownBy('own seat', rows)).toEqual(['M1']);
    expect(shownBy('short', rows)).toEqual(['M2', 'G-1-2']);
    expect(shownBy('served', rows)).toEqual(['G-1-12']);
  });

  test('quotes keep a value whole that has joining words or signs in it', () => {
    const rows = madeRows().map((row, i) => ({ ...row, block: i === 0 ? 'North, east and <west>' : row.block }));
    expect(shownBy('block = "North, east and <west>"', rows)).toEqual(['M1']);
    expect(shownBy('"east and <"', rows)).toEqual(['M1']);
  });

  test('"and" inside a word joins nothing', () => {
    const rows = madeRows().map((row, i) => ({ ...row, block: i === 2 ? 'Grandstand' : row.block }));
    expect(shownBy('block = grandstand', rows)).toEqual(['G-1-2']);
  });
});

describe('a wrong filter says what is wrong', () => {
  test.each([
    ['marign < 0', '“marign” is not a column.'],
    ['margin <', '“margin <” needs a number after it.'],
    ['block =', '“block =” needs a name after it.'],
    ['< 0', 'Name a column before “<”, as in “margin < 0”.'],
    ['margin < low', 'margin is a number, “low” is not.'],
    ['margin', 'Compare margin with a number, as in “margin < 0”.'],
    ['block > Members', 'block is a name: compare it with = or !=.'],
    ['margin < 0 or sti < 0.5', '“or” is not understood: join comparisons with “and” or a comma.'],
    ['block = M, marign < 0', '“marign” is not a column.'],
  ])('%s', (text, problem) => {
    expect(parseFilter(text)).toEqual({ ok: false, problem });
  });

  test('the names it lists are names it knows', () => {
    for (const name of ['sti', 's/n', 'gap', 'by', 'block', 'margin', 'potential', 'short', 'own seat']) {
      expect(KNOWN_NAMES).toContain(name);
    }
    const listed = /Columns: ([^;]*);/.exec(KNOWN_NAMES)?.[1].split(', ') ?? [];
    expect(listed.length).toBeGreaterThan(8);
    for (const name of listed) expect(parseFilter(`${name} = 1`)).toMatchObject({ ok: true });
  });
});
