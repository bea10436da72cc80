import { Line } from '@react-three/drei';
import { useFrame, useThree } from '@react-three/fiber';
import { useMemo, useRef, useState } from 'react';
import type { Vec3 } from '../layout/schema';
import { cssColour, mixOklab, type Rgb } from './colour-scale';
import { cutWalls, facesSeen } from './cut-walls';
import FlatMesh from './FlatMesh';
import { hatchLines } from './hatch-lines';
import type { PickTargets } from './Picking';
import { cornersOf, type RoomShape } from './room-shape';
import { faceColours, faceTriangles } from './shell-mesh';
import ThinLines from './ThinLines';
import type { ThemeColours } from './theme-colours';

interface RoomShellProps {
  shape: RoomShape;
  colours: ThemeColours;
  selectedFace: string | null;
  targets: PickTargets;
}

/** The room as a card model: faces seen from inside only, cut walls in ink, and what stands in it. */
export default function RoomShell({ shape, colours, selectedFace, targets }: RoomShellProps) {
  const seen = useFacesSeen(shape);
  const shell = useMemo(() => faceTriangles(shape, false), [shape]);
  const standing = useMemo(() => faceTriangles(shape, true), [shape]);
  const shellColours = useMemo(() => faceColours(shape, shell.faceOf, colours), [shape, shell, colours]);
  const standingColours = useMemo(() => faceColours(shape, standing.faceOf, colours), [shape, standing, colours]);
  const outline = useMemo(() => outlineOf(shape, shape.ids.indexOf(selectedFace ?? '')), [shape, selectedFace]);
  return (
    <>
      <FlatMesh
        positions={shell.positions}
        colours={shellColours}
        bothSides={false}
        meshRef={(mesh) => {
          targets.shell = mesh === null ? null : { mesh, ownerOf: (triangle) => shell.faceOf[triangle] };
        }}
      />
      <FlatMesh
        positions={standing.positions}
        colours={standingColours}
        bothSides
        meshRef={(mesh) => {
          targets.standing = mesh === null ? null : { mesh, ownerOf: (triangle) => standing.faceOf[triangle] };
        }}
      />
      <Edges shape={shape} seen={seen} colours={colours} />
      <Cuts shape={shape} seen={seen} colours={colours} />
      {outline.length > 0 && <Line points={outline} segments color={colours.css.accent} lineWidth={2} />}
    </>
  );
}

function Edges({ shape, seen, colours }: { shape: RoomShape; seen: Uint8Array; colours: ThemeColours }) {
  const { shellEdges, standingEdges, hatch } = useMemo(() => {
    const faces = Array.from(seen.keys());
    return {
      shellEdges: faces
        .filter((face) => seen[face] && !shape.faces.twoSided[face])
        .flatMap((face) => outlineOf(shape, face)),
      standingEdges: faces.filter((face) => shape.faces.twoSided[face]).flatMap((face) => outlineOf(shape, face)),
      hatch: faces.filter((face) => seen[face]).flatMap((face) => hatchLines(shape, face)),
    };
  }, [shape, seen]);
  const faint = cssColour(mixOklab(colours.linear['card-a'], colours.linear['card-edge'], 0.38));
  return (
    <>
      <ThinLines points={hatch} colour={faint} />
      <ThinLines points={shellEdges} colour={colours.css['card-edge']} />
      <ThinLines points={standingEdges} colour={colours.css['hair-2']} />
    </>
  );
}

const DASH = [0.28, 0.16] as const;

function Cuts({ shape, seen, colours }: { shape: RoomShape; seen: Uint8Array; colours: ThemeColours }) {
  const cut = useMemo(() => cutWalls(shape, seen), [shape, seen]);
  const mesh = useMemo(() => {
    const { poche, paper } = colours.linear;
    const triangles = [...cut.poche, ...cut.pocheSides];
    const sides = mixOklab(poche, paper, 0.16);
    return {
      positions: new Float32Array(triangles.flat()),
      colours: new Float32Array(triangles.flatMap((_, i): Rgb => (i < cut.poche.length ? poche : sides))),
    };
  }, [cut, colours]);
  return (
    <>
      <FlatMesh positions={mesh.positions} colours={mesh.colours} bothSides />
      <ThinLines points={cut.taken} colour={colours.css['hair-2']} opacity={0.8} dash={DASH} />
    </>
  );
}

/** Changes only when the camera passes the plane of a face, which is seldom enough for React. */
function useFacesSeen(shape: RoomShape): Uint8Array {
  const camera = useThree((three) => three.camera);
  const now = () => facesSeen(shape, camera.position.toArray() as Vec3);
  const [seen, setSeen] = useState(() => ({ shape, flags: now() }));
  const kept = useRef(seen);
  useFrame(() => {
    const flags = now();
    if (kept.current.shape === shape && flags.every((flag, face) => flag === kept.current.flags[face])) return;
    kept.current = { shape, flags };
    setSeen(kept.current);
  });
  return useMemo(
    () => (seen.shape === shape ? seen.flags : facesSeen(shape, camera.position.toArray() as Vec3)),
    [seen, shape, camera],
  );
}

function outlineOf(shape: RoomShape, face: number): Vec3[] {
  if (face < 0) return [];
  const corners = cornersOf(shape.faces, face);
  return corners.flatMap((corner, i) => [corner, corners[(i + 1) % corners.length]]);
}
