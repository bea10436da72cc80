import type { Rung, SchemePrediction, TalkerPrediction } from '../predict/prediction';

/** How a quantity is coloured and read. */
export interface Quantity {
  id: QuantityId;
  /** As on a legend or a column. */
  label: string;
  unit: string;
  digits: number;
  /**
   * `margin`: two arms about the threshold 0, where the sign is the verdict. `wash`: little to much between the ends
   * given, which mean something (`threshold` is marked on the legend where the trade knows one).
   */
  scale: { kind: 'margin' } | { kind: 'wash'; from: number; to: number; threshold?: number; thresholdLabel?: string };
  /** Figure of one seat for one talker; NaN where there is none. */
  of: (talker: TalkerPrediction, seat: number) => number;
}

export type QuantityId = 'margin' | 'level' | 'signal-to-noise' | 'sti' | 'direct-to-reverberant' | 'arrival-gap';

/** Everything a seat can be coloured by, the first by default. */
export const QUANTITIES: readonly Quantity[] = [
  {
    id: 'margin',
    label: 'Margin',
    unit: 'dB',
    digits: 1,
    scale: { kind: 'margin' },
    of: (talker, seat) => talker.seats.room.marginDb[seat],
  },
  {
    id: 'level',
    label: 'Level',
    unit: 'dBA',
    digits: 1,
    scale: { kind: 'wash', from: 50, to: 75 },
    of: (talker, seat) => talker.room.totalDba[seat],
  },
  {
    id: 'signal-to-noise',
    label: 'Signal to noise',
    unit: 'dB',
    digits: 1,
    // 25 dB is common practice for speech.
    scale: { kind: 'wash', from: 0, to: 40, threshold: 25, thresholdLabel: '25 dB' },
    of: (talker, seat) => talker.room.signalToNoiseDb[seat],
  },
  {
    id: 'sti',
    label: 'Speech transmission index',
    unit: '',
    digits: 2,
    // Bad, poor, fair, good, excellent part at 0.30, 0.45, 0.60, 0.75 (IEC 60268-16).
    scale: { kind: 'wash', from: 0.3, to: 0.75, threshold: 0.6, thresholdLabel: 'good' },
    of: (talker, seat) => talker.room.sti[seat],
  },
  {
    id: 'direct-to-reverberant',
    label: 'Direct to reverberant',
    unit: 'dB',
    digits: 1,
    scale: { kind: 'wash', from: -12, to: 6, threshold: 0, thresholdLabel: 'equal' },
    of: (talker, seat) => talker.room.directToReverberantDb[seat],
  },
  {
    id: 'arrival-gap',
    label: 'Arrival gap',
    unit: 'ms',
    digits: 1,
    // The precedence effect holds to about 35 ms (Haas 1951).
    scale: { kind: 'wash', from: 0, to: 50, threshold: 35, thresholdLabel: '35 ms' },
    of: (talker, seat) => talker.room.arrivalGapMs[seat],
  },
];

export const quantityOf = (id: QuantityId): Quantity =>
  QUANTITIES.find((quantity) => quantity.id === id) ?? QUANTITIES[0];

/** The three rungs as people read them. */
export const RUNG_LABELS: Readonly<Record<Rung, string>> = {
  distance: 'Distance only',
  directivity: 'With directivity',
  room: 'In this room',
};

/** Index of the talker a seat is shown for: the one chosen, else its worst; −1 where it is judged for none. */
export function shownTalker(scheme: SchemePrediction, chosen: string | null, seat: number): number {
  if (chosen === null) return scheme.worstTalker[seat];
  return scheme.talkers.findIndex((talker) => talker.id === chosen);
}

/** How a seat stands for the talker it is shown for. */
export interface SeatStanding {
  /** Index of the talker, −1 for none. */
  talker: number;
  marginDb: number;
  /** Its own talker's seat, or no talker at all: shown but not judged. */
  judged: boolean;
  /** Judged, and below zero or without any finite margin. */
  short: boolean;
}

export function seatStanding(scheme: SchemePrediction, chosen: string | null, seat: number): SeatStanding {
  const talker = shownTalker(scheme, chosen, seat);
  if (talker < 0) return { talker, marginDb: Number.NaN, judged: false, short: false };
  const marginDb = scheme.talkers[talker].seats.room.marginDb[seat];
  const judged = !scheme.talkers[talker].ownSeat[seat];
  return { talker, marginDb, judged, short: judged && !(marginDb >= 0) };
}

/** Worst, mean, spread and how many short, over the seats that are judged. */
export interface SchemeSummary {
  judged: number;
  short: number;
  /** Index of the worst seat, −1 for none. */
  worstSeat: number;
  worstTalker: number;
  worstMarginDb: number;
  meanMarginDb: number;
  spreadDb: number;
  stiFrom: number;
  stiTo: number;
}

export function summarise(scheme: SchemePrediction, chosen: string | null, seats?: Iterable<number>): SchemeSummary {
  const summary: SchemeSummary = {
    judged: 0,
    short: 0,
    worstSeat: -1,
    worstTalker: -1,
    worstMarginDb: Number.NaN,
    meanMarginDb: Number.NaN,
    spreadDb: Number.NaN,
    stiFrom: Number.NaN,
    stiTo: Number.NaN,
  };
  let [sum, finite, best] = [0, 0, Number.NEGATIVE_INFINITY];
  let worst = Number.POSITIVE_INFINITY;
  for (const seat of seats ?? scheme.worstTalker.keys()) {
    const standing = seatStanding(scheme, chosen, seat);
    if (!standing.judged) continue;
    summary.judged++;
    if (standing.short) summary.short++;
    const value = Number.isNaN(standing.marginDb) ? Number.NEGATIVE_INFINITY : standing.marginDb;
    if (value < worst) {
      worst = value;
      summary.worstSeat = seat;
      summary.worstTalker = standing.talker;
      summary.worstMarginDb = standing.marginDb;
    }
    if (Number.isFinite(value)) {
      sum += value;
      finite++;
      best = Math.max(best, value);
    }
    const sti = scheme.talkers[standing.talker].room.sti[seat];
    if (!(summary.stiFrom <= sti)) summary.stiFrom = sti;
    if (!(summary.stiTo >= sti)) summary.stiTo = sti;
  }
  if (finite > 0) {
    summary.meanMarginDb = sum / finite;
    summary.spreadDb = Number.isFinite(worst) ? best - worst : Number.NaN;
  }
  return summary;
}
