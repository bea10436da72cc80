import { describe, expect, test } from 'vitest';
import { readLayout } from '../../src/layout/read';
import { type Json, readChanged, said, smallLayout } from '../support/layouts';

describe('a layout that cannot be read says the place, what was found and what is accepted', () => {
  test.each<[string, (document: Json) => void, string]>([
    [
      'too few corners',
      (d) => d.venue.faces[3].corners.splice(2),
      'venue.faces[3].corners: fewer than three corners; expected three or more corners, in order round the face.',
    ],
    [
      'a missing key',
      (d) => delete d.venue.faces[1].finish,
      'venue.faces[1].finish: not given; it belongs to a face: id, finish, corners, sides; add it.',
    ],
    ['a missing key of a block', (d) => delete d.venue.seating[0].rows, 'venue.seating[0].rows: not given; add it.'],
    [
      'a missing need',
      (d) => delete d.need,
      'need: not given; it belongs to a layout: an object with format, version, name, venue, need, schemes; add it.',
    ],
    ['a need of no kind', (d) => delete d.need.kind, 'need.kind: not given; add it.'],
    [
      'a need of another kind',
      (d) => {
        d.need.kind = 'level';
      },
      'need.kind: found "level"; expected "distance" or "noise".',
    ],
    [
      'a text for a number',
      (d) => {
        d.venue.talkers[0].position[2] = '1.4';
      },
      'venue.talkers[0].position[2]: found "1.4"; expected a coordinate in metres between -10000 and 10000.',
    ],
    [
      'an absorption above one',
      (d) => {
        d.venue.finishes[0].absorption[6] = 1.2;
      },
      'venue.finishes[0].absorption[6]: found 1.2; expected an absorption coefficient between 0 and 1.',
    ],
    [
      'six octaves',
      (d) => d.venue.finishes[0].absorption.pop(),
      'venue.finishes[0].absorption: found 6 entries; expected 7 absorption coefficients, one an octave from 125 Hz to 8 kHz.',
    ],
    [
      'an unknown effort',
      (d) => {
        d.venue.talkers[0].effort = 'whisper';
      },
      'venue.talkers[0].effort: found "whisper"; expected one of relaxed, normal, raised, loud, very-loud.',
    ],
    [
      'an unknown pattern',
      (d) => {
        d.models.push({ id: 'x', kind: 'microphone', pattern: { type: 'shotgun' } });
      },
      'models[0].pattern.type: found "shotgun"; expected "point" or "speech" or "first-order" or "tube" or "boundary" or ' +
        '"cap-on-sphere" or "horn" or "column" or "flush-piston" or "table".',
    ],
    [
      'a distance below the limit that is none',
      (d) => {
        d.schemes[0].system.belowLimit = 0;
      },
      'schemes[0].system.belowLimit: found 0; expected a distance below the limit in dB above 0, at most 100.',
    ],
    [
      'a size of no device',
      (d) => {
        d.models.push({ id: 'x', kind: 'microphone', pattern: { type: 'tube', length: 250 } });
      },
      'models[0].pattern.length: found 250; expected a tube length in metres between 0.001 and 3.',
    ],
    [
      'half a row',
      (d) => {
        d.venue.seating[0].rows = 2.5;
      },
      'venue.seating[0].rows: found 2.5; expected a number of rows, a whole number between 1 and 1000.',
    ],
    [
      'a reflection order beyond three',
      (d) => {
        d.venue.reflectionOrder = 4;
      },
      'venue.reflectionOrder: found 4; expected a reflection order between 0 and 3.',
    ],
    [
      'no scheme',
      (d) => {
        d.schemes = [];
      },
      'schemes: found 0 entries; expected one or more schemes.',
    ],
    [
      'noise of no known kind',
      (d) => {
        d.venue.noise = { nc: 30 };
      },
      'venue.noise: found an object; expected { "nr": number } or { "levels": [seven levels in dB] }.',
    ],
  ])('%s', (_, change, expected) => {
    expect(said(readChanged(change))).toEqual([expected]);
  });

  test('several problems are said at once', () => {
    const outcome = readChanged((d) => {
      d.need.metres = -1;
      d.schemes[0].microphones[0].open = 'yes';
    });
    expect(outcome.problems.map(({ path }) => path)).toEqual(['need.metres', 'schemes[0].microphones[0].open']);
  });
});

