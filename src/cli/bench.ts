import { checkLayout } from '../layout/check';
import type { Layout } from '../layout/schema';
import { prepareScheme, prepareVenue } from '../predict/prepare';
import { loopsOf, predict } from '../predict/run';
import { seatFigures } from '../predict/seat-stage';
import { benchHall } from './bench-hall';

const RUNS = 7;
const SEATS = [250, 500, 1000, 2000, 4000];

/**
 * Measures the prediction of the hall of `bench-hall.ts`: each stage and the whole at 2,000 seats, and how the whole
 * grows with seats. Prints one JSON object; medians in milliseconds, for comparing runs on one machine, never a test.
 */
export async function main(): Promise<number> {
  const hall = benchHall(2000);
  const problems = checkLayout(hall);
  if (problems.length > 0) throw new Error(problems[0].found);
  const result = {
    hall: { seats: 2000, loudspeakers: 24, microphones: 12, faces: hall.venue.faces.length, reflectionOrder: 1 },
    runs: RUNS,
    stages_ms: stages(hall),
    total_ms: median(() => predict(hall)),
    totalThreeTalkers_ms: median(() => predict(benchHall(2000, 3))),
    growth: growth(),
    memory_MB: Math.round(process.memoryUsage().rss / 1e6),
  };
  process.stdout.write(`${JSON.stringify(result, null, 2)}\n`);
  return 0;
}

function stages(layout: Layout): Record<string, number> {
  const venue = prepareVenue(layout);
  const scheme = prepareScheme(layout, layout.schemes[0], venue);
  const loops = loopsOf(venue, scheme);
  return {
    check: median(() => checkLayout(layout)),
    prepareVenue: median(() => prepareVenue(layout)),
    prepareScheme: median(() => prepareScheme(layout, layout.schemes[0], venue)),
    loops: median(() => loopsOf(venue, scheme)),
    seats: median(() => seatFigures(venue, scheme, loops, layout.need)),
  };
}

/** Time against seats: `exponent` is the slope of log time over log seats, 1 for strict proportion. */
function growth() {
  const times = SEATS.map((seats) => {
    const layout = benchHall(seats);
    return median(() => predict(layout));
  });
  const last = SEATS.length - 1;
  const exponent = Math.log(times[last] / times[0]) / Math.log(SEATS[last] / SEATS[0]);
  return { seats: SEATS, total_ms: times, exponent: Math.round(exponent * 100) / 100 };
}

function median(run: () => unknown): number {
  run();
  const times = Array.from({ length: RUNS }, () => {
    const start = performance.now();
    run();
    return performance.now() - start;
  });
  times.sort((a, b) => a - b);
  return Math.round(times[Math.floor(RUNS / 2)] * 10) / 10;
}
