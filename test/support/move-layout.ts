import type { Layout, Vec3 } from '../../src/layout/schema';

/** A rigid motion of everything in a layout. Angles in degrees. */
interface Motion {
  point: (p: Vec3) => Vec3;
  pan: (panDeg: number) => number;
  roll: (rollDeg: number) => number;
  /** True where left and right change places: outlines then run the other way round. */
  mirrors: boolean;
}

export const translation = ([dx, dy, dz]: Vec3): Motion => ({
  point: ([x, y, z]) => [x + dx, y + dy, z + dz],
  pan: (pan) => pan,
  roll: (roll) => roll,
  mirrors: false,
});

/** About the vertical through the origin. */
export function rotation(degrees: number): Motion {
  const [c, s] = [Math.cos((degrees * Math.PI) / 180), Math.sin((degrees * Math.PI) / 180)];
  return {
    point: ([x, y, z]) => [c * x - s * y, s * x + c * y, z],
    pan: (pan) => pan + degrees,
    roll: (roll) => roll,
    mirrors: false,
  };
}

/** Left and right exchanged: y to −y. Blocks of seats are listed first, see `listSeats`. */
export const mirror: Motion = {
  point: ([x, y, z]) => [x, -y, z],
  pan: (pan) => -pan,
  roll: (roll) => -roll,
  mirrors: true,
};

export function moved(layout: Layout, motion: Motion): Layout {
  const next = structuredClone(layout);
  const { venue } = next;
  for (const face of venue.faces) {
    face.corners = face.corners.map(motion.point);
    if (motion.mirrors) face.corners.reverse();
  }
  for (const part of venue.seating) {
    if (part.kind === 'list') {
      for (const seat of part.seats) seat.position = motion.point(seat.position);
    } else {
      if (motion.mirrors) throw new Error('A block has a hand: list its seats before mirroring.');
      part.origin = motion.point(part.origin);
      part.facing = motion.pan(part.facing);
    }
  }
  const devices = next.schemes.flatMap(({ microphones, loudspeakers }) => [...microphones, ...loudspeakers]);
  for (const thing of [...venue.talkers, ...devices]) {
    thing.position = motion.point(thing.position);
    thing.pan = motion.pan(thing.pan);
  }
  for (const device of devices) device.roll = motion.roll(device.roll);
  return next;
}
