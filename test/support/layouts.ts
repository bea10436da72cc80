import type { FaceInput, Faces } from '../../src/acoustics/room/faces';
import { createFaces } from '../../src/acoustics/room/faces';
import { type Outcome, sayProblem } from '../../src/layout/problem';
import { readLayout } from '../../src/layout/read';
import type { Face, Layout, Loudspeaker, Microphone, Scheme, Talker, Vec3, Venue } from '../../src/layout/schema';

/** Small layouts for tests. Each builder returns a fresh object that a test may change at will. */

/** Seven times one coefficient. */
export const flat = (value: number): number[] => [value, value, value, value, value, value, value];

/** The walls of a prism over a ground outline, corners counter-clockwise seen from inside. */
export function prism(outline: readonly [number, number][], heightM: number, finish = 'wall'): Face[] {
  const floor = outline.map(([x, y]): Vec3 => [x, y, 0]);
  const ceiling = outline.map(([x, y]): Vec3 => [x, y, heightM]).reverse();
  const walls = outline.map(([x, y], i): Face => {
    const [nx, ny] = outline[(i + 1) % outline.length];
    const corners: Vec3[] = [
      [nx, ny, 0],
      [x, y, 0],
      [x, y, heightM],
      [nx, ny, heightM],
    ];
    return { id: `wall${i + 1}`, finish, corners, sides: 1 };
  });
  return [
    { id: 'floor', finish, corners: floor, sides: 1 },
    { id: 'ceiling', finish, corners: ceiling, sides: 1 },
    ...walls,
  ];
}

/** A box with one corner at the origin. */
export const box = (x: number, y: number, z: number): Face[] =>
  prism(
    [
      [0, 0],
      [x, 0],
      [x, y],
      [0, y],
    ],
    z,
  );

/** An L: 6 × 6 m less the quarter beyond (3, 3), 3 m high. */
export const lShape = (): Face[] =>
  prism(
    [
      [0, 0],
      [6, 0],
      [6, 3],
      [3, 3],
      [3, 6],
      [0, 6],
    ],
    3,
  );

/** A free-standing upright panel along y at some x, from the floor to a height. */
export const panel = (x: number, fromY: number, toY: number, heightM: number): Face => ({
  id: `panel${x}`,
  finish: 'wall',
  sides: 2,
  corners: [
    [x, fromY, 0],
    [x, toY, 0],
    [x, toY, heightM],
    [x, fromY, heightM],
  ],
});

/** Faces as the acoustics take them, all of one absorption or one for each face. */
export const acousticFaces = (faces: readonly Face[], absorption: number | readonly number[]): Faces =>
  createFaces(
    faces.map(
      ({ corners, sides }, i): FaceInput => ({
        corners,
        sides,
        absorption: flat(typeof absorption === 'number' ? absorption : absorption[i]),
      }),
    ),
  );

export const talker = (id: string, position: Vec3, more: Partial<Talker> = {}): Talker => ({
  id,
  label: '',
  position,
  pan: 0,
  tilt: 0,
  effort: 'normal',
  model: 'talker',
  ...more,
});

export const microphone = (id: string, position: Vec3, more: Partial<Microphone> = {}): Microphone => ({
  id,
  label: '',
  position,
  pan: 180,
  tilt: 0,
  roll: 0,
  model: 'cardioid',
  open: true,
  automix: true,
  host: null,
  ...more,
});

export const loudspeaker = (id: string, position: Vec3, more: Partial<Loudspeaker> = {}): Loudspeaker => ({
  id,
  label: '',
  position,
  pan: 0,
  tilt: 0,
  roll: 0,
  model: 'point',
  gain: 0,
  delay: 0,
  host: null,
  ...more,
});

/** An 8 × 6 × 3 m room of one finish with a talker, a microphone, a loudspeaker and a block of six seats. */
export function smallLayout(): Layout {
  return {
    format: 'gainwright-layout',
    version: 1,
    name: 'Small room',
    notes: '',
    venue: {
      air: { temperature: 20, humidity: 50, pressure: 101.325 },
      finishes: [{ id: 'wall', label: 'Wall', source: 'invented', absorption: flat(0.2) }],
      faces: box(8, 6, 3),
      volume: null,
      decay: { model: 'eyring' },
      reflectionOrder: 1,
      noise: { nr: 30 },
      seating: [
        {
          id: 'A',
          label: 'Public',
          kind: 'block',
          origin: [5, 2, 0],
          facing: 180,
          rows: 2,
          columns: 3,
          rowSpacing: 0.9,
          seatSpacing: 0.6,
          rise: 0,
          radius: null,
          earHeight: 1.2,
          omit: [],
        },
      ],
      talkers: [talker('t', [1.2, 2.9, 1.4])],
      views: [],
    },
    need: { kind: 'distance', metres: 2 },
    schemes: [scheme('A')],
    models: [],
  };
}

export const scheme = (id: string, more: Partial<Scheme> = {}): Scheme => ({
  id,
  label: '',
  microphones: [microphone('m', [1.6, 2.9, 1.3])],
  loudspeakers: [loudspeaker('l', [2.6, 5.1, 2.3], { pan: -30, tilt: -15, model: 'box-small' })],
  routing: [],
  system: {
    stabilityMargin: 6,
    highPassHz: 0,
    automix: 'off',
    belowLimit: null,
    latency: 0,
    delayHold: 10,
    equaliser: flat(0),
  },
  ...more,
});

/** The small layout with some of its venue replaced. */
export const withVenue = (more: Partial<Venue>): Layout => {
  const layout = smallLayout();
  return { ...layout, venue: { ...layout.venue, ...more } };
};

/** The small layout with other schemes. */
export const withSchemes = (...schemes: Scheme[]): Layout => ({ ...smallLayout(), schemes });

/** The document of a layout after a change to its plain JSON, as the schema sees it. */
export function readChanged(change: (document: Json) => void): Outcome<Layout> {
  const document = JSON.parse(JSON.stringify(smallLayout()));
  change(document);
  return readLayout(document);
}

// biome-ignore lint/suspicious/noExplicitAny: tests reach into documents that are wrong on purpose
export type Json = any;

/** All problems as a person reads them. */
export const said = (outcome: { problems: Parameters<typeof sayProblem>[0][] }): string[] =>
  outcome.problems.map(sayProblem);
