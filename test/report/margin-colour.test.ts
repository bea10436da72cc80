import { expect, test } from 'vitest';
import { marginColour } from '../../src/report/margin-colour';

test.each([
  [0, 'color-mix(in oklab, var(--hand-0), var(--hand-1) 0%)'],
  [0.4, 'color-mix(in oklab, var(--hand-0), var(--hand-1) 40%)'],
  [1, 'color-mix(in oklab, var(--hand-0), var(--hand-1) 100%)'],
  [2, 'color-mix(in oklab, var(--hand-1), var(--hand-3) 50%)'],
  [4.5, 'color-mix(in oklab, var(--hand-3), var(--hand-6) 50%)'],
  [60, 'color-mix(in oklab, var(--hand-3), var(--hand-6) 100%)'],
  [Number.POSITIVE_INFINITY, 'color-mix(in oklab, var(--hand-3), var(--hand-6) 100%)'],
  [-0.001, 'color-mix(in oklab, var(--short-0), var(--short-1) 0%)'],
  [-0.4, 'color-mix(in oklab, var(--short-0), var(--short-1) 40%)'],
  [-1.5, 'color-mix(in oklab, var(--short-1), var(--short-3) 25%)'],
  [-7, 'color-mix(in oklab, var(--short-3), var(--short-6) 100%)'],
  [Number.NEGATIVE_INFINITY, 'color-mix(in oklab, var(--short-3), var(--short-6) 100%)'],
  [Number.NaN, 'color-mix(in oklab, var(--short-3), var(--short-6) 100%)'],
])('a margin of %s dB', (marginDb, colour) => {
  expect(marginColour(marginDb)).toBe(colour);
});
