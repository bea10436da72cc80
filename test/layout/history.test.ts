import { expect, test } from 'vitest';
import { abandonMark, closeMark, type History, record, redo, startHistory, undo } from '../../src/layout/history';
import type { Layout } from '../../src/layout/schema';
import { smallLayout } from '../support/layouts';

const named = (name: string): Layout => ({ ...smallLayout(), name });
const names = (history: History) => [
  history.past.map(({ layout }) => layout.name).join(),
  history.layout.name,
  history.future.map(({ layout }) => layout.name).join(),
];

test('undo and redo walk the steps, and a new edit forgets what was undone', () => {
  let history = startHistory(named('a'));
  history = record(history, named('b'), 'rename');
  history = record(history, named('c'), 'rename');
  history = undo(history);
  expect(names(history)).toEqual(['a', 'b', 'c']);
  history = undo(history);
  expect(undo(history)).toBe(history);
  history = redo(redo(history));
  expect(names(history)).toEqual(['a,b', 'c', '']);
  expect(redo(history)).toBe(history);
  history = record(undo(history), named('d'), 'rename');
  expect(names(history)).toEqual(['a,b', 'd', '']);
});

test('undo carries the label of the edit it takes back, and redo too', () => {
  const history = record(record(startHistory(named('a')), named('b'), 'turn m1'), named('c'), 'move l1');
  expect(history.past.at(-1)?.label).toBe('move l1');
  expect(undo(history).future[0].label).toBe('move l1');
  expect(redo(undo(history)).past.at(-1)?.label).toBe('move l1');
});

test('edits of one mark are one step; another mark, or a closed one, starts anew', () => {
  let history = startHistory(named('a'));
  for (const name of ['b', 'c', 'd']) history = record(history, named(name), 'drag', 'drag m1');
  expect(names(history)).toEqual(['a', 'd', '']);
  history = record(history, named('e'), 'drag', 'drag m2');
  expect(names(history)).toEqual(['a,d', 'e', '']);
  history = record(closeMark(history), named('f'), 'drag', 'drag m2');
  expect(names(history)).toEqual(['a,d,e', 'f', '']);
});

test('after an undo the same mark does not join the step before', () => {
  let history = record(startHistory(named('a')), named('b'), 'drag', 'k');
  history = record(undo(history), named('c'), 'drag', 'k');
  expect(names(history)).toEqual(['a', 'c', '']);
});

test('giving up a drag returns to where it began, once', () => {
  let history = record(startHistory(named('a')), named('b'), 'rename');
  history = record(record(history, named('c'), 'drag', 'k'), named('d'), 'drag', 'k');
  history = abandonMark(history);
  expect(names(history)).toEqual(['a', 'b', '']);
  expect(abandonMark(history)).toBe(history);
});

test('an edit that changes nothing is no step', () => {
  const history = startHistory(named('a'));
  expect(record(history, history.layout, 'nothing')).toBe(history);
});

test('500 steps are kept', () => {
  let history = startHistory(named('0'));
  for (let i = 1; i <= 600; i++) history = record(history, named(String(i)), 'rename');
  expect(history.past).toHaveLength(500);
  expect(history.past[0].layout.name).toBe('100');
});
