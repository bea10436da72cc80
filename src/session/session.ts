import { create } from 'zustand';
import { emptyLayout } from '../layout/empty';
import { abandonMark, closeMark, type History, record, redo, startHistory, undo } from '../layout/history';
import type { Problem } from '../layout/problem';
import type { Ref } from '../layout/ref';
import type { Layout, Scheme } from '../layout/schema';
import { createPredictor, type Predictor, type WorkerPort } from '../predict/client';
import type { Prediction, SchemePrediction } from '../predict/prediction';
import type { QuantityId } from '../report/quantities';
import type { Units } from '../report/units';

/**
 * The one store of the page: the document with its history, what it predicts, and what is selected and shown. Regions
 * read from it and write through `edit` and the setters; only layout edits reach the file.
 */
export interface Session {
  history: History;
  /** Layout of the last save or open; another one means unsaved work. */
  saved: Layout;
  fileName: string;
  schemeId: string;
  /** What the newest finished prediction says, and the layout and scheme it is of. */
  prediction: Prediction | null;
  predictedLayout: Layout | null;
  predictedSchemeId: string | null;
  problems: readonly Problem[];
  /** A failure of our own, to be said. */
  failure: string | null;
  selection: Ref | null;
  /** Seat under the pointer, by id. */
  hoveredSeat: string | null;
  /** Talker shown, null for the worst of each seat. */
  talkerId: string | null;
  quantity: QuantityId;
  /** What the seat table is filtered by, as typed. */
  seatFilter: string;
  /** Index of the octave shown where one is. */
  octave: number;
  units: Units;
  theme: 'light' | 'dark';

  /** Changes the layout. Edits in a row with the same `mark` are one step of undo until `endEdit`. */
  edit(label: string, change: (layout: Layout) => Layout, mark?: string): void;
  endEdit(): void;
  cancelEdit(): void;
  undo(): void;
  redo(): void;
  open(layout: Layout, fileName: string): void;
  markSaved(fileName: string): void;
  select(ref: Ref | null): void;
  hoverSeat(id: string | null): void;
  showScheme(id: string): void;
  showTalker(id: string | null): void;
  setSeatFilter(filter: string): void;
  showQuantity(id: QuantityId): void;
  showOctave(index: number): void;
  setUnits(units: Units): void;
  setTheme(theme: Session['theme']): void;
}

let predictor: Predictor | null = null;

export const useSession = create<Session>()((set, get) => {
  const change = (history: History) => {
    if (history === get().history) return;
    const schemeId = keptScheme(history.layout, get().schemeId);
    set({ history, schemeId });
    requestPrediction(get());
  };
  const blank = emptyLayout();
  return {
    history: startHistory(blank),
    saved: blank,
    fileName: '',
    schemeId: 'A',
    prediction: null,
    predictedLayout: null,
    predictedSchemeId: null,
    problems: [],
    failure: null,
    selection: null,
    hoveredSeat: null,
    talkerId: null,
    quantity: 'margin',
    seatFilter: '',
    octave: 4,
    units: 'metric',
    theme: 'light',

    edit: (label, alter, mark) => change(record(get().history, alter(get().history.layout), label, mark ?? null)),
    endEdit: () => set({ history: closeMark(get().history) }),
    cancelEdit: () => change(abandonMark(get().history)),
    undo: () => change(undo(get().history)),
    redo: () => change(redo(get().history)),
    open(layout, fileName) {
      const schemeId = layout.schemes[0].id;
      set({
        history: startHistory(layout),
        saved: layout,
        fileName,
        schemeId,
        selection: null,
        hoveredSeat: null,
        talkerId: null,
        seatFilter: '',
        prediction: null,
        predictedLayout: null,
        problems: [],
      });
      requestPrediction(get());
    },
    markSaved: (fileName) => set({ saved: get().history.layout, fileName }),
    select: (selection) => set({ selection }),
    hoverSeat: (hoveredSeat) => set({ hoveredSeat }),
    showScheme(schemeId) {
      set({ schemeId });
      requestPrediction(get());
    },
    showTalker: (talkerId) => set({ talkerId }),
    setSeatFilter: (seatFilter) => set({ seatFilter }),
    showQuantity: (quantity) => set({ quantity }),
    showOctave: (octave) => set({ octave }),
    setUnits: (units) => set({ units }),
    setTheme: (theme) => set({ theme }),
  };
});

/** Starts predicting with the worker given; the page calls this once. */
export function startPredicting(createWorker: () => WorkerPort): void {
  predictor = createPredictor(
    createWorker,
    ({ problems, prediction }, asked) => {
      // A layout with errors keeps the last good figures on screen, marked as of another state.
      if (prediction === null) useSession.setState({ problems, failure: null });
      else {
        useSession.setState({
          problems,
          prediction,
          predictedLayout: asked.layout,
          predictedSchemeId: asked.schemeIds[0],
          failure: null,
        });
      }
    },
    (failure) => useSession.setState({ failure }),
  );
  requestPrediction(useSession.getState());
}

function requestPrediction(session: Session): void {
  predictor?.request(session.history.layout, [session.schemeId]);
}

const keptScheme = (layout: Layout, schemeId: string): string =>
  layout.schemes.some((scheme) => scheme.id === schemeId) ? schemeId : layout.schemes[0].id;

/** The layout shown. */
export const useLayout = (): Layout => useSession((session) => session.history.layout);

/** The scheme shown. */
export const useScheme = (): Scheme => useSession(currentScheme);

export const currentScheme = (session: Session): Scheme =>
  session.history.layout.schemes.find((scheme) => scheme.id === session.schemeId) ?? session.history.layout.schemes[0];

/** The newest prediction of the scheme shown, null while there is none. It may be of the layout before the last edit. */
export const useSchemePrediction = (): SchemePrediction | null => useSession(currentPrediction);

export const currentPrediction = (session: Session): SchemePrediction | null =>
  session.prediction?.schemes.find((scheme) => scheme.id === session.schemeId) ?? null;

/** True where the figures shown are of an earlier state of the layout. */
export const useStale = (): boolean => useSession((session) => session.predictedLayout !== session.history.layout);
