import { averagingWavenumbers, FREQUENCY_COUNT } from './averaging';
import { firstOrderPressure } from './first-order';
import type { Pattern } from './pattern';
import { createSampledPattern, greatestWavenumber } from './sampled-pattern';

const HYPERCARDIOID_ALPHA = 0.25;

/** Line microphone: a tube of the given length before a hypercardioid capsule, averaged over each octave, floored. */
export function createTube(lengthM: number, soundSpeedMS: number): Pattern {
  const lengthsInRad = averagingWavenumbers(soundSpeedMS).map((k) => k * lengthM);
  return createSampledPattern(
    (thetaRad, out) => {
      for (let i = 0; i < FREQUENCY_COUNT; i++) out[i] = tubePressure(lengthsInRad[i], thetaRad) ** 2;
    },
    greatestWavenumber(soundSpeedMS) * lengthM + 2,
    Math.PI,
  );
}

/**
 * D = (0.25 + 0.75 cos θ)·sin x/x, x = (kL/2)(1 − cos θ), signed, at one frequency
 * (Olson, Elements of Acoustical Engineering).
 */
export function tubePressure(kL: number, thetaRad: number): number {
  const x = kL * Math.sin(thetaRad / 2) ** 2;
  const line = Math.abs(x) < 1e-8 ? 1 : Math.sin(x) / x;
  return firstOrderPressure(HYPERCARDIOID_ALPHA, Math.cos(thetaRad)) * line;
}
