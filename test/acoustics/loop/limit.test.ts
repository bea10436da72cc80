import { describe, expect, test } from 'vitest';
import { loudspeakerFeeds } from '../../../src/acoustics/loop/feeds';
import { highPassPowers } from '../../../src/acoustics/loop/filter';
import { type LoopInput, loopLimit, loopMatrix } from '../../../src/acoustics/loop/limit';
import { seededRandom } from '../../support/random';

const ones = (length: number, value = 1) => new Float64Array(length).fill(value);

function loop(microphones: number, loudspeakers: number, bands: number, value = 1): LoopInput {
  const pairs = microphones * loudspeakers * bands;
  return { microphones, loudspeakers, bands, returns: ones(pairs, value), routing: ones(pairs), filter: ones(bands) };
}

function randomLoop(seed: number): LoopInput {
  const random = seededRandom(seed);
  const input = loop(4, 3, 7);
  for (const list of [input.returns, input.routing, input.filter])
    list.forEach((_, i) => {
      list[i] = random();
    });
  return input;
}

describe('the limit', () => {
  test('of one microphone and one loudspeaker is the path between them turned round', () => {
    expect(loopLimit(loop(1, 1, 1, 0.04), ones(1)).limitDb).toBeCloseTo(13.9794, 4);
  });

  test('lies in the octave that rings first, the lowest of equal ones', () => {
    const input = loop(2, 2, 7);
    input.returns.forEach((_, i) => {
      input.returns[i] = [1, 3, 2, 3 * (1 + 1e-10), 1, 1, 1][i % 7];
    });
    const limit = loopLimit(input, ones(2));
    expect(limit.limitingBand).toBe(1);
    expect(limit.limitDb).toBeCloseTo(-10 * Math.log10(12), 9);
    expect(Array.from(limit.bandLimitsDb).map((db) => Math.round(db * 100) / 100)).toEqual(
      [4, 12, 8, 12, 4, 4, 4].map((radius) => Math.round(-1000 * Math.log10(radius)) / 100),
    );
  });

  test.each(['open', 'routed', 'heard'])('is none where nothing is %s', (what) => {
    const input = loop(2, 2, 7);
    if (what === 'routed') input.routing.fill(0);
    if (what === 'heard') input.returns.fill(0);
    expect(loopLimit(input, ones(2, what === 'open' ? 0 : 1))).toMatchObject({
      limitDb: null,
      limitingBand: -1,
      openMicrophoneCostDb: null,
      crosspoints: null,
    });
  });

  test('is none for a chain that never comes back', () => {
    // Microphone 1 feeds only loudspeaker 2, which only microphone 2 hears, and that is sent nowhere.
    const input = loop(2, 2, 1);
    input.routing.set([0, 0, 1, 0]);
    input.returns.set([0, 0, 0, 1]);
    expect(loopLimit(input, ones(2)).limitDb).toBeNull();
  });

  test('closing a microphone never lowers it (seeds 1 to 20)', () => {
    for (let seed = 1; seed <= 20; seed++) {
      const input = randomLoop(seed);
      const all = loopLimit(input, ones(4)).limitDb ?? Number.NaN;
      for (let closed = 0; closed < 4; closed++) {
        const share = ones(4);
        share[closed] = 0;
        expect(loopLimit(input, share).limitDb ?? Number.NaN).toBeGreaterThanOrEqual(all - 1e-9);
      }
    }
  });
});

test('W[m][m′] = h Σ A κ w, by hand', () => {
  const input = loop(2, 2, 1);
  input.returns.set([1, 2, 3, 4]);
  input.routing.set([5, 6, 7, 8]);
  input.filter[0] = 0.5;
  // A = (1 2; 3 4), κ = (5 6; 7 8), w = (1, 10): A κ = (19 22; 43 50).
  expect(Array.from(loopMatrix(input, Float64Array.of(1, 10), 0))).toEqual([9.5, 110, 21.5, 250]);
});

describe('crosspoints', () => {
  test('sum to one and none is negative (seeds 1 to 10)', () => {
    for (let seed = 1; seed <= 10; seed++) {
      const { crosspoints } = loopLimit(randomLoop(seed), Float64Array.of(1, 0.3, 0, 1));
      expect(crosspoints?.reduce((a, b) => a + b)).toBeCloseTo(1, 12);
      expect(Math.min(...(crosspoints ?? []))).toBeGreaterThanOrEqual(0);
    }
  });

  test('tell how the limit moves with each path: the derivative of log ρ by log A (seed 4)', () => {
    const input = randomLoop(4);
    const share = Float64Array.of(1, 0.5, 1, 0.2);
    const { crosspoints, limitingBand, radii } = loopLimit(input, share);
    const step = 1e-6;
    for (let m = 0; m < 4; m++) {
      for (let l = 0; l < 3; l++) {
        const at = (m * 3 + l) * 7 + limitingBand;
        const louder = { ...input, returns: input.returns.slice() };
        louder.returns[at] *= 1 + step;
        const moved = Math.log(loopLimit(louder, share).radii[limitingBand] / radii[limitingBand]) / Math.log(1 + step);
        expect(crosspoints?.[m * 3 + l]).toBeCloseTo(moved, 5);
      }
    }
  });

  test('share a loop of equal paths equally', () => {
    expect(Array.from(loopLimit(loop(2, 3, 1), ones(2)).crosspoints ?? []).map((x) => x.toFixed(6))).toEqual(
      Array(6).fill((1 / 6).toFixed(6)),
    );
  });
});

describe('open-microphone cost', () => {
  test.each([1, 2, 4, 9])('is 10 log N for %d equal microphones, and 0 under equal sharing', (n) => {
    expect(loopLimit(loop(n, 2, 1), ones(n)).openMicrophoneCostDb).toBeCloseTo(10 * Math.log10(n), 9);
    expect(loopLimit(loop(n, 2, 1), ones(n, 1 / n)).openMicrophoneCostDb).toBeCloseTo(0, 9);
  });

  test('is negative where the microphone with the share is the safe one', () => {
    const input = loop(2, 1, 1);
    input.returns.set([0.1, 1]);
    expect(loopLimit(input, Float64Array.of(0.9, 0.1)).openMicrophoneCostDb).toBeCloseTo(10 * Math.log10(0.19), 9);
  });
});

describe('what loudspeakers are fed', () => {
  test('h Σ T κ w by hand', () => {
    const input = {
      microphones: 2,
      loudspeakers: 2,
      bands: 1,
      talkerToMicrophone: Float64Array.of(2, 3),
      routing: Float64Array.of(1, 10, 0, 100),
      share: Float64Array.of(1, 0.5),
      filter: Float64Array.of(0.25),
    };
    const feeds = loudspeakerFeeds(input);
    expect(Array.from(feeds)).toEqual([0.25 * (2 + 15), 0.25 * 150]);
  });
});

test('the high-pass is 3 dB down at its corner, falls 12 dB an octave and is absent at 0 Hz', () => {
  expect(Array.from(highPassPowers(0))).toEqual([1, 1, 1, 1, 1, 1, 1]);
  expect(10 * Math.log10(highPassPowers(1000)[3])).toBeCloseTo(-3.0103, 4);
  expect(10 * Math.log10(highPassPowers(8000)[0] / highPassPowers(8000)[1])).toBeCloseTo(-40 * 0.3, 2);
});
