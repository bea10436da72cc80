import { describe, expect, test } from 'vitest';
import type { Layout, Scheme } from '../../src/layout/schema';
import { answer } from '../../src/predict/request';
import { predict } from '../../src/predict/run';
import { flat, loudspeaker, microphone, panel, scheme, smallLayout, talker, withSchemes } from '../support/layouts';

const first = (layout: Layout) => predict(layout).schemes[0].talkers[0];
const RUNGS = ['distance', 'directivity', 'room'] as const;

describe('the distance rung is the hand calculation', () => {
  test('20 log of four distances, by hand, margins and need with it', () => {
    const layout = smallLayout();
    const { loop, seats } = first(layout);
    const apart = (a: number[], b: number[]) => Math.hypot(a[0] - b[0], a[1] - b[1], a[2] - b[2]);
    const [t, m, l] = [
      layout.venue.talkers[0].position,
      ...[layout.schemes[0].microphones[0], layout.schemes[0].loudspeakers[0]].map((d) => d.position),
    ];
    const seat = [5, 1.4, 1.2];
    expect(loop.distance.limitDb).toBeCloseTo(20 * Math.log10(apart(m, l)), 9);
    const gain = 20 * Math.log10((apart(t, seat) * apart(m, l)) / (apart(t, m) * apart(l, seat)));
    expect(seats.distance.potentialDb[1]).toBeCloseTo(gain, 9);
    expect(seats.distance.neededDb[1]).toBeCloseTo(20 * Math.log10(apart(t, seat) / 2), 9);
    expect(seats.distance.marginDb[1]).toBeCloseTo(gain - 6 - 20 * Math.log10(apart(t, seat) / 2), 9);
  });

  test('wanted above the noise: noise + ratio − unaided', () => {
    const layout = { ...smallLayout(), need: { kind: 'noise' as const, signalToNoise: 25 } };
    const prediction = predict(layout);
    const { seats } = prediction.schemes[0].talkers[0];
    const r = Math.hypot(5 - 1.2, 2 - 2.9, 1.2 - 1.4);
    expect(seats.distance.neededDb[0]).toBeCloseTo(prediction.venue.noiseDba + 25 - (60 - 20 * Math.log10(r)), 9);
  });

  test('no patterns, faces, equaliser or high-pass count', () => {
    const plain = first(smallLayout());
    const layout = smallLayout();
    layout.schemes[0].system.highPassHz = 400;
    layout.schemes[0].system.equaliser = [-9, -6, -3, 0, 0, 3, 3];
    layout.schemes[0].microphones[0].model = 'bidirectional';
    layout.venue.faces.push(panel(3.5, 0.5, 5.5, 2.6));
    expect(first(layout).loop.distance.limitDb).toBeCloseTo(plain.loop.distance.limitDb ?? Number.NaN, 12);
    expect(Array.from(first(layout).seats.distance.marginDb)).toEqual(Array.from(plain.seats.distance.marginDb));
  });
});

describe('no loop', () => {
  test.each<[string, Partial<Scheme>]>([
    ['no microphone', { microphones: [] }],
    ['no loudspeaker', { loudspeakers: [] }],
    ['no open microphone', { microphones: [microphone('m', [1.6, 2.9, 1.3], { open: false })] }],
    ['nothing sent', { routing: [{ microphone: 'm', loudspeaker: 'l', gain: null }] }],
  ])('%s: silent, null and nothing invented', (_, more) => {
    for (const automix of ['off', 'gain-sharing'] as const) {
      const one = scheme('A', more);
      one.system.automix = automix;
      const { loop, working, seats, room, headroom } = first(withSchemes(one));
      for (const rung of RUNGS) {
        expect(loop[rung]).toMatchObject({ limitDb: null, openMicrophoneCostDb: null, crosspoints: null });
        expect(seats[rung].marginDb.every(Number.isNaN) && seats[rung].potentialDb.every(Number.isNaN)).toBe(true);
        expect(seats[rung].neededDb.every(Number.isFinite)).toBe(true);
      }
      expect(working).toEqual({
        workingGainDb: null,
        regenerationDb: null,
        peakAllowanceDb: null,
        belowPeakAllowance: false,
      });
      expect(room.systemDba.every(Number.isNaN)).toBe(true);
      expect(Array.from(room.totalDba)).toEqual(Array.from(room.unaidedDba));
      expect(room.sti.every((sti) => sti > 0 && sti < 1)).toBe(true);
      for (const { levelDb, headroomDb, powerW } of headroom)
        expect([levelDb, headroomDb, powerW]).toEqual([null, null, 0]);
    }
  });

  test('no seats and no talkers', () => {
    const layout = smallLayout();
    layout.venue.seating = [];
    expect(predict(layout).schemes[0].worstTalker).toHaveLength(0);
    layout.venue.talkers = [];
    expect(predict(layout).schemes[0].talkers).toEqual([]);
  });
});

