import type { Layout } from './schema';

/** A talker's name as people read it: its label, its id where it has none. */
export const talkerLabel = (layout: Layout, id: string): string =>
  layout.venue.talkers.find((talker) => talker.id === id)?.label || id;
