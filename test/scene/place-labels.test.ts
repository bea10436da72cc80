import { describe, expect, test } from 'vitest';
import { type LabelBox, placeLabels } from '../../src/scene/place-labels';

const area = { widthPx: 200, heightPx: 100, covered: [] };
const box = (xPx: number, yPx: number, more: Partial<LabelBox> = {}): LabelBox => ({
  xPx,
  yPx,
  widthPx: 40,
  heightPx: 12,
  places: [
    [4, -14],
    [-44, -14],
    [4, 2],
  ],
  needed: false,
  ...more,
});

describe('labels', () => {
  test('take the place they like best where it is free', () => {
    expect(placeLabels([box(50, 50)], area)).toEqual([[54, 36]]);
  });

  test('give way to those before them', () => {
    expect(placeLabels([box(100, 50), box(102, 52)], area)).toEqual([
      [104, 36],
      [58, 38],
    ]);
  });

  test('that touch no other still stay out of what is covered', () => {
    expect(placeLabels([box(50, 50)], { ...area, covered: [[54, 30, 100, 20]] })).toEqual([[6, 36]]);
  });

  test('are left out where there is no room', () => {
    const crowd = Array.from({ length: 5 }, () => box(100, 50));
    const placed = placeLabels(crowd, area);
    expect(placed.filter((place) => place !== null)).toHaveLength(3);
    expect(placed.slice(3)).toEqual([null, null]);
  });

  test('never leave the area', () => {
    expect(placeLabels([box(190, 50), box(100, 5)], area)).toEqual([
      [146, 36],
      [104, 7],
    ]);
  });

  test('that are needed are moved inside rather than left out', () => {
    const crowd = [...Array.from({ length: 3 }, () => box(100, 50)), box(180, 5, { needed: true, places: [[4, -14]] })];
    expect(placeLabels(crowd, area)[3]).toEqual([160, 0]);
  });

  test('of points outside the picture are not shown, needed or not', () => {
    expect(placeLabels([box(-500, 50, { needed: true })], area)).toEqual([null]);
  });

  test('with no place at all are left out', () => {
    expect(placeLabels([box(50, 50, { places: [] })], area)).toEqual([null]);
  });
});
