import { BAND_COUNT } from '../bands';
import { averagingWavenumbers, FREQUENCY_COUNT, STEP_COUNT } from './averaging';
import { capPhaseRate, capSampler } from './cap-on-sphere';
import { FLOOR_POWER, type Pattern } from './pattern';
import { cellsForRate, greatestWavenumber } from './sampled-pattern';
import { createUniformTable, cubicWeights, type UniformTable } from './uniform-table';

/** A vertical row of equal drivers, each a cap on a sphere. Diameters in metres. */
export interface ColumnShape {
  drivers: number;
  spacingM: number;
  /** Electronic steer, up positive. */
  steerRad: number;
  sphereDiameterM: number;
  capDiameterM: number;
}

/**
 * Column loudspeaker by the product theorem (Olson, Elements of Acoustical Engineering): element times array, 1 at the
 * main lobe (in the plane of u and w at elevation `steer`), averaged over each octave, floored. Both factors of the 63
 * frequencies are sampled once, the element in θ and the array in sin e.
 */
export function createColumn(shape: ColumnShape, soundSpeedMS: number): Pattern {
  const elements = sampleElement(shape, soundSpeedMS);
  const arrays = sampleArray(shape, soundSpeedMS);
  return {
    axisymmetric: false,
    ringsAbout: 'up',
    powers(u, _v, w, out, at) {
      averageProduct(elements, Math.acos(Math.max(-1, Math.min(1, u))), arrays, w, out, at);
      for (let b = at; b < at + BAND_COUNT; b++) if (out[b] < FLOOR_POWER) out[b] = FLOOR_POWER;
    },
  };
}

/** |sin(n x)/(n sin x)|, 1 where |sin x| < 1e-7 (Olson). */
export function arrayFactor(drivers: number, x: number): number {
  const sine = Math.sin(x);
  return Math.abs(sine) < 1e-7 ? 1 : Math.abs(Math.sin(drivers * x) / (drivers * sine));
}

/** D² of one element over its own value at the main lobe, in θ. */
function sampleElement(shape: ColumnShape, soundSpeedMS: number): UniformTable {
  const sampler = capSampler(shape.sphereDiameterM, shape.capDiameterM, soundSpeedMS);
  const cells = cellsForRate(Math.PI, Math.PI / 360, capPhaseRate(shape.sphereDiameterM, soundSpeedMS));
  const atLobe = new Float64Array(FREQUENCY_COUNT);
  sampler(Math.abs(shape.steerRad), atLobe);
  const row = new Float64Array(FREQUENCY_COUNT);
  return createUniformTable(0, Math.PI, cells, FREQUENCY_COUNT, (thetaRad, out, at) => {
    sampler(thetaRad, row);
    for (let i = 0; i < FREQUENCY_COUNT; i++) out[at + i] = row[i] / atLobe[i];
  });
}

/** Array factor squared, in sin e. */
function sampleArray(shape: ColumnShape, soundSpeedMS: number): UniformTable {
  const { drivers, spacingM } = shape;
  const halfPhases = averagingWavenumbers(soundSpeedMS).map((k) => (k * spacingM) / 2);
  const steerSine = Math.sin(shape.steerRad);
  const rate = greatestWavenumber(soundSpeedMS) * spacingM * (drivers - 1);
  const cells = cellsForRate(2, 0.01, rate);
  return createUniformTable(-1, 1, cells, FREQUENCY_COUNT, (sinElevation, out, at) => {
    for (let i = 0; i < FREQUENCY_COUNT; i++) {
      out[at + i] = arrayFactor(drivers, halfPhases[i] * (sinElevation - steerSine)) ** 2;
    }
  });
}

/** Band means of element at θ times array at sin e, both interpolated as `interpolateRow` does, in one pass. */
function averageProduct(
  elements: UniformTable,
  thetaRad: number,
  arrays: UniformTable,
  sinElevation: number,
  out: Float64Array,
  at: number,
): void {
  // Own copies: where modules are loaded one by one an imported constant is looked up at every use.
  const stride = FREQUENCY_COUNT;
  const steps = STEP_COUNT;
  const e = elements.values;
  const a = arrays.values;
  cubicWeights(elements, thetaRad, elementWeights);
  cubicWeights(arrays, sinElevation, arrayWeights);
  const e0 = elementWeights[0];
  const e1 = elementWeights[1];
  const e2 = elementWeights[2];
  const e3 = elementWeights[3];
  const a0 = arrayWeights[0];
  const a1 = arrayWeights[1];
  const a2 = arrayWeights[2];
  const a3 = arrayWeights[3];
  // `| 0`: the cells come as floating-point numbers, and indices are to stay whole ones for the compiler.
  let i = (elementWeights[4] * stride) | 0;
  let k = (arrayWeights[4] * stride) | 0;
  for (let b = 0; b < BAND_COUNT; b++) {
    let sum = 0;
    for (let j = 0; j < steps; j++, i++, k++) {
      const element = e0 * e[i] + e1 * e[i + stride] + e2 * e[i + 2 * stride] + e3 * e[i + 3 * stride];
      const array = a0 * a[k] + a1 * a[k + stride] + a2 * a[k + 2 * stride] + a3 * a[k + 3 * stride];
      sum += element * array;
    }
    out[at + b] = sum / steps;
  }
}

const elementWeights = new Float64Array(5);
const arrayWeights = new Float64Array(5);
