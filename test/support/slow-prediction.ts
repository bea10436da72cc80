import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { airAttenuationDbPerM, soundSpeed } from '../../src/acoustics/air';
import { CENTRES_HZ } from '../../src/acoustics/bands';
import { createPattern } from '../../src/acoustics/directivity/create-pattern';
import { directivityFactors } from '../../src/acoustics/directivity/integrate';
import { deviceFrame } from '../../src/acoustics/frame';
import { A_WEIGHTS, aWeightedDb } from '../../src/acoustics/level';
import { noiseLevelsOfNr } from '../../src/acoustics/speech/noise';
import { talkerLevelsDb, VOCAL_EFFORT_DBA } from '../../src/acoustics/speech/spectra';
import { findModel } from '../../src/layout/catalogue';
import type { DeviceKind, Layout, Vec3 } from '../../src/layout/schema';
import { seatsOf } from '../../src/layout/seating';
import { slowPaths } from './slow-reflections';

/**
 * Limits and margins of a layout's first scheme and talker, straight from the formulas: one pair, one path, one octave at
 * a time, eigenvalues by a library. Patterns, air and spectra are the program's own, which have tests of their own.
 */

type Seven = number[];
const OCTAVES = [0, 1, 2, 3, 4, 5, 6];

interface End {
  position: Vec3;
  /** Power towards a direction in room coordinates. */
  power: (direction: readonly number[]) => Seven;
  factor: Seven;
  host: number;
  /** Mean absorption of the faces it sees first. */
  sees: Seven;
}

export interface SlowRung {
  limitDb: number;
  idleLimitDb: number | null;
  /** [seat] */
  marginDb: number[];
  potentialDb: number[];
}

export function slowPrediction(
  layout: Layout,
  volumeM3: number,
): Record<'distance' | 'directivity' | 'room', SlowRung> {
  const { venue } = layout;
  const [scheme] = layout.schemes;
  const { air } = venue;
  const c = soundSpeed(air.temperature);
  const airDb = Array.from(
    airAttenuationDbPerM({ temperatureC: air.temperature, humidityPercent: air.humidity, pressureKPa: air.pressure }),
  );
  const room = slowRoom(layout, volumeM3, airDb, c);
  const end = (thing: Parameters<typeof slowEnd>[1], kind: DeviceKind) => slowEnd(layout, thing, kind, c, room);
  const [first] = venue.talkers;
  const talker = end({ ...first, roll: 0, host: null }, 'talker');
  const microphones = scheme.microphones.map((m) => end(m, 'microphone'));
  const loudspeakers = scheme.loudspeakers.map((l) => end(l, 'loudspeaker'));
  const listeners = seatsOf(venue.seating).map(
    ({ ear }): End => ({
      position: ear,
      power: () => OCTAVES.map(() => 1),
      factor: OCTAVES.map(() => 1),
      host: -1,
      sees: room.mean,
    }),
  );
  const level = first.level ?? VOCAL_EFFORT_DBA[first.effort];
  const noiseDb = Array.from('nr' in venue.noise ? noiseLevelsOfNr(venue.noise.nr) : venue.noise.levels);

  const rung = (name: 'distance' | 'directivity' | 'room'): SlowRung => {
    const plain = name === 'distance';
    const octaves = plain ? [0] : OCTAVES;
    const gain = (from: End, to: End): Seven =>
      plain
        ? [Math.max(distance(from.position, to.position), 0.02) ** -2]
        : pairGain(layout, room, airDb, from, to, name === 'room');
    const speech = plain ? [10 ** (level / 10)] : Array.from(talkerLevelsDb(level), (db) => 10 ** (db / 10));
    const noise = plain ? [10 ** (aWeightedDb(noiseDb) / 10)] : noiseDb.map((db) => 10 ** (db / 10));
    const weight = plain ? [1] : Array.from(A_WEIGHTS);
    const T = microphones.map((m) => gain(talker, m));
    const U = listeners.map((s) => gain(talker, s));
    const B = loudspeakers.map((l) => listeners.map((s) => gain(l, s)));
    const A = microphones.map((m) => loudspeakers.map((l) => gain(l, m)));
    const routed = (l: number, m: number, b: number): number => {
      const send = scheme.routing.find(
        (pair) => pair.microphone === scheme.microphones[m].id && pair.loudspeaker === scheme.loudspeakers[l].id,
      );
      if (send?.gain === null) return 0;
      const db = (send?.gain ?? 0) + scheme.loudspeakers[l].gain + (plain ? 0 : scheme.system.equaliser[b]);
      return 10 ** (db / 10);
    };
    const pass = (b: number) => (plain ? 1 : 1 / (1 + (scheme.system.highPassHz / CENTRES_HZ[b]) ** 4));

    const shares = (speaking: boolean): number[] => {
      const takesPart = scheme.microphones.map((m) => m.open && m.automix && scheme.system.automix === 'gain-sharing');
      const heard = microphones.map((m, i) =>
        octaves.reduce(
          (sum, b) => sum + weight[b] * ((speaking ? speech[b] * T[i][b] : 0) + noise[b] / (plain ? 1 : m.factor[b])),
          0,
        ),
      );
      const all = heard.reduce((sum, q, i) => sum + (takesPart[i] ? q : 0), 0);
      return scheme.microphones.map((m, i) => (takesPart[i] ? heard[i] / all : m.open ? 1 : 0));
    };
    const limitOf = (w: number[]): number =>
      Math.min(
        ...octaves.map((b) => {
          const loop = microphones.map((_, m) =>
            microphones.map(
              (__, n) => loudspeakers.reduce((sum, ___, l) => sum + A[m][l][b] * routed(l, n, b) * w[n], 0) * pass(b),
            ),
          );
          const { realEigenvalues, imaginaryEigenvalues } = new EigenvalueDecomposition(new Matrix(loop));
          return -10 * Math.log10(Math.max(...realEigenvalues.map((x, i) => Math.hypot(x, imaginaryEigenvalues[i]))));
        }),
      );
    const w = shares(true);
    const limitDb = limitOf(w);
    const idleLimitDb = scheme.system.automix === 'off' ? null : limitOf(shares(false));
    const lower = Math.min(limitDb, idleLimitDb ?? limitDb);
    const dba = (powers: number[]) =>
      10 * Math.log10(octaves.reduce((sum, b) => sum + weight[b] * speech[b] * powers[b], 0));
    const wanted =
      layout.need.kind === 'distance'
        ? level - 20 * Math.log10(layout.need.metres)
        : aWeightedDb(noiseDb) + layout.need.signalToNoise;
    const system = listeners.map((_, s) =>
      dba(
        octaves.map((b) =>
          microphones.reduce(
            (sum, __, m) =>
              sum +
              loudspeakers.reduce((part, ___, l) => part + pass(b) * T[m][b] * routed(l, m, b) * w[m] * B[l][s][b], 0),
            0,
          ),
        ),
      ),
    );
    return {
      limitDb,
      idleLimitDb,
      marginDb: system.map((db) => db + lower - scheme.system.stabilityMargin - wanted),
      potentialDb: system.map((db, s) => db + limitDb - dba(U[s])),
    };
  };
  return { distance: rung('distance'), directivity: rung('directivity'), room: rung('room') };
}

