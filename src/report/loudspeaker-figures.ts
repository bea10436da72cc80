import type { SchemePrediction, TalkerPrediction } from '../predict/prediction';

export interface LoudspeakerFigures {
  delay: { talkerId: string; proposedMs: number } | null;
  level: { talkerId: string; levelDb: number; headroomDb: number | null; powerW: number | null } | null;
}

/** What a loudspeaker is asked for: the delay that keeps every talker meant first, and the level of the loudest. */
export function loudspeakerFigures(scheme: SchemePrediction, chosen: string | null, id: string): LoudspeakerFigures {
  const l = scheme.loudspeakerIds.indexOf(id);
  if (l < 0) return { delay: null, level: null };
  const meant = talkersMeant(scheme, chosen);
  const negative = (value: number | null | undefined) => (value == null ? null : -value);
  const latest = least(meant, (talker) => negative(talker.proposedDelayMs[l]));
  const loudest = least(meant, (talker) => negative(talker.headroom[l]?.levelDb));
  return {
    delay: latest === null ? null : { talkerId: latest.talker.id, proposedMs: -latest.value + 0 },
    level:
      loudest === null
        ? null
        : { talkerId: loudest.talker.id, levelDb: -loudest.value, ...headroomOf(loudest.talker, l) },
  };
}

function headroomOf(talker: TalkerPrediction, l: number): { headroomDb: number | null; powerW: number | null } {
  const { headroomDb, powerW } = talker.headroom[l];
  return { headroomDb, powerW };
}

/**
 * Total delay of each loudspeaker in ms that keeps every talker meant first at every seat it serves, rounded up to
 * 0.1 ms; null where it serves no seat. In the order of loudspeakers.
 */
export const proposedDelays = (scheme: SchemePrediction, chosen: string | null): (number | null)[] =>
  scheme.loudspeakerIds.map((id) => {
    const { delay } = loudspeakerFigures(scheme, chosen, id);
    return delay === null ? null : Math.ceil(10 * delay.proposedMs) / 10;
  });

/** The talkers whose figures are shown: the one chosen, else all. */
export function talkersMeant(scheme: SchemePrediction, chosen: string | null): TalkerPrediction[] {
  return scheme.talkers.filter((talker) => chosen === null || talker.id === chosen);
}

/** The talker of the least figure (or the first), with the figure; null where none has one. */
export function least<T>(
  talkers: readonly T[],
  figure: (talker: T) => number | null,
): { talker: T; value: number } | null {
  let found: { talker: T; value: number } | null = null;
  for (const talker of talkers) {
    const value = figure(talker);
    if (value !== null && Number.isFinite(value) && (found === null || value < found.value)) found = { talker, value };
  }
  return found;
}
