import fc from 'fast-check';
import { expect, test } from 'vitest';
import { jsonFault } from '../../src/formats/json-fault';

test.each([
  ['{"a": "x\ny"}', 8, 'a closing quote before the line ends'],
  ['["\\q"]', 2, 'an escape such as \\n or \\\\'],
  ['["\\u12G4"]', 2, 'an escape such as \\n or \\\\'],
  ['["abc', 5, 'a closing quote'],
  ['[1, 01]', 5, 'a comma or "]"'],
  ['[1.]', 2, 'a comma or "]"'],
  ['[1,]', 3, 'a value'],
  ['[}', 1, 'a value or "]"'],
  ['{]', 1, 'a key in quotes or "}"'],
  ['tru', 0, 'a value'],
  ['', 0, 'a value'],
])('%j fails at %d', (text, offset, expected) => {
  expect(jsonFault(text)).toEqual({ offset, expected });
});

test('depth overflows nothing', () => {
  expect(jsonFault('['.repeat(200_000))?.offset).toBe(200_000);
});

test('finds a fault just where the engine refuses, and none where it does not (seed 11)', () => {
  const accepts = (text: string): boolean => {
    try {
      JSON.parse(text);
      return true;
    } catch {
      return false;
    }
  };
  const bit = fc.constantFrom(
    '{',
    '}',
    '[',
    ']',
    ',',
    ':',
    '"',
    '"a"',
    '1',
    '-',
    '.5',
    'e3',
    'null',
    'tru',
    ' ',
    '\n',
    '\\',
    '\\n',
  );
  fc.assert(
    fc.property(
      fc.oneof(
        fc.json(),
        fc.array(bit, { maxLength: 8 }).map((bits) => bits.join('')),
      ),
      (text) => {
        expect(jsonFault(text) === null).toBe(accepts(text));
      },
    ),
    { seed: 11, numRuns: 2000 },
  );
});
