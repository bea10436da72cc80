import { describe, expect, test } from 'vitest';
import { heardPowers, shares } from '../../../src/acoustics/loop/shares';

const input = {
  microphones: 4,
  open: [1, 1, 1, 0],
  sharing: [1, 1, 0, 0],
  speech: [3, 0, 9, 9],
  noise: [1, 1, 1, 1],
};

describe('shares', () => {
  test('go by what each hears; one that takes no part stays whole, a closed one has none', () => {
    expect(Array.from(shares(input))).toEqual([0.8, 0.2, 1, 0]);
  });

  test('of those that take part sum to one', () => {
    const speech = [0.3, 70, 5e-9, 2];
    const result = shares({ ...input, open: [1, 1, 1, 1], sharing: [1, 1, 1, 1], speech });
    expect(result.reduce((a, b) => a + b)).toBeCloseTo(1, 14);
  });

  test('are one each without sharing', () => {
    expect(Array.from(shares({ ...input, sharing: [0, 0, 0, 0] }))).toEqual([1, 1, 1, 0]);
  });

  test('are nothing where nothing is heard', () => {
    expect(Array.from(shares({ ...input, speech: [0, 0, 0, 0], noise: [0, 0, 0, 0] }))).toEqual([0, 0, 1, 0]);
  });
});

test('a directional microphone hears less of the noise, weighted like the speech', () => {
  const q = (value: number) => new Float64Array(7).fill(value);
  const weights = Float64Array.of(0, 0, 1, 2, 0, 0, 0);
  const heard = heardPowers(
    [9, 9, 5, 7, 9, 9, 9],
    new Float64Array(14).fill(0.5),
    [9, 9, 4, 1, 9, 9, 9],
    [q(1), q(3)],
    weights,
  );
  expect(Array.from(heard.speech)).toEqual([9.5, 9.5]);
  expect(Array.from(heard.noise)).toEqual([6, 2]);
});
