import { expect, it } from 'vitest';
import { criticalTalker, loopShare, nearestTalker } from '../../src/panels/device-figures';
import type { SchemePrediction } from '../../src/predict/prediction';
import { loudspeakerFigures } from '../../src/report/loudspeaker-figures';

/** Two microphones, three loudspeakers, two talkers; only what the figures read. */
const scheme = {
  microphoneIds: ['m1', 'm2'],
  loudspeakerIds: ['l1', 'l2', 'l3'],
  talkers: [
    {
      id: 'a',
      loop: { room: { limitDb: 4, crosspoints: Float64Array.of(0.1, 0.2, 0.05, 0.25, 0.3, 0.1) } },
      proposedDelayMs: [12, 0, null],
      headroom: [
        { levelDb: 70, headroomDb: 20, powerW: 0.1 },
        { levelDb: null, headroomDb: null, powerW: null },
        { levelDb: 60, headroomDb: null, powerW: null },
      ],
    },
    {
      id: 'b',
      loop: { room: { limitDb: 9, crosspoints: Float64Array.of(0.6, 0.4, 0, 0, 0, 0) } },
      proposedDelayMs: [15, null, null],
      headroom: [
        { levelDb: 65, headroomDb: 25, powerW: 0.05 },
        { levelDb: null, headroomDb: null, powerW: null },
        { levelDb: 62, headroomDb: 3, powerW: 1 },
      ],
    },
  ],
} as unknown as SchemePrediction;

it('takes the talker whose loop may be raised least, or the one chosen', () => {
  expect(criticalTalker(scheme, null)?.id).toBe('a');
  expect(criticalTalker(scheme, 'b')?.id).toBe('b');
});

it('sums a microphone over its loudspeakers and a loudspeaker over its microphones', () => {
  const microphone = loopShare(scheme, null, 'microphone', 'm2');
  expect(microphone?.share).toBeCloseTo(0.65, 12);
  expect(microphone?.through).toBe('l2');
  const loudspeaker = loopShare(scheme, null, 'loudspeaker', 'l1');
  expect(loudspeaker?.share).toBeCloseTo(0.35, 12);
  expect(loudspeaker).toMatchObject({ through: 'm2', talkerId: 'a' });
  expect(loopShare(scheme, null, 'loudspeaker', 'added since')).toBeNull();
});

it('proposes the delay that keeps every talker first, and the level of the loudest', () => {
  expect(loudspeakerFigures(scheme, null, 'l1')).toEqual({
    delay: { talkerId: 'b', proposedMs: 15 },
    level: { talkerId: 'a', levelDb: 70, headroomDb: 20, powerW: 0.1 },
  });
  expect(loudspeakerFigures(scheme, 'b', 'l3').level).toMatchObject({ talkerId: 'b', levelDb: 62, headroomDb: 3 });
  expect(loudspeakerFigures(scheme, null, 'l2')).toEqual({ delay: { talkerId: 'a', proposedMs: 0 }, level: null });
});

it('measures to the nearest talker', () => {
  const talkers = [
    { id: 'far', position: [9, 0, 0] },
    { id: 'near', position: [3, 4, 0] },
  ] as never;
  expect(nearestTalker(talkers, [0, 0, 0])).toMatchObject({ talker: { id: 'near' }, distanceM: 5 });
  expect(nearestTalker([], [0, 0, 0])).toBeNull();
});
