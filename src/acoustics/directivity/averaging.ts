import { AVERAGING_STEPS, BAND_COUNT, CENTRES_HZ } from '../bands';

/** Frequencies averaged in each band. */
export const STEP_COUNT = AVERAGING_STEPS.length;

/** Frequencies over all bands. */
export const FREQUENCY_COUNT = BAND_COUNT * STEP_COUNT;

/**
 * Wavenumbers k = 2πf/c in rad/m at which patterns with interference are averaged, [band][step], 63 values
 * rising in frequency within each band.
 */
export function averagingWavenumbers(soundSpeedMS: number): Float64Array {
  const wavenumbers = CENTRES_HZ.flatMap((centreHz) =>
    AVERAGING_STEPS.map((step) => (2 * Math.PI * centreHz * step) / soundSpeedMS),
  );
  return Float64Array.from(wavenumbers);
}
