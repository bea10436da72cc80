import { frameOf } from '../layout/aim';
import type { DeviceModel, Vec3 } from '../layout/schema';
import type { Pointing } from './aim';

/** A device to draw: flat outlines filled with a tone of the sheet, and its edges as pairs of ends. In room coordinates. */
export interface DeviceShape {
  surfaces: { outline: Vec3[]; tone: 'raised' | 'well' | 'ink' }[];
  edges: Vec3[];
}

type Local = [number, number, number];
type Surface = { outline: Local[]; tone: DeviceShape['surfaces'][number]['tone'] };
interface Part {
  surfaces: Surface[];
  edges: [Local, Local][];
}

/** A loudspeaker to the size its pattern tells, its reference point in the middle of its front. */
export function loudspeakerShape(device: Pointing, pattern: DeviceModel['pattern'] | undefined): DeviceShape {
  return placed(device, loudspeakerPart(pattern));
}

function loudspeakerPart(pattern: DeviceModel['pattern'] | undefined): Part {
  switch (pattern?.type) {
    case 'flush-piston':
      return can(pattern.diameter / 2, 0.1);
    case 'horn':
      return horn(pattern.mouthWidth, pattern.mouthHeight);
    case 'column':
      return joined(
        box(pattern.sphere * 0.9, pattern.drivers * pattern.spacing + 0.06, pattern.sphere),
        ...Array.from({ length: Math.min(24, pattern.drivers) }, (_, i) =>
          cone(pattern.cap / 2, (i - (pattern.drivers - 1) / 2) * pattern.spacing),
        ),
      );
    case 'cap-on-sphere':
      // A box of about the volume of the sphere it is modelled as.
      return joined(
        box(pattern.sphere * 0.72, pattern.sphere * 1.08, pattern.sphere * 0.68),
        cone(pattern.cap / 2, -pattern.sphere * 0.12),
      );
    default:
      return joined(box(0.16, 0.16, 0.16), cone(0.06, 0));
  }
}

/** A ceiling unit, its rim a little wider than its cone. */
function can(radius: number, depth: number): Part {
  const rim = circle(radius + 0.04, 0, 24);
  const top = circle(radius + 0.04, -depth, 24);
  const inner = circle(radius, 0.005, 24);
  return {
    surfaces: [
      ...rim.map((point, i): Surface => {
        const next = (i + 1) % rim.length;
        return { outline: [point, rim[next], top[next], top[i]], tone: 'raised' };
      }),
      { outline: top, tone: 'raised' },
      { outline: rim, tone: 'raised' },
      { outline: inner, tone: 'well' },
    ],
    edges: [...loop(rim), ...loop(top), ...loop(inner), ...[0, 6, 12, 18].map((i): [Local, Local] => [rim[i], top[i]])],
  };
}

/** A flare from its throat to its mouth, with the driver behind. */
function horn(width: number, height: number): Part {
  const depth = 0.75 * Math.max(width, height);
  const mouth = rectangle(width, height, 0);
  const throat = rectangle(width * 0.28, height * 0.28, -depth);
  const driver = shifted(box(0.16, 0.16, 0.14), -depth);
  const flare: Part = {
    surfaces: mouth.map((point, i) => {
      const next = (i + 1) % 4;
      return { outline: [point, mouth[next], throat[next], throat[i]], tone: 'raised' };
    }),
    edges: [...loop(mouth), ...loop(throat), ...mouth.map((point, i): [Local, Local] => [point, throat[i]])],
  };
  const inside: Surface = { outline: rectangle(width * 0.9, height * 0.9, -0.02), tone: 'well' };
  return joined(flare, { surfaces: [inside], edges: [] }, driver);
}

function box(width: number, height: number, depth: number): Part {
  const front = rectangle(width, height, 0);
  const back = rectangle(width, height, -depth);
  return {
    surfaces: [
      { outline: front, tone: 'raised' },
      { outline: back, tone: 'raised' },
      ...front.map((point, i): Surface => {
        const next = (i + 1) % 4;
        return { outline: [point, front[next], back[next], back[i]], tone: 'raised' };
      }),
    ],
    edges: [...loop(front), ...loop(back), ...front.map((point, i): [Local, Local] => [point, back[i]])],
  };
}

function cone(radius: number, up: number): Part {
  const outline = circle(radius, 0.006, 16).map(([u, v, w]): Local => [u, v, w + up]);
  return { surfaces: [{ outline, tone: 'well' }], edges: loop(outline) };
}

/** A microphone: what stands out of its stem, and a plate where it is a boundary. */
export function microphoneShape(device: Pointing, pattern: DeviceModel['pattern'] | undefined): DeviceShape {
  if (pattern?.type === 'boundary') return placed(device, shifted(box(0.12, 0.09, 0.015), 0.015));
  const lengthM = pattern?.type === 'tube' ? pattern.length : 0.07;
  return placed(device, shifted(box(0.032, 0.032, lengthM), 0.02));
}

/** The stem behind a microphone, from its capsule down to what it stands on; null for one that lies on something. */
export function stemOf(
  device: Pointing,
  pattern: DeviceModel['pattern'] | undefined,
  supportM: (from: Vec3) => number | null,
): Vec3[] {
  if (pattern?.type === 'boundary') return [];
  const [fx, fy] = frameOf(device);
  const [x, y, z] = device.position;
  const base: Vec3 = [x - 0.18 * fx, y - 0.18 * fy, z - 0.1];
  const dropM = supportM(base);
  const foot: Vec3 = [base[0], base[1], base[2] - Math.min(dropM ?? 0.3, base[2] + 100)];
  return [device.position, base, base, foot];
}

function placed(device: Pointing, part: Part): DeviceShape {
  const f = frameOf(device);
  const [x, y, z] = device.position;
  const at = ([u, v, w]: Local): Vec3 => [
    x + u * f[0] + v * f[3] + w * f[6],
    y + u * f[1] + v * f[4] + w * f[7],
    z + u * f[2] + v * f[5] + w * f[8],
  ];
  return {
    surfaces: part.surfaces.map(({ outline, tone }) => ({ outline: outline.map(at), tone })),
    edges: part.edges.flatMap(([a, b]) => [at(a), at(b)]),
  };
}

const rectangle = (width: number, height: number, forward: number): Local[] => [
  [forward, -width / 2, -height / 2],
  [forward, width / 2, -height / 2],
  [forward, width / 2, height / 2],
  [forward, -width / 2, height / 2],
];

const circle = (radius: number, forward: number, count: number): Local[] =>
  Array.from({ length: count }, (_, i) => {
    const angle = (2 * Math.PI * i) / count;
    return [forward, radius * Math.cos(angle), radius * Math.sin(angle)];
  });

const loop = (outline: readonly Local[]): [Local, Local][] =>
  outline.map((point, i) => [point, outline[(i + 1) % outline.length]]);

const shifted = (part: Part, forward: number): Part => {
  const move = ([u, v, w]: Local): Local => [u + forward, v, w];
  return {
    surfaces: part.surfaces.map(({ outline, tone }) => ({ outline: outline.map(move), tone })),
    edges: part.edges.map(([a, b]) => [move(a), move(b)]),
  };
};

const joined = (...parts: Part[]): Part => ({
  surfaces: parts.flatMap((part) => part.surfaces),
  edges: parts.flatMap((part) => part.edges),
});
