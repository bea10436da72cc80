import { useThree } from '@react-three/fiber';
import { type RefObject, useEffect } from 'react';
import { type Camera, type Mesh, Raycaster, Vector2, Vector3 } from 'three';
import type { Ref } from '../layout/ref';
import type { Vec3 } from '../layout/schema';
import { isPinned, PIN_HEIGHT_M } from './SeatPins';
import { pinOf } from './seat-geometry';
import type { RoomScene } from './use-room-scene';

/** A mesh that can be pointed at, and what each of its triangles belongs to. */
export interface PickTarget {
  mesh: Mesh;
  ownerOf: (triangle: number) => number;
}

/** Filled in by those who draw them. */
export interface PickTargets {
  seats: PickTarget | null;
  shell: PickTarget | null;
  standing: PickTarget | null;
}

/** Small things are hit within this many pixels, and where no seat is, within this many. */
const NEAR_PX = 4.5;
const ROUND_PX = 14;
/** Pressing and letting go within so many pixels is a click, not a drag. */
const CLICK_PX = 4;

interface PickingProps {
  scene: RoomScene;
  targets: PickTargets;
  /** True while the camera moves: pointing waits. */
  moving: RefObject<boolean>;
  onHover: (seatId: string | null) => void;
  onPick: (ref: Ref | null) => void;
}

/** Finds what is under the pointer: devices by their place on screen, so that none is too small; the rest by rays. */
export default function Picking({ scene, targets, moving, onHover, onPick }: PickingProps) {
  const canvas = useThree((three) => three.gl.domElement);
  const camera = useThree((three) => three.camera);
  useEffect(() => {
    let asked = 0;
    let pressed: [number, number] | null = null;
    const pick = (event: MouseEvent): Ref | null => {
      const box = canvas.getBoundingClientRect();
      return pickAt(scene, targets, camera, event.clientX - box.left, event.clientY - box.top, box);
    };
    const move = (event: PointerEvent) => {
      if (event.pointerType === 'touch' || event.buttons !== 0 || moving.current) return;
      cancelAnimationFrame(asked);
      asked = requestAnimationFrame(() => {
        const found = pick(event);
        canvas.style.cursor = found !== null && found.kind !== 'face' ? 'pointer' : 'grab';
        onHover(found?.kind === 'seat' ? found.id : null);
      });
    };
    const leave = () => {
      cancelAnimationFrame(asked);
      onHover(null);
    };
    const down = (event: PointerEvent) => {
      pressed = event.button === 0 && event.isPrimary ? [event.clientX, event.clientY] : null;
    };
    const up = (event: PointerEvent) => {
      const from = pressed;
      pressed = null;
      if (from === null || Math.hypot(event.clientX - from[0], event.clientY - from[1]) > CLICK_PX) return;
      onPick(pick(event));
    };
    canvas.addEventListener('pointermove', move);
    canvas.addEventListener('pointerleave', leave);
    canvas.addEventListener('pointerdown', down);
    canvas.addEventListener('pointerup', up);
    return () => {
      cancelAnimationFrame(asked);
      canvas.removeEventListener('pointermove', move);
      canvas.removeEventListener('pointerleave', leave);
      canvas.removeEventListener('pointerdown', down);
      canvas.removeEventListener('pointerup', up);
    };
  }, [canvas, camera, scene, targets, moving, onHover, onPick]);
  return null;
}

const raycaster = new Raycaster();

function pickAt(
  scene: RoomScene,
  targets: PickTargets,
  camera: Camera,
  xPx: number,
  yPx: number,
  size: { width: number; height: number },
): Ref | null {
  camera.updateMatrixWorld();
  const small = nearestSmall(scene, camera, xPx, yPx, size);
  if (small !== null && small.distancePx <= NEAR_PX) return small.ref;
  raycaster.setFromCamera(new Vector2((xPx / size.width) * 2 - 1, 1 - (yPx / size.height) * 2), camera);
  const hit = (target: PickTarget | null) => (target === null ? undefined : raycaster.intersectObject(target.mesh)[0]);
  const seat = hit(targets.seats);
  const faces = [targets.shell, targets.standing].flatMap((target) => {
    const met = hit(target);
    return target === null || met === undefined ? [] : [{ met, face: target.ownerOf(met.faceIndex ?? 0) }];
  });
  const face = faces.sort((a, b) => a.met.distance - b.met.distance)[0];
  // A chair half under its desk is still the chair.
  if (seat !== undefined && targets.seats !== null && seat.distance < (face?.met.distance ?? 1e9) + 0.6) {
    return { kind: 'seat', id: scene.seats[targets.seats.ownerOf(seat.faceIndex ?? 0)].id };
  }
  if (small !== null && small.distancePx <= ROUND_PX) return small.ref;
  return face === undefined ? null : { kind: 'face', id: scene.shape.ids[face.face] };
}

function nearestSmall(
  scene: RoomScene,
  camera: Camera,
  xPx: number,
  yPx: number,
  size: { width: number; height: number },
): { ref: Ref; distancePx: number } | null {
  let nearest: { ref: Ref; distancePx: number } | null = null;
  const point = new Vector3();
  const consider = (ref: Ref, at: Vec3) => {
    point.fromArray(at).project(camera);
    if (point.z > 1) return;
    const distancePx = Math.hypot(((point.x + 1) / 2) * size.width - xPx, ((1 - point.y) / 2) * size.height - yPx);
    if (distancePx <= ROUND_PX && (nearest === null || distancePx < nearest.distancePx)) nearest = { ref, distancePx };
  };
  for (const { device } of scene.loudspeakers) consider({ kind: 'loudspeaker', id: device.id }, device.position);
  for (const { device } of scene.microphones) consider({ kind: 'microphone', id: device.id }, device.position);
  for (const talker of scene.layout.venue.talkers) consider({ kind: 'talker', id: talker.id }, talker.position);
  scene.seats.forEach((seat, index) => {
    if (!isPinned(scene.figures, index)) return;
    consider({ kind: 'seat', id: seat.id }, pinOf(seat, PIN_HEIGHT_M)[1]);
  });
  return nearest;
}