describe('gain sharing', () => {
  const sharing = (microphones: Scheme['microphones']): Layout => {
    const one = scheme('A', { microphones });
    one.system.automix = 'gain-sharing';
    return withSchemes(one);
  };
  const near = microphone('near', [1.6, 2.9, 1.3]);
  const far = microphone('far', [1.6, 4.6, 1.3]);

  test('the limit in pauses is the talker’s own where no open microphone takes part', () => {
    const { loop } = first(
      sharing([
        { ...near, automix: false },
        { ...far, open: false },
      ]),
    );
    for (const rung of RUNGS) {
      expect(loop[rung].idleLimitDb).toBe(loop[rung].limitDb);
      expect(loop[rung].pauseCostDb).toBe(0);
    }
  });

  test('a pause shares by noise alone: on the distance rung equally', () => {
    const { loop } = first(sharing([near, far]));
    const r = (m: typeof near) => Math.hypot(...m.position.map((c, axis) => c - [2.6, 5.1, 2.3][axis]));
    const mean = (r(near) ** -2 + r(far) ** -2) / 2;
    expect(loop.distance.idleLimitDb).toBeCloseTo(-10 * Math.log10(mean), 9);
    // The far microphone is nearer the loudspeaker, so pauses ring first, and that is charged.
    expect(loop.distance.pauseCostDb).toBeGreaterThan(1);
  });

  test('the working gain keeps the margin below the lower of the two', () => {
    const { loop, working } = first(sharing([near, far]));
    expect(working.workingGainDb).toBeCloseTo(Math.min(loop.room.limitDb ?? 0, loop.room.idleLimitDb ?? 0) - 6, 12);
  });

  test('is null without sharing', () => {
    expect(first(smallLayout()).loop.room.idleLimitDb).toBeNull();
  });
});

test('belowLimit sets the working gain, not the margin', () => {
  const layout = smallLayout();
  const before = first(layout);
  layout.schemes[0].system.belowLimit = 15;
  const after = first(layout);
  expect(after.working.workingGainDb).toBeCloseTo((after.loop.room.limitDb ?? 0) - 15, 12);
  expect(Array.from(after.seats.room.marginDb)).toEqual(Array.from(before.seats.room.marginDb));
  expect(after.working.regenerationDb).toBeCloseTo(-10 * Math.log10(1 - 10 ** -1.5), 9);
});

test('a talker hidden behind a panel has a margin on the directivity rung, but no potential or needed gain', () => {
  const layout = smallLayout();
  layout.venue.faces.push(panel(4, 0, 6, 2));
  layout.schemes[0].loudspeakers[0].position = [4.5, 3, 2.8];
  layout.schemes[0].loudspeakers[0].tilt = -60;
  layout.schemes[0].microphones[0].position = [2, 2.9, 1.6];
  const { seats } = first(layout);
  expect(seats.directivity.potentialDb.every(Number.isNaN)).toBe(true);
  expect(seats.directivity.neededDb.every(Number.isNaN)).toBe(true);
  expect(seats.room.potentialDb.every(Number.isFinite)).toBe(true);
});

describe('a talker’s own seat', () => {
  const layout = smallLayout();
  layout.venue.talkers.push(talker('u', [1.2, 4.5, 1.4]));
  layout.venue.seating.push({
    id: 'T',
    label: '',
    kind: 'list',
    earHeight: 1.2,
    seats: [
      { id: 'T1', position: [1.2, 2.9, 0] },
      { id: 'T2', position: [1.2, 2.9, 0], earHeight: 1.901 },
    ],
  });
  const prediction = predict(layout).schemes[0];
  const seats = predict(layout).seats.map(({ id }) => id);

  test('is within half a metre, and not judged for it', () => {
    expect(prediction.talkers[0].ownSeat[seats.indexOf('T1')]).toBe(1);
    expect(prediction.talkers[0].ownSeat[seats.indexOf('T2')]).toBe(0);
    expect(prediction.worstTalker[seats.indexOf('T1')]).toBe(1);
  });

  test('does not count in the uniformity', () => {
    const [own] = prediction.talkers;
    const levels = Array.from(own.room.totalDba).filter((_, s) => !own.ownSeat[s]);
    expect(own.uniformity.spreadDb).toBeCloseTo(Math.max(...levels) - Math.min(...levels), 12);
    const mean = levels.reduce((a, b) => a + b) / levels.length;
    const variance = levels.reduce((sum, level) => sum + (level - mean) ** 2, 0) / levels.length;
    expect(own.uniformity.deviationDb).toBeCloseTo(Math.sqrt(variance), 9);
  });

  test('of two talkers alike the first is the worst', () => {
    const twins = smallLayout();
    twins.venue.talkers.push(talker('u', [1.2, 2.9, 1.4]));
    expect(Array.from(predict(twins).schemes[0].worstTalker)).toEqual([0, 0, 0, 0, 0, 0]);
  });
});

