import type { Prediction, SchemePrediction } from '../predict/prediction';
import { type Quantity, seatStanding, summarise } from '../report/quantities';
import { mixOklab, type Rgb } from './colour-scale';
import type { ThemeColours } from './theme-colours';

/** What each seat of the drawing shows. Arrays are in the order of the seats drawn. */
export interface SeatFigures {
  /** Seat's index in the prediction, −1 where it is not in it. */
  predicted: Int32Array;
  /** 1 where the seat is judged and falls short: drawn as a wedge. */
  short: Uint8Array;
  /** 1 where the seat has a colour of the scale; the others are neutral. */
  judged: Uint8Array;
  marginDb: Float64Array;
  /** The quantity shown. */
  value: Float64Array;
  shortCount: number;
  judgedCount: number;
  /** Index of the worst seat drawn, −1 for none. */
  worst: number;
}

/**
 * Figures of the seats drawn. A prediction may be of the layout before the last edit, so that its seats are matched
 * by their ids; seats it does not know are neutral.
 */
export function seatFigures(
  seats: readonly { id: string }[],
  prediction: Prediction | null,
  scheme: SchemePrediction | null,
  talkerId: string | null,
  quantity: Quantity,
): SeatFigures {
  const figures: SeatFigures = {
    predicted: matchSeats(seats, prediction),
    short: new Uint8Array(seats.length),
    judged: new Uint8Array(seats.length),
    marginDb: new Float64Array(seats.length).fill(Number.NaN),
    value: new Float64Array(seats.length).fill(Number.NaN),
    shortCount: 0,
    judgedCount: 0,
    worst: -1,
  };
  if (scheme === null) return figures;
  figures.predicted.forEach((index, seat) => {
    if (index < 0) return;
    const standing = seatStanding(scheme, talkerId, index);
    figures.marginDb[seat] = standing.marginDb;
    if (standing.talker >= 0) figures.value[seat] = quantity.of(scheme.talkers[standing.talker], index);
    figures.judged[seat] = standing.judged ? 1 : 0;
    figures.short[seat] = standing.short ? 1 : 0;
    figures.judgedCount += figures.judged[seat];
    figures.shortCount += figures.short[seat];
  });
  figures.worst = figures.predicted.indexOf(summarise(scheme, talkerId).worstSeat);
  if (figures.worst >= 0 && figures.predicted[figures.worst] < 0) figures.worst = -1;
  return figures;
}

function matchSeats(seats: readonly { id: string }[], prediction: Prediction | null): Int32Array {
  if (prediction === null) return new Int32Array(seats.length).fill(-1);
  const indices = new Map(prediction.seats.map((seat, index) => [seat.id, index]));
  return Int32Array.from(seats, (seat) => indices.get(seat.id) ?? -1);
}

/** Colour of one seat's figure; null where it has none. */
export function seatColour(figures: SeatFigures, seat: number, quantity: Quantity, colours: ThemeColours): Rgb | null {
  if (!figures.judged[seat]) return null;
  const { scale } = quantity;
  if (scale.kind === 'margin') {
    // No margin at all is the worst there is.
    return colours.scale.margin(Number.isNaN(figures.value[seat]) ? -6 : figures.value[seat]);
  }
  if (!Number.isFinite(figures.value[seat])) return null;
  return colours.scale.wash((figures.value[seat] - scale.from) / (scale.to - scale.from));
}

/** Tone of a seat that is not judged or not predicted. */
export const neutralSeat = (colours: ThemeColours): Rgb =>
  mixOklab(colours.linear['card-floor'], colours.linear['hair-2'], 0.12);
