import { describe, expect, test } from 'vitest';
import { createColourScale, cssColour, linearOfHex, mixOklab, oklabOf } from '../../src/scene/colour-scale';

const TOKENS = {
  short: ['#f2bc79', '#d78a3f', '#ac5c23', '#733717'],
  hand: ['#a1d6d9', '#56aeb8', '#247e8e', '#075062'],
  wash: ['#dfe5ec', '#a9b9ca', '#7289a1', '#405b76', '#192f46'],
};
const scale = createColourScale(TOKENS);

describe('OKLab', () => {
  // Ottosson, "A perceptual color space for image processing", 2020: white is 1, 0, 0; sRGB red as computed there.
  test.each([
    ['#ffffff', [1, 0, 0]],
    ['#000000', [0, 0, 0]],
    ['#ff0000', [0.62796, 0.22486, 0.12585]],
    ['#0000ff', [0.45201, -0.03246, -0.31153]],
  ])('of %s', (hex, expected) => {
    oklabOf(linearOfHex(hex)).forEach((value, i) => {
      expect(value).toBeCloseTo(expected[i], 3);
    });
  });

  test('mixing half way lies half way in lightness and both colour axes', () => {
    const [a, b] = [linearOfHex('#f2bc79'), linearOfHex('#733717')];
    const [from, to, middle] = [oklabOf(a), oklabOf(b), oklabOf(mixOklab(a, b, 0.5))];
    middle.forEach((value, i) => {
      expect(value).toBeCloseTo((from[i] + to[i]) / 2, 4);
    });
  });
});

describe('colours as text', () => {
  test.each(['#f2bc79', '#075062', '#000000', '#ffffff'])('%s comes back as it was', (hex) => {
    expect(cssColour(linearOfHex(hex))).toBe(hex);
  });

  test('short notation means the same', () => {
    expect(linearOfHex('#fc0')).toEqual(linearOfHex('#ffcc00'));
  });
});

describe('the margin scale', () => {
  test.each([
    [-6, '#733717'],
    [-3, '#ac5c23'],
    [-1, '#d78a3f'],
    [0, '#a1d6d9'],
    [1, '#56aeb8'],
    [3, '#247e8e'],
    [6, '#075062'],
  ])('%d dB has the colour of its stop', (marginDb, hex) => {
    expect(cssColour(scale.margin(marginDb))).toBe(hex);
  });

  test('just below zero is already of the other arm', () => {
    expect(cssColour(scale.margin(-1e-9))).toBe('#f2bc79');
  });

  test('beyond the last stop nothing changes', () => {
    expect(scale.margin(-40)).toEqual(scale.margin(-6));
    expect(scale.margin(40)).toEqual(scale.margin(6));
  });

  test('further short is darker, all along', () => {
    const lightness = [0.01, 0.5, 1, 2, 3, 4.5, 6].map((short) => oklabOf(scale.margin(-short))[0]);
    for (let i = 1; i < lightness.length; i++) expect(lightness[i]).toBeLessThan(lightness[i - 1]);
  });
});

describe('the wash', () => {
  test('ends and middle are its colours, and it stops at its ends', () => {
    expect(cssColour(scale.wash(0))).toBe('#dfe5ec');
    expect(cssColour(scale.wash(0.5))).toBe('#7289a1');
    expect(cssColour(scale.wash(1))).toBe('#192f46');
    expect(scale.wash(-1)).toEqual(scale.wash(0));
    expect(scale.wash(2)).toEqual(scale.wash(1));
  });
});
