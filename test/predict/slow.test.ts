import { expect, test } from 'vitest';
import { checkLayout } from '../../src/layout/check';
import type { Layout } from '../../src/layout/schema';
import { predict } from '../../src/predict/run';
import { loudspeaker, lShape, microphone, panel, scheme, smallLayout, talker } from '../support/layouts';
import { slowPrediction } from '../support/slow-prediction';

/** An L with a panel, uneven finishes, a given decay and one of most things: much that the worked examples leave out. */
function intricate(reflectionOrder: number): Layout {
  const layout = smallLayout();
  const { venue } = layout;
  Object.assign(venue, { reflectionOrder, noise: { levels: [50, 44, 38, 33, 30, 28, 25] } });
  venue.air = { temperature: 26, humidity: 33, pressure: 97 };
  venue.finishes = [
    { id: 'wall', label: '', source: 'invented', absorption: [0.05, 0.08, 0.1, 0.15, 0.2, 0.25, 0.3] },
    { id: 'soft', label: '', source: 'invented', absorption: [0.3, 0.5, 0.8, 0.95, 1, 1, 0.9] },
  ];
  venue.faces = [...lShape(), panel(2.6, 0.4, 1.7, 1.8)];
  venue.faces[1].finish = 'soft';
  venue.faces[4].finish = 'soft';
  venue.decay = { model: 'given', seconds: [0.9, 0.8, 0.7, 0.6, 0.55, 0.5, 0.4] };
  venue.talkers = [talker('t', [0.9, 1.2, 1.5], { pan: 15, tilt: -10, effort: 'raised' })];
  venue.seating = [
    {
      id: 'S',
      label: '',
      kind: 'list',
      earHeight: 1.2,
      seats: [
        { id: 'S1', position: [5.1, 1.4, 0] },
        { id: 'S2', position: [1.2, 5.2, 0] },
        { id: 'S3', position: [3.4, 1.1, 0] },
      ],
    },
  ];
  layout.need = { kind: 'noise', signalToNoise: 20 };
  layout.schemes = [
    scheme('A', {
      microphones: [
        microphone('m1', [1.2, 1.3, 1.3], { model: 'supercardioid', pan: 200, tilt: 10 }),
        microphone('m2', [2, 2.4, 0], { model: 'boundary', pan: 0, tilt: 90, host: 'floor' }),
        microphone('m3', [1.1, 3.6, 1.1], { model: 'tube-250', pan: -80, automix: false }),
      ],
      loudspeakers: [
        loudspeaker('l1', [4, 2.6, 2.4], { model: 'horn-90x40', pan: -30, tilt: -20, roll: 12, gain: -2 }),
        loudspeaker('l2', [2, 4.5, 3], { model: 'ceiling-160', tilt: -90, host: 'ceiling', gain: 3 }),
        loudspeaker('l3', [5.5, 0.5, 1.6], { model: 'column-8', pan: 160, roll: -4 }),
      ],
      routing: [
        { microphone: 'm1', loudspeaker: 'l2', gain: null },
        { microphone: 'm2', loudspeaker: 'l1', gain: -7.5 },
        { microphone: 'm3', loudspeaker: 'l3', gain: 4 },
      ],
    }),
  ];
  Object.assign(layout.schemes[0].system, {
    automix: 'gain-sharing',
    highPassHz: 150,
    equaliser: [-3, -2, -6, 0, 1, 2, -4],
    stabilityMargin: 8,
  });
  return layout;
}

test.each([0, 1, 2])(
  'limits, margins and potential gains agree with the formulas worked one path at a time, order %d',
  { timeout: 120_000 },
  (order) => {
    const layout = intricate(order);
    expect(checkLayout(layout)).toEqual([]);
    const slow = slowPrediction(layout, 81);
    const [found] = predict(layout).schemes[0].talkers;
    for (const rung of ['distance', 'directivity', 'room'] as const) {
      expect(found.loop[rung].limitDb).toBeCloseTo(slow[rung].limitDb, 6);
      expect(found.loop[rung].idleLimitDb).toBeCloseTo(slow[rung].idleLimitDb ?? Number.NaN, 6);
      slow[rung].marginDb.forEach((marginDb, s) => {
        expect(found.seats[rung].marginDb[s], `${rung}, seat ${s}`).toBeCloseTo(marginDb, 6);
        if (Number.isFinite(slow[rung].potentialDb[s])) {
          expect(found.seats[rung].potentialDb[s]).toBeCloseTo(slow[rung].potentialDb[s], 6);
        } else expect(found.seats[rung].potentialDb[s]).toBeNaN();
      });
    }
  },
);
