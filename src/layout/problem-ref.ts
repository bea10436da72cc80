import type { Ref } from './ref';
import type { Layout } from './schema';

/** The thing a problem's path leads to, and its name for a sentence; the path itself where it leads to no one thing. */
export function refOfPath(layout: Layout, path: string): { text: string; ref: Ref | null } {
  const inVenue = /^venue\.(finishes|faces|seating|talkers)\[(\d+)\]/.exec(path);
  if (inVenue !== null) {
    const [, list, index] = inVenue;
    const kind = ({ finishes: 'finish', faces: 'face', seating: 'seating', talkers: 'talker' } as const)[
      list as 'finishes' | 'faces' | 'seating' | 'talkers'
    ];
    const item = layout.venue[list as 'finishes' | 'faces' | 'seating' | 'talkers'][Number(index)];
    if (item !== undefined) return { text: item.id, ref: { kind, id: item.id } };
  }
  const inScheme = /^schemes\[(\d+)\]\.(microphones|loudspeakers)\[(\d+)\]/.exec(path);
  if (inScheme !== null) {
    const [, scheme, list, index] = inScheme;
    const kind = list === 'microphones' ? 'microphone' : 'loudspeaker';
    const item = layout.schemes[Number(scheme)]?.[list as 'microphones' | 'loudspeakers'][Number(index)];
    if (item !== undefined)
      return { text: `${item.id} of scheme ${layout.schemes[Number(scheme)].id}`, ref: { kind, id: item.id } };
  }
  return { text: path, ref: null };
}
