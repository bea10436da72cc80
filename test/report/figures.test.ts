import { expect, test } from 'vitest';
import { amountFigure, count, figure, marginFigure, octaveFigure, signedFigure } from '../../src/report/figures';

test.each([
  [12.34, '12.3'],
  [-3.25, '−3.3'],
  [-0.04, '0.0'],
  [0, '0.0'],
  [null, '–'],
  [Number.NaN, '–'],
  [Number.POSITIVE_INFINITY, '–'],
])('figure of %s', (value, shown) => {
  expect(figure(value)).toBe(shown);
});

test.each([
  [2, '+2.0'],
  [-2, '−2.0'],
  [0.04, '0.0'],
  [null, '–'],
])('signed figure of %s', (value, shown) => {
  expect(signedFigure(value)).toBe(shown);
});

test.each([
  [-0.04, '−0.04'],
  [0.04, '+0.04'],
  [-0.000001, '−0.00001'],
  [0.000001, '+0.00001'],
  [0, '0.0'],
  [-2.08, '−2.1'],
  [Number.NaN, '–'],
])('a margin of %d never rounds onto the threshold', (value, shown) => {
  expect(marginFigure(value)).toBe(shown);
  expect(amountFigure(value)).toBe(shown.replace(/^[+−]/, ''));
});

test('octaves and counts', () => {
  expect([250, 1000, 8000].map(octaveFigure)).toEqual(['250 Hz', '1 kHz', '8 kHz']);
  expect([count(1, 'seat'), count(0, 'seat'), count(2, 'box', 'boxes')]).toEqual(['1 seat', '0 seats', '2 boxes']);
});
