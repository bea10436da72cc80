import { NOMINAL_HZ } from '../acoustics/bands';
import { canCopy, duplicate, remove, setDelays, whyKept } from '../layout/edits';
import { octaveFigure } from '../report/figures';
import { proposedDelays } from '../report/loudspeaker-figures';
import { QUANTITIES } from '../report/quantities';
import { SHORT_FILTER } from '../seats/filter';
import { currentPrediction, type Session, useSession } from '../session/session';
import { openFile, saveFile } from './files';
import { openVenue, VENUES } from './venues';

/** Something a person can do, by name, by key or by a button. */
export interface Action {
  id: string;
  label: string;
  /** Keys as `event.key`, with Mod for Ctrl or ⌘; the first is shown. */
  keys?: readonly string[];
  /** Why it cannot be done now; null where it can. */
  unavailable?: (session: Session) => string | null;
  run: () => void;
}

const session = () => useSession.getState();

/** Every action of the page that does not belong to one region's own keys. */
export function allActions(): Action[] {
  const { history } = session();
  return [
    { id: 'open', label: 'Open a layout', keys: ['Mod+o'], run: () => void openFile() },
    { id: 'save', label: 'Save', keys: ['Mod+s'], run: () => void saveFile() },
    { id: 'save-as', label: 'Save as another file', keys: ['Mod+Shift+s'], run: () => void saveFile(true) },
    {
      id: 'undo',
      label: history.past.length === 0 ? 'Undo' : `Undo: ${history.past[history.past.length - 1].label}`,
      keys: ['Mod+z'],
      unavailable: (now) => (now.history.past.length === 0 ? 'Nothing to undo.' : null),
      run: () => session().undo(),
    },
    {
      id: 'redo',
      label: history.future.length === 0 ? 'Redo' : `Redo: ${history.future[0].label}`,
      keys: ['Mod+Shift+z', 'Mod+y'],
      unavailable: (now) => (now.history.future.length === 0 ? 'Nothing to redo.' : null),
      run: () => session().redo(),
    },
    { id: 'units', label: 'Switch between metres and feet and inches', run: toggleUnits },
    { id: 'theme', label: 'Switch between light and dark', run: toggleTheme },
    ...schemeActions(),
    ...selectionActions(),
    ...showActions(),
    ...VENUES.map((venue, i) => ({
      id: `venue-${i}`,
      label: `Open the worked venue: ${venue.label}`,
      run: () => void openVenue(i),
    })),
  ];
}

export function toggleUnits(): void {
  session().setUnits(session().units === 'metric' ? 'imperial' : 'metric');
}

export function toggleTheme(): void {
  session().setTheme(session().theme === 'light' ? 'dark' : 'light');
}

function schemeActions(): Action[] {
  const { history, schemeId } = session();
  return [
    ...history.layout.schemes.map((scheme, i) => ({
      id: `scheme-${scheme.id}`,
      label: `Show scheme ${scheme.id}${scheme.label === '' ? '' : `: ${scheme.label}`}`,
      ...(i < 9 ? { keys: [`Alt+${i + 1}`] } : {}),
      run: () => session().showScheme(scheme.id),
    })),
    { id: 'duplicate-scheme', label: `Duplicate scheme ${schemeId}`, run: duplicateScheme },
    {
      id: 'delete-scheme',
      label: `Delete scheme ${schemeId}`,
      unavailable: (now) => whyKept(now.history.layout, { kind: 'scheme', id: now.schemeId }),
      run: () =>
        session().edit(`Delete scheme ${schemeId}`, (layout) =>
          remove(layout, schemeId, { kind: 'scheme', id: schemeId }),
        ),
    },
    {
      id: 'delays',
      label: 'Use all proposed delays',
      unavailable: (now) => (currentPrediction(now) === null ? 'Not predicted yet.' : null),
      run: useProposedDelays,
    },
    { id: 'system', label: 'Change the system settings', run: () => session().select({ kind: 'system', id: '' }) },
    { id: 'routing', label: 'Change the routing', run: () => session().select({ kind: 'routing', id: '' }) },
    { id: 'venue', label: 'Change the venue, noise, air or need', run: () => session().select(null) },
  ];
}

/** A copy of the scheme shown, shown in its place. */
export function duplicateScheme(): void {
  const { history, schemeId } = session();
  const copy = duplicate(history.layout, schemeId, { kind: 'scheme', id: schemeId });
  if (copy === null) return;
  session().edit(`Duplicate scheme ${schemeId}`, () => copy.layout);
  session().showScheme(copy.ref.id);
}

/** Sets every loudspeaker to the delay that keeps the talker shown, or every talker, first. */
function useProposedDelays(): void {
  const prediction = currentPrediction(session());
  if (prediction === null) return;
  const { schemeId, talkerId } = session();
  const delays = proposedDelays(prediction, talkerId);
  session().edit('Use all proposed delays', (layout) => setDelays(layout, schemeId, delays));
}

function selectionActions(): Action[] {
  const { selection, schemeId } = session();
  if (!canCopy(selection) || selection.kind === 'scheme') return [];
  const ref = selection;
  return [
    {
      id: 'duplicate',
      label: `Duplicate ${ref.id}`,
      keys: ['Mod+d'],
      run: () => {
        const copy = duplicate(session().history.layout, schemeId, ref);
        if (copy === null) return;
        session().edit(`Duplicate ${ref.id}`, () => copy.layout);
        session().select(copy.ref);
      },
    },
    {
      id: 'delete',
      label: `Delete ${ref.id}`,
      unavailable: (now) => whyKept(now.history.layout, ref),
      run: () => {
        session().edit(`Delete ${ref.id}`, (layout) => remove(layout, schemeId, ref));
        session().select(null);
      },
    },
  ];
}

function showActions(): Action[] {
  const { history } = session();
  return [
    ...QUANTITIES.map((quantity) => ({
      id: `show-${quantity.id}`,
      label: `Colour seats by ${quantity.label.toLowerCase()}`,
      run: () => session().showQuantity(quantity.id),
    })),
    { id: 'talker-worst', label: 'Show the worst talker of each seat', run: () => session().showTalker(null) },
    ...history.layout.venue.talkers.map((talker) => ({
      id: `talker-${talker.id}`,
      label: `Show seats for ${talker.label || talker.id}`,
      run: () => session().showTalker(talker.id),
    })),
    ...NOMINAL_HZ.map((frequencyHz, octave) => ({
      id: `octave-${frequencyHz}`,
      label: `Show the ${octaveFigure(frequencyHz)} octave`,
      run: () => session().showOctave(octave),
    })),
    { id: 'short', label: 'Show only the seats that fall short', run: () => session().setSeatFilter(SHORT_FILTER) },
    { id: 'all-seats', label: 'Show all seats', run: () => session().setSeatFilter('') },
  ];
}
