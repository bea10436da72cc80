import { BAND_COUNT } from '../bands';
import { averagingWavenumbers, FREQUENCY_COUNT, STEP_COUNT } from './averaging';
import { FLOOR_POWER, type Pattern } from './pattern';
import { createUniformTable, interpolateRow, type UniformTable } from './uniform-table';

/** Single-frequency D² of an axisymmetric pattern at one θ: writes one value per averaging frequency. */
export type AngleSampler = (thetaRad: number, out: Float64Array) => void;

/** Phase per cell in a sampled D²: the cubic is then within (3/128)·0.4⁴ = 0.06 % of a lobe, under 0.003 dB. */
const PHASE_PER_CELL_RAD = 0.4;
const COARSEST_CELL_RAD = Math.PI / 360;
const MOST_CELLS = 16384;

/**
 * An axisymmetric interference pattern, averaged over the octave and sampled once in θ so that a look-up costs a
 * cubic instead of a series. The floor is applied after interpolation.
 *
 * @param phaseRate greatest angular rate of D² in θ (rad per rad), which sets the step: at most 0.5°
 * @param endRad    last angle sampled: π, or π/2 for a pattern that is 0 behind its plane (cos θ < −1e-9)
 * @param sampler   has to continue smoothly one step beyond 0 and endRad
 */
export function createSampledPattern(sampler: AngleSampler, phaseRate: number, endRad: number): Pattern {
  const single = new Float64Array(FREQUENCY_COUNT);
  const cells = cellsForRate(endRad, COARSEST_CELL_RAD, phaseRate);
  const table = createUniformTable(0, endRad, cells, BAND_COUNT, (thetaRad, out, at) => {
    sampler(thetaRad, single);
    bandMeans(single, out, at);
  });
  return endRad < Math.PI ? hemisphere(table) : sphere(table);
}

/** Cells needed over a span for functions of the given angular rate, none wider than `coarsest`. */
export function cellsForRate(span: number, coarsest: number, rate: number): number {
  const step = Math.min(coarsest, PHASE_PER_CELL_RAD / rate);
  return Math.min(MOST_CELLS, Math.ceil(span / step - 1e-9));
}

/** Mean over the averaging frequencies of each band: [band][step] to [band]. */
export function bandMeans(single: Float64Array, out: Float64Array, at: number): void {
  for (let b = 0; b < BAND_COUNT; b++) {
    let sum = 0;
    for (let j = 0; j < STEP_COUNT; j++) sum += single[b * STEP_COUNT + j];
    out[at + b] = sum / STEP_COUNT;
  }
}

/** Greatest wavenumber that is averaged, in rad/m: the one that sets the finest detail. */
export function greatestWavenumber(soundSpeedMS: number): number {
  return averagingWavenumbers(soundSpeedMS)[FREQUENCY_COUNT - 1];
}

function sphere(table: UniformTable): Pattern {
  return {
    axisymmetric: true,
    powers(u, _v, _w, out, at) {
      interpolateRow(table, Math.acos(Math.max(-1, Math.min(1, u))), out, at);
      for (let b = at; b < at + BAND_COUNT; b++) if (out[b] < FLOOR_POWER) out[b] = FLOOR_POWER;
    },
  };
}

function hemisphere(table: UniformTable): Pattern {
  const inFront = sphere(table);
  return {
    axisymmetric: true,
    powers(u, v, w, out, at) {
      if (u < BEHIND_COSINE) out.fill(0, at, at + BAND_COUNT);
      else inFront.powers(u, v, w, out, at);
    },
  };
}

/** Devices lying on a surface send and receive nothing where cos θ is below this. */
export const BEHIND_COSINE = -1e-9;
