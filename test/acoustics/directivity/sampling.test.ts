import { expect, test } from 'vitest';
import { BAND_COUNT } from '../../../src/acoustics/bands';
import { averagingWavenumbers, FREQUENCY_COUNT } from '../../../src/acoustics/directivity/averaging';
import { capSampler } from '../../../src/acoustics/directivity/cap-on-sphere';
import { arrayFactor } from '../../../src/acoustics/directivity/column';
import { createPattern } from '../../../src/acoustics/directivity/create-pattern';
import { pistonRatio } from '../../../src/acoustics/directivity/flush-piston';
import { FLOOR_POWER, type PatternSpec } from '../../../src/acoustics/directivity/pattern';
import { bandMeans } from '../../../src/acoustics/directivity/sampled-pattern';
import { tubePressure } from '../../../src/acoustics/directivity/tube';
import { dbOfPower } from '../../../src/acoustics/level';

const SPEED = 343.2;
const wavenumbers = averagingWavenumbers(SPEED);

/** D² at the averaging frequencies straight from the formula. */
type Direct = (thetaRad: number, sinElevation: number, out: Float64Array) => void;

const tubeDirect =
  (lengthM: number): Direct =>
  (theta, _e, out) =>
    wavenumbers.forEach((k, i) => {
      out[i] = tubePressure(k * lengthM, theta) ** 2;
    });

const pistonDirect =
  (diameterM: number): Direct =>
  (theta, _e, out) =>
    wavenumbers.forEach((k, i) => {
      out[i] = theta > Math.PI / 2 ? 0 : pistonRatio(((k * diameterM) / 2) * Math.sin(theta)) ** 2;
    });

const capDirect = (sphereM: number, capM: number): Direct => {
  const sampler = capSampler(sphereM, capM, SPEED);
  return (theta, _e, out) => sampler(theta, out);
};

const columnDirect = (drivers: number, steerDeg: number): Direct => {
  const sampler = capSampler(0.14, 0.08, SPEED);
  const steerRad = (steerDeg * Math.PI) / 180;
  const lobe = new Float64Array(FREQUENCY_COUNT);
  sampler(steerRad, lobe);
  return (theta, sinElevation, out) => {
    sampler(theta, out);
    for (let i = 0; i < FREQUENCY_COUNT; i++) {
      const x = ((wavenumbers[i] * 0.1) / 2) * (sinElevation - Math.sin(steerRad));
      out[i] *= arrayFactor(drivers, x) ** 2 / lobe[i];
    }
  };
};

const column = (drivers: number, steer: number): PatternSpec => ({
  type: 'column',
  drivers,
  steer,
  spacing: 0.1,
  sphere: 0.14,
  cap: 0.08,
});

const cases: [string, PatternSpec, Direct][] = [
  ['tube of 0.25 m', { type: 'tube', length: 0.25 }, tubeDirect(0.25)],
  ['tube of 1.5 m', { type: 'tube', length: 1.5 }, tubeDirect(1.5)],
  ['piston of 0.1 m', { type: 'flush-piston', diameter: 0.1 }, pistonDirect(0.1)],
  ['piston of 0.16 m', { type: 'flush-piston', diameter: 0.16 }, pistonDirect(0.16)],
  ['piston of 1 m', { type: 'flush-piston', diameter: 1 }, pistonDirect(1)],
  ['small box', { type: 'cap-on-sphere', sphere: 0.24, cap: 0.13 }, capDirect(0.24, 0.13)],
  ['large box', { type: 'cap-on-sphere', sphere: 0.42, cap: 0.25 }, capDirect(0.42, 0.25)],
  ['box of 2 m', { type: 'cap-on-sphere', sphere: 2, cap: 0.5 }, capDirect(2, 0.5)],
  ['column of 8', column(8, 0), columnDirect(8, 0)],
  ['column of 16 steered down', column(16, -12), columnDirect(16, -12)],
];

test.each(cases)('%s: sampled within 0.01 dB of the formula wherever it is above the floor', (_name, spec, direct) => {
  const pattern = createPattern(spec, SPEED);
  const single = new Float64Array(FREQUENCY_COUNT);
  const expected = new Float64Array(BAND_COUNT);
  const found = new Float64Array(BAND_COUNT);
  let worstDb = 0;
  for (let i = 0; i <= 1500; i++) {
    // Irrational steps fall on every part of a cell.
    const theta = i === 1500 ? Math.PI / 2 : (i * (Math.PI * 0.618034)) % Math.PI;
    const clock = i * 2.4;
    const [u, v, w] = [Math.cos(theta), Math.sin(theta) * Math.cos(clock), Math.sin(theta) * Math.sin(clock)];
    pattern.powers(u, v, w, found, 0);
    direct(theta, w, single);
    bandMeans(single, expected, 0);
    for (let b = 0; b < BAND_COUNT; b++) {
      const behind = spec.type === 'flush-piston' && theta > Math.PI / 2;
      const power = behind ? 0 : Math.max(FLOOR_POWER, expected[b]);
      if (power === 0) expect(found[b]).toBe(0);
      else worstDb = Math.max(worstDb, Math.abs(dbOfPower(found[b] / power)));
    }
  }
  expect(worstDb).toBeLessThan(0.01);
});

test.each<PatternSpec>([{ type: 'flush-piston', diameter: 0.16 }, { type: 'boundary' }])(
  '$type is whole at 90° and nothing just behind it',
  (spec) => {
    const pattern = createPattern(spec, SPEED);
    const out = new Float64Array(BAND_COUNT);
    for (const cosine of [1e-6, 0, -0.9e-9]) {
      pattern.powers(cosine, 1, 0, out, 0);
      expect(out.every((power) => power >= FLOOR_POWER)).toBe(true);
    }
    for (const cosine of [-1.1e-9, -1e-6, -1]) {
      pattern.powers(cosine, 0, 1, out, 0);
      expect([...out]).toEqual([0, 0, 0, 0, 0, 0, 0]);
    }
  },
);

test.each([-12, 0, 7])('a column steered to %d° has its main lobe there, exactly 0 dB', (steerDeg) => {
  const pattern = createPattern(column(8, steerDeg), SPEED);
  const out = new Float64Array(BAND_COUNT);
  pattern.powers(Math.cos((steerDeg * Math.PI) / 180), 0, Math.sin((steerDeg * Math.PI) / 180), out, 0);
  for (const power of out) expect(Math.abs(dbOfPower(power))).toBeLessThan(0.003);
});
