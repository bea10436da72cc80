import { useMemo } from 'react';
import type { Ref } from '../layout/ref';
import { cutWalls } from './cut-walls';
import { dimensionStrings, floorRegister } from './floor-marks';
import type { PlanFrame } from './plan-frame';
import { cornersOf } from './room-shape';
import type { RoomScene } from './use-room-scene';

interface PlanRoomProps {
  scene: RoomScene;
  frame: PlanFrame;
  selectedFace: string | null;
  onPick: (ref: Ref | null) => void;
}

/** Floors, cut walls and furniture in plan, with the metre register and dimension strings. */
export default function PlanRoom({ scene, frame, selectedFace, onPick }: PlanRoomProps) {
  const { shape, units } = scene;
  const { faces } = shape;
  const drawn = useMemo(() => {
    const seen = new Uint8Array(faces.count).fill(1);
    const level = (face: number) => Math.abs(faces.normals[3 * face + 2]) > 0.5;
    const all = Array.from(seen.keys());
    return {
      floors: all.filter((face) => !faces.twoSided[face] && faces.normals[3 * face + 2] > 0.5),
      tables: all.filter((face) => faces.twoSided[face] && level(face)),
      fronts: all.filter((face) => faces.twoSided[face] && !level(face)),
      poche: cutWalls(shape, seen).poche,
      register: floorRegister(shape),
    };
  }, [shape, faces]);
  const dimensions = useMemo(() => dimensionStrings(shape, units, false, false), [shape, units]);
  const face = (index: number, look: string) => {
    const id = shape.ids[index];
    const name = id === selectedFace ? `${look} room-plan-on` : look;
    return (
      // biome-ignore lint/a11y/noStaticElementInteractions: the list of faces is the way with keys
      <polygon
        key={id}
        className={name}
        points={frame.points(cornersOf(faces, index))}
        onClick={() => onPick({ kind: 'face', id })}
      />
    );
  };
  return (
    <>
      {drawn.floors.map((index) => face(index, `room-plan-${shape.tones[index]}`))}
      <path className="room-plan-register" d={linesOf(drawn.register, frame)} />
      <path className="room-plan-poche" d={trianglesOf(drawn.poche, frame)} />
      {drawn.tables.map((index) => face(index, 'room-plan-timber'))}
      {drawn.fronts.map((index) => face(index, 'room-plan-timber'))}
      {dimensions.map(({ from, to, ticks, text }) => {
        const [a, b] = [frame.at(from), frame.at(to)];
        const [x, y] = [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2];
        const upright = Math.abs(a[0] - b[0]) < 1;
        return (
          <g key={text + from.join()}>
            <path className="room-plan-dimension" d={linesOf([from, to, ...ticks], frame)} />
            <text
              className="room-plan-length"
              x={x}
              y={y}
              dy={4}
              transform={upright ? `rotate(-90 ${x} ${y})` : undefined}
            >
              {text}
            </text>
          </g>
        );
      })}
    </>
  );
}

type Points = Parameters<PlanFrame['points']>[0];

function linesOf(points: Points, frame: PlanFrame): string {
  return points
    .map((point, i) => {
      const [x, y] = frame.at(point);
      return `${i % 2 === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`;
    })
    .join('');
}

function trianglesOf(points: Points, frame: PlanFrame): string {
  return points
    .map((point, i) => {
      const [x, y] = frame.at(point);
      return `${i % 3 === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}${i % 3 === 2 ? 'Z' : ''}`;
    })
    .join('');
}
