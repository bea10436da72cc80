import { expect, test } from 'vitest';
import { createPattern } from '../../../src/acoustics/directivity/create-pattern';
import { directivityFactors } from '../../../src/acoustics/directivity/integrate';
import type { Pattern, PatternSpec } from '../../../src/acoustics/directivity/pattern';
import { dbOfPower } from '../../../src/acoustics/level';

const SPEED = 343.2;
const column = { type: 'column', spacing: 0.1, sphere: 0.14, cap: 0.08 } as const;
const specs: [string, PatternSpec][] = [
  ['cardioid', { type: 'first-order', alpha: 0.5 }],
  ['bidirectional', { type: 'first-order', alpha: 0 }],
  ['tube', { type: 'tube', length: 0.25 }],
  ['boundary', { type: 'boundary' }],
  ['talker', { type: 'speech' }],
  ['small box', { type: 'cap-on-sphere', sphere: 0.24, cap: 0.13 }],
  ['large box', { type: 'cap-on-sphere', sphere: 0.42, cap: 0.25 }],
  ['ceiling unit', { type: 'flush-piston', diameter: 0.16 }],
  ['piston of 1 m', { type: 'flush-piston', diameter: 1 }],
  ['horn', { type: 'horn', horizontal: 90, vertical: 40, mouthWidth: 0.45, mouthHeight: 0.35 }],
  ['narrow horn', { type: 'horn', horizontal: 90, vertical: 8, mouthWidth: 1, mouthHeight: 1 }],
  ['column of 8', { ...column, drivers: 8, steer: 0 }],
  ['column of 16', { ...column, drivers: 16, steer: -5 }],
];

test.each(specs)('%s: directivity factor within 0.004 dB of a much finer sum', (_name, spec) => {
  const pattern = createPattern(spec, SPEED);
  const found = directivityFactors(pattern);
  bruteFactors(pattern).forEach((expected, b) => {
    expect(Math.abs(dbOfPower(found[b] / expected))).toBeLessThan(0.004);
  });
});

/** Directivity indices found by an independent implementation of the same model at 343.2 m/s. */
test.each<[string, PatternSpec, number[]]>([
  ['omni', { type: 'first-order', alpha: 1 }, [0, 0, 0, 0, 0, 0, 0]],
  ['cardioid', { type: 'first-order', alpha: 0.5 }, new Array(7).fill(4.769668)],
  ['talker', { type: 'speech' }, [1.498844, 2.081239, 1.756266, 2.476404, 4.482009, 5.465924, 6.876482]],
  [
    'large box',
    { type: 'cap-on-sphere', sphere: 0.42, cap: 0.25 },
    [0.7836, 2.455015, 3.977925, 7.070708, 9.400167, 9.332302, 9.250711],
  ],
  [
    'ceiling unit of 0.13 m',
    { type: 'flush-piston', diameter: 0.13 },
    [3.028213, 3.081528, 3.292505, 4.111254, 6.987225, 13.138482, 18.98158],
  ],
  [
    'ceiling unit of 0.16 m',
    { type: 'flush-piston', diameter: 0.16 },
    [3.037429, 3.118107, 3.436346, 4.653234, 8.583095, 14.971598, 20.560938],
  ],
])('%s: directivity index as found independently', (_name, spec, expected) => {
  const found = directivityFactors(createPattern(spec, SPEED));
  expected.forEach((indexDb, b) => {
    expect(Math.abs(dbOfPower(found[b]) - indexDb)).toBeLessThan(0.001);
  });
});

test('rings about the up axis give the same factor as rings about the aim', () => {
  const pattern = createPattern({ ...column, drivers: 6, steer: 10 }, SPEED);
  const aboutAim = directivityFactors({ axisymmetric: false, powers: pattern.powers });
  directivityFactors(pattern).forEach((factor, b) => {
    expect(Math.abs(dbOfPower(factor / aboutAim[b]))).toBeLessThan(0.004);
  });
});

/** Plain midpoint sum over equal steps of the height along an axis: the aim, or w for what is not axisymmetric. */
function bruteFactors(pattern: Pattern): Float64Array {
  const steps = pattern.axisymmetric ? 100_000 : 2000;
  const turns = pattern.axisymmetric ? 1 : 240;
  const sums = new Float64Array(7);
  const out = new Float64Array(7);
  for (let i = 0; i < steps; i++) {
    const height = 1 - (2 * i + 1) / steps;
    const radius = Math.sqrt(1 - height * height);
    for (let j = 0; j < turns; j++) {
      const across = radius * Math.cos((2 * Math.PI * (j + 0.5)) / turns);
      const along = radius * Math.sin((2 * Math.PI * (j + 0.5)) / turns);
      if (pattern.axisymmetric) pattern.powers(height, across, along, out, 0);
      else pattern.powers(across, along, height, out, 0);
      for (let b = 0; b < 7; b++) sums[b] += out[b] / (steps * turns);
    }
  }
  return sums.map((mean) => 1 / mean);
}
