import { describe, expect, it } from 'vitest';
import { createFaces } from '../../src/acoustics/room/faces';
import { aimDirection, aimMeets, aimsThrough, layOn, nearestFace, turnTo } from '../../src/layout/aim';
import type { Vec3 } from '../../src/layout/schema';

const absorption = [0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1];
/** Floor and ceiling of a room of 8 by 6 by 3 m, and a screen standing free at x = 5. */
const faces = createFaces([
  {
    corners: [
      [0, 0, 0],
      [8, 0, 0],
      [8, 6, 0],
      [0, 6, 0],
    ],
    absorption,
    sides: 1,
  },
  {
    corners: [
      [0, 0, 3],
      [0, 6, 3],
      [8, 6, 3],
      [8, 0, 3],
    ],
    absorption,
    sides: 1,
  },
  {
    corners: [
      [5, 1, 0],
      [5, 4, 0],
      [5, 4, 2],
      [5, 1, 2],
    ],
    absorption,
    sides: 2,
  },
]);
const at = (position: Vec3, pan = 0, tilt = 0) => ({ position, pan, tilt });

describe('aimMeets', () => {
  it('finds the face, the distance and the point', () => {
    const met = aimMeets(faces, at([2, 3, 3], 0, -90), 1);
    expect(met?.face).toBe(0);
    expect(met?.distanceM).toBeCloseTo(3, 12);
    expect(met?.point[2]).toBeCloseTo(0, 12);
  });

  it('meets nothing where there is nothing', () => {
    expect(aimMeets(faces, at([2, 3, 1], 180, 0))).toBeNull();
  });
});

describe('turnTo', () => {
  it('turns so that the aim goes through the point', () => {
    for (const target of [
      [5, 2, 1],
      [0.5, 5.5, 0],
      [2, 3, 2.9],
      [7.9, 0.1, 2.4],
    ] as Vec3[]) {
      const device = at([2.1, 2.9, 1.3]);
      const turned = { ...device, ...turnTo(device, target) };
      expect(aimsThrough(turned, target)).toBe(true);
      expect(aimsThrough({ ...turned, pan: turned.pan + 0.05, tilt: turned.tilt + 0.05 }, target)).toBe(false);
      expect(aimsThrough({ ...turned, pan: turned.pan + 180, tilt: -turned.tilt }, target)).toBe(false);
    }
  });

  it('keeps the pan of a device that looks straight down', () => {
    expect(turnTo(at([2, 3, 3], 70, 0), [2, 3, 0])).toEqual({ pan: 70, tilt: -90 });
  });

  it('leaves the turn as it is where the point is the device', () => {
    expect(turnTo(at([2, 3, 3], 12, 34), [2, 3, 3])).toEqual({ pan: 12, tilt: 34 });
  });
});

describe('layOn', () => {
  it('moves a device onto the plane and turns it along the inward normal', () => {
    const laid = layOn(faces, 1, at([2, 3, 2.4], 30, 10));
    expect(laid.position).toEqual([2, 3, 3]);
    expect(laid.tilt).toBe(-90);
  });

  it('moves it inside the outline', () => {
    expect(layOn(faces, 0, at([9, -1, 0.5])).position).toEqual([8, 0, 0]);
  });

  it('lies on the side of a free-standing face that the device is on', () => {
    const normalX = faces.normals[6];
    for (const x of [4.5, 5.5]) {
      const laid = layOn(faces, 2, at([x, 2, 1]));
      expect(laid.position).toEqual([5, 2, 1]);
      expect(Math.sign(aimDirection(laid)[0])).toBe(Math.sign(x - 5));
    }
    expect(Math.abs(normalX)).toBe(1);
  });
});

describe('nearestFace', () => {
  it('names the nearest one, −1 without any', () => {
    expect(nearestFace(faces, [2, 3, 2.4])).toBe(1);
    expect(nearestFace(faces, [4.8, 2, 1.2])).toBe(2);
    expect(nearestFace(createFaces([]), [0, 0, 0])).toBe(-1);
  });
});
