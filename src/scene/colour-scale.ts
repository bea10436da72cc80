import { MARGIN_STOPS_DB } from '../report/margin-colour';
/** A colour in linear light, 0 to 1: what vertex colours are given in. */
export type Rgb = readonly [number, number, number];

/** The colours a scale is made of, each a hexadecimal colour of the theme. */
export interface ScaleTokens {
  /** Short of the threshold, at each of the stops. */
  short: readonly string[];
  /** In hand above it, at each of the stops. */
  hand: readonly string[];
  /** One-way quantities, little to much, evenly spaced. */
  wash: readonly string[];
}

export interface ColourScale {
  /** Two arms that never meet: zero belongs to the arm in hand. */
  margin: (marginDb: number) => Rgb;
  /** @param share 0 at the low end of the quantity, 1 at its high end; clamped */
  wash: (share: number) => Rgb;
}

export function createColourScale(tokens: ScaleTokens): ColourScale {
  const [short, hand, wash] = [tokens.short, tokens.hand, tokens.wash].map((arm) => arm.map(linearOfHex));
  const evenly = wash.map((_, i) => i / (wash.length - 1));
  return {
    margin: (marginDb) => between(marginDb < 0 ? short : hand, MARGIN_STOPS_DB, Math.abs(marginDb)),
    wash: (share) => between(wash, evenly, share),
  };
}

function between(colours: readonly Rgb[], stops: readonly number[], value: number): Rgb {
  const last = stops.length - 1;
  if (!(value > stops[0])) return colours[0];
  if (value >= stops[last]) return colours[last];
  let i = 1;
  while (value > stops[i]) i++;
  return mixOklab(colours[i - 1], colours[i], (value - stops[i - 1]) / (stops[i] - stops[i - 1]));
}

/** Mixes in OKLab, where equal steps look equal; `share` 0 is all `a`. */
export function mixOklab(a: Rgb, b: Rgb, share: number): Rgb {
  const [from, to] = [oklabOf(a), oklabOf(b)];
  return linearOfOklab([
    from[0] + (to[0] - from[0]) * share,
    from[1] + (to[1] - from[1]) * share,
    from[2] + (to[2] - from[2]) * share,
  ]);
}

/** OKLab and its matrices: B. Ottosson, "A perceptual color space for image processing", 2020. */
export function oklabOf([r, g, b]: Rgb): Rgb {
  const l = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
  const m = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
  const s = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
  return [
    0.2104542553 * l + 0.793617785 * m - 0.0040720468 * s,
    1.9779984951 * l - 2.428592205 * m + 0.4505937099 * s,
    0.0259040371 * l + 0.7827717662 * m - 0.808675766 * s,
  ];
}

function linearOfOklab([lightness, a, b]: Rgb): Rgb {
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  return [
    clamp(4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s),
    clamp(-1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s),
    clamp(-0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s),
  ];
}

const clamp = (value: number): number => Math.min(1, Math.max(0, value));

/** Linear light of "#rgb" or "#rrggbb"; a middle grey for anything else, which no theme should hold. */
export function linearOfHex(hex: string): Rgb {
  const digits = hex.trim().replace(/^#/, '');
  const full = digits.length === 3 ? [...digits].map((digit) => digit + digit).join('') : digits;
  if (!/^[0-9a-f]{6}$/i.test(full)) return [0.2, 0.2, 0.2];
  const channel = (at: number): number => linearOfSrgb(Number.parseInt(full.slice(at, at + 2), 16) / 255);
  return [channel(0), channel(2), channel(4)];
}

/** The colour as CSS writes it. */
export function cssColour(colour: Rgb): string {
  const digits = colour.map((channel) =>
    Math.round(srgbOfLinear(channel) * 255)
      .toString(16)
      .padStart(2, '0'),
  );
  return `#${digits.join('')}`;
}

/** IEC 61966-2-1. */
const linearOfSrgb = (value: number): number => (value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4);
const srgbOfLinear = (value: number): number =>
  value <= 0.0031308 ? value * 12.92 : 1.055 * value ** (1 / 2.4) - 0.055;
