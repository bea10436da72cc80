import { readLayout } from './read';
import { LAYOUT_VERSION, type Layout } from './schema';

/** A layout with nothing in it yet: what the page holds before one is opened. */
export function emptyLayout(): Layout {
  const outcome = readLayout({
    format: 'gainwright-layout',
    version: LAYOUT_VERSION,
    venue: { finishes: [], faces: [], seating: [], talkers: [] },
    need: { kind: 'distance', metres: 3 },
    schemes: [{ id: 'A', microphones: [], loudspeakers: [] }],
  });
  if (!outcome.ok) throw new Error('The empty layout does not fit the schema.');
  return outcome.value;
}
