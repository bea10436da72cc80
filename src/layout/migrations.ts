import { LAYOUT_VERSION } from './schema';

/** Takes a document of the version it is listed under to the next. Pure; never refuses: the schema does that after. */
export type Migration = (document: Record<string, unknown>) => Record<string, unknown>;

/**
 * One step for each version before today's, keyed by the version it starts from. Version 1 is the first, so there is
 * none yet. A step comes with a saved file of its version in `data/migrations/`, which the tests open.
 */
export const MIGRATIONS: ReadonlyMap<number, Migration> = new Map();

/** The document at today's version. */
export function migrate(document: Record<string, unknown>, version: number): Record<string, unknown> {
  let current = document;
  for (let from = version; from < LAYOUT_VERSION; from++) {
    const step = MIGRATIONS.get(from);
    if (step === undefined) throw new Error(`No migration leads from version ${from}.`);
    current = { ...step(current), version: from + 1 };
  }
  return current;
}
