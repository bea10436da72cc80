import council from '../../data/layouts/council-chamber.layout.json';
import { readLayout } from '../layout/read';
import { useSession } from '../session/session';
import { unsaved } from './files';
import { tell } from './notice';

/** The worked venues one can open to look around. The first opens on a first visit; the others load when asked for. */
export const VENUES: readonly { label: string; fileName: string; load: () => Promise<{ default: unknown }> }[] = [
  {
    label: 'Council chamber',
    fileName: 'council-chamber.layout.json',
    load: () => Promise.resolve({ default: council }),
  },
  {
    label: 'Recital hall',
    fileName: 'recital-hall.layout.json',
    load: () => import('../../data/layouts/recital-hall.layout.json'),
  },
  {
    label: 'Meeting room',
    fileName: 'meeting-room.layout.json',
    load: () => import('../../data/layouts/meeting-room.layout.json'),
  },
];

/** Opens the venue every first visit begins with. */
export function openFirst(): void {
  show(council, VENUES[0].fileName);
}

/** Opens a worked venue by its place in the list, asking first where it would replace unsaved work. */
export async function openVenue(index: number): Promise<void> {
  const { label, fileName, load } = VENUES[index];
  const value = (await load()).default;
  if (!unsaved()) {
    show(value, fileName);
    return;
  }
  tell(
    'Give up the changes to the open layout?',
    [`Opening the ${label.toLowerCase()} replaces it.`],
    [
      { label: 'Open without saving', run: () => show(value, fileName) },
      { label: 'Cancel', main: true },
    ],
  );
}

function show(value: unknown, fileName: string): void {
  const outcome = readLayout(value);
  if (outcome.ok) useSession.getState().open(outcome.value, fileName);
}
