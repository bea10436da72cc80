import './band-chart.css';

/** One line of a chart over octaves. */
export interface BandSeries {
  label: string;
  /** One value a band, NaN where there is none. */
  values: ArrayLike<number>;
  /** A dashed line with open squares, so that two series part without colour. */
  second?: boolean;
}

interface BandChartProps {
  /** What is drawn, with its unit, for someone who does not see it. */
  label: string;
  unit: string;
  series: readonly BandSeries[];
  /** Names of the bands along the axis. */
  bands: readonly string[];
  /** The axis spans at least this. */
  least?: number;
  most?: number;
  /** How a value is written. */
  write: (value: number) => string;
}

const WIDTH = 276;
const HEIGHT = 108;
const FRAME = { left: 30, right: 8, top: 8, bottom: 18 };

/** Octave figures as a small line chart: grid, dots, the series named at their ends. */
export default function BandChart({ label, unit, series, bands, least = 0, most, write }: BandChartProps) {
  const finite = series.flatMap((line) => Array.from(line.values).filter(Number.isFinite));
  const axis = niceAxis(Math.min(least, ...finite), Math.max(most ?? Number.NEGATIVE_INFINITY, ...finite));
  const x = (band: number) => FRAME.left + ((WIDTH - FRAME.left - FRAME.right) * (band + 0.5)) / bands.length;
  const y = (value: number) =>
    HEIGHT - FRAME.bottom - ((HEIGHT - FRAME.top - FRAME.bottom) * (value - axis.from)) / (axis.to - axis.from);
  return (
    <figure className="band-chart">
      <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} role="img" aria-label={`${label}: ${sayAll(series, bands, unit, write)}`}>
        {axis.ticks.map((tick) => (
          <g key={tick}>
            <line className="grid" x1={FRAME.left} x2={WIDTH - FRAME.right} y1={y(tick)} y2={y(tick)} />
            <text x={FRAME.left - 5} y={y(tick) + 4} textAnchor="end">
              {write(tick)}
            </text>
          </g>
        ))}
        {bands.map((band, i) => (
          <text key={band} x={x(i)} y={HEIGHT - 4} textAnchor="middle">
            {band}
          </text>
        ))}
        {series.map((line) => (
          <Line key={line.label} line={line} x={x} y={y} />
        ))}
      </svg>
      {series.length > 1 && (
        <figcaption>
          {series.map((line) => (
            <span key={line.label} className={line.second ? 'second' : ''}>
              {line.label}
            </span>
          ))}
        </figcaption>
      )}
    </figure>
  );
}

function Line({ line, x, y }: { line: BandSeries; x: (band: number) => number; y: (value: number) => number }) {
  const points = Array.from(line.values).flatMap((value, band) =>
    Number.isFinite(value) ? [{ band, left: x(band), top: y(value) }] : [],
  );
  return (
    <g className={line.second ? 'series second' : 'series'}>
      <polyline points={points.map((point) => `${point.left},${point.top}`).join(' ')} />
      {points.map((point) =>
        line.second ? (
          <rect key={point.band} x={point.left - 2.5} y={point.top - 2.5} width="5" height="5" />
        ) : (
          <circle key={point.band} cx={point.left} cy={point.top} r="2.8" />
        ),
      )}
    </g>
  );
}

/** Three to five round steps that hold the values. */
function niceAxis(least: number, most: number): { from: number; to: number; ticks: number[] } {
  const span = Math.max(most - least, 1e-6);
  const rough = span / 3;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 2.5, 5, 10].map((part) => part * power).find((candidate) => candidate >= rough) ?? 10 * power;
  const from = Math.floor(least / step + 1e-9) * step;
  const to = Math.max(Math.ceil(most / step - 1e-9) * step, from + step);
  const ticks = Array.from({ length: Math.round((to - from) / step) + 1 }, (_, i) => from + i * step);
  return { from, to, ticks };
}

function sayAll(
  series: readonly BandSeries[],
  bands: readonly string[],
  unit: string,
  write: (value: number) => string,
) {
  return series
    .map(
      (line) => `${line.label} ${bands.map((band, i) => `${band} ${write(line.values[i])} ${unit}`.trim()).join(', ')}`,
    )
    .join('; ');
}
