/** Where a text stops being JSON, and what would have been accepted there. */
export interface JsonFault {
  /** Index into the text; its length where the text ends too early. */
  offset: number;
  expected: string;
}

type Awaited = 'value' | 'value or ]' | 'key' | 'key or }' | ':' | ', or ]' | ', or }' | 'end';

const SAID: Record<Awaited, string> = {
  value: 'a value',
  'value or ]': 'a value or "]"',
  key: 'a key in quotes',
  'key or }': 'a key in quotes or "}"',
  ':': 'a colon after the key',
  ', or ]': 'a comma or "]"',
  ', or }': 'a comma or "}"',
  end: 'nothing after the end of the document',
};

const PLAIN = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?|true|false|null/y;
const SPACE = /[ \t\r\n]*/y;

/**
 * The first fault of a text that is not JSON (RFC 8259), null where there is none. The engines' own messages differ and
 * often give no place. Open lists and objects are kept on a stack of our own, so that depth overflows nothing.
 */
export function jsonFault(text: string): JsonFault | null {
  const open: ('[' | '{')[] = [];
  let awaited: Awaited = 'value';
  let at = 0;
  const afterValue = (): Awaited => (open.length === 0 ? 'end' : open.at(-1) === '[' ? ', or ]' : ', or }');
  for (;;) {
    at = skip(SPACE, text, at);
    const next = text[at];
    if (next === undefined) return awaited === 'end' ? null : { offset: at, expected: SAID[awaited] };
    const takesValue: boolean = awaited === 'value' || awaited === 'value or ]';
    const takesKey: boolean = awaited === 'key' || awaited === 'key or }';
    if ((next === ']' && awaited.endsWith(']')) || (next === '}' && awaited.endsWith('}'))) {
      open.pop();
      awaited = afterValue();
      at++;
    } else if (next === ',' && awaited.startsWith(',')) {
      awaited = awaited === ', or ]' ? 'value' : 'key';
      at++;
    } else if (next === ':' && awaited === ':') {
      awaited = 'value';
      at++;
    } else if (next === '"' && (takesValue || takesKey)) {
      const end = stringEnd(text, at + 1);
      if (typeof end !== 'number') return end;
      awaited = takesKey ? ':' : afterValue();
      at = end;
    } else if ((next === '[' || next === '{') && takesValue) {
      open.push(next);
      awaited = next === '[' ? 'value or ]' : 'key or }';
      at++;
    } else {
      const end = takesValue ? skip(PLAIN, text, at) : at;
      if (end === at) return { offset: at, expected: SAID[awaited] };
      awaited = afterValue();
      at = end;
    }
  }
}

function skip(pattern: RegExp, text: string, at: number): number {
  pattern.lastIndex = at;
  return pattern.test(text) ? pattern.lastIndex : at;
}

/** Index after the closing quote of the text that begins at `at`, or its fault. */
function stringEnd(text: string, at: number): number | JsonFault {
  for (let i = at; i < text.length; i++) {
    if (text[i] === '"') return i + 1;
    if (text[i] < ' ') return { offset: i, expected: 'a closing quote before the line ends' };
    if (text[i] !== '\\') continue;
    const escaped = /^(?:["\\/bfnrt]|u[0-9a-fA-F]{4})/.exec(text.slice(i + 1, i + 6));
    if (escaped === null) return { offset: i, expected: 'an escape such as \\n or \\\\' };
    i += escaped[0].length;
  }
  return { offset: text.length, expected: 'a closing quote' };
}
