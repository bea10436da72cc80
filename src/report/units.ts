import { figure, NO_FIGURE } from './figures';

/** Layouts are in metres; a person may read and type feet and inches. */
export type Units = 'metric' | 'imperial';

const M_PER_INCH = 0.0254;
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
  let found = false;
  let feetGiven = false;
  const piece =
    /^\s*(\d+(?:\.\d*)?|\.\d+)(?:\s+(\d+)\s*\/\s*(\d+)|\s*\/\s*(\d+))?\s*(mm|cm|m|ft|feet|in|inches|'|′|"|″)?\s*-?/;
  while (rest.trim() !== '') {
    const match = piece.exec(rest);
    if (match === null) return null;
    let value = Number(match[1]);
    if (match[2] !== undefined) value += Number(match[2]) / Number(match[3]);
    if (match[4] !== undefined) value /= Number(match[4]);
    const scale = scaleOf(match[5], units, feetGiven);
    if (scale === M_PER_INCH * 12) feetGiven = true;
    total += value * scale;
    found = true;
    rest = rest.slice(match[0].length);
  }
  return found && Number.isFinite(total) ? (negative ? -total : total) : null;
}

function scaleOf(unit: string | undefined, units: Units, feetGiven: boolean): number {
  switch (unit) {
    case 'mm':
      return 0.001;
    case 'cm':
      return 0.01;
    case 'm':
      return 1;
    case 'in':
    case 'inches':
    case '"':
    case '″':
      return M_PER_INCH;
    case undefined:
      if (units === 'metric') return 1;
      return feetGiven ? M_PER_INCH : 12 * M_PER_INCH;
    default:
      return 12 * M_PER_INCH;
  }
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
