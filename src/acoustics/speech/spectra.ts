import { aWeightedDb } from '../level';

export type VocalEffort = 'relaxed' | 'normal' | 'raised' | 'loud' | 'very-loud';

/** A-weighted level of speech 1 m in front of the mouth, dBA (ISO 9921:2003, Annex A; relaxed from memory). */
export const VOCAL_EFFORT_DBA: Readonly<Record<VocalEffort, number>> = {
  relaxed: 54,
  normal: 60,
  raised: 66,
  loud: 72,
  'very-loud': 78,
};

/** Octave spectrum of male speech in dB re its 500 Hz band, 125 Hz … 8 kHz (IEC 60268-16:2020, A.6.1). */
export const SPEECH_SPECTRUM_DB: readonly number[] = [-2.5, 0.5, 0, -6, -12, -18, -24];

/** Band levels in dB at 1 m of a talker whose A-weighted level there is exactly `levelDba`. */
export function talkerLevelsDb(levelDba: number): Float64Array {
  const shiftDb = levelDba - aWeightedDb(SPEECH_SPECTRUM_DB);
  return Float64Array.from(SPEECH_SPECTRUM_DB, (relativeDb) => relativeDb + shiftDb);
}
