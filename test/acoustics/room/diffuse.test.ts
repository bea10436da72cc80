import { describe, expect, test } from 'vitest';
import { createPattern } from '../../../src/acoustics/directivity/create-pattern';
import { directivityFactors } from '../../../src/acoustics/directivity/integrate';
import { deviceFrame } from '../../../src/acoustics/frame';
import { createListener, type Device } from '../../../src/acoustics/paths/device';
import { diffuseGains, firstAbsorption } from '../../../src/acoustics/room/diffuse';
import { firstHit } from '../../../src/acoustics/room/faces';
import { acousticFaces, box, panel } from '../../support/layouts';
import { field, SOUND_SPEED } from '../../support/rooms';

const room = box(8, 6, 3);
/** Floor, ceiling, south, east, north, west. */
const uneven = [0.1, 0.6, 0.2, 0.3, 0.2, 0.05];

function cardioid(panDeg: number, tiltDeg = 0): Device {
  const pattern = createPattern({ type: 'first-order', alpha: 0.5 }, SOUND_SPEED);
  const radians = (degrees: number) => (degrees * Math.PI) / 180;
  return {
    ...createListener(4, 3, 1.5),
    frame: deviceFrame(radians(panDeg), radians(tiltDeg), 0),
    pattern,
    directivityFactors: directivityFactors(pattern),
  };
}

const end = (absorption: number, device: Device = createListener(0, 0, 0)) => ({
  device,
  absorption: new Float64Array(7).fill(absorption),
});

function gain(order: number, source: number, receiver: number, mean = 0.2): number {
  const faces = acousticFaces(room, mean);
  const out = new Float64Array(7);
  diffuseGains(field(faces, 144), order, end(source), end(receiver), out);
  return out[3];
}

describe('what a device sees first', () => {
  test('is the mean absorption where every face is alike', () => {
    const faces = acousticFaces(room, 0.37);
    for (const device of [cardioid(0), cardioid(70, 20)]) {
      expect(firstAbsorption(device, faces, field(faces, 144))[3]).toBeCloseTo(0.37, 12);
    }
  });

  test('is what it is aimed at: the ceiling more than the floor', () => {
    const faces = acousticFaces(room, uneven);
    const seen = (tilt: number) => firstAbsorption(cardioid(0, tilt), faces, field(faces, 144))[3];
    expect(seen(90)).toBeGreaterThan(seen(0));
    expect(seen(0)).toBeGreaterThan(seen(-90));
    // Up: ceiling 0.6 weighted with (1 + cos)²/4 over a half space of steradians dominates.
    expect(seen(90)).toBeGreaterThan(0.45);
  });

  test('agrees with a fine grid of rays weighted by D²', () => {
    const faces = acousticFaces([...room, panel(6, 1, 5, 2.5)], [...uneven, 0.9]);
    const device = cardioid(25, 10);
    const roomField = field(faces, 144);
    let [weighted, weights] = [0, 0];
    for (let i = 0; i < 300; i++) {
      for (let j = 0; j < 600; j++) {
        const cosine = 1 - (2 * i + 1) / 300;
        const clock = (2 * Math.PI * j) / 600;
        const sine = Math.sqrt(1 - cosine * cosine);
        const { frame } = device;
        const direction = [0, 1, 2].map(
          (axis) =>
            cosine * frame[axis] + sine * (Math.cos(clock) * frame[3 + axis] + Math.sin(clock) * frame[6 + axis]),
        );
        const hit = firstHit(faces, [4, 3, 1.5], direction, 1e-6, -1);
        const power = Math.max(((1 + cosine) / 2) ** 2, 10 ** -2.5);
        weighted += power * roomField.seenAbsorption[7 * (hit?.face ?? 0) + 3];
        weights += power;
      }
    }
    // 500 directions stand for the whole sphere: a few of them decide the edges of faces.
    expect(Math.abs(firstAbsorption(device, faces, roomField)[3] - weighted / weights)).toBeLessThan(0.006);
  });

  test('leaves out its own host', () => {
    const faces = acousticFaces(room, [0.9, 0.1, 0.1, 0.1, 0.1, 0.1]);
    const roomField = field(faces, 144);
    const lying = { ...cardioid(0, 90), z: 0.0005 };
    expect(firstAbsorption({ ...lying, host: 0 }, faces, roomField)[3]).toBeLessThan(
      firstAbsorption(lying, faces, roomField)[3],
    );
  });

  test('is the mean where nothing is hit', () => {
    const faces = acousticFaces([panel(6, 1, 5, 2.5)], 0.9);
    const away = { ...cardioid(180), x: 7 };
    const seen = firstAbsorption({ ...away, pattern: createPattern({ type: 'boundary' }, SOUND_SPEED) }, faces, {
      ...field(faces, 100),
      meanAbsorption: new Float64Array(7).fill(0.123),
    })[3];
    expect(seen).toBeGreaterThan(0.123);
    expect(seen).toBeLessThan(0.99);
  });
});

