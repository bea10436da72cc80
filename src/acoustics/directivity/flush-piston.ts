import { averagingWavenumbers, FREQUENCY_COUNT } from './averaging';
import { besselJ1 } from './bessel-j1';
import type { Pattern } from './pattern';
import { createSampledPattern, greatestWavenumber } from './sampled-pattern';

/** Circular piston flush in an infinite wall: averaged over each octave, floored in front, 0 where cos θ < −1e-9. */
export function createFlushPiston(diameterM: number, soundSpeedMS: number): Pattern {
  const radiusM = diameterM / 2;
  const radiiInRad = averagingWavenumbers(soundSpeedMS).map((k) => k * radiusM);
  return createSampledPattern(
    (thetaRad, out) => {
      const sine = Math.sin(thetaRad);
      for (let i = 0; i < FREQUENCY_COUNT; i++) out[i] = pistonRatio(radiiInRad[i] * sine) ** 2;
    },
    2 * greatestWavenumber(soundSpeedMS) * radiusM,
    Math.PI / 2,
  );
}

/** D = 2J₁(x)/x, x = ka sin θ, signed, at one frequency (Beranek & Mellow, Acoustics, 2nd ed., 4.42; even in x). */
export function pistonRatio(kaSinTheta: number): number {
  return Math.abs(kaSinTheta) < 1e-8 ? 1 : (2 * besselJ1(kaSinTheta)) / kaSinTheta;
}
