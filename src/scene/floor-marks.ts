import { type Camera, Vector3 } from 'three';
import { insideOutline } from '../acoustics/room/faces';
import type { Vec3 } from '../layout/schema';
import { lengthText, type Units } from '../report/units';
import type { RoomShape } from './room-shape';

const CROSS_M = 0.07;
/** Marks lie this much above their floor, metres. */
const LIFT_M = 0.006;
const MOST_CROSSES = 1500;

/** A small cross at every metre of the floors, as pairs of ends; every five metres in a very large room. */
export function floorRegister(shape: RoomShape): Vec3[] {
  const { least, greatest } = shape;
  const stepM = (greatest[0] - least[0]) * (greatest[1] - least[1]) > MOST_CROSSES ? 5 : 1;
  const lines: Vec3[] = [];
  for (let x = Math.ceil(least[0] + 0.2); x < greatest[0] - 0.1; x += stepM) {
    for (let y = Math.ceil(least[1] + 0.2); y < greatest[1] - 0.1; y += stepM) {
      const floor = floorAt(shape, x, y);
      if (floor === null) continue;
      const z = floor + LIFT_M;
      lines.push([x - CROSS_M, y, z], [x + CROSS_M, y, z], [x, y - CROSS_M, z], [x, y + CROSS_M, z]);
    }
  }
  return lines;
}

/** Height of the highest floor of the shell over a point of the plan, metres; null where there is none. */
export function floorAt({ faces }: RoomShape, x: number, y: number): number | null {
  let highest: number | null = null;
  for (let face = 0; face < faces.count; face++) {
    const [nx, ny, nz] = faces.normals.subarray(3 * face, 3 * face + 3);
    if (nz < 0.5 || faces.twoSided[face]) continue;
    const z = (faces.offsets[face] - nx * x - ny * y) / nz;
    if ((highest === null || z > highest) && insideOutline(faces, face, x, y, z)) highest = z;
  }
  return highest;
}

/** A dimension string: its line, its ticks as pairs of ends, and the length it states. */
export interface DimensionString {
  from: Vec3;
  to: Vec3;
  ticks: Vec3[];
  text: string;
}

const OFF_M = 0.75;

/** Length and width of the room, on the two sides nearest the eye. */
export function dimensionStrings(
  shape: Pick<RoomShape, 'least' | 'greatest'>,
  units: Units,
  eyeEast: boolean,
  eyeNorth: boolean,
): DimensionString[] {
  const { least, greatest } = shape;
  const x = eyeEast ? greatest[0] + OFF_M : least[0] - OFF_M;
  const y = eyeNorth ? greatest[1] + OFF_M : least[1] - OFF_M;
  const z = least[2];
  return [
    dimension([least[0], y, z], [greatest[0], y, z], units),
    dimension([x, least[1], z], [x, greatest[1], z], units),
  ];
}

function dimension(from: Vec3, to: Vec3, units: Units): DimensionString {
  const lengthM = Math.hypot(to[0] - from[0], to[1] - from[1]);
  const stepM = units === 'metric' ? (lengthM > 40 ? 5 : 1) : 5 * 0.3048;
  const ticks: Vec3[] = [];
  const tick = (alongM: number, sizeM: number) => {
    const share = alongM / lengthM;
    const [x, y] = [from[0] + (to[0] - from[0]) * share, from[1] + (to[1] - from[1]) * share];
    ticks.push([x - sizeM, y - sizeM, from[2]], [x + sizeM, y + sizeM, from[2]]);
  };
  for (let at = stepM; at < lengthM - 1e-6; at += stepM) tick(at, 0.055);
  tick(0, 0.16);
  tick(lengthM, 0.16);
  return { from, to, ticks, text: lengthText(lengthM, units) };
}

const looking = new Vector3();

/** True where the camera looks level: dimension strings on the floor would then lie in its cut edge. */
export function seenLevel(camera: Camera): boolean {
  camera.getWorldDirection(looking);
  return Math.abs(looking.z) < 0.1;
}
