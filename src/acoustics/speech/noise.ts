/** Coefficients of the noise rating curves, 125 Hz … 8 kHz: L = a + b·NR (ISO R 1996:1971). */
const OFFSETS_DB: readonly number[] = [22.0, 12.0, 4.8, 0, -3.5, -6.1, -8.0];
const SLOPES: readonly number[] = [0.87, 0.93, 0.974, 1.0, 1.015, 1.025, 1.03];

/** Band levels in dB of the noise rating curve `nr`; the curve passes through its own number at 1 kHz. */
export function noiseLevelsOfNr(nr: number): Float64Array {
  return Float64Array.from(OFFSETS_DB, (offsetDb, band) => offsetDb + SLOPES[band] * nr);
}
