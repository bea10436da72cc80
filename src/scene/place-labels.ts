/** A label to be placed, pixels. */
export interface LabelBox {
  /** The point it names. */
  xPx: number;
  yPx: number;
  widthPx: number;
  heightPx: number;
  /** Top left corners it may take, from the point, the best first. */
  places: readonly (readonly [number, number])[];
  /** It is shown wherever it can, even over another. */
  needed: boolean;
}

export interface LabelArea {
  widthPx: number;
  heightPx: number;
  /** Parts of the area that are covered, as x, y, width, height. */
  covered: readonly Rectangle[];
}

export type Rectangle = readonly [number, number, number, number];

/**
 * Top left corners of labels such that none covers another or leaves the area, or null where there is no room. Labels
 * come in order of importance: the first take what they like best.
 */
export function placeLabels(labels: readonly LabelBox[], area: LabelArea): ([number, number] | null)[] {
  const taken: Rectangle[] = [...area.covered];
  return labels.map((label) => {
    const free = label.places
      .map(([dx, dy]): Rectangle => [label.xPx + dx, label.yPx + dy, label.widthPx, label.heightPx])
      .find((box) => within(box, area) && !taken.some((other) => overlap(box, other)));
    const box = free ?? (label.needed ? kept(label, area) : undefined);
    if (box === undefined) return null;
    taken.push(box);
    return [box[0], box[1]];
  });
}

const within = ([x, y, width, height]: Rectangle, area: LabelArea): boolean =>
  x >= 0 && y >= 0 && x + width <= area.widthPx && y + height <= area.heightPx;

function overlap(a: Rectangle, b: Rectangle): boolean {
  return a[0] < b[0] + b[2] && b[0] < a[0] + a[2] && a[1] < b[1] + b[3] && b[1] < a[1] + a[3];
}

/** A needed label whose point is in the area keeps to its best place, moved inside; one whose point is not is hidden. */
function kept(label: LabelBox, area: LabelArea): Rectangle | undefined {
  if (label.xPx < 0 || label.yPx < 0 || label.xPx > area.widthPx || label.yPx > area.heightPx) return undefined;
  const [dx, dy] = label.places[0];
  return [
    Math.min(area.widthPx - label.widthPx, Math.max(0, label.xPx + dx)),
    Math.min(area.heightPx - label.heightPx, Math.max(0, label.yPx + dy)),
    label.widthPx,
    label.heightPx,
  ];
}
