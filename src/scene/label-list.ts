import type { Ref } from '../layout/ref';
import { sameRef } from '../layout/ref';
import type { Vec3 } from '../layout/schema';
import { figure, marginFigure } from '../report/figures';
import { lengthText } from '../report/units';
import type { Aim } from './aim';
import type { DimensionString } from './floor-marks';
import { isPinned, PIN_HEIGHT_M } from './SeatPins';
import { pinOf } from './seat-geometry';
import type { RoomScene } from './use-room-scene';

/** Something written over the drawing. */
export interface LabelSpec {
  key: string;
  look: 'bubble' | 'tag' | 'talker' | 'worst' | 'seat' | 'aim' | 'aim-point' | 'dimension';
  text: string;
  /** What it names, in full, where its text is short. */
  name: string;
  /** The point it names, and the other end of what it stands on. */
  at: Vec3;
  to?: Vec3;
  /** What a press selects. */
  ref: Ref | null;
  on: boolean;
}

/** More than this cost more than they say. */
const MOST_LABELS = 60;
const TAG_APART_PX = 30;

/** What is written over the drawing, the most important first. */
export function labelList(scene: RoomScene, aim: Aim | null, dimensions: readonly DimensionString[]): LabelSpec[] {
  const { selection, loudspeakers, microphones, layout } = scene;
  const named = (kind: 'loudspeaker' | 'microphone' | 'talker', id: string) => ({
    key: `${kind}:${id}`,
    ref: { kind, id } as const,
    on: sameRef(selection, { kind, id }),
  });
  const things: LabelSpec[] = [
    ...loudspeakers.map(
      ({ device }): LabelSpec => ({
        ...named('loudspeaker', device.id),
        look: 'bubble',
        text: device.id,
        name: `Loudspeaker ${device.id}${device.label === '' ? '' : `, ${device.label}`}`,
        at: device.position,
      }),
    ),
    ...layout.venue.talkers.map(
      (talker): LabelSpec => ({
        ...named('talker', talker.id),
        look: 'talker',
        text: talker.label.split(',')[0] || talker.id,
        name: `Talker ${talker.label || talker.id}`,
        at: talker.position,
      }),
    ),
    ...microphones.map(
      ({ device }): LabelSpec => ({
        ...named('microphone', device.id),
        look: 'tag',
        text: device.id,
        name: `Microphone ${device.id}${device.label === '' ? '' : `, ${device.label}`}`,
        at: device.position,
      }),
    ),
  ];
  return [
    ...dimensionLabels(dimensions),
    ...seatLabels(scene),
    ...aimLabels(scene, aim),
    ...things.filter((label) => label.on),
    ...things.filter((label) => !label.on),
  ].slice(0, MOST_LABELS);
}

function seatLabels(scene: RoomScene): LabelSpec[] {
  const { seats, seatIndex, figures, quantity, selection } = scene;
  const label = (index: number, look: 'worst' | 'seat'): LabelSpec => {
    const { id } = seats[index];
    const unit = quantity.unit === '' ? '' : ` ${quantity.unit}`;
    const value =
      look === 'worst' || quantity.id === 'margin'
        ? `${marginFigure(figures.marginDb[index])} dB`
        : `${figure(figures.value[index], quantity.digits)}${unit}`;
    const pinned = isPinned(figures, index);
    return {
      key: `${look}:${id}`,
      look,
      text: figures.judged[index] ? `${id} ${value}` : id,
      name: look === 'worst' ? `Worst seat ${id}, margin ${value}` : `Seat ${id}`,
      at: pinOf(seats[index], pinned ? PIN_HEIGHT_M : 0.9)[1],
      ref: { kind: 'seat', id },
      on: selection?.kind === 'seat' && selection.id === id,
    };
  };
  const chosen = selection?.kind === 'seat' ? seatIndex.get(selection.id) : undefined;
  const labels = figures.worst >= 0 ? [label(figures.worst, 'worst')] : [];
  return chosen !== undefined && chosen !== figures.worst ? [label(chosen, 'seat'), ...labels] : labels;
}

function aimLabels({ units, layout }: RoomScene, aim: Aim | null): LabelSpec[] {
  if (aim === null) return [];
  const finish = layout.venue.faces.find((face) => face.id === aim.met.id);
  const met = aim.met.kind === 'seat' ? `seat ${aim.met.id}` : (finish?.id ?? aim.met.id).replaceAll('-', ' ');
  const text = `${lengthText(aim.distanceM, units)} to ${aim.met.kind === 'seat' ? met : `the ${met}`}`;
  const middle = aim.from.map((value, axis) => value + 0.55 * (aim.to[axis] - value)) as Vec3;
  return [
    { key: 'aim', look: 'aim', text, name: text, at: middle, ref: null, on: true },
    { key: 'aim-point', look: 'aim-point', text: '', name: 'Aim point', at: aim.to, ref: aim.met, on: true },
  ];
}

function dimensionLabels(dimensions: readonly DimensionString[]): LabelSpec[] {
  return dimensions.map(({ from, to, text }, i) => ({
    key: `dimension:${i}`,
    look: 'dimension',
    text,
    name: text,
    at: from,
    to,
    ref: null,
    on: false,
  }));
}

/** Small tags whose things stand so close that no one could tell which names which. */
export function crowdedTags(labels: readonly LabelSpec[], points: readonly (readonly [number, number])[]): Set<number> {
  const tags = labels.flatMap(({ look, on }, i) => (look === 'tag' && !on ? [i] : []));
  const near = (i: number, j: number) =>
    Math.hypot(points[i][0] - points[j][0], points[i][1] - points[j][1]) < TAG_APART_PX;
  return new Set(tags.filter((i) => tags.some((j) => j !== i && near(i, j))));
}
