import { Line } from '@react-three/drei';
import { useMemo } from 'react';
import { firstHit } from '../acoustics/room/faces';
import { aimDirection } from '../layout/aim';
import type { Vec3 } from '../layout/schema';
import { mixOklab } from './colour-scale';
import { type DeviceShape, loudspeakerShape, microphoneShape, stemOf } from './device-shapes';
import FlatMesh from './FlatMesh';
import type { RoomShape } from './room-shape';
import ThinLines from './ThinLines';
import type { ThemeColours } from './theme-colours';
import type { RoomScene } from './use-room-scene';

const DOTS = [0.05, 0.1] as const;

/** Loudspeakers and microphones to size, pointing where they point. */
export default function Devices({ scene }: { scene: RoomScene }) {
  const { loudspeakers, microphones, colours, shape, selection } = scene;
  const { boxes, capsules, stems, plumbs } = useMemo(
    () => ({
      boxes: loudspeakers.map(({ device, pattern }) => loudspeakerShape(device, pattern)),
      capsules: microphones.map(({ device, pattern }) => microphoneShape(device, pattern)),
      stems: microphones.flatMap(({ device, pattern }) => stemOf(device, pattern, (from) => dropM(shape, from))),
      plumbs: loudspeakers.map(({ device }) => plumbOf(shape, device.position)),
    }),
    [loudspeakers, microphones, shape],
  );
  const tips = useMemo(
    () =>
      microphones.flatMap(({ device }): Vec3[] => {
        const forward = aimDirection(device);
        return [device.position, device.position.map((value, axis) => value + 0.07 * forward[axis]) as Vec3];
      }),
    [microphones],
  );
  const selected =
    selection?.kind === 'loudspeaker'
      ? boxes[loudspeakers.findIndex(({ device }) => device.id === selection.id)]
      : selection?.kind === 'microphone'
        ? capsules[microphones.findIndex(({ device }) => device.id === selection.id)]
        : undefined;
  const dotted = useMemo(() => plumbs.flatMap(({ line }) => line), [plumbs]);
  const feet = useMemo(() => plumbs.flatMap(({ foot }) => foot), [plumbs]);
  return (
    <>
      <ThinLines points={dotted} colour={colours.css['hair-2']} dash={DOTS} />
      <ThinLines points={feet} colour={colours.css['ink-3']} />
      <ThinLines points={stems} colour={colours.css.ink} />
      <Shapes shapes={boxes} colours={colours} />
      <Shapes shapes={capsules} colours={colours} />
      {tips.length > 0 && <Line points={tips} segments color={colours.css.ink} lineWidth={3.2} />}
      {selected !== undefined && (
        <Line points={selected.edges} segments color={colours.css.accent} lineWidth={2} renderOrder={3} />
      )}
    </>
  );
}

function Shapes({ shapes, colours }: { shapes: readonly DeviceShape[]; colours: ThemeColours }) {
  const mesh = useMemo(() => fills(shapes, colours), [shapes, colours]);
  const edges = useMemo(() => shapes.flatMap((shape) => shape.edges), [shapes]);
  return (
    <>
      <FlatMesh positions={mesh.positions} colours={mesh.colours} bothSides />
      <ThinLines points={edges} colour={colours.css.ink} />
    </>
  );
}

/** Outlines of devices are convex: a fan of triangles fills each. */
function fills(shapes: readonly DeviceShape[], { linear }: ThemeColours) {
  const positions: number[] = [];
  const painted: number[] = [];
  for (const { outline, tone } of shapes.flatMap((shape) => shape.surfaces)) {
    const [a, b, c] = outline;
    const across = (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
    // Upright sides stand a little in the shade of level ones.
    const colour = mixOklab(linear[tone], linear['hair-2'], Math.abs(across) < 1e-7 ? 0.1 : 0);
    for (let i = 2; i < outline.length; i++) {
      positions.push(...outline[0], ...outline[i - 1], ...outline[i]);
      painted.push(...colour, ...colour, ...colour);
    }
  }
  return { positions: new Float32Array(positions), colours: new Float32Array(painted) };
}

const DOWN = [0, 0, -1];
const FOOT_M = 0.12;

function dropM(shape: RoomShape, from: Vec3): number | null {
  return firstHit(shape.faces, from, DOWN, 1e-3, -1)?.distanceM ?? null;
}

/** A dotted line from a loudspeaker down to what it hangs over, and a cross where it meets that. */
function plumbOf(shape: RoomShape, from: Vec3): { line: Vec3[]; foot: Vec3[] } {
  const distanceM = dropM(shape, [from[0], from[1], from[2] - 0.05]);
  if (distanceM === null) return { line: [], foot: [] };
  const [x, y] = from;
  const z = from[2] - 0.05 - distanceM + 0.006;
  return {
    line: [from, [x, y, z]],
    foot: [
      [x - FOOT_M, y, z],
      [x + FOOT_M, y, z],
      [x, y - FOOT_M, z],
      [x, y + FOOT_M, z],
    ],
  };
}
