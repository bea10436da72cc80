import { NOMINAL_HZ } from '../acoustics/bands';

/** What is written where there is no finite number. */
export const NO_FIGURE = '–';

const MINUS = '−';

/** A figure with a true minus sign; "–" where there is no finite number. */
export function figure(value: number | null, digits = 1): string {
  if (value === null || !Number.isFinite(value)) return NO_FIGURE;
  const shown = Math.abs(value).toFixed(digits);
  return value < 0 && Number(shown) !== 0 ? MINUS + shown : shown;
}

/** A setting as it was typed: 6, 7.5. */
export const plainFigure = (value: number): string => String(Number(value.toFixed(2))).replace('-', MINUS);

/** A figure whose sign carries meaning: plus as well as minus. */
export function signedFigure(value: number | null, digits = 1): string {
  const shown = figure(value, digits);
  return value !== null && value > 0 && Number(shown) !== 0 ? `+${shown}` : shown;
}

/** A margin in dB. It never rounds onto the threshold: −0.04, not 0.0, because below zero is a seat not served. */
export function marginFigure(value: number | null): string {
  if (value === null || !Number.isFinite(value) || value === 0) return figure(value);
  for (let digits = 1; digits < 6; digits++) {
    if (Number(Math.abs(value).toFixed(digits)) !== 0) return signedFigure(value, digits);
  }
  return value < 0 ? `${MINUS}0.00001` : '+0.00001';
}

/** The size of a shortfall or a reserve in dB, without its sign, likewise never rounded to nothing. */
export const amountFigure = (value: number): string => marginFigure(value).replace(/^[+−]/, '');

/** The octaves as an axis or a table head names them. */
export const BAND_NAMES: readonly string[] = NOMINAL_HZ.map((hz) => (hz < 1000 ? String(hz) : `${hz / 1000} k`));

/** An octave by its nominal frequency: "500 Hz", "2 kHz". */
export const octaveFigure = (nominalHz: number): string =>
  nominalHz < 1000 ? `${nominalHz} Hz` : `${nominalHz / 1000} kHz`;

/** "1 seat", "2 seats". */
export const count = (n: number, one: string, many = `${one}s`): string => `${n} ${n === 1 ? one : many}`;
