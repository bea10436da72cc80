import * as v from 'valibot';
import { migrate } from './migrations';
import { cautionAt, errorAt, type Outcome, type Problem } from './problem';
import { LAYOUT_VERSION, type Layout, layoutSchema } from './schema';

/** More than this and the first few already tell what is wrong. */
const MOST_PROBLEMS = 20;

/**
 * A layout from a value of unknown make (parsed JSON). Older versions are migrated, newer ones refused; keys this
 * version does not know are named in a caution, because saving would leave them out.
 */
export function readLayout(value: unknown): Outcome<Layout> {
  const refused = refuseEnvelope(value);
  if (refused !== null) return { ok: false, problems: [refused] };
  const document = value as Record<string, unknown> & { version: number };
  const current = migrate(document, document.version);
  const result = v.safeParse(layoutSchema, current);
  if (!result.success) return { ok: false, problems: result.issues.slice(0, MOST_PROBLEMS).map(problemOfIssue) };
  return { ok: true, value: result.output, problems: unknownKeys(current, result.output, '') };
}

function refuseEnvelope(value: unknown): Problem | null {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    return errorAt('', `this is ${describe(value)}`, 'a layout is a JSON object', 'open a *.layout.json file');
  }
  const { format, version } = value as Record<string, unknown>;
  if (format !== 'gainwright-layout') {
    return errorAt(
      'format',
      format === undefined ? 'not given' : `found ${describe(format)}`,
      'a layout says "gainwright-layout" here',
      'open a *.layout.json file',
    );
  }
  if (typeof version !== 'number' || !Number.isInteger(version) || version < 1) {
    return errorAt(
      'version',
      version === undefined ? 'not given' : `found ${describe(version)}`,
      `a whole number from 1 to ${LAYOUT_VERSION}`,
      `put "version": ${LAYOUT_VERSION} after "format"`,
    );
  }
  if (version > LAYOUT_VERSION) {
    return errorAt(
      'version',
      `the file is of version ${version}`,
      `this program reads versions up to ${LAYOUT_VERSION}`,
      'open it with a newer program; the file was left untouched',
    );
  }
  return null;
}

function problemOfIssue(issue: v.BaseIssue<unknown>): Problem {
  const path = pathOf(issue);
  const expected = expectedOf(issue);
  // Valibot reports a missing key as an undefined input at that key, with the message of the object it belongs to.
  if (issue.input === undefined) {
    const owner = issue.message.startsWith('Invalid ') ? '' : `it belongs to ${issue.message}`;
    return errorAt(path, 'not given', owner, 'add it');
  }
  return errorAt(path, foundOf(issue), `expected ${expected}`, '');
}

function foundOf(issue: v.BaseIssue<unknown>): string {
  if (issue.type === 'min_length' && Array.isArray(issue.input)) {
    return path3(issue.requirement) ? 'fewer than three corners' : `found ${issue.input.length} entries`;
  }
  if (issue.type === 'length' && Array.isArray(issue.input)) return `found ${issue.input.length} entries`;
  return `found ${describe(issue.input)}`;
}

const path3 = (requirement: unknown): boolean => requirement === 3;

function expectedOf(issue: v.BaseIssue<unknown>): string {
  const ownMessage = !issue.message.startsWith('Invalid ');
  if (ownMessage) return issue.message;
  return (issue.expected ?? 'another value')
    .replace(/^\((.*)\)$/, '$1')
    .replace(/ \| /g, ' or ')
    .replace(/^Object$/, 'an object');
}

function pathOf(issue: v.BaseIssue<unknown>): string {
  return (issue.path ?? []).reduce((path, item) => join(path, item.key as string | number), '');
}

function join(path: string, key: string | number): string {
  if (typeof key === 'number') return `${path}[${key}]`;
  return path === '' ? key : `${path}.${key}`;
}

/** A value in a message: short, quoted where it is text. */
function describe(value: unknown): string {
  if (value === null) return 'null';
  if (Array.isArray(value)) return `a list of ${value.length}`;
  if (typeof value === 'object') return 'an object';
  if (typeof value === 'string') return value.length > 40 ? `"${value.slice(0, 40)}…"` : `"${value}"`;
  return String(value);
}

function unknownKeys(input: unknown, output: unknown, path: string): Problem[] {
  if (Array.isArray(input) && Array.isArray(output)) {
    return input.flatMap((item, i) => unknownKeys(item, output[i], join(path, i)));
  }
  if (typeof input !== 'object' || input === null || typeof output !== 'object' || output === null) return [];
  return Object.entries(input).flatMap(([key, item]) => {
    if (!Object.hasOwn(output, key)) {
      const known = nearest(key, Object.keys(output));
      const remedy = known === null ? 'it is ignored and not kept when saving' : `did you mean "${known}"?`;
      return [cautionAt(join(path, key), 'this key is not known here', '', remedy)];
    }
    return unknownKeys(item, (output as Record<string, unknown>)[key], join(path, key));
  });
}

/** The known key one slip of a finger away, if any. */
function nearest(key: string, known: readonly string[]): string | null {
  return known.find((other) => oneEditApart(key.toLowerCase(), other.toLowerCase())) ?? null;
}

function oneEditApart(a: string, b: string): boolean {
  if (Math.abs(a.length - b.length) > 1) return false;
  let start = 0;
  while (start < a.length && start < b.length && a[start] === b[start]) start++;
  const tail = (word: string, skip: number) => word.slice(start + skip);
  return tail(a, 1) === tail(b, 1) || tail(a, 0) === tail(b, 1) || tail(a, 1) === tail(b, 0);
}
