import { describe, expect, test } from 'vitest';
import { powerOfDb } from '../../../src/acoustics/level';
import {
  auditoryPowers,
  createTransmissionIndex,
  MODULATION_HZ,
  maskingDb,
  RECEPTION_THRESHOLDS_DB,
  transmissionIndexOfModulations,
} from '../../../src/acoustics/speech/transmission-index';

const bands = (value: number) => new Float64Array(7).fill(value);

describe('index of a modulation matrix', () => {
  test('m above 1 counts as 1, m below 0 as 0', () => {
    expect(transmissionIndexOfModulations(new Float64Array(98).fill(1.2)).sti).toBe(1);
    expect(transmissionIndexOfModulations(new Float64Array(98).fill(-0.1)).sti).toBe(0);
  });

  test('the matrix is [band][frequency]', () => {
    const m = new Float64Array(98);
    m.fill(1, 14, 28);
    const { mti, sti } = transmissionIndexOfModulations(m);
    expect([...mti]).toEqual([0, 1, 0, 0, 0, 0, 0]);
    expect(sti).toBeCloseTo(0.127, 12);
  });

  test('the effective signal-to-noise ratio ends at ±15 dB', () => {
    const atDb = (snrDb: number) =>
      transmissionIndexOfModulations(new Float64Array(98).fill(1 / (1 + powerOfDb(-snrDb)))).sti;
    expect(atDb(15.5)).toBe(atDb(20));
    expect(atDb(-15.5)).toBe(0);
    expect(atDb(14.5)).toBeLessThan(atDb(15.5));
  });
});

describe('hearing', () => {
  test('masking is steady where its pieces meet', () => {
    expect(maskingDb(63 - 1e-9)).toBeCloseTo(maskingDb(63), 6);
    expect(maskingDb(67 - 1e-9)).toBeCloseTo(maskingDb(67), 6);
    expect(maskingDb(120)).toBe(-10);
  });

  test('speech and noise of the band below mask together, 125 Hz is not masked', () => {
    const speech = bands(0);
    const noise = bands(0);
    speech[0] = powerOfDb(70);
    noise[0] = powerOfDb(70);
    const heard = new Float64Array(7);
    auditoryPowers(speech, noise, heard);
    expect(heard[0]).toBeCloseTo(2 * powerOfDb(70) + powerOfDb(46), 3);
    const masking = 2 * powerOfDb(70) * powerOfDb(0.5 * (70 + 10 * Math.log10(2)) - 59.8);
    expect(heard[1]).toBeCloseTo(masking + powerOfDb(27), 3);
    expect(heard[2]).toBeCloseTo(powerOfDb(12), 9);
  });

  test('with nothing to hear the thresholds remain', () => {
    const heard = new Float64Array(7);
    auditoryPowers(bands(0), bands(0), heard);
    expect([...heard]).toEqual(RECEPTION_THRESHOLDS_DB.map(powerOfDb));
  });
});

