/** Octave bands (IEC 61260-1), low to high. Every array "of seven" in the program is in this order. */
export const BAND_COUNT = 7;

/** What people call the bands. */
export const NOMINAL_HZ: readonly number[] = [125, 250, 500, 1000, 2000, 4000, 8000];

/** Exact mid-band frequencies, 1000·10^(3k/10) Hz for k = −3…3: standards' tables are computed at these. */
export const CENTRES_HZ: readonly number[] = [-3, -2, -1, 0, 1, 2, 3].map((k) => 1000 * 10 ** (0.3 * k));

/** Frequencies at which patterns with interference are averaged over an octave: f·2^(j/8), j = −4…4. */
export const AVERAGING_STEPS: readonly number[] = [-4, -3, -2, -1, 0, 1, 2, 3, 4].map((j) => 2 ** (j / 8));
