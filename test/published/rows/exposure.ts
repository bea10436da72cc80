import { exposureMinutes } from '../../../src/report/cautions';
import type { PublishedRow } from '../row';

const TABLE: [levelDba: number, minutes: number][] = [
  [85, 480],
  [88, 240],
  [91, 120],
  [94, 60],
  [97, 30],
  [100, 15],
];

export const rows: PublishedRow[] = TABLE.map(([levelDba, minutes]) => ({
  quantity: `daily exposure allowed at ${levelDba} dBA`,
  compute: () => exposureMinutes(levelDba),
  value: minutes,
  tolerance: 1e-9,
  unit: 'min',
  source: 'NIOSH, Criteria for a Recommended Standard: Occupational Noise Exposure, Publication 98-126, table 1-1',
}));
