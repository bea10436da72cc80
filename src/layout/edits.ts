import { type Draft, produce } from 'immer';
import { findModel } from './catalogue';
import type { Ref } from './ref';
import type { Layout, Loudspeaker, Microphone, Scheme, Seating, Talker } from './schema';
import { seatsOf } from './seating';

/**
 * Edits of a layout. Each takes a layout and returns another, sharing what did not change; none fails: an edit of a
 * thing that is not there returns the layout as it was.
 */

/** Changes the scheme of an id. */
export function editScheme(layout: Layout, schemeId: string, change: (scheme: Draft<Scheme>) => void): Layout {
  return produce(layout, (draft) => {
    const scheme = draft.schemes.find((candidate) => candidate.id === schemeId);
    if (scheme !== undefined) change(scheme);
  });
}

export function editMicrophone(
  layout: Layout,
  schemeId: string,
  id: string,
  change: (microphone: Draft<Microphone>) => void,
): Layout {
  return editScheme(layout, schemeId, (scheme) => {
    const microphone = scheme.microphones.find((candidate) => candidate.id === id);
    if (microphone !== undefined) change(microphone);
  });
}

export function editLoudspeaker(
  layout: Layout,
  schemeId: string,
  id: string,
  change: (loudspeaker: Draft<Loudspeaker>) => void,
): Layout {
  return editScheme(layout, schemeId, (scheme) => {
    const loudspeaker = scheme.loudspeakers.find((candidate) => candidate.id === id);
    if (loudspeaker !== undefined) change(loudspeaker);
  });
}

/** Sets the delays of a scheme's loudspeakers in ms, in their order; null leaves one as it is. */
export function setDelays(layout: Layout, schemeId: string, delaysMs: readonly (number | null)[]): Layout {
  return editScheme(layout, schemeId, (scheme) => {
    scheme.loudspeakers.forEach((loudspeaker, l) => {
      loudspeaker.delay = delaysMs[l] ?? loudspeaker.delay;
    });
  });
}

export function editTalker(layout: Layout, id: string, change: (talker: Draft<Talker>) => void): Layout {
  return produce(layout, (draft) => {
    const talker = draft.venue.talkers.find((candidate) => candidate.id === id);
    if (talker !== undefined) change(talker);
  });
}

/** Sends a microphone to a loudspeaker at a gain in dB, or (null) not at all. 0 dB is what a pair not listed has. */
export function setSend(
  layout: Layout,
  schemeId: string,
  microphone: string,
  loudspeaker: string,
  gain: number | null,
): Layout {
  return editScheme(layout, schemeId, (scheme) => {
    const at = scheme.routing.findIndex((send) => send.microphone === microphone && send.loudspeaker === loudspeaker);
    if (at >= 0 && gain === 0) scheme.routing.splice(at, 1);
    else if (at >= 0) scheme.routing[at].gain = gain;
    else if (gain !== 0) scheme.routing.push({ microphone, loudspeaker, gain });
  });
}

/** Gain of a crosspoint in dB, null where it is not sent. */
export function sendGain(scheme: Scheme, microphone: string, loudspeaker: string): number | null {
  const send = scheme.routing.find((pair) => pair.microphone === microphone && pair.loudspeaker === loudspeaker);
  return send === undefined ? 0 : send.gain;
}

/** The first of `stem1`, `stem2`, … (or stem itself when it ends in no digit and is free) that is not taken. */
export function freeId(taken: readonly { id: string }[], wanted: string): string {
  const ids = new Set(taken.map((item) => item.id));
  if (!ids.has(wanted)) return wanted;
  const stem = wanted.replace(/\d+$/, '');
  for (let n = 1; ; n++) if (!ids.has(`${stem}${n}`)) return `${stem}${n}`;
}

/** Things of this kind can be added, copied and taken away one by one. */
export const CAN_COPY = ['talker', 'microphone', 'loudspeaker', 'seating', 'finish', 'scheme'] as const;
export type Copied = (typeof CAN_COPY)[number];
export const canCopy = (ref: Ref | null): ref is Ref & { kind: Copied } =>
  ref !== null && (CAN_COPY as readonly string[]).includes(ref.kind);

