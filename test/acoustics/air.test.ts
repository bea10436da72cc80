import { describe, expect, test } from 'vitest';
import { airAttenuationDbPerM, airAttenuationDbPerMAt, soundSpeed } from '../../src/acoustics/air';
import { CENTRES_HZ } from '../../src/acoustics/bands';

const AIR = { temperatureC: 20, humidityPercent: 50, pressureKPa: 101.325 };

describe('speed of sound', () => {
  test('grows with the root of absolute temperature', () => {
    expect(soundSpeed(20)).toBeCloseTo(343.2, 10);
    expect(soundSpeed(4 * 293.15 - 273.15)).toBeCloseTo(2 * 343.2, 9);
  });
});

describe('air attenuation', () => {
  test('is seven values at the exact centres, in dB per metre', () => {
    const bands = airAttenuationDbPerM(AIR);
    expect(bands).toHaveLength(7);
    expect(bands[6]).toBe(airAttenuationDbPerMAt(CENTRES_HZ[6], AIR));
    expect(bands[6]).toBeCloseTo(0.104, 3);
  });

  test('rises with frequency', () => {
    const bands = airAttenuationDbPerM(AIR);
    for (let b = 1; b < 7; b++) expect(bands[b]).toBeGreaterThan(bands[b - 1]);
  });

  test('at high frequency dry air takes more than damp air, at low frequency less', () => {
    const dry = airAttenuationDbPerM({ ...AIR, humidityPercent: 20 });
    const damp = airAttenuationDbPerM({ ...AIR, humidityPercent: 80 });
    expect(dry[6]).toBeGreaterThan(damp[6]);
    expect(dry[0]).toBeGreaterThan(damp[0]);
    expect(dry[2]).toBeLessThan(damp[2]);
  });

  test('far above relaxation the classical term remains, inversely with pressure', () => {
    const at = (pressureKPa: number) => airAttenuationDbPerMAt(1e8, { ...AIR, humidityPercent: 0, pressureKPa });
    expect(at(50) / at(100)).toBeCloseTo(2, 3);
  });
});
