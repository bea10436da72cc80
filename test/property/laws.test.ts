import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { createPattern } from '../../src/acoustics/directivity/create-pattern';
import { directivityFactors } from '../../src/acoustics/directivity/integrate';
import type { PatternSpec } from '../../src/acoustics/directivity/pattern';
import { deviceFrame } from '../../src/acoustics/frame';
import { createListener, type Device } from '../../src/acoustics/paths/device';
import { createPairPaths, createPathFinder, type PairPaths } from '../../src/acoustics/paths/finder';
import { createFaces, type Faces } from '../../src/acoustics/room/faces';
import type { Layout } from '../../src/layout/schema';
import type { Prediction } from '../../src/predict/prediction';
import { predict } from '../../src/predict/run';
import { acousticFaces, box, flat, lShape, panel } from '../support/layouts';
import { randomLayout } from '../support/random-layout';
import { field, NO_AIR, SOUND_SPEED } from '../support/rooms';

const first = (prediction: Prediction) => prediction.schemes[0].talkers[0];
const limitsOf = (layout: Layout) => {
  const { loop } = first(predict(layout));
  return [loop.distance.limitDb, loop.directivity.limitDb, loop.room.limitDb].map((db) => db ?? Number.NaN);
};

const coordinate = fc.double({ min: 0.2, max: 2.8, noNaN: true });
const angle = fc.double({ min: -Math.PI, max: Math.PI, noNaN: true });
/** Made once: integrating a pattern is dear. */
const PATTERNS = (
  [
    { type: 'point' },
    { type: 'speech' },
    { type: 'first-order', alpha: 0.5 },
    { type: 'tube', length: 0.25 },
    { type: 'horn', horizontal: 90, vertical: 40, mouthWidth: 0.45, mouthHeight: 0.35 },
  ] satisfies PatternSpec[]
).map((spec) => {
  const pattern = createPattern(spec, SOUND_SPEED);
  return { pattern, directivityFactors: directivityFactors(pattern) };
});
const device: fc.Arbitrary<Device> = fc
  .record({
    x: coordinate,
    y: coordinate,
    z: coordinate,
    pan: angle,
    tilt: angle,
    roll: angle,
    made: fc.constantFrom(...PATTERNS),
  })
  .map(({ x, y, z, pan, tilt, roll, made }) => ({
    ...createListener(x, y, z),
    frame: deviceFrame(pan, tilt, roll),
    ...made,
  }));

function between(faces: Faces, order: number, from: Device, to: Device, airDbPerM = NO_AIR): PairPaths {
  const finder = createPathFinder({ faces, field: field(faces, 81), airDbPerM, reflectionOrder: order });
  const paths = createPairPaths();
  finder.find(finder.source(from), finder.receiver(to), paths);
  return paths;
}

const expectRelative = (found: ArrayLike<number>, reference: ArrayLike<number>) => {
  for (let i = 0; i < reference.length; i++) {
    if (reference[i] === 0) expect(found[i]).toBe(0);
    else expect(Math.abs(found[i] / reference[i] - 1)).toBeLessThan(1e-9);
  }
};

/** Equal to 1e-7, or both no finite number. */
function expectClose(found: number, reference: number): void {
  if (Number.isNaN(reference)) expect(found).toBeNaN();
  else expect(found).toBeCloseTo(reference, 7);
}

