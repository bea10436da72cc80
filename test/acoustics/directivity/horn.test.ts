import { expect, test } from 'vitest';
import { CENTRES_HZ } from '../../../src/acoustics/bands';
import { controlFrequencyHz, coverageDeg, createHorn } from '../../../src/acoustics/directivity/horn';
import { dbOfPower } from '../../../src/acoustics/level';

const RAD = Math.PI / 180;

test('a horn keeps its angle above the control frequency and widens in proportion below it', () => {
  const control = controlFrequencyHz(60, 0.4);
  expect(coverageDeg(60, 0.4, control * 3)).toBe(60);
  expect(coverageDeg(60, 0.4, control)).toBe(60);
  expect(coverageDeg(60, 0.4, control / 2)).toBeCloseTo(120, 9);
  expect(coverageDeg(60, 0.4, control / 20)).toBe(360);
});

test('formula of the model written out in degrees, all bands and directions', () => {
  const horn = createHorn(90, 40, 0.35, 0.25);
  const out = new Float64Array(7);
  for (let theta = 5; theta <= 180; theta += 25) {
    for (let phi = -170; phi <= 180; phi += 35) {
      const sine = Math.sin(theta * RAD);
      horn.powers(Math.cos(theta * RAD), sine * Math.cos(phi * RAD), sine * Math.sin(phi * RAD), out, 0);
      CENTRES_HZ.forEach((f, b) => {
        const h = Math.min(360, Math.max(90, 25_400 / 0.35 / f)) / 2;
        const v = Math.min(360, Math.max(40, 25_400 / 0.25 / f)) / 2;
        // On the rear pole the clock angle is 0 by definition.
        const clock = theta === 180 ? 0 : phi * RAD;
        const edge = (Math.abs(Math.cos(clock) / h) ** 4 + Math.abs(Math.sin(clock) / v) ** 4) ** -0.25;
        expect(dbOfPower(out[b])).toBeCloseTo(Math.max(-20, -6 * (theta / edge) ** 3), 6);
      });
    }
  }
});
