const KEY = 'gainwright-seat-columns-hidden';

/** Hidden until asked for: the rest fits the table's usual width. */
export const USUALLY_HIDDEN: readonly string[] = ['direct-to-reverberant'];

/** Ids of the columns this browser was told to hide. */
export function keptHiddenColumns(): readonly string[] {
  try {
    const value: unknown = JSON.parse(localStorage.getItem(KEY) ?? 'null');
    return Array.isArray(value) ? value.filter((id) => typeof id === 'string') : USUALLY_HIDDEN;
  } catch {
    return USUALLY_HIDDEN;
  }
}

export function keepHiddenColumns(ids: readonly string[]): void {
  try {
    localStorage.setItem(KEY, JSON.stringify(ids));
  } catch {
    // Storage may be closed to the page; the choice then holds until it is left.
  }
}