const distance = (a: Vec3, b: Vec3): number => Math.hypot(a[0] - b[0], a[1] - b[1], a[2] - b[2]);

interface SlowRoom {
  mean: Seven;
  absorptionAreaM2: Seven;
  /** [face] */
  own: Seven[];
  seen: Seven[];
}

function slowRoom({ venue }: Layout, volumeM3: number, airDb: Seven, c: number): SlowRoom {
  const own = venue.faces.map(({ finish }) => venue.finishes.find(({ id }) => id === finish)?.absorption ?? []);
  const areas = venue.faces.map(({ corners, sides }) => {
    const sum = [0, 0, 0];
    corners.forEach((a, i) => {
      const b = corners[(i + 1) % corners.length];
      sum[0] += a[1] * b[2] - a[2] * b[1];
      sum[1] += a[2] * b[0] - a[0] * b[2];
      sum[2] += a[0] * b[1] - a[1] * b[0];
    });
    return (sides * Math.hypot(...sum)) / 2;
  });
  const S = areas.reduce((a, b) => a + b);
  const limited = (x: number) => Math.min(0.99, Math.max(0.01, x));
  const weighted = OCTAVES.map((b) => limited(areas.reduce((sum, area, f) => sum + area * own[f][b], 0) / S));
  const fourMV = airDb.map((db) => (4 * db * volumeM3) / (10 * Math.log10(Math.E)));
  const { decay } = venue;
  const mean = weighted.map((alpha, b) =>
    decay.model === 'given'
      ? limited(1 - Math.exp(-((55.26 * volumeM3) / (c * decay.seconds[b]) - fourMV[b]) / S))
      : alpha,
  );
  return {
    mean,
    absorptionAreaM2: mean.map((alpha, b) => S * alpha + fourMV[b]),
    own,
    seen: own.map((alphas) => alphas.map((alpha, b) => Math.min(0.99, (alpha * mean[b]) / weighted[b]))),
  };
}

