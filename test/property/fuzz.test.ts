import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { formatLayout, parseLayout } from '../../src/formats/layout-json';
import { sayProblem } from '../../src/layout/problem';
import { readLayout } from '../../src/layout/read';
import { predictionJson } from '../../src/predict/prediction-json';
import { answer } from '../../src/predict/request';
import { predictionText } from '../../src/report/prediction-text';
import { seatsCsv } from '../../src/report/seats-csv';
import { projectText } from '../support/files';
import { type Json, scheme, smallLayout } from '../support/layouts';

/** A layout with one of everything, so that every part of the schema can be damaged. */
function fullDocument(): Json {
  const layout = smallLayout();
  layout.schemes.push(scheme('B', { routing: [{ microphone: 'm', loudspeaker: 'l', gain: -3 }] }));
  layout.venue.decay = { model: 'given', seconds: [1, 1, 1, 1, 1, 1, 1] };
  layout.venue.seating.push({
    id: 'L',
    label: '',
    kind: 'list',
    earHeight: 1.2,
    seats: [{ id: 'L1', position: [3, 2, 0] }],
  });
  layout.models.push(
    { id: 'own', label: '', kind: 'microphone', pattern: { type: 'tube', length: 0.2 } },
    {
      id: 'table',
      label: '',
      kind: 'loudspeaker',
      pattern: { type: 'table', theta: [0, 180], phi: [0], levels: Array.from({ length: 7 }, () => [[0], [-12]]) },
      maximum: 110,
    },
  );
  layout.schemes[1].microphones[0].model = 'own';
  layout.schemes[1].loudspeakers[0].model = 'table';
  return JSON.parse(JSON.stringify(layout));
}

/** Values that fit nowhere, or only just. */
const odd = fc.constantFrom<unknown>(
  null,
  true,
  '',
  'not a number',
  '1e999',
  '<script>',
  '__proto__',
  [],
  {},
  [[]],
  0,
  -1,
  -0,
  0.5,
  1e-12,
  1e308,
  -1e308,
  3,
  181,
  1000,
  2 ** 53,
);

type Damage = { at: number; how: 'delete' | 'replace' | 'repeat' | 'rename' | 'scale'; value: unknown };
const damage: fc.Arbitrary<Damage> = fc.record({
  at: fc.nat(100_000),
  how: fc.constantFrom('delete', 'replace', 'repeat', 'rename', 'scale'),
  value: odd,
});

function applyDamage(document: Json, { at, how, value }: Damage): void {
  const places: [holder: Json, key: string][] = [];
  const walk = (holder: Json) => {
    for (const key of Object.keys(holder)) {
      places.push([holder, key]);
      if (typeof holder[key] === 'object' && holder[key] !== null) walk(holder[key]);
    }
  };
  walk(document);
  if (places.length === 0) return;
  const [holder, key] = places[at % places.length];
  const item = holder[key];
  if (how === 'delete' && Array.isArray(holder)) holder.splice(Number(key), 1);
  else if (how === 'delete') delete holder[key];
  else if (how === 'rename' && !Array.isArray(holder)) {
    holder[`${key}s`] = item;
    delete holder[key];
  } else if (how === 'repeat' && Array.isArray(item)) holder[key] = Array.from({ length: 50 }, () => item).flat();
  else if (how === 'scale' && typeof item === 'number') holder[key] = item * (typeof value === 'number' ? value : 1000);
  else holder[key] = value;
}

