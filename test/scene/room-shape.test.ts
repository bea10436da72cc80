import { describe, expect, test } from 'vitest';
import council from '../../data/layouts/council-chamber.layout.json';
import { readLayout } from '../../src/layout/read';
import { quantityOf } from '../../src/report/quantities';
import { aimOf } from '../../src/scene/aim';
import { cutWalls, facesSeen } from '../../src/scene/cut-walls';
import { roomShape } from '../../src/scene/room-shape';
import { seatFigures } from '../../src/scene/seat-figures';
import { seatPlaces } from '../../src/scene/seat-places';
import { orbitShot, planShot } from '../../src/scene/views';

const outcome = readLayout(council);
if (!outcome.ok) throw new Error('the council chamber cannot be read');
const { venue, schemes } = outcome.value;
const shape = roomShape(venue);
const face = (id: string) => shape.ids.indexOf(id);

describe('the room to draw', () => {
  test('tells walls, which are cut, from the sides of the dais, which are not', () => {
    expect(shape.walls[face('front-wall')]).toBe(1);
    expect(shape.walls[face('south-windows')]).toBe(1);
    for (const id of ['dais-front', 'dais-south', 'desk-south', 'floor', 'ceiling'])
      expect(shape.walls[face(id)]).toBe(0);
  });

  test('gives glass, floors and furniture their tones', () => {
    expect(shape.tones[face('south-windows')]).toBe('glass');
    expect(shape.tones[face('floor')]).toBe('floor');
    expect(shape.tones[face('witness-table')]).toBe('timber');
  });

  test('knows no edge between the dado and the windows above it', () => {
    const tops = shape.wallEdges.filter((edge) => edge.side === 'top').map((edge) => shape.ids[edge.face]);
    expect(tops).toContain('south-frieze');
    expect(tops).not.toContain('south-dado');
    expect(tops).not.toContain('south-windows');
  });

  test('from outside the north-east corner only those two walls are taken away', () => {
    const seen = facesSeen(shape, [40, 40, 20]);
    const hidden = shape.ids.filter((_, i) => !seen[i] && shape.walls[i]);
    expect(hidden.sort()).toEqual(['back-wall', 'door', 'north-dado', 'north-hangings', 'north-wall']);
    expect(seen[face('ceiling')]).toBe(0);
  });

  test('cut walls stand outside the room, those taken away as stubs', () => {
    const { poche } = cutWalls(shape, facesSeen(shape, [40, 40, 20]));
    for (const [x, y] of poche) {
      const inside = x > 0.001 && x < 14.399 && y > 0.001 && y < 10.999;
      expect(inside).toBe(false);
    }
    const northern = poche.filter(([, y]) => y > 11.1).map(([, , z]) => z);
    expect(Math.max(...northern.filter((z) => z < 4))).toBeCloseTo(0.09, 6);
  });
});

describe('seats to draw', () => {
  const seats = seatPlaces(venue);
  const facingDeg = (id: string) => {
    const found = seats.find((seat) => seat.id === id);
    return (((((found?.facingRad ?? Number.NaN) * 180) / Math.PI) % 360) + 360) % 360;
  };

  test('members face their desks and the chair the room', () => {
    expect(facingDeg('S7')).toBeCloseTo(90, 0);
    expect(facingDeg('N7')).toBeCloseTo(270, 0);
    expect(facingDeg('Chair')).toBeCloseTo(0, 6);
  });

  test('without a prediction none has a figure, and none is short', () => {
    const figures = seatFigures(seats, null, null, null, quantityOf('margin'));
    expect(figures.worst).toBe(-1);
    expect(figures.shortCount + figures.judgedCount).toBe(0);
    expect(figures.predicted.every((index) => index === -1)).toBe(true);
  });
});

describe('an aim', () => {
  const device = schemes[0].loudspeakers.find(({ id }) => id === 'p2');
  if (device === undefined) throw new Error('no p2');

  test('from the ceiling down meets the public floor, 4.5 m below', () => {
    const aim = aimOf(device, shape.faces, shape.ids, []);
    expect(aim?.met).toEqual({ kind: 'face', id: 'public-floor' });
    expect(aim?.distanceM).toBeCloseTo(4.5, 9);
  });

  test('meets a seat whose ear is within 0.4 m of the line, and not one further off', () => {
    const [x, y] = device.position;
    const near = aimOf(device, shape.faces, shape.ids, [{ id: 'near', ear: [x + 0.39, y, 1.2] }]);
    expect(near?.met).toEqual({ kind: 'seat', id: 'near' });
    expect(near?.distanceM).toBeCloseTo(3.3, 9);
    const far = aimOf(device, shape.faces, shape.ids, [{ id: 'far', ear: [x + 0.41, y, 1.2] }]);
    expect(far?.met.kind).toBe('face');
  });
});

describe('views', () => {
  const area = { widthPx: 976, heightPx: 440, rightPx: 308, bottomPx: 0 };

  test('the first one stands outside, above, towards north-east, and looks at the room', () => {
    const { eye, target } = orbitShot(shape, area);
    expect(eye[0]).toBeGreaterThan(14.4);
    expect(eye[1]).toBeGreaterThan(11);
    const azimuth = (Math.atan2(eye[1] - target[1], eye[0] - target[0]) * 180) / Math.PI;
    expect(azimuth).toBeCloseTo(57, 6);
    expect(target[0]).toBeGreaterThan(2);
    expect(target[0]).toBeLessThan(12);
  });

  test('the plan shows the whole room in the free part of the drawing', () => {
    const { metresPerPixel } = planShot(shape, area);
    expect(14.4 / metresPerPixel).toBeLessThan(976 - 308);
    expect(11 / metresPerPixel).toBeLessThan(440);
    expect(11 / metresPerPixel).toBeGreaterThan(300);
  });
});
