import { expect } from 'vitest';
import type { Layout } from '../../src/layout/schema';
import { predictionJson } from '../../src/predict/prediction-json';
import { predict } from '../../src/predict/run';
import { predictionDifferences } from './prediction-differences';

/** The figures of a layout. */
export const figuresOf = (layout: Layout): unknown =>
  JSON.parse(JSON.stringify(predictionJson(layout, predict(layout))));

/** Expects two predictions to agree in every figure to 2e-6 (the last digit the contract has), positions aside. */
export function expectSameFigures(found: unknown, reference: unknown): void {
  const differences = predictionDifferences(found, withoutPositions(reference), { tolerance: 2e-6 });
  expect(differences, differences.slice(0, 5).join('\n')).toEqual([]);
}

const withoutPositions = (value: unknown): unknown =>
  JSON.parse(JSON.stringify(value, (key, item) => (key === 'position' ? undefined : item)));
