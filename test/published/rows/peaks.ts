import table from '../../../data/reference/feedback-stability.json';
import { marcumQ1, peakAllowanceDb } from '../../../src/acoustics/loop/peaks';
import type { PublishedRow } from '../row';

const { bandwidthTimesDecay, limitDb, origin } = table;

/** The published constant is a fit: the law itself, 10 log(ln(BT/22)), stays within 0.2 dB of it. */
const stability: PublishedRow[] = bandwidthTimesDecay.map((product, i) => ({
  quantity: `peak above the mean of a diffuse loop, bandwidth × decay = ${product}`,
  compute: () => peakAllowanceDb({ ratio: 0, chances: product / 22 }),
  value: -limitDb[i],
  tolerance: 0.2,
  unit: 'dB',
  source: origin,
}));

const closed: PublishedRow[] = bandwidthTimesDecay.map((product) => ({
  quantity: `peak above the mean of a diffuse loop, exponential law, bandwidth × decay = ${product}`,
  compute: () => peakAllowanceDb({ ratio: 0, chances: product / 22 }),
  value: 10 * Math.log10(Math.log(product / 22)),
  tolerance: 1e-6,
  unit: 'dB',
  source: 'closed form: e^(−x) = 22/(BT)',
}));

/** Q₁(a, a) = ½(1 + e^(−a²) I₀(a²)). */
const marcum: PublishedRow[] = [0.5, 1, 2, 3, 5].map((a) => ({
  quantity: `Marcum Q₁(${a}, ${a})`,
  compute: () => marcumQ1(a, a),
  value: 0.5 * (1 + scaledI0(a * a)),
  tolerance: 1e-11,
  unit: '1',
  source: 'closed form: Q₁(a, a) = ½(1 + e^(−a²) I₀(a²))',
}));

export const rows: PublishedRow[] = [
  ...stability,
  ...closed,
  ...marcum,
  {
    quantity: 'Marcum Q₁(0, 2)',
    compute: () => marcumQ1(0, 2),
    value: Math.exp(-2),
    tolerance: 1e-15,
    unit: '1',
    source: 'closed form: Q₁(0, b) = e^(−b²/2)',
  },
];

/** e^(−x) I₀(x) by its power series. */
function scaledI0(x: number): number {
  let term = 1;
  let sum = 1;
  for (let k = 1; k < 200; k++) {
    term *= (x / (2 * k)) ** 2;
    sum += term;
  }
  return Math.exp(-x) * sum;
}
