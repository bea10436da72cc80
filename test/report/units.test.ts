import { describe, expect, test } from 'vitest';
import { lengthFigure, lengthText, parseLength, parseNumber } from '../../src/report/units';

describe('a length as a person types it', () => {
  test.each([
    ['7.6', 7.6],
    ['7,6', 7.6],
    ['.5', 0.5],
    ['12.', 12],
    ['7.6 m', 7.6],
    ['760cm', 7.6],
    ['1200 mm', 1.2],
    ['1 m 20 cm', 1.2],
    ['-0.4', -0.4],
    ['−0.4 m', -0.4],
    ['+2', 2],
    ['25 ft', 25 * 0.3048],
    ['25 feet', 25 * 0.3048],
    ['3 inches', 3 * 0.0254],
    ['1 inch', 0.0254],
    ['24′ 11⅛″', 24 * 0.3048 + 11.125 * 0.0254],
    ['3/4"', 0.75 * 0.0254],
  ])('metric: %s', (typed, metres) => {
    expect(parseLength(typed, 'metric')).toBeCloseTo(metres, 12);
  });

  test.each([
    ['25', 25 * 0.3048],
    ['24\' 11"', 24 * 0.3048 + 11 * 0.0254],
    ["24'11", 24 * 0.3048 + 11 * 0.0254],
    ['24 11', 24 * 0.3048 + 11 * 0.0254],
    ['5\'-3 1/2"', 5 * 0.3048 + 3.5 * 0.0254],
    ['0′ 3½″', 3.5 * 0.0254],
    ['6 in', 6 * 0.0254],
    ['2 m', 2],
    ['-5\' 3"', -(5 * 0.3048 + 3 * 0.0254)],
  ])('imperial: %s', (typed, metres) => {
    expect(parseLength(typed, 'imperial')).toBeCloseTo(metres, 12);
  });

  test.each(['', '-', 'm', 'three', '1e3', '5 yards', '12 34', '3-4', '5 m 3', '3/0', '1..2', "5'-", 'NaN'])(
    'no length: "%s"',
    (typed) => {
      expect(parseLength(typed, 'metric')).toBeNull();
    },
  );

  test('three numbers are no length in feet either', () => {
    expect(parseLength('3 4 5', 'imperial')).toBeNull();
  });
});

describe('a length as it is shown', () => {
  test.each([
    [7.6, '7.60', '24′ 11¼″'],
    [0.3048, '0.30', '1′ 0″'],
    [0.3047, '0.30', '1′ 0″'],
    [-0.4, '−0.40', '−1′ 3¾″'],
    [0, '0.00', '0′ 0″'],
    [-0.001, '0.00', '0′ 0″'],
  ])('%d m', (metres, metric, imperial) => {
    expect(lengthFigure(metres, 'metric')).toBe(metric);
    expect(lengthFigure(metres, 'imperial')).toBe(imperial);
  });

  test('a unit stands beside metres only, and no figure is a dash', () => {
    expect(lengthText(2, 'metric')).toBe('2.00 m');
    expect(lengthText(0.3048, 'imperial')).toBe('1′ 0″');
    expect(lengthFigure(null, 'imperial')).toBe('–');
    expect(lengthFigure(Number.NaN, 'metric')).toBe('–');
  });

  test('feet and inches read back within half a shown part', () => {
    for (let mm = -9000; mm <= 9000; mm += 137) {
      const back = parseLength(lengthFigure(mm / 1000, 'imperial'), 'imperial');
      expect(Math.abs((back ?? Number.NaN) - mm / 1000)).toBeLessThanOrEqual(0.0254 / 16 + 1e-12);
    }
  });
});

test.each([
  ['6', 6],
  ['−12,5 dB', -12.5],
  ['90°', 90],
  ['1e-3', 0.001],
  ['60 %', 60],
  ['', null],
  ['1 2', null],
  ['six', null],
  ['0x10', null],
])('a number as typed: "%s"', (typed, value) => {
  expect(parseNumber(typed)).toBe(value);
});