/** What a person gets for a text: messages with a place, or a prediction in every form. Nothing may throw. */
function openAndPredict(source: string): 'refused' | 'predicted' {
  const outcome = parseLayout(source);
  const messages = outcome.problems.filter(({ severity }) => severity === 'error');
  if (!outcome.ok) {
    expect(messages.length).toBeGreaterThan(0);
    for (const problem of messages) expect(sayProblem(problem).length).toBeGreaterThan(5);
    return 'refused';
  }
  const layout = outcome.value;
  const { problems, prediction } = answer({ revision: 1, layout, schemeIds: layout.schemes.map(({ id }) => id) });
  const errors = problems.filter(({ severity }) => severity === 'error');
  expect(prediction === null).toBe(errors.length > 0);
  if (prediction === null) {
    for (const { path, found } of errors) expect(path === '' || found === '', `${path} ${found}`).toBe(false);
    return 'refused';
  }
  // JSON has no word for NaN; the forms for people must not have one either.
  JSON.stringify(predictionJson(layout, prediction));
  for (const form of [predictionText(layout, prediction, problems), seatsCsv(layout, prediction)]) {
    expect(/NaN|Infinity|undefined/.exec(form)?.[0]).toBeUndefined();
  }
  const text = formatLayout(layout);
  const again = parseLayout(text);
  expect(again.ok && formatLayout(again.value) === text && again.problems.length === 0).toBe(true);
  return 'predicted';
}

describe('damaged layouts are refused with a place or predicted, never thrown at', { timeout: 60_000 }, () => {
  test('one to three damages of any kind (seed 61)', () => {
    const tally = { refused: 0, predicted: 0 };
    fc.assert(
      fc.property(fc.array(damage, { minLength: 1, maxLength: 3 }), (damages) => {
        const document = fullDocument();
        for (const one of damages) applyDamage(document, one);
        tally[openAndPredict(JSON.stringify(document))]++;
      }),
      { seed: 61, numRuns: 150 },
    );
    // Both ways out must have been taken, or the damage proves nothing.
    expect(Math.min(tally.refused, tally.predicted)).toBeGreaterThan(15);
  });

  test('a number of any size in the place of a number (seed 62)', () => {
    fc.assert(
      fc.property(
        fc.nat(100_000),
        fc.oneof(fc.double({ noNaN: true }), fc.double({ min: -20, max: 20, noNaN: true })),
        (at, value) => {
          const document = fullDocument();
          const places: [Json, string][] = [];
          const walk = (holder: Json) => {
            for (const key of Object.keys(holder)) {
              if (typeof holder[key] === 'number') places.push([holder, key]);
              else if (typeof holder[key] === 'object' && holder[key] !== null) walk(holder[key]);
            }
          };
          walk(document);
          const [holder, key] = places[at % places.length];
          holder[key] = value;
          openAndPredict(JSON.stringify(document));
        },
      ),
      { seed: 62, numRuns: 100 },
    );
  });

  test('numbers beyond what a computer holds are refused with their place', () => {
    const outcome = parseLayout(formatLayout(smallLayout()).replace('"humidity": 50', '"humidity": 1e999'));
    expect(outcome.problems.map(({ path }) => path)).toEqual(['venue.air.humidity']);
  });

  test('text cut off or with a few characters changed (seed 63)', () => {
    const text = projectText('data/reference/examples/one-line.layout.json');
    fc.assert(
      fc.property(
        fc.nat(text.length),
        fc.nat(text.length),
        fc.constantFrom('', '"', '}', ',', '1', '\u0000', '\\'),
        (cut, at, bit) => {
          openAndPredict(text.slice(0, cut));
          openAndPredict(text.slice(0, at) + bit + text.slice(at + 1));
        },
      ),
      { seed: 63, numRuns: 60 },
    );
  });

  test('any JSON at all (seed 64)', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        expect(readLayout(value).ok).toBe(false);
        expect(readLayout({ ...smallLayout(), venue: value }).ok).toBe(false);
      }),
      { seed: 64, numRuns: 100 },
    );
  });

  test('the largest layouts allowed are refused or answered within seconds', () => {
    const document = fullDocument();
    Object.assign(document.venue.seating[0], { rows: 1000, columns: 1000 });
    document.venue.reflectionOrder = 3;
    const started = performance.now();
    expect(openAndPredict(JSON.stringify(document))).toBe('refused');
    expect(performance.now() - started).toBeLessThan(5000);
  });
});
