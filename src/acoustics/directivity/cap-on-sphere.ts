import { averagingWavenumbers, FREQUENCY_COUNT } from './averaging';
import { legendrePolynomials } from './legendre';
import type { Pattern } from './pattern';
import { type AngleSampler, createSampledPattern, greatestWavenumber } from './sampled-pattern';
import { sphericalDerivatives } from './spherical-hankel';

/** The radiating cap is never larger than kρ = 3: a box hands over to a smaller driver (our choice). */
const GREATEST_CAP_RAD = 3;

/**
 * Loudspeaker box as a cap that moves on a rigid sphere: averaged over each octave, floored.
 *
 * @param sphereDiameterM diameter 2R of the sphere
 * @param capDiameterM    diameter 2ρ of the cap, at most that of the sphere; the radiating one is min(ρ, 3/k)
 */
export function createCapOnSphere(sphereDiameterM: number, capDiameterM: number, soundSpeedMS: number): Pattern {
  const sampler = capSampler(sphereDiameterM, capDiameterM, soundSpeedMS);
  return createSampledPattern(sampler, capPhaseRate(sphereDiameterM, soundSpeedMS), Math.PI);
}

/** Greatest angular rate of D²: twice the highest order that still radiates. */
export function capPhaseRate(sphereDiameterM: number, soundSpeedMS: number): number {
  return sphereDiameterM * greatestWavenumber(soundSpeedMS) + 4;
}

/** D² at the 63 averaging frequencies, relative to the axis. */
export function capSampler(sphereDiameterM: number, capDiameterM: number, soundSpeedMS: number): AngleSampler {
  const radiusM = sphereDiameterM / 2;
  const series = Array.from(averagingWavenumbers(soundSpeedMS), (k) => {
    const capM = Math.min(capDiameterM / 2, GREATEST_CAP_RAD / k);
    return onAxisUnit(capSeries(k * radiusM, Math.asin(Math.min(1, capM / radiusM))));
  });
  const last = Math.max(...series.map((terms) => terms.real.length)) - 1;
  const legendre = new Float64Array(last + 1);
  return (thetaRad, out) => {
    legendrePolynomials(Math.cos(thetaRad), last, legendre);
    for (let i = 0; i < FREQUENCY_COUNT; i++) out[i] = sumPower(series[i], legendre);
  };
}

/**
 * Far pressure of the cap at one frequency, relative to a small source of the same volume velocity in the free field:
 * |Σ Wₙ Pₙ(cos θ) iⁿ⁺¹/hₙ⁽²⁾′(kR)| / (W₀ (kR)²). As β → 0 it is that of a point source on the sphere, by reciprocity
 * that on the sphere of a distant source.
 *
 * @param kR      sphere radius in radians of phase, above 0; checked for 1e-3 … 200
 * @param betaRad half-angle of the cap, sin β = ρ/R, above about 1e-4
 */
export function capPressure(kR: number, betaRad: number, thetaRad: number): number {
  const series = capSeries(kR, betaRad);
  const legendre = new Float64Array(series.real.length);
  legendrePolynomials(Math.cos(thetaRad), legendre.length - 1, legendre);
  return Math.sqrt(sumPower(series, legendre)) / (sourceWeight(betaRad) * kR * kR);
}

interface Series {
  readonly real: Float64Array;
  readonly imaginary: Float64Array;
}

/** Coefficients Wₙ iⁿ⁺¹/hₙ⁽²⁾′(kR) (Morse & Ingard, Theoretical Acoustics; Aarts & Janssen, J. Audio Eng. Soc. 2010). */
function capSeries(kR: number, betaRad: number): Series {
  const derivative = sphericalDerivatives(kR, Math.ceil(kR + 12 + 4 * Math.cbrt(kR)));
  const weights = capWeights(betaRad, derivative.j.length);
  const real = new Float64Array(weights.length);
  const imaginary = new Float64Array(weights.length);
  for (let n = 0; n < weights.length; n++) {
    // 1/(j′ − i y′) = (j′ + i y′)/(j′² + y′²), turned by iⁿ⁺¹.
    const size = Math.hypot(derivative.j[n], derivative.y[n]);
    const re = (weights[n] * (derivative.j[n] / size)) / size;
    const im = (weights[n] * (derivative.y[n] / size)) / size;
    const turns = (n + 1) % 4;
    real[n] = turns === 0 ? re : turns === 1 ? -im : turns === 2 ? -re : im;
    imaginary[n] = turns === 0 ? im : turns === 1 ? re : turns === 2 ? -im : -re;
  }
  return { real, imaginary };
}

/** Wₙ of the cap: W₀ = ½(1 − cos β), Wₙ = ½(Pₙ₋₁(cos β) − Pₙ₊₁(cos β)). */
function capWeights(betaRad: number, count: number): Float64Array {
  const legendre = new Float64Array(count + 1);
  legendrePolynomials(Math.cos(betaRad), count, legendre);
  return Float64Array.from({ length: count }, (_, n) =>
    n === 0 ? sourceWeight(betaRad) : (legendre[n - 1] - legendre[n + 1]) / 2,
  );
}

/** W₀ = ½(1 − cos β), the share of the sphere that moves. */
function sourceWeight(betaRad: number): number {
  return Math.sin(betaRad / 2) ** 2;
}

function sumPower({ real, imaginary }: Series, legendre: Float64Array): number {
  let re = 0;
  let im = 0;
  for (let n = 0; n < real.length; n++) {
    re += real[n] * legendre[n];
    im += imaginary[n] * legendre[n];
  }
  return re * re + im * im;
}

/** The same series scaled to 1 on the axis. */
function onAxisUnit({ real, imaginary }: Series): Series {
  const onAxis = Math.sqrt(sumPower({ real, imaginary }, new Float64Array(real.length).fill(1)));
  return { real: real.map((x) => x / onAxis), imaginary: imaginary.map((x) => x / onAxis) };
}
