import { readLayout } from '../layout/read';
import type { Layout } from '../layout/schema';

const CORNERS_PER_SIDE = 2;

/**
 * The hall every speed figure is measured in: a box of 12 faces, 24 loudspeakers, 12 microphones, one talker and the
 * number of seats asked for, in rows of 50. Made up for measuring; no venue.
 */
export function benchHall(seats: number, talkers = 1): Layout {
  const [length, width, height] = [50, 36, 12];
  const finish = (id: string, absorption: number[]) => ({ id, label: id, source: 'made up for measuring', absorption });
  const outcome = readLayout({
    format: 'gainwright-layout',
    version: 1,
    name: `Hall of ${seats} seats`,
    venue: {
      finishes: [
        finish('hard', [0.1, 0.08, 0.06, 0.06, 0.07, 0.08, 0.08]),
        finish('soft', [0.3, 0.4, 0.5, 0.6, 0.6, 0.6, 0.6]),
      ],
      faces: boxFaces(length, width, height),
      reflectionOrder: 1,
      seating: [
        {
          id: 'S',
          kind: 'block',
          origin: [10, 32, 0],
          facing: 180,
          rows: Math.ceil(seats / 50),
          columns: 50,
          rowSpacing: 38 / Math.ceil(seats / 50),
          seatSpacing: 0.55,
        },
      ],
      talkers: Array.from({ length: talkers }, (_, t) => ({ id: `t${t}`, position: [3, 14 + 2 * t, 1.6] })),
    },
    need: { kind: 'noise', signalToNoise: 25 },
    schemes: [
      {
        id: 'A',
        microphones: Array.from({ length: 12 }, (_, m) => ({
          id: `m${m}`,
          position: [3.4, 7 + 2 * m, 1.4],
          pan: 180,
          model: 'cardioid',
        })),
        loudspeakers: Array.from({ length: 24 }, (_, l) => ({
          id: `l${l}`,
          position: [4 + 7 * Math.floor(l / 4), 6 + 8 * (l % 4), 7],
          pan: 15 * (l % 4) - 22,
          tilt: -40,
          model: ['box-large', 'horn-90x60', 'column-8', 'box-small'][l % 4],
          delay: 20 * Math.floor(l / 4),
        })),
        system: { automix: 'gain-sharing', highPassHz: 125 },
      },
    ],
  });
  if (!outcome.ok) throw new Error('The hall for measuring is not a layout.');
  return outcome.value;
}

/** A box whose floor, ceiling and four walls are each in two parts. */
function boxFaces(x: number, y: number, z: number): object[] {
  const half = x / CORNERS_PER_SIDE;
  const face = (id: string, finish: string, corners: number[][]) => ({ id, finish, corners });
  const part = (from: number, to: number, name: string) => [
    face(`floor-${name}`, 'soft', [
      [from, 0, 0],
      [to, 0, 0],
      [to, y, 0],
      [from, y, 0],
    ]),
    face(`ceiling-${name}`, 'hard', [
      [from, y, z],
      [to, y, z],
      [to, 0, z],
      [from, 0, z],
    ]),
    face(`right-${name}`, 'hard', [
      [to, 0, 0],
      [from, 0, 0],
      [from, 0, z],
      [to, 0, z],
    ]),
    face(`left-${name}`, 'hard', [
      [from, y, 0],
      [to, y, 0],
      [to, y, z],
      [from, y, z],
    ]),
  ];
  const end = (at: number, from: number, to: number, name: string) => {
    const corners = [
      [at, from, 0],
      [at, to, 0],
      [at, to, z],
      [at, from, z],
    ];
    return face(name, 'hard', at === 0 ? corners : corners.reverse());
  };
  return [
    ...part(0, half, 'front'),
    ...part(half, x, 'rear'),
    end(0, 0, y / 2, 'stage-right'),
    end(0, y / 2, y, 'stage-left'),
    end(x, 0, y / 2, 'back-right'),
    end(x, y / 2, y, 'back-left'),
  ];
}
