import { figure, signedFigure } from '../report/figures';
import { MARGIN_STOPS_DB } from '../report/margin-colour';
import type { Quantity } from '../report/quantities';
import { cssColour } from './colour-scale';
import type { ThemeColours } from './theme-colours';
import type { RoomScene } from './use-room-scene';

const WIDTH = 276;
const PAD = 16;
const HEIGHT = 10;
const STEPS = 48;

interface LegendProps {
  scene: RoomScene;
  /** Beside the drawing as one low strip, where it would cover it. */
  strip: boolean;
}

/** The title block of the drawing: what the colours mean, and the three figures of the room. */
export default function Legend({ scene, strip }: LegendProps) {
  const { quantity, colours, prediction, layout, talkerId } = scene;
  const talker = layout.venue.talkers.find(({ id }) => id === talkerId);
  const { noise } = layout.venue;
  return (
    <aside className={strip ? 'room-block room-block-strip' : 'room-block'} aria-label="Legend">
      <div className="room-block-scale">
        <p>
          <b>
            {quantity.label}, {talker === undefined ? 'worst talker' : talker.label || talker.id}
          </b>
          <span className="u">{quantity.unit}</span>
        </p>
        {quantity.scale.kind === 'margin' ? (
          <MarginRamp colours={colours} />
        ) : (
          <WashRamp colours={colours} quantity={quantity} scale={quantity.scale} />
        )}
      </div>
      <div className="room-block-cells">
        <span>
          <small>Volume</small>
          {figure(prediction?.venue.volumeM3 ?? null, 0)}
          <span className="u">m³</span>
        </span>
        <span>
          <small>Decay, 500 Hz</small>
          {figure(prediction?.venue.decayS[2] ?? null, 2)}
          <span className="u">s</span>
        </span>
        <span>
          <small>Noise</small>
          {'nr' in noise && `NR ${figure(noise.nr, 0)} `}
          <span className={'nr' in noise ? 'u' : undefined}>{figure(prediction?.venue.noiseDba ?? null)}</span>
          <span className="u">dBA</span>
        </span>
      </div>
    </aside>
  );
}

/** Two arms with even room for each stop, zero in the middle. */
function MarginRamp({ colours }: { colours: ThemeColours }) {
  const x = (step: number) => PAD + ((WIDTH - 2 * PAD) * step) / 6;
  const top = 19;
  const stops = [-6, -3, -1, 0, 1, 3, 6];
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${top + HEIGHT + 18}`}
      role="img"
      aria-label="From 6 dB short or worse, a wedge, through 0 to 6 dB in hand or more, a square"
    >
      <Ramp from={x(0)} to={x(3)} top={top} colour={(share) => cssColour(colours.scale.margin(-marginAt(1 - share)))} />
      <Ramp from={x(3)} to={x(6)} top={top} colour={(share) => cssColour(colours.scale.margin(marginAt(share)))} />
      <rect className="room-frame" x={x(0)} y={top} width={x(6) - x(0)} height={HEIGHT} />
      {stops.map((value, i) => (
        <g key={value}>
          <path className="room-tick" d={`M${x(i)} ${top + HEIGHT}v3`} />
          <text className={value === 0 ? 'room-axis strong' : 'room-axis'} x={x(i)} y={top + HEIGHT + 14}>
            {value === -6 ? '≤ −6' : value === 6 ? '≥ +6' : signedFigure(value, 0)}
          </text>
        </g>
      ))}
      <path className="room-threshold" d={`M${x(3)} 2V${top + HEIGHT + 3}`} />
      <path className="room-key short" style={{ fill: 'var(--short-1)' }} d={`M${x(3) - 16} 4h10l-5 9z`} />
      <rect className="room-key" style={{ fill: 'var(--hand-1)' }} x={x(3) + 7} y={4} width={9} height={9} />
      <text className="room-axis end" x={x(3) - 21} y={12}>
        short
      </text>
      <text className="room-axis start" x={x(3) + 21} y={12}>
        served
      </text>
    </svg>
  );
}

/** Margin at a share of an arm, where the stops stand at even distances. */
function marginAt(share: number): number {
  const at = Math.min(share * 3, 2.9999);
  const stop = Math.floor(at);
  // Zero itself belongs to the arm in hand; the other begins just below it.
  return Math.max(1e-9, MARGIN_STOPS_DB[stop] + (MARGIN_STOPS_DB[stop + 1] - MARGIN_STOPS_DB[stop]) * (at - stop));
}

interface WashRampProps {
  colours: ThemeColours;
  quantity: Quantity;
  scale: Extract<Quantity['scale'], { kind: 'wash' }>;
}

function WashRamp({ colours, quantity, scale }: WashRampProps) {
  const x = (value: number) => PAD + ((WIDTH - 2 * PAD) * (value - scale.from)) / (scale.to - scale.from);
  const digits = Number.isInteger(scale.from) && Number.isInteger(scale.to) ? 0 : quantity.digits;
  const top = 19;
  const { threshold } = scale;
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${top + HEIGHT + 18}`}
      role="img"
      aria-label={`From ${figure(scale.from, digits)}, light, to ${figure(scale.to, digits)} ${quantity.unit}, dark; wedges are seats short of their margin`}
    >
      <Ramp from={x(scale.from)} to={x(scale.to)} top={top} colour={(share) => cssColour(colours.scale.wash(share))} />
      <rect className="room-frame" x={PAD} y={top} width={WIDTH - 2 * PAD} height={HEIGHT} />
      <text className="room-axis" x={x(scale.from)} y={top + HEIGHT + 14}>
        {figure(scale.from, digits)}
      </text>
      <text className="room-axis" x={x(scale.to)} y={top + HEIGHT + 14}>
        {figure(scale.to, digits)}
      </text>
      {threshold !== undefined && (
        <>
          <path className="room-threshold" d={`M${x(threshold)} 14V${top + HEIGHT + 3}`} />
          <text className="room-axis strong" x={x(threshold)} y={11}>
            {scale.thresholdLabel ?? figure(threshold, digits)}
          </text>
        </>
      )}
      <path className="room-key short" style={{ fill: 'var(--wash-2)' }} d={`M${PAD} 4h10l-5 9z`} />
      <text className="room-axis start" x={PAD + 14} y={12}>
        margin short
      </text>
    </svg>
  );
}

interface RampProps {
  from: number;
  to: number;
  top: number;
  colour: (share: number) => string;
}

/** Drawn in steps, because a gradient of the browser would mix its colours otherwise than the seats do. */
function Ramp({ from, to, top, colour }: RampProps) {
  const width = (to - from) / STEPS;
  return Array.from({ length: STEPS }, (_, i) => (
    <rect
      // biome-ignore lint/suspicious/noArrayIndexKey: a step is its place
      key={i}
      x={from + i * width}
      y={top}
      width={width + 0.4}
      height={HEIGHT}
      fill={colour((i + 0.5) / STEPS)}
    />
  ));
}
