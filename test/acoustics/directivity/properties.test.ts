import fc from 'fast-check';
import { expect, test } from 'vitest';
import { createPattern } from '../../../src/acoustics/directivity/create-pattern';
import { directivityFactors } from '../../../src/acoustics/directivity/integrate';
import {
  FLOOR_POWER,
  HORN_FLOOR_POWER,
  type Pattern,
  type PatternSpec,
} from '../../../src/acoustics/directivity/pattern';
import { dbOfPower } from '../../../src/acoustics/level';

const SEED = 20231;
const runs = (numRuns: number) => ({ seed: SEED, numRuns });

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const firstOrder = fc.record({ type: fc.constant('first-order' as const), alpha: between(0, 1) });
const flushPiston = fc.record({ type: fc.constant('flush-piston' as const), diameter: between(0.01, 0.5) });
const horn = fc.record({
  type: fc.constant('horn' as const),
  horizontal: between(10, 180),
  vertical: between(10, 180),
  mouthWidth: between(0.05, 1),
  mouthHeight: between(0.05, 1),
});
const box = fc
  .tuple(between(0.02, 1.2), between(0.1, 1))
  .map(([sphere, share]) => ({ type: 'cap-on-sphere' as const, sphere, cap: sphere * share }));
const column = fc
  .tuple(fc.integer({ min: 2, max: 16 }), between(0.05, 0.15), between(-20, 20))
  .map(([drivers, spacing, steer]) => ({ type: 'column' as const, drivers, spacing, steer, sphere: 0.14, cap: 0.08 }));
const tube = fc.record({ type: fc.constant('tube' as const), length: between(0.05, 1) });
const levels = fc.array(fc.array(between(-40, 3), { minLength: 4, maxLength: 4 }), { minLength: 2, maxLength: 2 });
const table = fc.tuple(levels, fc.boolean()).map(([rows, planes]) => ({
  type: 'table' as const,
  theta: [0, 45, 150],
  phi: [0, 90, 180, 270],
  levels: new Array<number[][]>(7).fill([[0, 0, 0, 0], ...rows]),
  planes,
}));
const anySpec: fc.Arbitrary<PatternSpec> = fc.oneof(
  firstOrder,
  flushPiston,
  horn,
  box,
  column,
  tube,
  table,
  fc.constant<PatternSpec>({ type: 'point' }),
  fc.constant<PatternSpec>({ type: 'speech' }),
  fc.constant<PatternSpec>({ type: 'boundary' }),
);
const soundSpeed = between(320, 360);

test(`D² is finite, not below the floor, and nothing only behind a surface (seed ${SEED})`, () => {
  fc.assert(
    fc.property(anySpec, soundSpeed, between(-1, 1), between(0, 2 * Math.PI), (spec, speed, cosine, clock) => {
      const hosted = spec.type === 'boundary' || spec.type === 'flush-piston';
      const floor = spec.type === 'horn' ? HORN_FLOOR_POWER : FLOOR_POWER;
      for (const power of at(createPattern(spec, speed), cosine, clock)) {
        if (hosted && cosine < -1e-9) expect(power).toBe(0);
        else expect(power).toBeGreaterThanOrEqual(floor);
        // Tables here rise to 3 dB, a talker to 0.8; a steered column's element may favour its own axis.
        expect(power).toBeLessThan(3);
      }
    }),
    runs(60),
  );
});

test(`on the axis D² is 1 (seed ${SEED})`, () => {
  const onAxis = (spec: PatternSpec): PatternSpec => (spec.type === 'column' ? { ...spec, steer: 0 } : spec);
  fc.assert(
    fc.property(anySpec.map(onAxis), soundSpeed, (spec, speed) => {
      for (const power of at(createPattern(spec, speed), 1, 0)) expect(Math.abs(dbOfPower(power))).toBeLessThan(0.001);
    }),
    runs(60),
  );
});

test(`a device on a surface has Q of 2 at least, a first-order one from 1 to 4 (seed ${SEED})`, () => {
  fc.assert(
    fc.property(flushPiston, soundSpeed, (spec, speed) => {
      for (const q of directivityFactors(createPattern(spec, speed))) expect(q).toBeGreaterThanOrEqual(2 - 1e-6);
    }),
    runs(15),
  );
  fc.assert(
    fc.property(firstOrder, (spec) => {
      for (const q of directivityFactors(createPattern(spec, 343))) {
        expect(q).toBeGreaterThanOrEqual(1 - 1e-6);
        expect(q).toBeLessThanOrEqual(4 + 1e-6);
      }
    }),
    runs(25),
  );
});

test(`the directivity index does not change with roll (seed ${SEED})`, () => {
  fc.assert(
    fc.property(fc.oneof(horn, table), between(0, 2 * Math.PI), (spec, rollRad) => {
      const pattern = createPattern(spec, 343);
      const [c, s] = [Math.cos(rollRad), Math.sin(rollRad)];
      const rolled: Pattern = {
        axisymmetric: false,
        powers: (u, v, w, out, start) => pattern.powers(u, v * c + w * s, w * c - v * s, out, start),
      };
      const turned = directivityFactors(rolled);
      directivityFactors(pattern).forEach((q, b) => {
        expect(Math.abs(dbOfPower(q / turned[b]))).toBeLessThan(0.005);
      });
    }),
    runs(6),
  );
});

test(`an axisymmetric pattern does not depend on the clock angle (seed ${SEED})`, () => {
  fc.assert(
    fc.property(anySpec, between(-1, 1), between(0, 6.28), (spec, cosine, clock) => {
      const pattern = createPattern(spec, 343);
      fc.pre(pattern.axisymmetric);
      const there = at(pattern, cosine, clock);
      at(pattern, cosine, 0).forEach((power, b) => {
        expect(Math.abs(dbOfPower((power + 1e-9) / (there[b] + 1e-9)))).toBeLessThan(1e-6);
      });
    }),
    runs(40),
  );
});

test(`blended planes give back their half-planes (seed ${SEED})`, () => {
  fc.assert(
    fc.property(levels, fc.integer({ min: 0, max: 3 }), (rows, half) => {
      const spec = { type: 'table' as const, theta: [0, 60, 120], phi: [0, 90, 180, 270], planes: true };
      const pattern = createPattern({ ...spec, levels: new Array(7).fill([[0, 0, 0, 0], ...rows]) }, 343);
      const found = at(pattern, Math.cos(Math.PI / 3), (half * Math.PI) / 2);
      for (const power of found) expect(dbOfPower(power)).toBeCloseTo(Math.max(-25, rows[0][half]), 6);
    }),
    runs(40),
  );
});

function at(pattern: Pattern, cosine: number, clockRad: number): Float64Array {
  const out = new Float64Array(7);
  const sine = Math.sqrt(1 - cosine * cosine);
  pattern.powers(cosine, sine * Math.cos(clockRad), sine * Math.sin(clockRad), out, 0);
  return out;
}
