import * as v from 'valibot';
import { BAND_COUNT } from '../acoustics/bands';
import type { PatternSpec } from '../acoustics/directivity/pattern';

/**
 * The layout document, defined once: this schema validates files, types the program and makes the messages.
 * The order of keys here is the order in which files are written. Messages say what would be accepted.
 */

/** Version this program writes. A step in `migrations.ts` leads from each earlier one. */
export const LAYOUT_VERSION = 1;

const between = (least: number, most: number, what: string) => {
  const message = `${what} between ${least} and ${most}`;
  return v.pipe(v.number(message), v.minValue(least, message), v.maxValue(most, message));
};
const positive = (most: number, what: string) => {
  const message = `${what} above 0, at most ${most}`;
  return v.pipe(v.number(message), v.gtValue(0, message), v.maxValue(most, message));
};
const whole = (least: number, most: number, what: string) =>
  v.pipe(between(least, most, what), v.integer(`${what}, a whole number between ${least} and ${most}`));
const seven = <T extends v.GenericSchema<unknown>>(item: T, what: string) =>
  v.pipe(
    v.array(item, `a list of ${BAND_COUNT} ${what}`),
    v.length(BAND_COUNT, `${BAND_COUNT} ${what}, one an octave from 125 Hz to 8 kHz`),
  );
const text = v.string('a text in quotes');
const id = v.pipe(text, v.minLength(1, 'an id of at least one character'));
const label = v.optional(text, '');
const degrees = v.optional(between(-3600, 3600, 'an angle in degrees'), 0);
const coordinate = between(-10000, 10000, 'a coordinate in metres');
const point = v.tuple([coordinate, coordinate, coordinate], 'three coordinates in metres: [x, y, z]');
const gainDb = between(-200, 100, 'a gain in dB');
const milliseconds = between(0, 10000, 'a time in milliseconds');
const absorption = between(0, 1, 'an absorption coefficient');

const air = v.object(
  {
    temperature: v.optional(between(-50, 60, 'a temperature in °C'), 20),
    humidity: v.optional(between(0, 100, 'a relative humidity in %'), 50),
    pressure: v.optional(between(10, 200, 'a pressure in kPa'), 101.325),
  },
  'an object with temperature, humidity and pressure',
);

const finish = v.object(
  { id, label, source: v.optional(text, ''), absorption: seven(absorption, 'absorption coefficients') },
  'a finish: id, label, source, absorption',
);

const face = v.object(
  {
    id,
    finish: id,
    corners: v.pipe(
      v.array(point, 'a list of corners'),
      v.minLength(3, 'three or more corners, in order round the face'),
      v.maxLength(1000, 'at most 1000 corners'),
    ),
    sides: v.optional(v.picklist([1, 2], '1 (part of the shell) or 2 (free-standing)'), 1),
  },
  'a face: id, finish, corners, sides',
);

const decay = v.variant('model', [
  v.object({ model: v.literal('eyring') }),
  v.object({ model: v.literal('sabine') }),
  v.object({ model: v.literal('given'), seconds: seven(positive(100, 'a decay time in seconds'), 'decay times') }),
]);

const noise = v.union(
  [
    v.object({ nr: between(-20, 130, 'a noise rating') }),
    v.object({ levels: seven(between(-100, 200, 'a level in dB'), 'noise levels') }),
  ],
  '{ "nr": number } or { "levels": [seven levels in dB] }',
);

const earHeight = between(0, 10, 'an ear height in metres');

const block = v.object({
  id,
  label,
  kind: v.literal('block'),
  origin: point,
  facing: degrees,
  rows: whole(1, 1000, 'a number of rows'),
  columns: whole(1, 1000, 'a number of columns'),
  rowSpacing: positive(100, 'a row spacing in metres'),
  seatSpacing: positive(100, 'a seat spacing in metres'),
  rise: v.optional(between(-10, 10, 'a rise from row to row in metres'), 0),
  radius: v.optional(v.nullable(positive(10000, 'a radius in metres')), null),
  earHeight: v.optional(earHeight, 1.2),
  omit: v.optional(v.array(id, 'a list of seat ids'), () => []),
});