describe('what is no layout of a known version is refused', () => {
  test.each<[unknown, string]>([
    [null, 'this is null; a layout is a JSON object; open a *.layout.json file.'],
    [[1, 2], 'this is a list of 2; a layout is a JSON object; open a *.layout.json file.'],
    [{}, 'format: not given; a layout says "gainwright-layout" here; open a *.layout.json file.'],
    [
      { format: 'gainwright-prediction', version: 1 },
      'format: found "gainwright-prediction"; a layout says "gainwright-layout" here; open a *.layout.json file.',
    ],
    [
      { format: 'gainwright-layout' },
      'version: not given; a whole number from 1 to 1; put "version": 1 after "format".',
    ],
    [
      { format: 'gainwright-layout', version: '1' },
      'version: found "1"; a whole number from 1 to 1; put "version": 1 after "format".',
    ],
    [
      { format: 'gainwright-layout', version: 2, venue: 'whatever comes' },
      'version: the file is of version 2; this program reads versions up to 1; ' +
        'open it with a newer program; the file was left untouched.',
    ],
  ])('%j', (value, expected) => {
    const outcome = readLayout(value);
    expect(outcome.ok).toBe(false);
    expect(said(outcome)).toEqual([expected]);
  });
});

describe('keys this version does not know', () => {
  test.each<[string, (document: Json) => void, string]>([
    [
      'a slip of a finger is guessed',
      (d) => {
        d.venue.talkers[0].efort = 'loud';
      },
      'venue.talkers[0].efort: this key is not known here; did you mean "effort"?',
    ],
    [
      'a capital is guessed',
      (d) => {
        d.schemes[0].system.highpassHz = 125;
      },
      'schemes[0].system.highpassHz: this key is not known here; did you mean "highPassHz"?',
    ],
    [
      'anything else is said to be lost on saving',
      (d) => {
        d.venue.carpetColour = 'red';
      },
      'venue.carpetColour: this key is not known here; it is ignored and not kept when saving.',
    ],
  ])('%s', (_, change, expected) => {
    const outcome = readChanged(change);
    expect(outcome.ok).toBe(true);
    expect(outcome.problems.map(({ severity }) => severity)).toEqual(['caution']);
    expect(said(outcome)).toEqual([expected]);
  });
});

test('what is left out takes its default', () => {
  const outcome = readLayout({
    format: 'gainwright-layout',
    version: 1,
    venue: { finishes: [], faces: [], seating: [], talkers: [{ id: 't', position: [0, 0, 0] }] },
    need: { kind: 'noise', signalToNoise: 25 },
    schemes: [{ id: 'A', microphones: [{ id: 'm', position: [1, 0, 0], model: 'omni' }], loudspeakers: [] }],
  });
  if (!outcome.ok) throw new Error(said(outcome).join());
  const { venue, schemes, models } = outcome.value;
  expect(outcome.problems).toEqual([]);
  expect(venue).toMatchObject({
    air: { temperature: 20, humidity: 50, pressure: 101.325 },
    volume: null,
    decay: { model: 'eyring' },
    reflectionOrder: 1,
    noise: { nr: 30 },
    talkers: [{ label: '', pan: 0, tilt: 0, effort: 'normal', model: 'talker' }],
  });
  expect(schemes[0]).toEqual({
    id: 'A',
    label: '',
    microphones: [
      {
        id: 'm',
        label: '',
        position: [1, 0, 0],
        pan: 0,
        tilt: 0,
        roll: 0,
        model: 'omni',
        open: true,
        automix: true,
        host: null,
      },
    ],
    loudspeakers: [],
    routing: [],
    system: {
      stabilityMargin: 6,
      highPassHz: 0,
      automix: 'off',
      belowLimit: null,
      latency: 0,
      delayHold: 10,
      equaliser: [0, 0, 0, 0, 0, 0, 0],
    },
  });
  expect(models).toEqual([]);
});

test('two readings share no default', () => {
  const read = () => {
    const outcome = readChanged((d) => delete d.schemes[0].system);
    if (!outcome.ok) throw new Error('not read');
    return outcome.value.schemes[0].system.equaliser;
  };
  expect(read()).not.toBe(read());
});

test('a whole layout is read as it is', () => {
  const outcome = readLayout(smallLayout());
  expect(outcome).toEqual({ ok: true, value: smallLayout(), problems: [] });
});
