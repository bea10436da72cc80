import { type Draft, produce } from 'immer';
import { CATALOGUE_FINISHES } from '../layout/catalogue';
import type { Face, Finish, Layout, Vec3 } from '../layout/schema';

/** The layout with a face changed. */
export function editFace(layout: Layout, id: string, change: (face: Draft<Face>) => void): Layout {
  return produce(layout, (draft) => {
    const face = draft.venue.faces.find((candidate) => candidate.id === id);
    if (face !== undefined) change(face);
  });
}

/** The layout with a finish changed. */
export function editFinish(layout: Layout, id: string, change: (finish: Draft<Finish>) => void): Layout {
  return produce(layout, (draft) => {
    const finish = draft.venue.finishes.find((candidate) => candidate.id === id);
    if (finish !== undefined) change(finish);
  });
}

/** Catalogue finishes the layout has not taken yet. */
export function finishesToTake(layout: Layout): Finish[] {
  const taken = new Set(layout.venue.finishes.map((finish) => finish.id));
  return CATALOGUE_FINISHES.filter((finish) => !taken.has(finish.id));
}

/** The layout with a face in a finish, one of its own or one taken from the catalogue. */
export function cover(layout: Layout, faceId: string, finishId: string): Layout {
  const known = layout.venue.finishes.some((finish) => finish.id === finishId);
  const taken = CATALOGUE_FINISHES.find((finish) => finish.id === finishId);
  if (!known && taken === undefined) return layout;
  return produce(layout, (draft) => {
    if (!known && taken !== undefined) draft.venue.finishes.push({ ...taken, absorption: [...taken.absorption] });
    const face = draft.venue.faces.find((candidate) => candidate.id === faceId);
    if (face !== undefined) face.finish = finishId;
  });
}

/** A corner between one corner of a face and the next: half way along the edge, so that the face keeps its shape. */
export function halfWay(corners: readonly Vec3[], index: number): Vec3 {
  const next = corners[(index + 1) % corners.length];
  return [0, 1, 2].map((axis) => Number(((corners[index][axis] + next[axis]) / 2).toFixed(4))) as Vec3;
}
