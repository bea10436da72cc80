import { useRef, useState } from 'react';

/** Rows marked to be copied, beside the one seat that is selected. */
export interface Marks {
  ids: ReadonlySet<string>;
  /** Adds a row or takes it away; the first time, the selected one stays with it. */
  toggle(id: string, selected: string | null): void;
  /** Marks everything between the last row chosen and this one, in the order shown. */
  extendTo(id: string, order: readonly { id: string }[]): void;
  all(order: readonly { id: string }[]): void;
  /** Marks nothing; the row given is where the next stretch begins. */
  startAt(id: string | null): void;
}

export function useMarks(): Marks {
  const [ids, setIds] = useState<ReadonlySet<string>>(new Set());
  const anchor = useRef<string | null>(null);
  return {
    ids,
    toggle(id, selected) {
      const next = new Set(ids.size === 0 && selected !== null ? [selected] : ids);
      if (!next.delete(id)) next.add(id);
      anchor.current = id;
      setIds(next);
    },
    extendTo(id, order) {
      const to = order.findIndex((row) => row.id === id);
      const from = order.findIndex((row) => row.id === anchor.current);
      const [first, last] = from < 0 ? [to, to] : [Math.min(from, to), Math.max(from, to)];
      if (from < 0) anchor.current = id;
      setIds(new Set(order.slice(first, last + 1).map((row) => row.id)));
    },
    all: (order) => setIds(new Set(order.map((row) => row.id))),
    startAt(id) {
      anchor.current = id;
      if (ids.size > 0) setIds(new Set());
    },
  };
}