describe('times', () => {
  test('arrival gap and proposed delay, by hand', () => {
    const layout = smallLayout();
    const { system, loudspeakers } = layout.schemes[0];
    Object.assign(system, { latency: 3, delayHold: 12 });
    loudspeakers[0].delay = 7;
    const { room, proposedDelayMs } = first(layout);
    const apart = (a: readonly number[], b: readonly number[]) => Math.hypot(...a.map((c, axis) => c - b[axis]));
    const ears = [5, 5.9].flatMap((x) => [2, 1.4, 0.8].map((y) => [x, y, 1.2]));
    const gaps = ears.map((ear) => {
      const system1 = apart([1.2, 2.9, 1.4], [1.6, 2.9, 1.3]) + apart([2.6, 5.1, 2.3], ear);
      return (1000 * (system1 - apart([1.2, 2.9, 1.4], ear))) / 343.2 + 3;
    });
    gaps.forEach((gap, s) => {
      expect(room.arrivalGapMs[s]).toBeCloseTo(gap + 7, 6);
    });
    expect(proposedDelayMs[0]).toBeCloseTo(12 - Math.min(...gaps), 6);
    // Delayed as proposed, the talker is 12 ms ahead at the tightest seat.
    loudspeakers[0].delay = proposedDelayMs[0] ?? Number.NaN;
    expect(Math.min(...first(layout).room.arrivalGapMs)).toBeCloseTo(12, 6);
  });

  test('a loudspeaker that serves no seat has no proposal, and none is negative', () => {
    const layout = smallLayout();
    layout.schemes[0].loudspeakers.push(loudspeaker('idle', [0.5, 0.5, 2.5], { gain: -60 }));
    layout.schemes[0].system.latency = 200;
    expect(first(layout).proposedDelayMs).toEqual([0, null]);
  });
});

test('headroom: level at 1 m, crest allowance and watts', () => {
  const { headroom } = first(smallLayout());
  const level = headroom[0].levelDb ?? Number.NaN;
  expect(headroom[0].headroomDb).toBeCloseTo(113 - 12 - level, 9);
  expect(headroom[0].powerW).toBeCloseTo(10 ** ((level - 88) / 10), 9);
});

test('several schemes are predicted as each alone, and only those asked for', () => {
  const other = scheme('B', { loudspeakers: [loudspeaker('x', [4, 3, 2.8], { tilt: -90 })] });
  const layout = withSchemes(scheme('A'), other);
  expect(predict(layout).schemes[1]).toEqual(predict(layout, ['B']).schemes[0]);
  expect(predict(layout, ['B']).schemes.map(({ id }) => id)).toEqual(['B']);
  expect(predict(withSchemes(other)).schemes[0]).toEqual(predict(layout, ['B']).schemes[0]);
});

test('own models come before the catalogue’s of the same id', () => {
  const layout = smallLayout();
  layout.models.push({
    id: 'cardioid',
    label: '',
    kind: 'microphone',
    pattern: { type: 'first-order', alpha: flat(1) },
  });
  const plain = smallLayout();
  plain.schemes[0].microphones[0].model = 'omni';
  expect(first(layout).loop).toEqual(first(plain).loop);
});

test('a layout with errors is answered with them and no prediction', () => {
  const layout = smallLayout();
  layout.venue.talkers[0].position = [50, 0, 0];
  const given = answer({ revision: 7, layout, schemeIds: ['A'] });
  expect(given.revision).toBe(7);
  expect(given.prediction).toBeNull();
  expect(given.problems).toHaveLength(1);
});

test('predicting changes nothing of the layout and is repeatable', () => {
  const layout = smallLayout();
  const before = JSON.stringify(layout);
  const once = predict(layout);
  expect(predict(layout)).toEqual(once);
  expect(JSON.stringify(layout)).toBe(before);
});
