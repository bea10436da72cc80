import type { Layout } from '../layout/schema';
import type { Prediction, SchemePrediction, TalkerPrediction } from '../predict/prediction';
import { seatStanding } from '../report/quantities';

/** One seat as the table shows it: names, how it stands, and where its figures are. */
export interface SeatRow {
  /** Index into the prediction's seats. */
  seat: number;
  id: string;
  block: string;
  blockId: string;
  /** The talker it is shown for; empty for none. */
  talker: string;
  talkerId: string;
  /** Figures of that talker for all seats; null for none. */
  figures: TalkerPrediction | null;
  /** That talker sits here: shown but not judged. */
  own: boolean;
  judged: boolean;
  short: boolean;
  /** Id of the loudspeaker that serves it; empty for none. */
  servedBy: string;
}

/**
 * The rows of a scheme in seat order. Figures are not copied, so that thousands of rows cost little each time a
 * prediction arrives.
 * @param layout the layout that was predicted
 * @param chosen talker shown, null for the worst of each seat
 */
export function seatRows(
  layout: Layout,
  prediction: Prediction,
  scheme: SchemePrediction,
  chosen: string | null,
): SeatRow[] {
  const blocks = layout.venue.seating.map((part) => ({ id: part.id, label: part.label || part.id }));
  const labels = new Map(layout.venue.talkers.map((talker) => [talker.id, talker.label || talker.id]));
  return prediction.seats.map(({ id, seating }, seat) => {
    const standing = seatStanding(scheme, chosen, seat);
    // Judged for nobody because every talker sits here: their figures are still worth showing.
    const talker =
      standing.talker >= 0 ? standing.talker : chosen === null ? scheme.talkers.findIndex((t) => t.ownSeat[seat]) : -1;
    const figures = scheme.talkers[talker] ?? null;
    const talkerId = figures?.id ?? '';
    return {
      seat,
      id,
      block: blocks[seating]?.label ?? '',
      blockId: blocks[seating]?.id ?? '',
      talker: labels.get(talkerId) ?? talkerId,
      talkerId,
      figures,
      own: figures !== null && !standing.judged,
      judged: standing.judged,
      short: standing.short,
      servedBy: scheme.loudspeakerIds[figures?.room.servedBy[seat] ?? -1] ?? '',
    };
  });
}