describe('the diffuse remainder', () => {
  test('falls by 1 − ᾱ for every order taken out', () => {
    for (const order of [1, 2]) expect(gain(order + 1, 0.3, 0.1) / gain(order, 0.3, 0.1)).toBeCloseTo(0.8, 12);
  });

  test('without image sources keeps what neither side has lost: at most the larger bracket', () => {
    const S = 2 * (48 + 24 + 18);
    const whole = (16 * Math.PI) / (S * 0.2);
    // (1 − 0.3)(1 − 0.1)/(1 − 0.2) = 0.7875 is below 0.9 …
    expect(gain(0, 0.3, 0.1)).toBeCloseTo(whole * 0.7875, 12);
    // … but (1 − 0.05)² / 0.2 is not below 0.95.
    expect(gain(0, 0.05, 0.05, 0.8)).toBeCloseTo(((16 * Math.PI) / (S * 0.8)) * 0.95, 12);
  });

  test('goes down with either directivity factor', () => {
    const faces = acousticFaces(room, 0.2);
    const out = new Float64Array(7);
    const directed = { ...createListener(0, 0, 0), directivityFactors: new Float64Array(7).fill(5) };
    diffuseGains(field(faces, 144), 1, end(0.2, directed), end(0.2, directed), out);
    expect(out[3]).toBeCloseTo(gain(1, 0.2, 0.2) / 25, 12);
  });

  test('is nothing where there are no faces', () => {
    const out = new Float64Array(7).fill(1);
    diffuseGains(field(acousticFaces([], 0.1), 1000), 0, end(0.2), end(0.2), out);
    expect(Array.from(out)).toEqual([0, 0, 0, 0, 0, 0, 0]);
  });
});

describe('the field of a room', () => {
  test('counts both sides of free-standing faces', () => {
    expect(field(acousticFaces([...room, panel(6, 1, 5, 2.5)], 0.2), 144).surfaceM2).toBeCloseTo(180 + 20, 12);
  });

  test('limits the mean absorption to 0.01 … 0.99', () => {
    expect(field(acousticFaces(room, 0), 144).meanAbsorption[3]).toBe(0.01);
    expect(field(acousticFaces(room, 1), 144).meanAbsorption[3]).toBe(0.99);
  });

  test('given the decay that Eyring finds, gives back the absorption it came from', () => {
    const faces = acousticFaces(room, uneven);
    const found = field(faces, 144);
    const given = field(faces, 144, { model: 'given', seconds: Array.from(found.decayS) });
    given.meanAbsorption.forEach((mean, b) => {
      expect(mean).toBeCloseTo(found.meanAbsorption[b], 12);
    });
    given.seenAbsorption.forEach((seen, i) => {
      expect(seen).toBeCloseTo(found.seenAbsorption[i], 12);
    });
  });

  test('given a longer decay, every face seems harder in proportion, and none above 0.99', () => {
    const faces = acousticFaces(room, uneven);
    const [free, live] = [field(faces, 144), field(faces, 144, { model: 'given', seconds: [2, 2, 2, 2, 2, 2, 2] })];
    const ratio = live.meanAbsorption[3] / free.meanAbsorption[3];
    expect(ratio).toBeLessThan(1);
    live.seenAbsorption.forEach((seen, i) => {
      expect(seen).toBeCloseTo(free.seenAbsorption[i] * ratio, 12);
    });
    const dead = field(faces, 144, { model: 'given', seconds: [0.05, 0.05, 0.05, 0.05, 0.05, 0.05, 0.05] });
    expect(Math.max(...dead.seenAbsorption)).toBe(0.99);
  });
});
