import * as v from 'valibot';
import { errorAt, type Outcome } from '../layout/problem';
import { readLayout } from '../layout/read';
import { type Layout, layoutSchema } from '../layout/schema';
import { jsonFault } from './json-fault';

/** A layout from the text of a file. Never throws: whatever is wrong comes back with its place and remedy. */
export function parseLayout(text: string): Outcome<Layout> {
  const json = text.replace(/^\uFEFF/, '');
  let value: unknown;
  try {
    value = JSON.parse(json);
  } catch {
    return { ok: false, problems: [syntaxProblem(json)] };
  }
  return readLayout(value);
}

function syntaxProblem(json: string) {
  if (json.trim() === '') return errorAt('', 'the file is empty', 'a layout is a JSON object', 'choose another file');
  const fault = jsonFault(json) ?? { offset: json.length, expected: 'a JSON document' };
  const before = json.slice(0, fault.offset).split('\n');
  const place = `line ${before.length}, column ${(before.at(-1) ?? '').length + 1}`;
  return errorAt(place, 'not valid JSON', `expected ${fault.expected}`, 'mend it in a text editor');
}

/** Longest list of plain values written on one line. */
const LINE_WIDTH = 100;

/**
 * The text of a layout file: keys in schema order, two-space indent, lists of numbers on one line, numbers no longer
 * than they need be, a final newline.
 */
export function formatLayout(layout: Layout): string {
  // The schema lays keys in its own order, whatever order edits added them in.
  const ordered = v.safeParse(layoutSchema, layout);
  return `${write(ordered.success ? ordered.output : layout, '')}\n`;
}

function write(value: unknown, indent: string): string {
  if (typeof value === 'number') return String(tidy(value));
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  const flat = onOneLine(value);
  if (flat !== null && flat.length <= LINE_WIDTH) return flat;
  const inner = `${indent}  `;
  if (Array.isArray(value)) {
    if (value.length === 0) return '[]';
    return `[\n${value.map((item) => inner + write(item, inner)).join(',\n')}\n${indent}]`;
  }
  const entries = Object.entries(value).filter(([, item]) => item !== undefined);
  if (entries.length === 0) return '{}';
  const lines = entries.map(([key, item]) => `${inner}${JSON.stringify(key)}: ${write(item, inner)}`);
  return `{\n${lines.join(',\n')}\n${indent}}`;
}

/** A list that holds no objects as one line; null for anything else. */
function onOneLine(value: object): string | null {
  if (!Array.isArray(value)) return null;
  const items = value.map((item) => {
    if (typeof item === 'number') return String(tidy(item));
    if (Array.isArray(item)) return onOneLine(item);
    return typeof item === 'object' && item !== null ? null : JSON.stringify(item);
  });
  return items.includes(null) ? null : `[${items.join(', ')}]`;
}

/** Drops the dust of arithmetic (0.1 + 0.2 is written 0.3), never a digit a person typed. */
function tidy(value: number): number {
  const rounded = Number(value.toPrecision(14));
  return String(rounded).length + 4 <= String(value).length ? rounded : value;
}
