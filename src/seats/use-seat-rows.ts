import { useDeferredValue, useMemo } from 'react';
import type { SchemePrediction } from '../predict/prediction';
import { useSession, useStale } from '../session/session';
import { parseFilter } from './filter';
import { type SeatRow, seatRows } from './rows';

export interface SeatRows {
  /** All seats, in seat order; empty without a prediction. */
  all: readonly SeatRow[];
  /** Those the filter and the block leave, in seat order. */
  kept: readonly SeatRow[];
  scheme: SchemePrediction | null;
  /** The figures are of an earlier state of the layout, or of another scheme. */
  stale: boolean;
  /** What is wrong with the filter; null for nothing. */
  problem: string | null;
}

/** The seats to show. Figures follow the drawing: while predictions come fast, the view goes first. */
export function useSeatRows(blockId: string | null): SeatRows {
  const prediction = useDeferredValue(useSession((session) => session.prediction));
  const layout = useDeferredValue(useSession((session) => session.predictedLayout));
  const talkerId = useSession((session) => session.talkerId);
  const schemeId = useSession((session) => session.schemeId);
  const filterText = useDeferredValue(useSession((session) => session.seatFilter));
  const stale = useStale();

  const asked = prediction?.schemes.find((scheme) => scheme.id === schemeId) ?? null;
  // Until the scheme shown is predicted, the one before it stays rather than leave the table empty for a moment.
  const scheme = asked ?? prediction?.schemes[0] ?? null;
  const all = useMemo(
    () =>
      layout === null || prediction === null || scheme === null ? [] : seatRows(layout, prediction, scheme, talkerId),
    [layout, prediction, scheme, talkerId],
  );
  const filter = useMemo(() => parseFilter(filterText), [filterText]);
  const kept = useMemo(() => {
    const shows = filter.ok ? filter.shows : () => true;
    return all.filter((row) => (blockId === null || row.blockId === blockId) && shows(row));
  }, [all, filter, blockId]);
  return { all, kept, scheme, stale: stale || asked === null, problem: filter.ok ? null : filter.problem };
}
