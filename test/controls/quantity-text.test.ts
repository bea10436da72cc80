import { describe, expect, it } from 'vitest';
import { nudge, type QuantityRule, readQuantity, stepsOfKey } from '../../src/controls/quantity-text';
import { parseLength } from '../../src/report/units';

const rule: QuantityRule = { min: -10, max: 20, say: (value) => `${value} dB` };

describe('readQuantity', () => {
  it('reads numbers with a true minus, a decimal comma or a unit', () => {
    for (const [text, value] of [
      ['7.5', 7.5],
      ['−3', -3],
      ['1,25', 1.25],
      [' 6 dB ', 6],
    ] as const) {
      expect(readQuantity(text, rule)).toEqual({ ok: true, value });
    }
  });

  it('keeps every digit that was typed', () => {
    expect(readQuantity('1.23456789', rule)).toEqual({ ok: true, value: 1.23456789 });
  });

  it('says what would be accepted', () => {
    expect(readQuantity('21', rule)).toEqual({
      ok: false,
      unfinished: false,
      why: '“21” is too large: a number from -10 dB to 20 dB is accepted.',
    });
    expect(readQuantity('-10.1', rule)).toMatchObject({ ok: false, why: expect.stringContaining('too small') });
    expect(readQuantity('two', rule)).toMatchObject({
      ok: false,
      unfinished: false,
      why: expect.stringContaining('“two”'),
    });
  });

  it('takes the ends of the range', () => {
    expect(readQuantity('-10', rule)).toEqual({ ok: true, value: -10 });
    expect(readQuantity('20', rule)).toEqual({ ok: true, value: 20 });
  });

  it('knows a number that is only begun, which is no mistake yet', () => {
    for (const text of ['', '-', '−', '.', '-,'])
      expect(readQuantity(text, rule)).toMatchObject({ ok: false, unfinished: true });
  });

  it('takes nothing for none only where there may be none', () => {
    expect(readQuantity(' ', { ...rule, nullable: true })).toEqual({ ok: true, value: null });
    expect(readQuantity(' ', rule).ok).toBe(false);
    expect(readQuantity('x', { ...rule, nullable: true })).toMatchObject({
      why: expect.stringContaining('or nothing'),
    });
  });

  it('refuses parts where whole numbers are wanted', () => {
    expect(readQuantity('2.5', { ...rule, whole: true })).toMatchObject({
      ok: false,
      why: expect.stringContaining('whole'),
    });
    expect(readQuantity('2', { ...rule, whole: true })).toEqual({ ok: true, value: 2 });
  });

  it('reads feet and inches through the parser given', () => {
    const reading = readQuantity('5′ 6″', { ...rule, parse: (text) => parseLength(text, 'imperial') });
    expect(reading.ok && reading.value).toBeCloseTo(5.5 * 0.3048, 12);
  });
});

describe('nudge', () => {
  it('adds no noise of floating point', () => {
    expect(nudge(0.1, 2, 0.1, rule)).toBe(0.3);
    expect(nudge(1.23456, 1, 0.1, rule)).toBe(1.33456);
  });

  it('stops at the ends', () => {
    expect(nudge(19.95, 1, 0.1, rule)).toBe(20);
    expect(nudge(-9, -10, 1, rule)).toBe(-10);
  });

  it('keeps whole numbers whole, even in fine steps', () => {
    expect(nudge(3, 0.1, 1, { ...rule, whole: true })).toBe(3);
    expect(nudge(3, 10, 1, { ...rule, whole: true })).toBe(13);
  });
});

describe('stepsOfKey', () => {
  it('steps by one, ten with Shift or Page keys, a tenth with Alt', () => {
    expect(stepsOfKey('ArrowUp', false, false)).toBe(1);
    expect(stepsOfKey('ArrowDown', true, false)).toBe(-10);
    expect(stepsOfKey('ArrowUp', false, true)).toBe(0.1);
    expect(stepsOfKey('PageDown', false, false)).toBe(-10);
    expect(stepsOfKey('a', false, false)).toBeNull();
  });
});
