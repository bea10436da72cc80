/**
 * Several functions of one variable, sampled at equal steps for cubic interpolation.
 * `values` is [sample][column]; sample 0 lies one step before `from`, and the last one step after the end.
 */
export interface UniformTable {
  readonly values: Float64Array;
  readonly columns: number;
  readonly from: number;
  readonly cells: number;
  readonly cellsPerUnit: number;
}

/**
 * Samples over from…to in equal cells. `fill` writes the columns at x into out[at …]; it is also asked one step
 * beyond either end, where it has to continue smoothly.
 */
export function createUniformTable(
  from: number,
  to: number,
  cells: number,
  columns: number,
  fill: (x: number, out: Float64Array, at: number) => void,
): UniformTable {
  const values = new Float64Array((cells + 3) * columns);
  const step = (to - from) / cells;
  for (let sample = 0; sample < cells + 3; sample++) fill(from + (sample - 1) * step, values, sample * columns);
  return { values, columns, from, cells, cellsPerUnit: 1 / step };
}

/**
 * Weights of the four samples around x in weights[0 … 3], and the number of the first of them in weights[4]: the cubic
 * of Lagrange (Abramowitz & Stegun 25.2.13). For a component of angular rate p per unit and step s the error is at most
 * (3/128)(ps)⁴ of its amplitude (25.2.14).
 */
export function cubicWeights(table: UniformTable, x: number, weights: Float64Array): void {
  const position = (x - table.from) * table.cellsPerUnit;
  const cell = Math.max(0, Math.min(table.cells - 1, Math.floor(position)));
  const p = position - cell;
  weights[0] = (-p * (p - 1) * (p - 2)) / 6;
  weights[1] = ((p * p - 1) * (p - 2)) / 2;
  weights[2] = (-p * (p + 1) * (p - 2)) / 2;
  weights[3] = (p * (p * p - 1)) / 6;
  weights[4] = cell;
}

/** Writes all columns at x into out[at …]. */
export function interpolateRow(table: UniformTable, x: number, out: Float64Array, at: number): void {
  const { values, columns } = table;
  cubicWeights(table, x, scratch);
  const before = scratch[0];
  const left = scratch[1];
  const right = scratch[2];
  const after = scratch[3];
  const first = (scratch[4] * columns) | 0;
  const second = first + columns;
  const third = second + columns;
  const fourth = third + columns;
  for (let c = 0; c < columns; c++) {
    out[at + c] =
      before * values[first + c] + left * values[second + c] + right * values[third + c] + after * values[fourth + c];
  }
}

const scratch = new Float64Array(5);
