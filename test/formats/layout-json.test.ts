import { describe, expect, test } from 'vitest';
import { formatLayout, parseLayout } from '../../src/formats/layout-json';
import { editTalker } from '../../src/layout/edits';
import type { Layout } from '../../src/layout/schema';
import { projectText } from '../support/files';
import { said, smallLayout } from '../support/layouts';

function parsed(text: string): Layout {
  const outcome = parseLayout(text);
  if (!outcome.ok) throw new Error(said(outcome).join('\n'));
  return outcome.value;
}

const FILES = [
  'data/reference/examples/one-line.layout.json',
  'data/reference/examples/committee.layout.json',
  'data/layouts/council-chamber.layout.json',
  'data/layouts/meeting-room.layout.json',
  'data/layouts/recital-hall.layout.json',
];

test.each(FILES)('%s comes back the same from a round trip, and its text is stable', (path) => {
  const layout = parsed(projectText(path));
  const text = formatLayout(layout);
  expect(parsed(text)).toEqual(layout);
  expect(formatLayout(parsed(text))).toBe(text);
  expect(text.endsWith('}\n')).toBe(true);
});

test('keys stand in the order of the schema, however an edit added them', () => {
  const edited = editTalker(smallLayout(), 't', (talker) => {
    talker.level = 63;
  });
  const text = formatLayout(edited);
  expect(text).toContain('"effort": "normal",\n        "level": 63,\n        "model": "talker"');
  expect(formatLayout(parsed(text))).toBe(text);
});

describe('numbers', () => {
  const written = (value: number): string => {
    const layout = smallLayout();
    layout.venue.talkers[0].position[0] = value;
    return /"position": \[([^,]+),/.exec(formatLayout(layout))?.[1] ?? '';
  };

  test.each([
    [0.1 + 0.2, '0.3'],
    [1.1 * 3, '3.3'],
    [7, '7'],
    [-0.35, '-0.35'],
    [(Math.sqrt(3) - 1) / 2, '0.3660254037844386'],
    [1 / 3, '0.3333333333333333'],
    [1e-7, '1e-7'],
  ])('%d is written %s', (value, text) => {
    expect(written(value)).toBe(text);
  });

  test('lists of numbers stand on one line, two spaces a level', () => {
    expect(formatLayout(smallLayout())).toContain('\n      "absorption": [0.2, 0.2, 0.2, 0.2, 0.2, 0.2, 0.2]\n'.trim());
    expect(formatLayout(smallLayout())).toContain('\n  "need": {\n    "kind": "distance",\n    "metres": 2\n  },\n');
  });
});

describe('text that is not JSON', () => {
  test.each([
    ['', 'the file is empty; a layout is a JSON object; choose another file.'],
    [' \n ', 'the file is empty; a layout is a JSON object; choose another file.'],
    ['{"a": x}', 'line 1, column 7: not valid JSON; expected a value; mend it in a text editor.'],
    ['{\n  "a": 1,\n}', 'line 3, column 1: not valid JSON; expected a key in quotes; mend it in a text editor.'],
    [
      '{\n  "a": 1\n  "b": 2\n}',
      'line 3, column 3: not valid JSON; expected a comma or "}"; mend it in a text editor.',
    ],
    ['{"a": [1, 2', 'line 1, column 12: not valid JSON; expected a comma or "]"; mend it in a text editor.'],
    ['\uFEFF{"a" 1}', 'line 1, column 6: not valid JSON; expected a colon after the key; mend it in a text editor.'],
    [
      '{}\n{}',
      'line 2, column 1: not valid JSON; expected nothing after the end of the document; mend it in a text editor.',
    ],
  ])('%j', (text, expected) => {
    expect(said(parseLayout(text))).toEqual([expected]);
  });

  test('a byte order mark is no fault', () => {
    expect(parsed(`\uFEFF${formatLayout(smallLayout())}`)).toEqual(smallLayout());
  });
});