type Placed = { position: Vec3; pan: number; tilt: number; roll: number; model: string; host: string | null };

function slowEnd(layout: Layout, thing: Placed, kind: DeviceKind, c: number, room: SlowRoom): End {
  const model = findModel(layout, thing.model, kind);
  if (model === undefined) throw new Error(`No model ${thing.model}`);
  const pattern = createPattern(model.pattern, c);
  const [pan, tilt, roll] = [thing.pan, thing.tilt, thing.roll].map((degrees) => (degrees * Math.PI) / 180);
  const axes = deviceFrame(pan, tilt, roll);
  const power = (direction: readonly number[]): Seven => {
    const length = Math.hypot(...direction);
    const [u, v, w] = [0, 3, 6].map(
      (k) => (axes[k] * direction[0] + axes[k + 1] * direction[1] + axes[k + 2] * direction[2]) / length,
    );
    const out = new Float64Array(7);
    pattern.powers(u, v, w, out, 0);
    return Array.from(out);
  };
  const host = layout.venue.faces.findIndex(({ id }) => id === thing.host);
  const sums = OCTAVES.map(() => [0, 0]);
  for (let i = 0; i < 500; i++) {
    const cosine = 1 - (2 * i + 1) / 500;
    const [sine, clock] = [Math.sqrt(1 - cosine ** 2), i * Math.PI * (3 - Math.sqrt(5))];
    const direction = [0, 1, 2].map(
      (k) => cosine * axes[k] + sine * (Math.cos(clock) * axes[3 + k] + Math.sin(clock) * axes[6 + k]),
    );
    const face = firstFace(layout, thing.position, direction, host);
    power(direction).forEach((p, b) => {
      sums[b][0] += p * (face < 0 ? room.mean[b] : room.seen[face][b]);
      sums[b][1] += p;
    });
  }
  return {
    position: thing.position,
    power,
    factor: Array.from(directivityFactors(pattern)),
    host,
    sees: sums.map(([a, n]) => a / n),
  };
}

/** The face whose crossing lies nearest along a ray: the direct path to a point far off is cut there. */
function firstFace(layout: Layout, from: Vec3, direction: number[], host: number): number {
  const far = from.map((x, k) => x + 1000 * direction[k]);
  const lengths = layout.venue.faces.map((face, index) => {
    if (index === host) return Number.POSITIVE_INFINITY;
    const alone = { ...face, sides: 2 as const };
    // Halve the way until the face no longer lies across it: slow, and nothing like the program's way.
    if (slowPaths([alone], from, far, 0).length > 0) return Number.POSITIVE_INFINITY;
    let [near, beyond] = [0, 1000];
    while (beyond - near > 1e-4) {
      const middle = (near + beyond) / 2;
      const blocked =
        slowPaths(
          [alone],
          from,
          from.map((x, k) => x + middle * direction[k]),
          0,
        ).length === 0;
      if (blocked) beyond = middle;
      else near = middle;
    }
    return near;
  });
  const least = Math.min(...lengths);
  return Number.isFinite(least) ? lengths.indexOf(least) : -1;
}

function pairGain(layout: Layout, room: SlowRoom, airDb: Seven, from: End, to: End, indoors: boolean): Seven {
  const N = layout.venue.reflectionOrder;
  const paths = slowPaths(layout.venue.faces, from.position, to.position, indoors ? N : 0, {
    source: from.host,
    receiver: to.host,
  });
  return OCTAVES.map((b) => {
    const along = paths.reduce((sum, { lengthM, faces, departure, arrival }) => {
      const r = Math.max(lengthM, 0.02);
      const kept = faces.reduce((product, face) => product * (1 - room.own[face][b]), 1);
      return sum + (from.power(departure)[b] * to.power(arrival)[b] * kept * 10 ** ((-airDb[b] * r) / 10)) / r ** 2;
    }, 0);
    if (!indoors) return along;
    const brackets = (1 - from.sees[b]) * (1 - to.sees[b]) * (1 - room.mean[b]) ** (N - 1);
    const left = N === 0 ? Math.min(brackets, Math.max(1 - from.sees[b], 1 - to.sees[b])) : brackets;
    return along + ((16 * Math.PI) / room.absorptionAreaM2[b]) * (left / (from.factor[b] * to.factor[b]));
  });
}