describe('paths', { timeout: 60_000 }, () => {
  test('are the same in both directions: direct, reflected in number and sum, diffuse (seed 31)', () => {
    const faces = acousticFaces(
      [...lShape(), panel(1.6, 0.5, 2.2, 1.6)],
      [0.1, 0.5, 0.2, 0.3, 0.15, 0.25, 0.35, 0.05, 0.4],
    );
    fc.assert(
      fc.property(device, device, (a, b) => {
        const [there, back] = [between(faces, 2, a, b), between(faces, 2, b, a)];
        expectRelative(back.direct, there.direct);
        expect(back.reflections).toBe(there.reflections);
        expectRelative(back.diffuse, there.diffuse);
        expectRelative(back.total, there.total);
      }),
      { seed: 31, numRuns: 25 },
    );
  });

  test('in free field gain 6.02 dB for half the distance, whatever the patterns (seed 32)', () => {
    const open = createFaces([]);
    fc.assert(
      fc.property(device, device, (a, b) => {
        const midway = { ...b, x: (a.x + b.x) / 2, y: (a.y + b.y) / 2, z: (a.z + b.z) / 2 };
        fc.pre(Math.hypot(a.x - b.x, a.y - b.y, a.z - b.z) > 0.05);
        const [far, near] = [between(open, 0, a, b), between(open, 0, a, midway)];
        expectRelative(
          near.direct,
          far.direct.map((gain) => 4 * gain),
        );
        expect(near.distanceGain / far.distanceGain).toBeCloseTo(4, 9);
      }),
      { seed: 32, numRuns: 25 },
    );
  });

  test('with no faces and order 0 are the direct path alone (seed 33)', () => {
    fc.assert(
      fc.property(device, device, (a, b) => {
        const paths = between(createFaces([]), 0, a, b, Float64Array.of(0.001, 0.002, 0.003, 0.004, 0.01, 0.03, 0.1));
        expect(Array.from(paths.total)).toEqual(Array.from(paths.direct));
      }),
      { seed: 33, numRuns: 20 },
    );
  });

  test('more absorption on any face never raises the reflected or the diffuse part (seed 34)', () => {
    const coefficient = fc.double({ min: 0, max: 1, noNaN: true });
    const six = fc.array(coefficient, { minLength: 6, maxLength: 6 });
    fc.assert(
      fc.property(
        device,
        device,
        six,
        fc.nat(5),
        coefficient,
        fc.integer({ min: 0, max: 2 }),
        (a, b, soft, face, more, order) => {
          const harder = acousticFaces(box(3, 3, 3), soft);
          const softer = acousticFaces(
            box(3, 3, 3),
            soft.map((value, i) => (i === face ? value + (1 - value) * more : value)),
          );
          const [before, after] = [between(harder, order, a, b), between(softer, order, a, b)];
          for (let band = 0; band < 7; band++) {
            expect(after.diffuse[band]).toBeLessThanOrEqual(before.diffuse[band] * (1 + 1e-9));
            expect(after.total[band]).toBeLessThanOrEqual(before.total[band] * (1 + 1e-9));
          }
        },
      ),
      { seed: 34, numRuns: 40 },
    );
  });
});

describe('the loop of a whole layout', { timeout: 60_000 }, () => {
  test('twice as many microphones at the same places cost 3.01 dB on every rung, and nothing under sharing (seed 41)', () => {
    fc.assert(
      fc.property(randomLayout, (layout) => {
        const doubled = structuredClone(layout);
        const { microphones } = doubled.schemes[0];
        microphones.push(...structuredClone(microphones).map((m) => ({ ...m, id: `${m.id}'` })));
        const cost = layout.schemes[0].system.automix === 'gain-sharing' ? 0 : 10 * Math.log10(2);
        const [before, after] = [limitsOf(layout), limitsOf(doubled)];
        after.forEach((limitDb, rung) => {
          expect(before[rung] - limitDb).toBeCloseTo(cost, 6);
        });
      }),
      { seed: 41, numRuns: 12 },
    );
  });

  test('closing a microphone never lowers the limit without gain sharing (seed 42)', () => {
    fc.assert(
      fc.property(randomLayout, fc.nat(2), (layout, which) => {
        layout.schemes[0].system.automix = 'off';
        const { microphones } = layout.schemes[0];
        fc.pre(microphones.length > 1);
        const before = limitsOf(layout);
        microphones[which % microphones.length].open = false;
        limitsOf(layout).forEach((limitDb, rung) => {
          expect(limitDb).toBeGreaterThanOrEqual(before[rung] - 1e-9);
        });
      }),
      { seed: 42, numRuns: 12 },
    );
  });

  test('raising every loudspeaker by x lowers the limit by x and leaves margins, levels and speech as they are (seed 43)', () => {
    fc.assert(
      fc.property(randomLayout, fc.double({ min: -30, max: 30, noNaN: true }), (layout, gain) => {
        const raised = structuredClone(layout);
        for (const loudspeaker of raised.schemes[0].loudspeakers) loudspeaker.gain += gain;
        const [before, after] = [first(predict(layout)), first(predict(raised))];
        for (const rung of ['distance', 'directivity', 'room'] as const) {
          expect((after.loop[rung].limitDb ?? Number.NaN) + gain).toBeCloseTo(
            before.loop[rung].limitDb ?? Number.NaN,
            7,
          );
          after.seats[rung].marginDb.forEach((db, s) => {
            expectClose(db, before.seats[rung].marginDb[s]);
          });
        }
        after.room.sti.forEach((sti, s) => {
          expect(sti).toBeCloseTo(before.room.sti[s], 9);
        });
      }),
      { seed: 43, numRuns: 12 },
    );
  });

  test('margin = potential − pause cost − stability margin − needed; costs and shares keep their signs (seed 44)', () => {
    fc.assert(
      fc.property(randomLayout, (layout) => {
        const talker = first(predict(layout));
        for (const rung of ['distance', 'directivity', 'room'] as const) {
          const { pauseCostDb, limitDb, idleLimitDb, crosspoints } = talker.loop[rung];
          const sharing = layout.schemes[0].system.automix === 'gain-sharing';
          expect(idleLimitDb === null).toBe(!sharing);
          expect(pauseCostDb).toBeCloseTo(Math.max(0, (limitDb ?? 0) - (idleLimitDb ?? limitDb ?? 0)), 12);
          if (crosspoints !== null) expect(crosspoints.reduce((a, b) => a + b)).toBeCloseTo(1, 12);
          talker.seats[rung].marginDb.forEach((marginDb, s) => {
            const { potentialDb, neededDb } = talker.seats[rung];
            if (Number.isNaN(potentialDb[s])) return;
            expect(potentialDb[s] - (pauseCostDb ?? Number.NaN) - 6 - neededDb[s]).toBeCloseTo(marginDb, 9);
          });
        }
      }),
      { seed: 44, numRuns: 12 },
    );
  });
});

