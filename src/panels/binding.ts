import type { Draft } from 'immer';
import type { Phase } from '../controls/QuantityField';
import { editLoudspeaker, editMicrophone, editTalker } from '../layout/edits';
import type { Ref } from '../layout/ref';
import type { Layout, Loudspeaker, Microphone, Talker } from '../layout/schema';
import { useSession } from '../session/session';

/** What a field needs to write to the layout. */
export interface Binding<T> {
  onChange: (value: T, phase: Phase) => void;
  onCancel: () => void;
}

/**
 * Lets a field write to the layout: everything typed, nudged or dragged until it is settled is one step of undo, named
 * `label`; `mark` tells this field from all others.
 */
export function bind<T>(label: string, mark: string, change: (layout: Layout, value: T) => Layout): Binding<T> {
  return {
    onChange(value, phase) {
      const session = useSession.getState();
      session.edit(label, (layout) => change(layout, value), mark);
      if (phase === 'commit') session.endEdit();
    },
    onCancel: () => useSession.getState().cancelEdit(),
  };
}

/** One step of undo by itself. */
export function editOnce(label: string, change: (layout: Layout) => Layout): void {
  const session = useSession.getState();
  session.endEdit();
  session.edit(label, change);
}

/** What has a place and a turn. */
export type Placed = Talker | Microphone | Loudspeaker;
export type DeviceRef = Ref & { kind: 'talker' | 'microphone' | 'loudspeaker' };

/** Changes a talker, microphone or loudspeaker. */
export function changePlaced(
  layout: Layout,
  schemeId: string,
  ref: DeviceRef,
  change: (device: Draft<Placed>) => void,
): Layout {
  switch (ref.kind) {
    case 'talker':
      return editTalker(layout, ref.id, change);
    case 'microphone':
      return editMicrophone(layout, schemeId, ref.id, change);
    case 'loudspeaker':
      return editLoudspeaker(layout, schemeId, ref.id, change);
  }
}
