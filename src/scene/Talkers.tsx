import { useFrame } from '@react-three/fiber';
import { useEffect, useMemo, useRef } from 'react';
import { BufferGeometry, type Group, Shape, ShapeGeometry, Vector3 } from 'three';
import { aimDirection } from '../layout/aim';
import type { Talker, Vec3 } from '../layout/schema';
import ThinLines from './ThinLines';
import type { ThemeColours } from './theme-colours';

const HEAD_M = 0.115;
/** Seen more steeply than this, a standing figure would lie on its back: only its head is drawn. */
const STEEP = Math.cos((28 * Math.PI) / 180);

interface TalkersProps {
  talkers: readonly Talker[];
  selectedId: string | null;
  colours: ThemeColours;
}

/** Talkers as figures of paper that turn to whoever looks, each with a line the way the voice goes. */
export default function Talkers({ talkers, selectedId, colours }: TalkersProps) {
  const voices = useMemo(
    () =>
      talkers.flatMap((talker): Vec3[] => {
        const forward = aimDirection(talker);
        return [talker.position, talker.position.map((value, axis) => value + 0.36 * forward[axis]) as Vec3];
      }),
    [talkers],
  );
  return (
    <>
      {talkers.map((talker) => (
        <Figure
          key={talker.id}
          at={talker.position}
          fill={colours.css.raised}
          edge={talker.id === selectedId ? colours.css.accent : colours.css.ink}
        />
      ))}
      <ThinLines points={voices} colour={colours.css.ink} />
    </>
  );
}

function Figure({ at, fill, edge }: { at: Vec3; fill: string; edge: string }) {
  const group = useRef<Group>(null);
  const bust = useRef<Group>(null);
  const made = useMemo(() => ({ bust: outlined(bustShape()), head: outlined(headShape()) }), []);
  useEffect(
    () => () => {
      for (const { fill, edge } of [made.bust, made.head]) {
        fill.dispose();
        edge.dispose();
      }
    },
    [made],
  );
  useFrame(({ camera }) => {
    if (group.current === null || bust.current === null) return;
    group.current.quaternion.copy(camera.quaternion);
    camera.getWorldDirection(looking);
    bust.current.visible = Math.abs(looking.z) < STEEP;
  });
  return (
    <group ref={group} position={at}>
      <group ref={bust}>
        <Paper made={made.bust} fill={fill} edge={edge} />
      </group>
      <Paper made={made.head} fill={fill} edge={edge} />
    </group>
  );
}

const looking = new Vector3();

function Paper({ made, fill, edge }: { made: ReturnType<typeof outlined>; fill: string; edge: string }) {
  return (
    <>
      <mesh geometry={made.fill}>
        <meshBasicMaterial color={fill} polygonOffset polygonOffsetFactor={1} polygonOffsetUnits={1} />
      </mesh>
      <lineLoop geometry={made.edge}>
        <lineBasicMaterial color={edge} />
      </lineLoop>
    </>
  );
}

function outlined(shape: Shape): { fill: ShapeGeometry; edge: BufferGeometry } {
  return { fill: new ShapeGeometry(shape, 8), edge: new BufferGeometry().setFromPoints(shape.getPoints(8)) };
}

function bustShape(): Shape {
  return new Shape()
    .moveTo(-0.2, -0.58)
    .lineTo(-0.23, -0.26)
    .quadraticCurveTo(-0.2, -0.15, 0, -0.13)
    .quadraticCurveTo(0.2, -0.15, 0.23, -0.26)
    .lineTo(0.2, -0.58)
    .closePath();
}

function headShape(): Shape {
  return new Shape().absarc(0, 0, HEAD_M, 0, 2 * Math.PI, false);
}
