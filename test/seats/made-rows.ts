import type { Layout } from '../../src/layout/schema';
import type { Seat } from '../../src/layout/seating';
import type { Prediction, RungSeats, SchemePrediction, TalkerPrediction } from '../../src/predict/prediction';
import { type SeatRow, seatRows } from '../../src/seats/rows';

const NONE = Number.NaN;

/** Four seats in two blocks and two talkers, one of whom sits on M1; figures are made up, and told apart by their sum. */
export const MARGINS = { chair: [-3, -0.04, NONE, 2.5], clerk: [0.2, 1, 4, 0] };

export function madeLayout(): Layout {
  return {
    name: 'Old hall',
    venue: {
      seating: [
        { id: 'M', label: 'Members', kind: 'list' },
        { id: 'G', label: '', kind: 'block' },
      ],
      talkers: [
        { id: 'chair', label: 'The Chair' },
        { id: 'clerk', label: '' },
      ],
    },
  } as unknown as Layout;
}

export function madePrediction(): Prediction {
  const seats = [
    { id: 'M1', seating: 0 },
    { id: 'M2', seating: 0 },
    { id: 'G-1-2', seating: 1 },
    { id: 'G-1-12', seating: 1 },
  ] as Seat[];
  return { venue: {} as Prediction['venue'], seats, schemes: [madeScheme()] };
}

function madeScheme(): SchemePrediction {
  return {
    id: 'A',
    models: [],
    talkers: [madeTalker('chair', MARGINS.chair, [1, 0, 0, 0]), madeTalker('clerk', MARGINS.clerk, [0, 0, 0, 0])],
    microphoneIds: ['m1'],
    loudspeakerIds: ['c1', 'c2'],
    worstTalker: Int16Array.from([1, 0, 0, 1]),
    worstMarginDb: Float64Array.from([0.2, -0.04, NONE, 0]),
  };
}

function madeTalker(id: string, margins: number[], own: number[]): TalkerPrediction {
  const rung = (offset: number): RungSeats => ({
    potentialDb: Float64Array.from(margins, (margin) => margin + 10 + offset),
    neededDb: Float64Array.from(margins, () => 10),
    marginDb: Float64Array.from(margins, (margin) => margin + offset),
  });
  const each = (...values: number[]) => Float64Array.from(values);
  return {
    id,
    seats: { distance: rung(-2), directivity: rung(1), room: rung(0) },
    room: {
      totalDba: each(65.04, 66, 67, 68),
      signalToNoiseDb: each(20, 21, 22, 23),
      directToReverberantDb: each(-5, -6, -7, NONE),
      arrivalGapMs: each(5, 20.5, 30, NONE),
      sti: each(0.55, 0.6, 0.65, 0.704),
      servedBy: Int16Array.from([0, 1, 1, -1]),
    },
    ownSeat: Uint8Array.from(own),
  } as unknown as TalkerPrediction;
}

export function madeRows(chosen: string | null = null, prediction = madePrediction()): SeatRow[] {
  return seatRows(madeLayout(), prediction, prediction.schemes[0], chosen);
}