const seatList = v.object({
  id,
  label,
  kind: v.literal('list'),
  earHeight: v.optional(earHeight, 1.2),
  seats: v.array(
    v.object({ id, position: point, earHeight: v.exactOptional(earHeight) }, 'a seat: id, position'),
    'a list of seats',
  ),
});

const talker = v.object(
  {
    id,
    label,
    position: point,
    pan: degrees,
    tilt: degrees,
    effort: v.optional(
      v.picklist(
        ['relaxed', 'normal', 'raised', 'loud', 'very-loud'],
        'one of relaxed, normal, raised, loud, very-loud',
      ),
      'normal',
    ),
    level: v.exactOptional(v.nullable(between(0, 150, 'a level in dBA at 1 m'))),
    model: v.optional(id, 'talker'),
  },
  'a talker: id, label, position, pan, tilt, effort, model',
);

const savedView = v.object({ id, label, eye: point, target: point }, 'a view: id, label, eye, target');

const venue = v.object(
  {
    air: v.optional(air, () => ({ temperature: 20, humidity: 50, pressure: 101.325 })),
    finishes: v.array(finish, 'a list of finishes'),
    faces: v.array(face, 'a list of faces'),
    volume: v.optional(v.nullable(positive(1e7, 'a volume in m³')), null),
    decay: v.optional(decay, () => ({ model: 'eyring' as const })),
    reflectionOrder: v.optional(whole(0, 3, 'a reflection order'), 1),
    noise: v.optional(noise, () => ({ nr: 30 })),
    seating: v.array(v.variant('kind', [block, seatList]), 'a list of seating blocks'),
    talkers: v.array(talker, 'a list of talkers'),
    views: v.optional(v.array(savedView, 'a list of views'), () => []),
  },
  'the venue: an object',
);

const need = v.variant('kind', [
  v.object({ kind: v.literal('distance'), metres: positive(1000, 'an equivalent acoustic distance in metres') }),
  v.object({ kind: v.literal('noise'), signalToNoise: between(-50, 100, 'a signal-to-noise ratio in dB') }),
]);

const device = { id, label, position: point, pan: degrees, tilt: degrees, roll: degrees, model: id };
const host = v.optional(v.nullable(id), null);

const microphone = v.object(
  {
    ...device,
    open: v.optional(v.boolean('true or false'), true),
    automix: v.optional(v.boolean('true or false'), true),
    host,
  },
  'a microphone: id, position, pan, tilt, model, open, automix',
);

const loudspeaker = v.object(
  { ...device, gain: v.optional(gainDb, 0), delay: v.optional(milliseconds, 0), host },
  'a loudspeaker: id, position, pan, tilt, model, gain, delay',
);

const send = v.object(
  { microphone: id, loudspeaker: id, gain: v.nullable(gainDb) },
  'a routing pair: microphone, loudspeaker, gain in dB or null for not sent',
);

const system = v.object(
  {
    stabilityMargin: v.optional(between(0, 60, 'a stability margin in dB'), 6),
    highPassHz: v.optional(between(0, 5000, 'a frequency in Hz, 0 for none,'), 0),
    automix: v.optional(v.picklist(['off', 'gain-sharing'], '"off" or "gain-sharing"'), 'off'),
    belowLimit: v.optional(v.nullable(positive(100, 'a distance below the limit in dB')), null),
    latency: v.optional(milliseconds, 0),
    delayHold: v.optional(milliseconds, 10),
    equaliser: v.optional(seven(gainDb, 'gains in dB'), () => [0, 0, 0, 0, 0, 0, 0]),
  },
  'the system settings: an object',
);

const scheme = v.object(
  {
    id,
    label,
    notes: v.exactOptional(text),
    microphones: v.array(microphone, 'a list of microphones'),
    loudspeakers: v.array(loudspeaker, 'a list of loudspeakers'),
    routing: v.optional(v.array(send, 'a list of routing pairs'), () => []),
    system: v.optional(system, () => v.getDefaults(system) as v.InferOutput<typeof system>),
  },
  'a scheme: id, label, microphones, loudspeakers, routing, system',
);

