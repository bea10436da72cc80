import { distanceToFace, type Faces, heightAbove } from '../acoustics/room/faces';
import { insideShell, openEdges } from '../acoustics/room/shell';
import { aimDirection } from './aim';
import { cautionAt, errorAt, type Problem } from './problem';
import type { Layout, Vec3 } from './schema';
import type { Seat } from './seating';

/** What lies on a face may be this far outside it, metres. */
const SKIN_M = 0.01;
/** A talker nearer than this to a microphone is on it, metres. */
const TOUCH_M = 0.02;
const HOST_ANGLE_DEG = 1;

/** Things that stand where they cannot: outside the room, on one another, or off the face they are said to lie on. */
export function checkPlaces(layout: Layout, faces: Faces, seats: readonly Seat[]): Problem[] {
  const problems: Problem[] = [];
  const shell = shellTest(faces);
  const inside = (path: string, name: string, [x, y, z]: Vec3) => {
    if (shell(x, y, z)) return;
    problems.push(errorAt(path, `${name} is outside the room`, 'a place inside the shell', 'move it or the wall'));
  };
  const { venue } = layout;
  for (const [i, talker] of venue.talkers.entries()) inside(`venue.talkers[${i}].position`, talker.id, talker.position);
  const outside = seats.filter((seat) => !shell(...seat.ear));
  if (outside.length > 0) {
    const more = outside.length > 1 ? ` and ${outside.length - 1} more are` : ' is';
    const path = `venue.seating[${outside[0].seating}]`;
    problems.push(
      errorAt(
        path,
        `seat ${outside[0].id}${more} outside the room`,
        'ears inside the shell',
        'move the block or omit the seat',
      ),
    );
  }
  layout.schemes.forEach((scheme, s) => {
    scheme.microphones.forEach((microphone, i) => {
      const path = `schemes[${s}].microphones[${i}]`;
      inside(`${path}.position`, microphone.id, microphone.position);
      problems.push(...checkHost(layout, faces, path, microphone));
      const touched = venue.talkers.find((talker) => distance(talker.position, microphone.position) < TOUCH_M);
      if (touched !== undefined) {
        const found = `${touched.id} talks from inside ${microphone.id}`;
        problems.push(errorAt(`${path}.position`, found, `at least ${TOUCH_M * 1000} mm apart`, 'move one of them'));
      }
    });
    scheme.loudspeakers.forEach((loudspeaker, i) => {
      const path = `schemes[${s}].loudspeakers[${i}]`;
      inside(`${path}.position`, loudspeaker.id, loudspeaker.position);
      problems.push(...checkHost(layout, faces, path, loudspeaker));
    });
  });
  return problems;
}

const distance = (a: readonly number[], b: readonly number[]): number =>
  Math.hypot(a[0] - b[0], a[1] - b[1], a[2] - b[2]);

/** Tells whether a point is inside the shell or on its skin; an open shell has no outside. */
function shellTest(faces: Faces): (x: number, y: number, z: number) => boolean {
  const closed = faces.twoSided.includes(0) && openEdges(faces).length === 0;
  if (!closed) return () => true;
  const shell = Array.from(faces.twoSided.keys()).filter((face) => !faces.twoSided[face]);
  return (x, y, z) =>
    insideShell(faces, x, y, z) || shell.some((face) => distanceToFace(faces, face, x, y, z) <= SKIN_M);
}

interface Hosted {
  id: string;
  position: Vec3;
  pan: number;
  tilt: number;
  roll: number;
  host: string | null;
}

/** A hosted device more than 1° off its face's normal or 1 cm off its plane is said; it is predicted as given. */
function checkHost(layout: Layout, faces: Faces, path: string, device: Hosted): Problem[] {
  if (device.host === null) return [];
  const face = layout.venue.faces.findIndex((candidate) => candidate.id === device.host);
  const problems: Problem[] = [];
  const offM = Math.abs(heightAbove(faces, face, ...device.position));
  if (offM > SKIN_M) {
    const found = `${device.id} lies ${Math.round(offM * 1000)} mm off ${device.host}`;
    problems.push(cautionAt(`${path}.position`, found, 'a hosted device lies on its face', 'move it onto the plane'));
  }
  const aim = aimDirection(device);
  const along = [0, 1, 2].reduce((sum, axis) => sum + aim[axis] * faces.normals[3 * face + axis], 0);
  // A free-standing face may be lain on from either side.
  const cosine = faces.twoSided[face] ? Math.abs(along) : along;
  const offDeg = (Math.acos(Math.min(1, Math.max(-1, cosine))) * 180) / Math.PI;
  if (offDeg > HOST_ANGLE_DEG) {
    const found = `${device.id} aims ${offDeg.toFixed(1)}° off the normal of ${device.host}`;
    problems.push(cautionAt(`${path}.pan`, found, 'a hosted device aims along the normal', 'turn it'));
  }
  return problems;
}
