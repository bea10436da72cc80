import { parseNumber } from '../report/units';

/** What a typed quantity may be, and how it is read and written. */
export interface QuantityRule {
  min: number;
  max: number;
  /** Only whole numbers. */
  whole?: boolean;
  /** Empty text means none. */
  nullable?: boolean;
  /** Reads what was typed; null where it is no number. */
  parse?: (text: string) => number | null;
  /** Writes a value with its unit, for the range in messages. */
  say: (value: number) => string;
}

export type Reading = { ok: true; value: number | null } | { ok: false; unfinished: boolean; why: string };

/** A quantity from what a person typed, or why it is none and what would be accepted. */
export function readQuantity(text: string, rule: QuantityRule): Reading {
  const trimmed = text.trim();
  if (trimmed === '' && rule.nullable) return { ok: true, value: null };
  const accepted = `${rule.whole ? 'a whole number' : 'a number'} from ${rule.say(rule.min)} to ${rule.say(rule.max)}`;
  const refuse = (found: string, unfinished: boolean): Reading => ({
    ok: false,
    unfinished,
    why: `${found}: ${accepted}${rule.nullable ? ', or nothing' : ''} is accepted.`,
  });
  if (trimmed === '') return refuse('Nothing is typed', true);
  const value = (rule.parse ?? parseNumber)(text);
  if (value === null) return refuse(`“${trimmed}” is not a number`, /^[+\-−–]?[.,]?$/.test(trimmed));
  if (rule.whole && !Number.isInteger(value)) return refuse(`“${trimmed}” is not whole`, false);
  if (value < rule.min) return refuse(`“${trimmed}” is too small`, false);
  if (value > rule.max) return refuse(`“${trimmed}” is too large`, false);
  return { ok: true, value };
}

/** A value moved by some steps and kept in its range; what floating point adds (0.30000000000000004) is taken off. */
export function nudge(value: number, steps: number, step: number, rule: Pick<QuantityRule, 'min' | 'max' | 'whole'>) {
  const moved = rule.whole ? Math.round(value + steps * step) : value + steps * step;
  return Math.min(rule.max, Math.max(rule.min, Number(moved.toFixed(9))));
}

/** How many steps a key nudges by, null for a key that does not. */
export function stepsOfKey(key: string, shift: boolean, alt: boolean): number | null {
  const size = shift ? 10 : alt ? 0.1 : 1;
  switch (key) {
    case 'ArrowUp':
      return size;
    case 'ArrowDown':
      return -size;
    case 'PageUp':
      return 10;
    case 'PageDown':
      return -10;
    default:
      return null;
  }
}
