import curves from '../../../data/reference/noise-curves.json';
import { noiseLevelsOfNr } from '../../../src/acoustics/speech/noise';
import type { PublishedRow } from '../row';

const { a, b, bandsHz, origin } = curves.noiseRating;

export const rows: PublishedRow[] = bandsHz.flatMap((hz, band) => [
  {
    quantity: `NR 0 at ${hz} Hz (coefficient a)`,
    compute: () => noiseLevelsOfNr(0)[band],
    value: a[band],
    tolerance: 1e-9,
    unit: 'dB',
    source: origin,
  },
  {
    quantity: `rise per NR step at ${hz} Hz (coefficient b)`,
    compute: () => noiseLevelsOfNr(31)[band] - noiseLevelsOfNr(30)[band],
    value: b[band],
    tolerance: 1e-9,
    unit: 'dB',
    source: origin,
  },
  {
    quantity: `NR 30 at ${hz} Hz`,
    compute: () => noiseLevelsOfNr(30)[band],
    value: a[band] + 30 * b[band],
    tolerance: 1e-9,
    unit: 'dB',
    source: `closed form: a + b·NR, ${origin}`,
  },
]);