/** A copy of a thing beside it, and the ref of the copy; null where it cannot be copied. */
export function duplicate(layout: Layout, schemeId: string, ref: Ref): { layout: Layout; ref: Ref } | null {
  if (!canCopy(ref)) return null;
  let made: string | null = null;
  const next = produce(layout, (draft) => {
    const list = listOf(draft, schemeId, ref.kind);
    const at = list?.findIndex((item) => item.id === ref.id) ?? -1;
    if (list === null || at < 0) return;
    const original = JSON.parse(JSON.stringify(list[at])) as { id: string; position?: number[] };
    made = ref.kind === 'scheme' ? freeLetter(draft.schemes) : freeId(list, ref.id);
    const copy = { ...original, id: made };
    if (ref.kind === 'talker' || ref.kind === 'microphone' || ref.kind === 'loudspeaker') {
      copy.position = original.position?.map((c, axis) => (axis === 1 ? c + 0.5 : c));
    }
    if (ref.kind === 'seating') nameCopiedSeats(layout, copy as Draft<Seating>, ref.id);
    list.splice(at + 1, 0, copy as never);
    if (ref.kind === 'microphone' || ref.kind === 'loudspeaker') copySends(draft, schemeId, ref, made);
  });
  return made === null ? null : { layout: next, ref: { kind: ref.kind, id: made } };
}

/** The layout without a thing and without what pointed to it; unchanged where it is the last scheme or still in use. */
export function remove(layout: Layout, schemeId: string, ref: Ref): Layout {
  return produce(layout, (draft) => {
    if (whyKept(layout, ref) !== null) return;
    const list = listOf(draft, schemeId, ref.kind);
    const at = list?.findIndex((item) => item.id === ref.id) ?? -1;
    if (list === null || at < 0) return;
    list.splice(at, 1);
    if (ref.kind !== 'microphone' && ref.kind !== 'loudspeaker') return;
    const scheme = draft.schemes.find((candidate) => candidate.id === schemeId);
    const kind = ref.kind;
    if (scheme !== undefined) scheme.routing = scheme.routing.filter((send) => send[kind] !== ref.id);
  });
}

/** Why a thing cannot be taken away, null where it can. */
export function whyKept(layout: Layout, ref: Ref): string | null {
  if (ref.kind === 'scheme' && layout.schemes.length === 1) return 'A layout has at least one scheme.';
  if (ref.kind === 'finish') {
    const faces = layout.venue.faces.filter((face) => face.finish === ref.id);
    if (faces.length > 0) return `${ref.id} is on ${faces.map((face) => face.id).join(', ')}.`;
  }
  return canCopy(ref) ? null : 'This cannot be taken away.';
}

type AnyList = { id: string }[];

function listOf(draft: Draft<Layout>, schemeId: string, kind: Ref['kind']): AnyList | null {
  const scheme = draft.schemes.find((candidate) => candidate.id === schemeId);
  switch (kind) {
    case 'talker':
      return draft.venue.talkers;
    case 'seating':
      return draft.venue.seating;
    case 'finish':
      return draft.venue.finishes;
    case 'face':
      return draft.venue.faces;
    case 'scheme':
      return draft.schemes;
    case 'microphone':
      return scheme?.microphones ?? null;
    case 'loudspeaker':
      return scheme?.loudspeakers ?? null;
    default:
      return null;
  }
}

/** Schemes are lettered: the first free capital, then AA and on. */
function freeLetter(schemes: readonly { id: string }[]): string {
  const letters = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ';
  const ids = new Set(schemes.map((scheme) => scheme.id));
  for (const first of ['', ...letters])
    for (const letter of letters) if (!ids.has(first + letter)) return first + letter;
  return freeId(schemes, 'A1');
}

/** Seat ids are unique over the venue: a copied list's seats are numbered under its id, a block's are named by it anyway. */
function nameCopiedSeats(layout: Layout, copy: Draft<Seating>, from: string): void {
  if (copy.kind === 'block') {
    renameSeats(copy, from, copy.id);
    return;
  }
  const taken = new Set(seatsOf(layout.venue.seating).map((seat) => seat.id));
  let number = 0;
  for (const seat of copy.seats) {
    do number++;
    while (taken.has(`${copy.id}-${number}`));
    seat.id = `${copy.id}-${number}`;
  }
}

