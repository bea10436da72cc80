import { checkLayout } from '../layout/check';
import type { Problem } from '../layout/problem';
import type { Layout } from '../layout/schema';
import type { Prediction } from './prediction';
import { predict } from './run';

/** Asks for the prediction of some schemes of a layout. */
export interface PredictRequest {
  /** Rising number; the answer carries it, so that a stale one can be told. */
  revision: number;
  layout: Layout;
  schemeIds: readonly string[];
}

export interface PredictAnswer {
  revision: number;
  problems: Problem[];
  /** null where an error keeps the layout from being predicted. */
  prediction: Prediction | null;
}

/** Checks a layout and predicts it where nothing is wrong: the same in the worker and in tests. */
export function answer(request: PredictRequest): PredictAnswer {
  const problems = checkLayout(request.layout);
  const sound = !problems.some((problem) => problem.severity === 'error');
  const prediction = sound ? predict(request.layout, request.schemeIds) : null;
  return { revision: request.revision, problems, prediction };
}
