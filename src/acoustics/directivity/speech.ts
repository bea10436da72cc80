import type { Pattern } from './pattern';
import { createTable } from './table';

/** A talker: the table below spun about the mouth axis, since no vertical one is published with it. */
export function createSpeech(): Pattern {
  const theta = NORMAL_SPEECH.map(([deg]) => deg);
  const levels = [1, 2, 3, 4, 5, 6, 7].map((column) => NORMAL_SPEECH.map((row) => [row[column]]));
  return createTable({ theta, phi: [0], levels });
}

/**
 * Horizontal directivity of normal speech: angle in degrees, then dB relative to 0° in the octaves 125 … 8000 Hz.
 * Monson, Hunter & Story, J. Acoust. Soc. Am. 132, 433 (2012), Table I; the 0° row is the reference.
 */
const NORMAL_SPEECH: readonly (readonly number[])[] = [
  [0, 0, 0, 0, 0, 0, 0, 0],
  [15, 0.8, 0.7, 0.6, -0.2, -1.0, -1.7, -1.0],
  [30, -0.1, -0.2, 0.1, -0.7, -0.1, -0.7, -1.7],
  [45, -0.4, -0.5, 0, -1.4, -0.8, -1.6, -3.1],
  [60, -0.6, -0.8, -0.1, -1.5, -2.5, -3.9, -5.8],
  [75, -1.1, -1.6, -0.7, -1.4, -4.7, -5.3, -7.0],
  [90, -1.6, -2.3, -1.6, -1.6, -7.0, -6.3, -8.7],
  [105, -2.1, -3.1, -2.8, -2.5, -7.6, -9.0, -11.5],
  [120, -2.7, -3.9, -4.4, -4.6, -7.9, -12.7, -15.0],
  [135, -3.1, -4.5, -5.5, -7.0, -9.3, -14.5, -17.8],
  [150, -3.5, -4.9, -6.0, -7.9, -13.0, -16.7, -21.5],
  [165, -3.6, -5.0, -6.0, -6.9, -15.0, -21.0, -25.0],
  [180, -3.6, -5.1, -5.9, -6.3, -13.1, -18.9, -26.3],
];
