import { findModel } from '../layout/catalogue';
import type { Ref, RefKind } from '../layout/ref';
import type { DeviceKind, Layout, Scheme, Seating } from '../layout/schema';
import { seatsOf } from '../layout/seating';
import { count } from '../report/figures';

/** One row of the list: a thing, its label, and a few words at the right. */
export interface ListedItem {
  ref: Ref;
  label: string;
  detail: string;
}

export interface ListedGroup {
  kind: RefKind;
  label: string;
  /** How many, as shown at the right. */
  total: string;
  items: ListedItem[];
}

/** Everything in the layout by kind, things of the scheme given among them. */
export function listGroups(layout: Layout, scheme: Scheme): ListedGroup[] {
  const { venue } = layout;
  const model = (id: string, kind: DeviceKind) => findModel(layout, id, kind)?.label || id;
  const seats = venue.seating.map((part) => seatsOf([part]).length);
  const group = (kind: RefKind, label: string, items: ListedItem[], total = String(items.length)) => ({
    kind,
    label,
    total,
    items,
  });
  const item = (kind: RefKind, thing: { id: string; label?: string }, detail: string): ListedItem => ({
    ref: { kind, id: thing.id },
    label: thing.label ?? '',
    detail,
  });
  const finishLabel = (id: string) => venue.finishes.find((finish) => finish.id === id)?.label || id;
  return [
    group(
      'talker',
      'Talkers',
      venue.talkers.map((t) => item('talker', t, t.level == null ? t.effort.replace('-', ' ') : `${t.level} dBA`)),
    ),
    group(
      'microphone',
      'Microphones',
      scheme.microphones.map((m) => item('microphone', m, model(m.model, 'microphone') + (m.open ? '' : ', closed'))),
    ),
    group(
      'loudspeaker',
      'Loudspeakers',
      scheme.loudspeakers.map((l) => item('loudspeaker', l, model(l.model, 'loudspeaker'))),
    ),
    group(
      'seating',
      'Seating',
      venue.seating.map((part: Seating, i) => item('seating', part, count(seats[i], 'seat'))),
      count(
        seats.reduce((sum, n) => sum + n, 0),
        'seat',
      ),
    ),
    group(
      'face',
      'Faces',
      venue.faces.map((face) => item('face', { id: face.id }, finishLabel(face.finish))),
    ),
    group(
      'finish',
      'Finishes',
      venue.finishes.map((finish) => item('finish', finish, mid(finish.absorption))),
    ),
  ];
}

/** Absorption at 1 kHz, the figure people know a finish by. */
const mid = (absorption: readonly number[]): string => absorption[3].toFixed(2);

/** The items that carry every word of the query in id, label or detail, case aside; groups without any are left out. */
export function searchGroups(groups: readonly ListedGroup[], query: string): ListedGroup[] {
  const words = query.toLowerCase().split(/\s+/).filter(Boolean);
  if (words.length === 0) return [...groups];
  return groups.flatMap((group) => {
    const items = group.items.filter((item) => {
      const text = `${item.ref.id} ${item.label} ${item.detail} ${group.label}`.toLowerCase();
      return words.every((word) => text.includes(word));
    });
    return items.length === 0 ? [] : [{ ...group, items, total: `${items.length} of ${group.items.length}` }];
  });
}

/** A row's key in the list, and back. Kinds have no colon in them. */
export const keyOf = (ref: Ref): string => `${ref.kind}:${ref.id}`;

export function refOf(key: string): Ref {
  const colon = key.indexOf(':');
  return { kind: key.slice(0, colon) as RefKind, id: key.slice(colon + 1) };
}

/** The thing of the list that a selection belongs to: a seat's block, else the thing itself. */
export function listedRef(layout: Layout, selection: Ref | null): Ref | null {
  if (selection?.kind !== 'seat') return selection;
  const seat = seatsOf(layout.venue.seating).find((candidate) => candidate.id === selection.id);
  return seat === undefined ? null : { kind: 'seating', id: layout.venue.seating[seat.seating].id };
}
