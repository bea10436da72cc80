import { create } from 'zustand';

/** Something to tell the person, over the sheet until it is answered. */
export interface Notice {
  title: string;
  /** One paragraph each. */
  lines: readonly string[];
  /** What can be done about it; the last is the safe way out. A plain notice has one, "Close". */
  choices: readonly { label: string; main?: boolean; run?: () => void }[];
}

interface Notices {
  notice: Notice | null;
}

export const useNotice = create<Notices>()(() => ({ notice: null }));

export const tell = (title: string, lines: readonly string[], choices?: Notice['choices']): void =>
  useNotice.setState({ notice: { title, lines, choices: choices ?? [{ label: 'Close', main: true }] } });

export const dismiss = (): void => useNotice.setState({ notice: null });