/** What is named after its block or list is renamed with it. */
function renameSeats(part: Draft<Seating>, from: string, to: string): void {
  const renamed = (id: string) => (id.startsWith(from) ? to + id.slice(from.length) : `${to}-${id}`);
  if (part.kind === 'block') part.omit = part.omit.map(renamed);
  else for (const seat of part.seats) seat.id = renamed(seat.id);
}

function copySends(draft: Draft<Layout>, schemeId: string, ref: Ref, made: string): void {
  const scheme = draft.schemes.find((candidate) => candidate.id === schemeId);
  const kind = ref.kind as 'microphone' | 'loudspeaker';
  scheme?.routing.push(
    ...scheme.routing.filter((send) => send[kind] === ref.id).map((send) => ({ ...send, [kind]: made })),
  );
}

/** The layout with a thing renamed, and everything that points to it; unchanged where the id is taken or empty. */
export function rename(layout: Layout, schemeId: string, ref: Ref, id: string): Layout {
  return produce(layout, (draft) => {
    const list = listOf(draft, schemeId, ref.kind);
    const item = list?.find((candidate) => candidate.id === ref.id);
    if (list === null || item === undefined || id === '' || list.some((other) => other.id === id)) return;
    if (ref.kind === 'seating') renameSeats(item as Draft<Seating>, ref.id, id);
    item.id = id;
    const { kind } = ref;
    if (kind === 'finish') for (const face of draft.venue.faces) if (face.finish === ref.id) face.finish = id;
    if (kind === 'face') {
      for (const scheme of draft.schemes) {
        for (const device of [...scheme.microphones, ...scheme.loudspeakers])
          if (device.host === ref.id) device.host = id;
      }
    }
    if (kind === 'microphone' || kind === 'loudspeaker') {
      const scheme = draft.schemes.find((candidate) => candidate.id === schemeId);
      for (const send of scheme?.routing ?? []) if (send[kind] === ref.id) send[kind] = id;
    }
  });
}

/** A new talker, microphone or loudspeaker at a place, or a block of seats, and its ref. */
export function add(
  layout: Layout,
  schemeId: string,
  kind: 'talker' | 'microphone' | 'loudspeaker' | 'seating',
  place: [number, number, number],
): { layout: Layout; ref: Ref } {
  const taken = listOf(layout as Draft<Layout>, schemeId, kind) ?? [];
  const stems = { talker: 't1', microphone: 'm1', loudspeaker: 'l1', seating: 'S' };
  const id = kind === 'seating' ? freeLetter(taken) : freeId(taken, stems[kind]);
  const next = produce(layout, (draft) => {
    const list = listOf(draft, schemeId, kind) as unknown[] | null;
    list?.push(fresh(layout, kind, id, place));
  });
  return { layout: next, ref: { kind, id } };
}

function fresh(
  layout: Layout,
  kind: 'talker' | 'microphone' | 'loudspeaker' | 'seating',
  id: string,
  place: [number, number, number],
): object {
  const [x, y, z] = place;
  const turned = { pan: 0, tilt: 0 };
  switch (kind) {
    case 'talker':
      return { id, label: '', position: [x, y, z + 1.5], ...turned, effort: 'normal', model: 'talker' };
    case 'microphone': {
      const model = findModel(layout, 'cardioid', 'microphone') === undefined ? 'omni' : 'cardioid';
      return {
        id,
        label: '',
        position: [x, y, z + 1.2],
        pan: 180,
        tilt: 0,
        roll: 0,
        model,
        open: true,
        automix: true,
        host: null,
      };
    }
    case 'loudspeaker':
      return {
        id,
        label: '',
        position: [x, y, z + 2],
        ...turned,
        roll: 0,
        model: 'box-small',
        gain: 0,
        delay: 0,
        host: null,
      };
    case 'seating':
      return {
        id,
        label: '',
        kind: 'block',
        origin: [x, y, z],
        facing: 180,
        rows: 2,
        columns: 4,
        rowSpacing: 0.95,
        seatSpacing: 0.6,
        rise: 0,
        radius: null,
        earHeight: 1.2,
        omit: [],
      };
  }
}