describe('a rung is the one below it when its effects are off', { timeout: 60_000 }, () => {
  /** The same in all directions, nothing in between. */
  function plain(layout: Layout): Layout {
    layout.venue.talkers[0].model = 'talker-point';
    for (const microphone of layout.schemes[0].microphones) microphone.model = 'omni';
    for (const loudspeaker of layout.schemes[0].loudspeakers) loudspeaker.model = 'point';
    layout.schemes[0].system.automix = 'off';
    layout.venue.faces = layout.venue.faces.filter(({ sides }) => sides === 1);
    return layout;
  }

  test('directivity is distance, less what air takes in the octave that limits (seed 51)', () => {
    fc.assert(
      fc.property(randomLayout.map(plain), (layout) => {
        const prediction = predict(layout);
        const { loop, seats } = first(prediction);
        // The longest path of this room is 10.5 m.
        const mostAirDb = 10.5 * prediction.venue.airDbPerM[loop.directivity.limitingBand];
        const gainedDb = (loop.directivity.limitDb ?? Number.NaN) - (loop.distance.limitDb ?? Number.NaN);
        expect(gainedDb).toBeGreaterThan(0);
        expect(gainedDb).toBeLessThanOrEqual(mostAirDb);
        // Speech is weighted over octaves up to 8 kHz: all of it on the longest path.
        seats.directivity.potentialDb.forEach((db, s) => {
          expect(Math.abs(db - seats.distance.potentialDb[s])).toBeLessThan(10.5 * 0.02 + mostAirDb);
        });
      }),
      { seed: 51, numRuns: 12 },
    );
  });

  test('room is directivity where every face swallows all, to the 1 % that the mean absorption is held from 1 (seed 52)', () => {
    fc.assert(
      fc.property(randomLayout, (layout) => {
        layout.venue.finishes[0].absorption = flat(1);
        layout.venue.reflectionOrder = 2;
        const { loop, seats } = first(predict(layout));
        // What is left is 16π/(S·0.99)·0.01³ = 3e-7, 48 dB below a direct path of 8 m.
        fc.pre(loop.directivity.limitDb !== null && loop.directivity.limitDb < 30);
        expect(Math.abs((loop.room.limitDb ?? Number.NaN) - (loop.directivity.limitDb ?? Number.NaN))).toBeLessThan(
          0.01,
        );
        seats.room.marginDb.forEach((db, s) => {
          if (Number.isFinite(seats.directivity.potentialDb[s]))
            expect(db).toBeCloseTo(seats.directivity.marginDb[s], 1);
        });
      }),
      { seed: 52, numRuns: 12 },
    );
  });
});
