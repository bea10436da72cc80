/** A figure for JSON: null where there is no finite number, else six significant decimals or digits. */
export function jsonFigure(value: number | null): number | null {
  if (value === null || !Number.isFinite(value)) return null;
  return Math.abs(value) < 1e-3 ? Number(value.toPrecision(6)) : Number(value.toFixed(6));
}

/** A list of figures for JSON. */
export const jsonFigures = (values: ArrayLike<number>): (number | null)[] => Array.from(values, jsonFigure);
