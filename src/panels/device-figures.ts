import type { Talker } from '../layout/schema';
import type { SchemePrediction, TalkerPrediction } from '../predict/prediction';
import { least, talkersMeant } from '../report/loudspeaker-figures';

/** The talker whose loop may be raised least, of those meant. */
export function criticalTalker(scheme: SchemePrediction, chosen: string | null): TalkerPrediction | null {
  const meant = talkersMeant(scheme, chosen);
  return least(meant, ({ loop }) => loop.room.limitDb)?.talker ?? meant[0] ?? null;
}

export interface LoopShare {
  /** Part of the loop that goes through the device, 0…1. */
  share: number;
  /** The device at the other end that carries most of it. */
  through: string;
  talkerId: string;
}

/** A device's share of the loop in the room, for the most critical talker meant; null without a loop. */
export function loopShare(
  scheme: SchemePrediction,
  chosen: string | null,
  kind: 'microphone' | 'loudspeaker',
  id: string,
): LoopShare | null {
  const talker = criticalTalker(scheme, chosen);
  const crosspoints = talker?.loop.room.crosspoints ?? null;
  const [own, others] =
    kind === 'microphone'
      ? [scheme.microphoneIds.indexOf(id), scheme.loudspeakerIds]
      : [scheme.loudspeakerIds.indexOf(id), scheme.microphoneIds];
  if (talker === null || crosspoints === null || own < 0) return null;
  const wide = scheme.loudspeakerIds.length;
  const parts = others.map((_, other) => crosspoints[kind === 'microphone' ? own * wide + other : other * wide + own]);
  const share = parts.reduce((sum, part) => sum + part, 0);
  return { share, through: others[parts.indexOf(Math.max(...parts))] ?? '', talkerId: talker.id };
}

/** The talker nearest to a place, and how far; null where there is none. */
export function nearestTalker(
  talkers: readonly Talker[],
  position: readonly number[],
): { talker: Talker; distanceM: number } | null {
  const nearest = least(talkers, (talker) =>
    Math.hypot(...[0, 1, 2].map((axis) => talker.position[axis] - position[axis])),
  );
  return nearest === null ? null : { talker: nearest.talker, distanceM: nearest.value };
}
