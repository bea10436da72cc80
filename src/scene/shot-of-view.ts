import { aimDirection } from '../layout/aim';
import type { Vec3 } from '../layout/schema';
import type { Pointing } from './aim';
import type { RoomScene } from './use-room-scene';
import {
  type FreeArea,
  orbitShot,
  planShot,
  type Shot,
  savedShot,
  sectionShot,
  standingShot,
  type ViewChoice,
} from './views';

/** Where to stand for the view asked for; null where what it hangs on is not there. */
export function shotOfView(view: ViewChoice, scene: RoomScene, area: FreeArea): Shot | null {
  const { shape, seats, seatIndex, layout } = scene;
  switch (view.kind) {
    case 'orbit':
      return orbitShot(shape, area);
    case 'plan':
      return planShot(shape, area);
    case 'long-section':
      return sectionShot(shape, area, 'long');
    case 'cross-section':
      return sectionShot(shape, area, 'cross');
    case 'saved': {
      const saved = layout.venue.views.find(({ id }) => id === view.id);
      return saved === undefined ? null : savedShot(saved.eye, saved.target);
    }
    case 'seat': {
      const index = seatIndex.get(view.id);
      if (index === undefined) return null;
      const { ear, facingRad } = seats[index];
      // Heads are held a little down: what matters lies below the horizon.
      return standingShot(ear, [Math.cos(facingRad), Math.sin(facingRad), -0.06]);
    }
    case 'aim': {
      const device = pointingOf(scene, view.id);
      if (device === null) return null;
      const forward = aimDirection(device);
      // A little in front, clear of its own box.
      const eye = device.position.map((value, axis) => value + 0.1 * forward[axis]) as Vec3;
      return standingShot(eye, forward);
    }
  }
}

/** The selected device, else whichever has this id. */
export function pointingOf(scene: RoomScene, id: string): Pointing | null {
  const { loudspeakers, microphones, layout, selection } = scene;
  const kinds = {
    loudspeaker: loudspeakers.map(({ device }) => device),
    microphone: microphones.map(({ device }) => device),
    talker: layout.venue.talkers,
  };
  const own = kinds[selection?.kind as keyof typeof kinds] ?? Object.values(kinds).flat();
  return own.find((device) => device.id === id) ?? null;
}

/** The point a selected thing is at; null for things that are nowhere in particular. */
export function placeOfSelection(scene: RoomScene): Vec3 | null {
  const { selection, seats, seatIndex } = scene;
  if (selection === null) return null;
  if (selection.kind === 'seat') {
    const index = seatIndex.get(selection.id);
    return index === undefined ? null : seats[index].ear;
  }
  if (!['loudspeaker', 'microphone', 'talker'].includes(selection.kind)) return null;
  return pointingOf(scene, selection.id)?.position ?? null;
}
