import type { Problem } from '../layout/problem';
import type { Ref } from '../layout/ref';
import type { Layout } from '../layout/schema';

/** Where in the file a thing lies, null where it is not there. */
export function placeOf(layout: Layout, schemeId: string, ref: Ref): string | null {
  const { venue, schemes } = layout;
  const s = schemes.findIndex((scheme) => scheme.id === schemeId);
  const at = (path: string, list: readonly { id: string }[] | undefined) => {
    const i = list?.findIndex((item) => item.id === ref.id) ?? -1;
    return i < 0 ? null : `${path}[${i}]`;
  };
  switch (ref.kind) {
    case 'talker':
      return at('venue.talkers', venue.talkers);
    case 'seating':
      return at('venue.seating', venue.seating);
    case 'face':
      return at('venue.faces', venue.faces);
    case 'finish':
      return at('venue.finishes', venue.finishes);
    case 'view':
      return at('venue.views', venue.views);
    case 'scheme':
      return at('schemes', schemes);
    case 'microphone':
      return at(`schemes[${s}].microphones`, schemes[s]?.microphones);
    case 'loudspeaker':
      return at(`schemes[${s}].loudspeakers`, schemes[s]?.loudspeakers);
    case 'routing':
      return `schemes[${s}].routing`;
    case 'system':
      return `schemes[${s}].system`;
    default:
      return null;
  }
}

/** A problem of one thing, with the place inside it: `position`, `corners[2]`, or empty for the thing as a whole. */
export interface ItemProblem {
  at: string;
  problem: Problem;
}

/** The problems that lie at or inside a place of the file; those of a scheme's parts are told at the parts. */
export function problemsAt(problems: readonly Problem[], place: string): ItemProblem[] {
  return problems.flatMap((problem) => {
    if (problem.path !== place && !/^[.[]/.test(problem.path.slice(place.length))) return [];
    if (!problem.path.startsWith(place)) return [];
    return [{ at: problem.path.slice(place.length).replace(/^\./, ''), problem }];
  });
}

/** The ones that a row of fields shows: those whose place begins with one of its own. */
export const problemsOn = (problems: readonly ItemProblem[], places: readonly string[]): ItemProblem[] =>
  problems.filter(({ at }) => places.some((place) => at === place || at.startsWith(`${place}[`)));
