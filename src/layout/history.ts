import type { Layout } from './schema';

/** One state a person can return to. Layouts share all parts that did not change, so keeping many is cheap. */
interface Step {
  layout: Layout;
  /** What was done to leave this state, such as "turn c3". */
  label: string;
}

/** The document and the way back and forth. */
export interface History {
  layout: Layout;
  past: readonly Step[];
  future: readonly Step[];
  /** Edits with this key join the step before them, so that a drag or a typed number is one step; null starts anew. */
  mark: string | null;
}

const MOST_STEPS = 500;

export const startHistory = (layout: Layout): History => ({ layout, past: [], future: [], mark: null });

/** The history after an edit. An edit that changes nothing leaves it as it was. */
export function record(history: History, layout: Layout, label: string, mark: string | null = null): History {
  if (layout === history.layout) return history;
  const joins = mark !== null && mark === history.mark && history.past.length > 0;
  const past = joins ? history.past : [...history.past, { layout: history.layout, label }].slice(-MOST_STEPS);
  return { layout, past, future: [], mark };
}

/** Ends a run of joined edits: the next one is a step of its own. */
export const closeMark = (history: History): History => (history.mark === null ? history : { ...history, mark: null });

/** Gives up the run of edits under way, as if it had not begun. */
export function abandonMark(history: History): History {
  const last = history.past.at(-1);
  if (history.mark === null || last === undefined) return history;
  return { layout: last.layout, past: history.past.slice(0, -1), future: history.future, mark: null };
}

export function undo(history: History): History {
  const last = history.past.at(-1);
  if (last === undefined) return history;
  const future = [{ layout: history.layout, label: last.label }, ...history.future];
  return { layout: last.layout, past: history.past.slice(0, -1), future, mark: null };
}

export function redo(history: History): History {
  const [next, ...future] = history.future;
  if (next === undefined) return history;
  return {
    layout: next.layout,
    past: [...history.past, { layout: history.layout, label: next.label }],
    future,
    mark: null,
  };
}
