import { describe, expect, test } from 'vitest';
import type { PublishedRow } from './row';

const modules = import.meta.glob<{ rows: PublishedRow[] }>('./rows/*.ts', { eager: true });
const tables = Object.entries(modules).map(([path, module]) => ({
  name: path.replace(/^.*\/(.*)\.ts$/, '$1'),
  rows: module.rows,
}));
const checked = new Set<PublishedRow>();

describe.each(tables)('published values: $name', ({ rows }) => {
  test.each(rows)('$quantity = $value $unit ($source)', (row) => {
    const found = row.compute();
    checked.add(row);
    expect(row.source).not.toBe('');
    expect(
      Math.abs(found - row.value),
      `found ${found}, published ${row.value} ± ${row.tolerance}`,
    ).toBeLessThanOrEqual(row.tolerance);
  });
});

test('no row was skipped', () => {
  const skipped = tables.flatMap((table) => table.rows).filter((row) => !checked.has(row));
  expect(skipped.map((row) => row.quantity)).toEqual([]);
});
