import { figure, NO_FIGURE } from './figures';

/** Layouts are in metres; a person may read and type feet and inches. */
export type Units = 'metric' | 'imperial';

const M_PER_INCH = 0.0254;
const M_PER_FOOT = 12 * M_PER_INCH;
/** Inches are shown to this part. */
const INCH_PARTS = 8;

/** A length for reading: "7.60 m" as "7.60", or 24′ 11⅛″. */
export function lengthFigure(lengthM: number | null, units: Units, digits = 2): string {
  if (lengthM === null || !Number.isFinite(lengthM)) return NO_FIGURE;
  return units === 'metric' ? figure(lengthM, digits) : feetAndInches(lengthM);
}

/** The unit to set beside `lengthFigure`; feet and inches carry their own marks. */
export const lengthUnit = (units: Units): string => (units === 'metric' ? 'm' : '');

/** `lengthFigure` with its unit, for sentences. */
export function lengthText(lengthM: number | null, units: Units, digits = 2): string {
  const unit = lengthUnit(units);
  return unit === '' ? lengthFigure(lengthM, units, digits) : `${lengthFigure(lengthM, units, digits)} ${unit}`;
}

const FRACTIONS = ['', '⅛', '¼', '⅜', '½', '⅝', '¾', '⅞'];

function feetAndInches(lengthM: number): string {
  const parts = Math.round((Math.abs(lengthM) / M_PER_INCH) * INCH_PARTS);
  const sign = lengthM < 0 && parts > 0 ? '−' : '';
  const feet = Math.floor(parts / (12 * INCH_PARTS));
  const inches = Math.floor((parts % (12 * INCH_PARTS)) / INCH_PARTS);
  return `${sign}${feet}′ ${inches}${FRACTIONS[parts % INCH_PARTS]}″`;
}

/**
 * Metres from what a person typed: a plain number is in the unit shown (metres, or feet), and any of m, cm, mm, ft, in
 * or the marks ′ ″ ' " may be written, with fractions (3 1/2") and a comma for the decimal point. Null where it is
 * no length.
 */
export function parseLength(text: string, units: Units): number | null {
  let rest = text.trim().toLowerCase().replace(/−|–/g, '-').replace(',', '.');
  const negative = rest.startsWith('-');
  rest = rest.replace(/^[+-]\s*/, '');
  if (rest === '') return null;
  for (const [i, fraction] of FRACTIONS.entries()) if (i > 0) rest = rest.replace(fraction, ` ${i}/8`);
  let total = 0;
  let feetGiven = false;
  let complete = false;
  while (rest.trim() !== '') {
    const match = PIECE.exec(rest);
    // A number of no unit says all there is to say, but for the inches after feet: "12 34" is no length.
    if (match === null || complete) return null;
    const [piece, number, numerator, denominator, divisor, unit] = match;
    let value = Number(number);
    if (numerator !== undefined) value += Number(numerator) / Number(denominator);
    if (divisor !== undefined) value /= Number(divisor);
    const first: boolean = total === 0 && !feetGiven;
    const scale: number | null = unit === undefined ? plainScale(units, first, feetGiven) : SCALES[unit];
    if (scale === null) return null;
    feetGiven = scale === M_PER_FOOT;
    complete = unit === undefined && !feetGiven;
    total += value * scale;
    rest = rest.slice(piece.length);
    // 5'-3" is how drawings write it.
    if (feetGiven && rest.trim() !== '-') rest = rest.replace(/^\s*-/, '');
  }
  return Number.isFinite(total) ? (negative ? -total : total) : null;
}

const PIECE =
  /^\s*(\d+(?:\.\d*)?|\.\d+)(?:\s+(\d+)\s*\/\s*(\d+)|\s*\/\s*(\d+))?\s*(mm|cm|m|feet|foot|ft|inches|inch|in|'|′|"|″)?/;

const SCALES: Readonly<Record<string, number>> = {
  mm: 0.001,
  cm: 0.01,
  m: 1,
  ft: M_PER_FOOT,
  foot: M_PER_FOOT,
  feet: M_PER_FOOT,
  "'": M_PER_FOOT,
  '′': M_PER_FOOT,
  in: M_PER_INCH,
  inch: M_PER_INCH,
  inches: M_PER_INCH,
  '"': M_PER_INCH,
  '″': M_PER_INCH,
};

/** Scale of a number without a unit: the unit shown where it stands first, inches after feet, else none. */
function plainScale(units: Units, first: boolean, feetGiven: boolean): number | null {
  if (feetGiven) return M_PER_INCH;
  if (!first) return null;
  return units === 'metric' ? 1 : M_PER_FOOT;
}

/** A plain number as typed, with a true minus or a comma accepted; null where it is none. */
export function parseNumber(text: string): number | null {
  const plain = text
    .trim()
    .replace(/−|–/g, '-')
    .replace(',', '.')
    .replace(/\s*(°|db|dba|ms|hz|%|°c|kpa|w)$/i, '');
  if (!/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain)) return null;
  return Number(plain);
}
