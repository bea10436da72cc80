import { distanceToFace, type Faces, firstHit } from '../acoustics/room/faces';
import { insideShell, openEdges } from '../acoustics/room/shell';
import { aimDirection, turnTo } from '../layout/aim';
import { add, editLoudspeaker, editMicrophone, editTalker } from '../layout/edits';
import { facesOf } from '../layout/geometry';
import type { Ref } from '../layout/ref';
import type { Layout, Talker, Vec3 } from '../layout/schema';
import { seatsOf } from '../layout/seating';

export type NewKind = 'talker' | 'microphone' | 'loudspeaker' | 'seating';

/** Height above the floor at which a new thing stands, metres. */
const HEIGHT_M: Record<NewKind, number> = { talker: 1.5, microphone: 1.2, loudspeaker: 2.5, seating: 0 };
/** Distance in front of the selected talker, metres. */
const AHEAD_M: Record<NewKind, number> = { talker: 1, microphone: 0.4, loudspeaker: 2, seating: 2.5 };
/** A new thing keeps this far from the room's surfaces, metres. */
const CLEAR_M = 0.1;

/**
 * The layout with a new thing where it makes sense: in front of the talker selected (the first one, for a microphone),
 * else in the middle of the room; always inside the shell where there is one.
 */
export function addSomewhere(
  layout: Layout,
  schemeId: string,
  kind: NewKind,
  selection: Ref | null,
): { layout: Layout; ref: Ref } {
  const faces = facesOf(layout.venue);
  const talker = talkerMeant(layout, kind, selection);
  const place = candidates(layout, faces, kind, talker).find(standsIn(faces)) ?? [0, 0, HEIGHT_M[kind]];
  const [x, y, z] = place.map((c) => Number(c.toFixed(2)) + 0);
  const made = add(layout, schemeId, kind, [x, y, z]);
  return { ref: made.ref, layout: settle(made.layout, schemeId, made.ref, [x, y, z], talker) };
}

function talkerMeant(layout: Layout, kind: NewKind, selection: Ref | null): Talker | null {
  const { talkers } = layout.venue;
  const selected = selection?.kind === 'talker' ? talkers.find((talker) => talker.id === selection.id) : undefined;
  return selected ?? (kind === 'microphone' ? talkers[0] : undefined) ?? null;
}

/** Places to try, best first. */
function candidates(layout: Layout, faces: Faces, kind: NewKind, talker: Talker | null): Vec3[] {
  const grounds = [...roundAbout(middleOf(faces)), ...seatsOf(layout.venue.seating).map((seat) => seat.floor)];
  // Furniture is no ground to stand on where there is a floor beside it.
  const clear = grounds.filter((ground) => !overFurniture(faces, ground));
  const onFloors = [...clear, ...grounds].flatMap((ground) =>
    [1, 0.75, 0.5, 0.25].map((part): Vec3 => [ground[0], ground[1], floorUnder(faces, ground) + part * HEIGHT_M[kind]]),
  );
  if (talker === null) return onFloors;
  const aim = aimDirection({ pan: talker.pan, tilt: 0 });
  const ahead = [1, 0.5, -0.5].map((part): Vec3 => {
    const distanceM = part * AHEAD_M[kind];
    const [x, y] = [0, 1].map((axis) => talker.position[axis] + distanceM * aim[axis]);
    const z =
      kind === 'microphone' ? talker.position[2] - 0.1 : floorUnder(faces, [x, y, talker.position[2]]) + HEIGHT_M[kind];
    return [x, y, z];
  });
  return [...ahead, ...onFloors];
}

/** Middle of the shell's plan, half way up. */
function middleOf(faces: Faces): Vec3 {
  const least = [Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY];
  const most = least.map((value) => -value);
  for (let face = 0; face < faces.count; face++) {
    for (let axis = 0; axis < 3; axis++) {
      least[axis] = Math.min(least[axis], faces.bounds[6 * face + 2 * axis]);
      most[axis] = Math.max(most[axis], faces.bounds[6 * face + 2 * axis + 1]);
    }
  }
  if (faces.count === 0) return [0, 0, 0];
  return [0, 1, 2].map((axis) => (least[axis] + most[axis]) / 2) as Vec3;
}

/** A point, then points 1 and 2 m from it in plan. */
function roundAbout(middle: Vec3): Vec3[] {
  const turns = [0, 1, 2, 3, 4, 5, 6, 7].map((i) => (i * Math.PI) / 4);
  const ring = (radiusM: number) =>
    turns.map((turn): Vec3 => [middle[0] + radiusM * Math.cos(turn), middle[1] + radiusM * Math.sin(turn), middle[2]]);
  return [middle, ...ring(1), ...ring(2)];
}

function overFurniture(faces: Faces, point: Vec3): boolean {
  const hit = firstHit(faces, [point[0], point[1], point[2] + 0.05], [0, 0, -1], 0, -1);
  return hit !== null && faces.twoSided[hit.face] === 1;
}

/** Height of the first face below a point, a little above it; the point's own height where there is none. */
function floorUnder(faces: Faces, point: Vec3): number {
  const from: Vec3 = [point[0], point[1], point[2] + 0.05];
  const hit = firstHit(faces, from, [0, 0, -1], 0, -1);
  return hit === null ? point[2] : from[2] - hit.distanceM;
}

/** Seats stand on the floor, so the clearance is asked for a little above the place. */
function standsIn(faces: Faces): (place: Vec3) => boolean {
  const closed = faces.twoSided.includes(0) && openEdges(faces).length === 0;
  return ([x, y, z]) => {
    if (!closed) return true;
    if (!insideShell(faces, x, y, z + CLEAR_M)) return false;
    for (let face = 0; face < faces.count; face++) {
      if (distanceToFace(faces, face, x, y, z + 1.5 * CLEAR_M) < CLEAR_M) return false;
    }
    return true;
  };
}

/** Puts the new thing exactly there and turns a microphone to the talker it is for. */
function settle(layout: Layout, schemeId: string, ref: Ref, position: Vec3, talker: Talker | null): Layout {
  switch (ref.kind) {
    case 'talker':
      return editTalker(layout, ref.id, (made) => {
        made.position = position;
      });
    case 'loudspeaker':
      return editLoudspeaker(layout, schemeId, ref.id, (made) => {
        made.position = position;
        if (talker !== null) made.pan = talker.pan;
      });
    case 'microphone':
      return editMicrophone(layout, schemeId, ref.id, (made) => {
        made.position = position;
        if (talker !== null) Object.assign(made, turnTo({ ...made, position }, talker.position));
      });
    default:
      return layout;
  }
}
