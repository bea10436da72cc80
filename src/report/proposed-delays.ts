import type { SchemePrediction } from '../predict/prediction';

/**
 * Total delay of each loudspeaker in ms that keeps the talker chosen, or every talker, first at every seat it serves:
 * the greatest of those proposed, rounded up to 0.1 ms. Null where it serves no seat. In the order of loudspeakers.
 */
export function proposedDelays(scheme: SchemePrediction, chosen: string | null): (number | null)[] {
  const meant = scheme.talkers.filter((talker) => chosen === null || talker.id === chosen);
  return scheme.loudspeakerIds.map((_, l) =>
    meant.reduce<number | null>((most, talker) => {
      const proposed = talker.proposedDelayMs[l];
      return proposed === null ? most : Math.max(most ?? 0, Math.ceil(10 * proposed) / 10);
    }, null),
  );
}
