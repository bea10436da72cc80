import { useFrame, useThree } from '@react-three/fiber';
import { type RefObject, useEffect } from 'react';
import { type Camera, Vector3 } from 'three';
import type { Vec3 } from '../layout/schema';
import { seenLevel } from './floor-marks';
import { crowdedTags, type LabelSpec } from './label-list';
import { type LabelBox, placeLabels, type Rectangle } from './place-labels';

interface LabelProjectorProps {
  labels: readonly LabelSpec[];
  elements: RefObject<Map<string, HTMLElement>>;
  /** The drawing's element, which tells tests where seats are. */
  wrapper: RefObject<HTMLElement | null>;
  card: RefObject<HTMLElement | null>;
  /** Seat pointed at, with a card beside it. */
  hovered: Vec3 | null;
  worst: Vec3 | null;
  /** Points of the seat selected, else pointed at, the best first, and the small things that may lie over them. */
  told: readonly Vec3[];
  small: readonly Vec3[];
  /** Parts of the drawing that are covered. */
  covered: readonly Rectangle[];
}

/** A pointer nearer than this to a small thing would mean that. */
const CLEAR_PX = 6;

/** Puts the lettering in its place after each move of the camera, without React. */
export default function LabelProjector(props: LabelProjectorProps) {
  const { labels, elements, wrapper, card, hovered, worst, told, small, covered } = props;
  const invalidate = useThree((three) => three.invalidate);
  // biome-ignore lint/correctness/useExhaustiveDependencies: whatever changes here has to be put in place
  useEffect(() => invalidate(), [labels, hovered, worst, told, small, covered, invalidate]);
  useFrame(({ camera, size }) => {
    camera.updateMatrixWorld();
    const at = (point: Vec3) => projected(point, camera, size);
    const free = labels.filter(({ look }) => look !== 'dimension' && look !== 'aim-point');
    const points = free.map((label) => at(label.at) ?? ([-1e6, -1e6] as const));
    const crowded = crowdedTags(free, points);
    const boxes = free.map((label, i): LabelBox => {
      const element = elements.current.get(label.key);
      const [xPx, yPx] = points[i];
      const [widthPx, heightPx] = [element?.offsetWidth ?? 0, element?.offsetHeight ?? 0];
      return {
        xPx,
        yPx,
        widthPx,
        heightPx,
        places: crowded.has(i) ? [] : placesOf(label, widthPx, heightPx),
        needed: label.on || label.look === 'worst',
      };
    });
    const area = { widthPx: size.width, heightPx: size.height, covered };
    const lettered: Rectangle[] = [];
    placeLabels(boxes, area).forEach((place, i) => {
      move(elements.current.get(free[i].key), place, '');
      if (place !== null) lettered.push([...place, boxes[i].widthPx, boxes[i].heightPx]);
    });
    const level = seenLevel(camera);
    for (const label of labels) {
      if (label.look === 'aim-point') move(elements.current.get(label.key), at(label.at), 'translate(-50%, -50%)');
      if (label.look === 'dimension') {
        const [from, to] = level ? [null, null] : [at(label.at), at(label.to ?? label.at)];
        alongLine(elements.current.get(label.key), from, to);
      }
    }
    if (wrapper.current !== null) {
      tell(wrapper.current, 'worst', worst === null ? null : at(worst));
      tell(wrapper.current, 'seat', clearPoint(told.map(at), small.map(at), lettered));
    }
    if (card.current !== null && hovered !== null) besideSeat(card.current, at(hovered), size);
  });
  return null;
}

/** The first of these places that neither small things nor lettering cover, else the first. */
function clearPoint(
  places: readonly ([number, number] | null)[],
  over: readonly ([number, number] | null)[],
  lettered: readonly Rectangle[],
): [number, number] | null {
  const clear = places.find(
    (place) =>
      place !== null &&
      !lettered.some(([x, y, w, h]) => place[0] > x && place[0] < x + w && place[1] > y && place[1] < y + h) &&
      over.every((other) => other === null || Math.hypot(place[0] - other[0], place[1] - other[1]) > CLEAR_PX),
  );
  return clear ?? places[0] ?? null;
}

const point = new Vector3();

function projected(at: Vec3, camera: Camera, size: { width: number; height: number }): [number, number] | null {
  point.fromArray(at).project(camera);
  if (point.z > 1) return null;
  return [((point.x + 1) / 2) * size.width, ((1 - point.y) / 2) * size.height];
}

function placesOf({ look }: LabelSpec, width: number, height: number): LabelBox['places'] {
  const middle = -width / 2;
  switch (look) {
    case 'bubble':
      return [
        [middle, -height - 11],
        [8, -height - 6],
        [-width - 8, -height - 6],
        [10, -height / 2],
        [-width - 10, -height / 2],
      ];
    case 'worst':
    case 'seat':
      return [
        [middle, -height - 10],
        [12, -height / 2],
        [-width - 12, -height / 2],
      ];
    case 'talker':
      return [
        [11, 2],
        [-width - 11, 2],
        [11, -height - 2],
        [middle, -height - 8],
      ];
    case 'aim':
      return [
        [-width - 10, -height / 2],
        [10, -height / 2],
      ];
    default:
      return [
        [3, 5],
        [-width - 4, 4],
        [4, -height - 3],
        [-width - 4, -height - 3],
      ];
  }
}

function move(element: HTMLElement | undefined, place: readonly [number, number] | null, more: string): void {
  if (element === undefined) return;
  element.style.visibility = place === null ? 'hidden' : 'visible';
  if (place !== null) {
    element.style.transform = `translate(${Math.round(place[0])}px, ${Math.round(place[1])}px) ${more}`;
  }
}

/** On a dimension string, in the middle and turned along it, never upside down. */
function alongLine(element: HTMLElement | undefined, a: [number, number] | null, b: [number, number] | null): void {
  if (element === undefined) return;
  const short = a === null || b === null || Math.hypot(b[0] - a[0], b[1] - a[1]) < 1.4 * element.offsetWidth;
  element.style.visibility = short ? 'hidden' : 'visible';
  if (a === null || b === null) return;
  let angle = Math.atan2(b[1] - a[1], b[0] - a[0]);
  if (Math.abs(angle) > Math.PI / 2 + 0.01) angle += Math.PI;
  element.style.transform = `translate(${(a[0] + b[0]) / 2}px, ${(a[1] + b[1]) / 2}px) translate(-50%, -50%) rotate(${angle}rad)`;
}

function tell(wrapper: HTMLElement, name: 'worst' | 'seat', place: [number, number] | null): void {
  wrapper.dataset[`${name}X`] = place === null ? '' : place[0].toFixed(1);
  wrapper.dataset[`${name}Y`] = place === null ? '' : place[1].toFixed(1);
}

/** The card stands to the side that has room for it. */
function besideSeat(card: HTMLElement, place: [number, number] | null, size: { width: number; height: number }): void {
  card.style.visibility = place === null ? 'hidden' : 'visible';
  if (place === null) return;
  card.style.transform = `translate(${Math.round(place[0])}px, ${Math.round(place[1])}px)`;
  card.dataset.across = place[0] + 270 > size.width ? 'left' : 'right';
  card.dataset.upright = place[1] < size.height / 2 ? 'below' : 'above';
}
