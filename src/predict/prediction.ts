import type { Seat } from '../layout/seating';

/**
 * What a layout's schemes will do. Typed arrays hold one figure a seat in the order of `seats`; NaN stands for "no
 * finite number" in them, null elsewhere. Levels and gains in dB.
 */
export interface Prediction {
  venue: VenuePrediction;
  seats: Seat[];
  schemes: SchemePrediction[];
}

export interface VenuePrediction {
  volumeM3: number;
  surfaceM2: number;
  decayS: Float64Array;
  roomConstantM2: Float64Array;
  airDbPerM: Float64Array;
  soundSpeedMS: number;
  noiseDba: number;
}

export interface SchemePrediction {
  id: string;
  /** Models in order of first use: microphones, loudspeakers, talkers. */
  models: { id: string; directivityIndexDb: Float64Array }[];
  talkers: TalkerPrediction[];
  /** Microphones and loudspeakers in the order of crosspoint tables. */
  microphoneIds: string[];
  loudspeakerIds: string[];
  /** Index into `talkers` of each seat's worst talker by room margin, its own left out; −1 for none. */
  worstTalker: Int16Array;
  /** Room margin for the worst talker. */
  worstMarginDb: Float64Array;
}

/** The three rungs of the same calculation, each assuming less than the one before. */
export const RUNGS = ['distance', 'directivity', 'room'] as const;
export type Rung = (typeof RUNGS)[number];

export interface TalkerPrediction {
  id: string;
  levelDba: number;
  loop: Record<Rung, RungLoop>;
  /** What the working gain means, on the room rung. */
  working: WorkingPoint;
  seats: Record<Rung, RungSeats>;
  room: RoomSeats;
  /** 1 where the seat is this talker's own and not judged. */
  ownSeat: Uint8Array;
  /** [loudspeaker] */
  headroom: { levelDb: number | null; headroomDb: number | null; powerW: number | null }[];
  /** [loudspeaker]: total delay in ms that keeps the talker first; null where it serves no seat. */
  proposedDelayMs: (number | null)[];
  /** Spread and standard deviation of the total level over seats that are not the talker's own. */
  uniformity: { spreadDb: number | null; deviationDb: number | null };
}

export interface RungLoop {
  limitDb: number | null;
  /** Limit in pauses; null without gain sharing. */
  idleLimitDb: number | null;
  openMicrophoneCostDb: number | null;
  pauseCostDb: number | null;
  /** Index of the octave that rings first, −1 without a loop; 0 on the distance rung's one pseudo-band. */
  limitingBand: number;
  /** Seven, or one on the distance rung. */
  bandLimitsDb: Float64Array;
  /** [microphone][loudspeaker], sums to 1; null without a loop. */
  crosspoints: Float64Array | null;
}

export interface WorkingPoint {
  workingGainDb: number | null;
  regenerationDb: number | null;
  peakAllowanceDb: number | null;
  belowPeakAllowance: boolean;
}

/** [seat] each. */
export interface RungSeats {
  potentialDb: Float64Array;
  neededDb: Float64Array;
  marginDb: Float64Array;
}

/** At working gain; [seat] each, totalDb [seat][band]. */
export interface RoomSeats {
  unaidedDba: Float64Array;
  systemDba: Float64Array;
  totalDba: Float64Array;
  totalDb: Float64Array;
  signalToNoiseDb: Float64Array;
  directToReverberantDb: Float64Array;
  arrivalGapMs: Float64Array;
  sti: Float64Array;
  /** Loudspeaker with the strongest direct sound, −1 for none. */
  servedBy: Int16Array;
}