/** Anything larger or smaller is a slip of the unit: patterns would take minutes, or be lost in rounding. */
const size = (what: string) => between(0.001, 3, `${what} in metres`);
const angle = positive(360, 'an angle in degrees');
const alpha = between(0, 1, 'a pattern coefficient');

const pattern = v.variant('type', [
  v.object({ type: v.literal('point') }),
  v.object({ type: v.literal('speech') }),
  v.object({
    type: v.literal('first-order'),
    alpha: v.union([alpha, seven(alpha, 'pattern coefficients')], 'a pattern coefficient between 0 and 1, or seven'),
  }),
  v.object({ type: v.literal('tube'), length: size('a tube length') }),
  v.object({ type: v.literal('boundary') }),
  v.object({ type: v.literal('cap-on-sphere'), sphere: size('a sphere diameter'), cap: size('a cap diameter') }),
  v.object({
    type: v.literal('horn'),
    horizontal: angle,
    vertical: angle,
    mouthWidth: size('a mouth width'),
    mouthHeight: size('a mouth height'),
  }),
  v.object({
    type: v.literal('column'),
    drivers: whole(1, 200, 'a number of drivers'),
    spacing: size('a driver spacing'),
    steer: v.optional(between(-89, 89, 'a steering angle in degrees'), 0),
    sphere: size('a sphere diameter'),
    cap: size('a cap diameter'),
  }),
  v.object({ type: v.literal('flush-piston'), diameter: size('a piston diameter') }),
  v.object({
    type: v.literal('table'),
    theta: v.pipe(v.array(between(0, 180, 'an off-axis angle in degrees')), v.minLength(1, 'one or more angles')),
    phi: v.pipe(v.array(between(-360, 360, 'a clock angle in degrees')), v.minLength(1, 'one or more angles')),
    levels: seven(
      v.array(v.array(between(-200, 60, 'a level in dB'), 'a row of levels'), 'rows of levels, one an off-axis angle'),
      'tables of levels [theta][phi]',
    ),
    planes: v.exactOptional(v.boolean('true or false')),
  }),
]);

const model = v.object(
  {
    id,
    label,
    kind: v.picklist(['microphone', 'loudspeaker', 'talker'], 'one of microphone, loudspeaker, talker'),
    pattern,
    sensitivity: v.exactOptional(between(0, 200, 'a sensitivity in dB at 1 m for 1 W')),
    maximum: v.exactOptional(between(0, 250, 'a maximum level in dB at 1 m')),
    source: v.exactOptional(text),
  },
  'a device model: id, label, kind, pattern',
);

export const layoutSchema = v.object(
  {
    format: v.literal('gainwright-layout', '"gainwright-layout"'),
    version: v.literal(LAYOUT_VERSION, `version ${LAYOUT_VERSION}`),
    name: v.optional(text, 'Untitled'),
    notes: v.optional(text, ''),
    venue,
    need,
    schemes: v.pipe(v.array(scheme, 'a list of schemes'), v.minLength(1, 'one or more schemes')),
    models: v.optional(v.array(model, 'a list of device models'), () => []),
  },
  'a layout: an object with format, version, name, venue, need, schemes',
);

export const modelListSchema = v.array(model);
export const finishListSchema = v.array(finish);

export type Layout = v.InferOutput<typeof layoutSchema>;
export type Venue = Layout['venue'];
export type Finish = Venue['finishes'][number];
export type Face = Venue['faces'][number];
export type Seating = Venue['seating'][number];
export type SeatBlock = Extract<Seating, { kind: 'block' }>;
export type SeatList = Extract<Seating, { kind: 'list' }>;
export type Talker = Venue['talkers'][number];
export type SavedView = Venue['views'][number];
export type Need = Layout['need'];
export type Scheme = Layout['schemes'][number];
export type Microphone = Scheme['microphones'][number];
export type Loudspeaker = Scheme['loudspeakers'][number];
export type Send = Scheme['routing'][number];
export type System = Scheme['system'];
export type DeviceModel = Layout['models'][number];
export type DeviceKind = DeviceModel['kind'];
export type Vec3 = [number, number, number];

/** The schema's patterns are those the acoustics know: a compile error here means the two have drifted apart. */
export const patternOf = (deviceModel: DeviceModel): PatternSpec => deviceModel.pattern;
