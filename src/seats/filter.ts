import { parseNumber } from '../report/units';
import { type FigureColumn, OWN_SEAT, SEAT_COLUMNS, type SeatColumn, type TextColumn } from './columns';
import type { SeatRow } from './rows';

/** Filter that leaves the seats that fall short. */
export const SHORT_FILTER = 'short';

/** What a filter text means: which rows it shows, or what is wrong with it. */
export type Filter = { ok: true; shows: (row: SeatRow) => boolean } | { ok: false; problem: string };

type Test = (row: SeatRow) => boolean;

/**
 * Reads a filter: comparisons ("margin < 0", "block = Gallery"), the words below, or any part of a seat's id, block or
 * talker; several, joined by "and" or commas, must all hold. An empty text shows everything. Quotes keep a value whole.
 */
export function parseFilter(text: string): Filter {
  const tests: Test[] = [];
  for (const term of termsOf(text)) {
    const test = parseTerm(term);
    if (typeof test === 'string') return { ok: false, problem: test };
    tests.push(test);
  }
  return { ok: true, shows: (row) => tests.every((test) => test(row)) };
}

const WORDS: ReadonlyMap<string, Test> = new Map([
  [SHORT_FILTER, (row) => row.short],
  ['served', (row) => row.judged && !row.short],
  [OWN_SEAT, (row) => row.own],
]);

/** What a filter may be made of, in words. */
export const KNOWN_NAMES = [
  `Columns: ${SEAT_COLUMNS.filter((column) => !column.names[0].includes(' '))
    .map((column) => column.names[0])
    .join(', ')};`,
  'potential, needed and margin also after “distance only”, “with directivity” or “in this room”.',
  `Words: ${[...WORDS.keys()].join(', ')}.`,
].join(' ');

/** Parts between "and" and commas, outside quotes; a comma between two digits is a decimal comma. */
function termsOf(text: string): string[] {
  const terms = [''];
  const piece = /"[^"]*"?|\d,\d|,|\band\b|[^",\da]+|./giy;
  for (const [part] of text.matchAll(piece)) {
    if (part === ',' || part.toLowerCase() === 'and') terms.push('');
    else terms[terms.length - 1] += part;
  }
  return terms.map((term) => term.trim()).filter((term) => term !== '');
}

/** Two-character signs first, so that <= is not taken for <. */
const COMPARISON = /^([^"<>=!≤≥≠]*)(<=|>=|!=|==|[<>=≤≥≠])(.*)$/;

function parseTerm(term: string): Test | string {
  const comparison = COMPARISON.exec(term);
  if (comparison !== null) return parseComparison(comparison[1].trim(), comparison[2], comparison[3].trim());
  const word = unquoted(term).toLowerCase();
  const known = WORDS.get(word);
  if (known !== undefined) return known;
  const column = columnNamed(word);
  if (column?.kind === 'figure') return `Compare ${word} with a number, as in “${word} < 0”.`;
  return (row) => [row.id, row.block, row.talker].some((value) => value.toLowerCase().includes(word));
}

function parseComparison(name: string, sign: string, value: string): Test | string {
  if (name === '') return `Name a column before “${sign}”, as in “margin ${sign} 0”.`;
  const column = columnNamed(name.toLowerCase());
  if (column === null) return `“${name}” is not a column.`;
  if (value === '') return `“${name} ${sign}” needs ${column.kind === 'text' ? 'a name' : 'a number'} after it.`;
  if (/^[^"]*\sor\s/i.test(value)) return '“or” is not understood: join comparisons with “and” or a comma.';
  return column.kind === 'text' ? compareText(column, name, sign, value) : compareFigure(column, name, sign, value);
}

/** The column of this name, with or without its unit. */
function columnNamed(name: string): SeatColumn | null {
  const plain = name.replace(/\s+/g, ' ');
  const called = (column: SeatColumn) =>
    column.names.some(
      (one) => one === plain || (column.unit !== '' && `${one} ${column.unit.toLowerCase()}` === plain),
    );
  return SEAT_COLUMNS.find(called) ?? null;
}

function compareText(column: TextColumn, name: string, sign: string, value: string): Test | string {
  const wanted = unquoted(value).toLowerCase();
  const same = (row: SeatRow) =>
    column.value(row).toLowerCase() === wanted || column.alias(row).toLowerCase() === wanted;
  if (sign === '=' || sign === '==') return same;
  if (sign === '!=' || sign === '≠') return (row) => !same(row);
  return `${name} is a name: compare it with = or !=.`;
}

function compareFigure(column: FigureColumn, name: string, sign: string, value: string): Test | string {
  const limit = parseNumber(value);
  if (limit === null) return `${name} is a number, “${value}” is not.`;
  // Equal means equal as far as was typed: 0.7 is what is shown as 0.7.
  const decimals = /[.,](\d*)/.exec(value)?.[1].length ?? 0;
  const tolerance = 0.5 * 10 ** -decimals + 1e-9;
  const holds: Record<string, (figure: number) => boolean> = {
    '<': (figure) => figure < limit,
    '>': (figure) => figure > limit,
    '<=': (figure) => figure <= limit,
    '≤': (figure) => figure <= limit,
    '>=': (figure) => figure >= limit,
    '≥': (figure) => figure >= limit,
    '=': (figure) => Math.abs(figure - limit) <= tolerance,
    '==': (figure) => Math.abs(figure - limit) <= tolerance,
    '!=': (figure) => Math.abs(figure - limit) > tolerance,
    '≠': (figure) => Math.abs(figure - limit) > tolerance,
  };
  const test = holds[sign];
  return (row) => {
    const figure = column.value(row);
    if (!Number.isNaN(figure)) return test(figure);
    return column.margin && row.judged && test(Number.NEGATIVE_INFINITY);
  };
}

const unquoted = (value: string): string => value.replace(/^"([^"]*)"?$/, '$1').trim();