describe('index of arrivals', () => {
  test('no speech gives 0', () => {
    const index = createTransmissionIndex();
    expect(index.finish(bands(1e3))).toBe(0);
    index.add(0.01, bands(0), 0);
    index.addDiffuse(0.01, bands(0), 0, bands(1));
    expect(index.finish(bands(0))).toBe(0);
    expect([...index.modulationsInQuiet()]).toEqual(Array(98).fill(0));
  });

  test('two equal arrivals cancel where they are half a modulation apart', () => {
    const index = createTransmissionIndex();
    const delayS = 0.5 / MODULATION_HZ[9];
    index.add(3, bands(1), 0);
    index.add(3 + delayS, bands(1), 0);
    const m = index.modulationsInQuiet();
    MODULATION_HZ.forEach((frequencyHz, f) => {
      expect(m[14 + f]).toBeCloseTo(Math.abs(Math.cos(Math.PI * frequencyHz * delayS)), 6);
    });
    expect(m[9]).toBeLessThan(1e-6);
  });

  test('a late diffuse field is worth less than one that starts with the direct sound', () => {
    const index = createTransmissionIndex();
    const at = (startS: number) => {
      index.reset();
      index.add(0, bands(1e6), 0);
      index.addDiffuse(startS, bands(1e6), 0, bands(1));
      return index.finish(bands(0));
    };
    expect(at(0.05)).toBeLessThan(at(0));
  });

  test('a diffuse field of no decay time is a discrete arrival', () => {
    const index = createTransmissionIndex();
    index.add(0, bands(2), 0);
    index.addDiffuse(0.04, bands(3), 0, bands(0));
    const diffuse = index.modulationsInQuiet();
    index.reset();
    index.add(0, bands(2), 0);
    index.add(0.04, bands(3), 0);
    expect([...diffuse]).toEqual([...index.modulationsInQuiet()]);
  });

  test('reset forgets, and offsets pick the seven energies', () => {
    const index = createTransmissionIndex();
    const energies = Float64Array.from({ length: 21 }, (_, i) => powerOfDb(40 + i));
    index.add(0, energies, 0);
    index.addDiffuse(0, energies, 7, bands(2));
    index.finish(bands(1e4));
    index.reset();
    index.add(5, energies, 14);
    const again = index.finish(bands(1e4));
    const fresh = createTransmissionIndex();
    fresh.add(0, energies.slice(14), 0);
    expect(again).toBe(fresh.finish(bands(1e4)));
    expect([...index.mti]).toEqual([...fresh.mti]);
  });

  test.each([1, 2, 3, 4, 5, 6])('equals the written-out formula in a random room, seed %i', (seed) => {
    const random = randomOf(seed);
    const arrivals = Array.from({ length: 50 }, () => ({
      timeS: random() * 0.4,
      energies: Float64Array.from({ length: 7 }, () => powerOfDb(70 * random())),
    }));
    const fields = Array.from({ length: 3 }, () => ({
      timeS: random() * 0.1,
      energies: Float64Array.from({ length: 7 }, () => powerOfDb(70 * random())),
      decayS: Float64Array.from({ length: 7 }, () => 0.2 + 4 * random()),
    }));
    const noise = Float64Array.from({ length: 7 }, () => powerOfDb(60 * random()));
    const index = createTransmissionIndex();
    for (const { timeS, energies } of arrivals) index.add(timeS, energies, 0);
    for (const { timeS, energies, decayS } of fields) index.addDiffuse(timeS, energies, 0, decayS);

    const quiet = index.modulationsInQuiet();
    const m = new Float64Array(98);
    const heard = new Float64Array(7);
    const speech = Float64Array.from({ length: 7 }, (_, b) =>
      [...arrivals, ...fields].reduce((sum, { energies }) => sum + energies[b], 0),
    );
    auditoryPowers(speech, noise, heard);
    for (let b = 0; b < 7; b++) {
      for (let f = 0; f < 14; f++) {
        const omega = 2 * Math.PI * 10 ** ((f - 2) / 10);
        let re = 0;
        let im = 0;
        for (const { timeS, energies } of arrivals) {
          re += energies[b] * Math.cos(omega * timeS);
          im -= energies[b] * Math.sin(omega * timeS);
        }
        for (const { timeS, energies, decayS } of fields) {
          // E·e^(−jωt)/(1 + jy) as modulus and argument.
          const y = (omega * decayS[b]) / (6 * Math.log(10));
          const size = energies[b] / Math.hypot(1, y);
          const angle = -omega * timeS - Math.atan(y);
          re += size * Math.cos(angle);
          im += size * Math.sin(angle);
        }
        const size = Math.hypot(re, im);
        expect(Math.abs(quiet[b * 14 + f] - size / speech[b])).toBeLessThan(1e-6);
        m[b * 14 + f] = size / heard[b];
      }
    }
    expect(Math.abs(index.finish(noise) - transmissionIndexOfModulations(m).sti)).toBeLessThan(1e-5);
  });

  test.each([11, 12, 13])('order and origin of time do not matter, seed %i', (seed) => {
    const random = randomOf(seed);
    const arrivals = Array.from({ length: 20 }, () => ({ timeS: random() * 0.3, energies: bands(1e6 * random()) }));
    const of = (list: typeof arrivals, shiftS: number) => {
      const index = createTransmissionIndex();
      for (const { timeS, energies } of list) index.add(timeS + shiftS, energies, 0);
      return index.finish(bands(1e3));
    };
    expect(Math.abs(of(arrivals, 0) - of([...arrivals].reverse(), 7))).toBeLessThan(1e-5);
  });
});

/** Uniform numbers in 0…1 from a seed (a linear congruential generator with the constants of Numerical Recipes). */
function randomOf(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}
