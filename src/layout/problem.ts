/** Something that is wrong with a layout: where, what was found, what would be accepted, and what to do about it. */
export interface Problem {
  /** Place in the file, such as `venue.faces[3].corners`; empty for the file as a whole. */
  path: string;
  found: string;
  expected: string;
  remedy: string;
  /** An error keeps the layout from being predicted; a caution is said beside the prediction. */
  severity: 'error' | 'caution';
}

export const errorAt = (path: string, found: string, expected: string, remedy: string): Problem => ({
  path,
  found,
  expected,
  remedy,
  severity: 'error',
});

export const cautionAt = (path: string, found: string, expected: string, remedy: string): Problem => ({
  ...errorAt(path, found, expected, remedy),
  severity: 'caution',
});

/** One line for a terminal or a notice: place, what is wrong, what would be accepted, remedy. */
export function sayProblem(problem: Problem): string {
  const place = problem.path === '' ? '' : `${problem.path}: `;
  const parts = [problem.found, problem.expected, problem.remedy].filter((part) => part !== '');
  return `${place}${parts.join('; ')}.`.replace(/\?\.$/, '?');
}

/** A value, or the problems that kept it from being one. Problems beside a value are cautions. */
export type Outcome<T> = { ok: true; value: T; problems: Problem[] } | { ok: false; problems: Problem[] };
