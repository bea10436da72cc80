import { Canvas, useFrame, useThree } from '@react-three/fiber';
import { type RefObject, useEffect, useMemo, useRef, useState } from 'react';
import type { Ref } from '../layout/ref';
import type { Vec3 } from '../layout/schema';
import { useSession } from '../session/session';
import AimLine from './AimLine';
import { type Aim, aimOf } from './aim';
import CameraRig, { type CameraHandle } from './CameraRig';
import Devices from './Devices';
import FloorMarks from './FloorMarks';
import { dimensionStrings } from './floor-marks';
import HoverCard from './HoverCard';
import LabelProjector from './LabelProjector';
import Labels from './Labels';
import { labelList } from './label-list';
import Picking, { type PickTargets } from './Picking';
import RoomShell from './RoomShell';
import SeatPins, { PIN_HEIGHT_M } from './SeatPins';
import Seats from './Seats';
import { pinOf, seatPoints } from './seat-geometry';
import { placeOfSelection, pointingOf, shotOfView } from './shot-of-view';
import Talkers from './Talkers';
import type { RoomScene } from './use-room-scene';
import { type FreeArea, orbitShot, type ViewChoice } from './views';

interface RoomCanvasProps {
  scene: RoomScene;
  view: ViewChoice;
  aimLines: boolean;
  software: boolean;
  /** Pixels on the right and, of those, at the bottom, under the legend. */
  rightPx: number;
  legendPx: number;
  wrapper: RefObject<HTMLElement | null>;
  camera: RefObject<CameraHandle | null>;
  /** The browser took the drawing away. */
  onLost: () => void;
}

/** The room in 3D with its lettering over it. */
export default function RoomCanvas(props: RoomCanvasProps) {
  const { scene, software, aimLines, onLost } = props;
  const { shape, units } = scene;
  const [targets] = useState<PickTargets>(() => ({ seats: null, shell: null, standing: null }));
  const [pointed, setPointed] = useState<string | null>(null);
  const [sides, setSides] = useState({ east: true, north: true });
  const elements = useRef(new Map<string, HTMLElement>());
  const card = useRef<HTMLDivElement>(null);
  const moving = useRef(false);
  const { select, hoverSeat } = useSession.getState();
  const hovered = useSession((session) => session.hoveredSeat);
  const dimensions = useMemo(() => dimensionStrings(shape, units, sides.east, sides.north), [shape, units, sides]);
  const aims = useAims(scene, aimLines);
  const labels = useMemo(() => labelList(scene, aims.selected, dimensions), [scene, aims, dimensions]);
  const onHover = useMemo(
    () => (id: string | null) => {
      setPointed(id);
      hoverSeat(id);
    },
    [hoverSeat],
  );
  const pickedHere = useRef<Ref | null>(null);
  const onPick = useMemo(
    () => (ref: Ref | null) => {
      pickedHere.current = ref;
      select(ref);
    },
    [select],
  );
  return (
    <>
      <Canvas
        flat
        frameloop="demand"
        dpr={software ? 1 : [1, 2]}
        gl={{ antialias: !software }}
        resize={{ debounce: 0 }}
        onCreated={({ gl }) => {
          gl.domElement.addEventListener('webglcontextlost', (event) => {
            // A renderer that is taken down on purpose loses its context too, but is no longer in the page.
            event.preventDefault();
            // It cannot be lost again when the canvas goes.
            gl.forceContextLoss = () => undefined;
            if (gl.domElement.isConnected) onLost();
          });
        }}
      >
        <Rig {...props} moving={moving} pickedHere={pickedHere} onSides={setSides} />
        <RoomShell
          shape={shape}
          colours={scene.colours}
          selectedFace={scene.selection?.kind === 'face' ? scene.selection.id : null}
          targets={targets}
        />
        <FloorMarks shape={shape} dimensions={dimensions} colours={scene.colours} />
        <Seats scene={scene} hovered={hovered} targets={targets} />
        <SeatPins scene={scene} />
        <Devices scene={scene} />
        <Talkers
          talkers={scene.layout.venue.talkers}
          selectedId={scene.selection?.kind === 'talker' ? scene.selection.id : null}
          colours={scene.colours}
        />
        <AimLine aim={aims.selected} others={aims.others} colours={scene.colours} />
        <Picking scene={scene} targets={targets} moving={moving} onHover={onHover} onPick={onPick} />
        <Projector {...props} labels={labels} elements={elements} card={card} hovered={pointed} />
      </Canvas>
      <Labels labels={labels} elements={elements} onPick={onPick} />
      {pointed !== null && <HoverCard scene={scene} seatId={pointed} cardRef={card} />}
    </>
  );
}

interface RigProps extends RoomCanvasProps {
  moving: RefObject<boolean>;
  pickedHere: RefObject<Ref | null>;
  onSides: (sides: { east: boolean; north: boolean }) => void;
}

/** What an orbit keeps free on the right, pixels. */
const ORBIT_ASIDE_PX = 120;

/** Where the camera stands, from the view chosen and the thing selected. */
function Rig({ scene, view, rightPx: asidePx, software, camera, moving, pickedHere, onSides }: RigProps) {
  const size = useThree((three) => three.size);
  // Seen from a corner the model leaves the legend's corner of the drawing free by itself.
  const rightPx = view.kind === 'orbit' ? Math.min(asidePx, ORBIT_ASIDE_PX) : asidePx;
  const { shape, selection } = scene;
  const area: FreeArea = useMemo(
    () => ({ widthPx: size.width, heightPx: size.height, rightPx, bottomPx: 0 }),
    [size, rightPx],
  );
  const home = useMemo(() => orbitShot(shape, area), [shape, area]);
  const latest = useRef({ scene, area, home });
  latest.current = { scene, area, home };
  const first = useRef(true);
  useEffect(() => {
    // The first view is the one the camera starts in.
    if (first.current && view.kind === 'orbit') {
      first.current = false;
      return;
    }
    first.current = false;
    const { scene, area, home } = latest.current;
    const shot = view.kind === 'orbit' ? home : shotOfView(view, scene, area);
    if (shot !== null) camera.current?.show(shot);
  }, [view, camera]);
  useEffect(() => {
    if (selection === null || selection === pickedHere.current) return;
    const place = placeOfSelection(latest.current.scene);
    if (place !== null) camera.current?.bringIn(place);
  }, [selection, camera, pickedHere]);
  useSides(shape, onSides);
  return <CameraRig handle={camera} rightPx={rightPx} home={home} software={software} moving={moving} />;
}

/** Dimension strings stand on the sides nearest the eye; they change sides seldom enough for React. */
function useSides(shape: RoomScene['shape'], onSides: RigProps['onSides']): void {
  const kept = useRef('');
  useFrame(({ camera }) => {
    const { least, greatest } = shape;
    const east = camera.position.x > (least[0] + greatest[0]) / 2 - 1e-3;
    const north = camera.position.y > (least[1] + greatest[1]) / 2 + 1e-3;
    if (kept.current === `${east} ${north}`) return;
    kept.current = `${east} ${north}`;
    onSides({ east, north });
  });
}

interface ProjectorProps extends RoomCanvasProps {
  labels: ReturnType<typeof labelList>;
  elements: RefObject<Map<string, HTMLElement>>;
  card: RefObject<HTMLElement | null>;
  hovered: string | null;
}

function Projector({ scene, wrapper, rightPx, legendPx, labels, elements, card, hovered }: ProjectorProps) {
  const size = useThree((three) => three.size);
  const { seats, figures, selection } = scene;
  const hoveredPoints = useMemo(() => pointsOfSeat(scene, hovered), [scene, hovered]);
  const selectedId = selection?.kind === 'seat' ? selection.id : null;
  const selectedPoints = useMemo(() => pointsOfSeat(scene, selectedId), [scene, selectedId]);
  const small = useMemo(
    () => [
      ...[...scene.loudspeakers, ...scene.microphones].map(({ device }) => device.position),
      ...scene.layout.venue.talkers.map(({ position }) => position),
    ],
    [scene],
  );
  const covered = useMemo(
    () => (legendPx === 0 ? [] : [[size.width - rightPx, size.height - legendPx, rightPx, legendPx] as const]),
    [size, rightPx, legendPx],
  );
  const worst =
    figures.worst < 0 ? null : pinOf(seats[figures.worst], PIN_HEIGHT_M)[figures.short[figures.worst] ? 1 : 0];
  return (
    <LabelProjector
      labels={labels}
      elements={elements}
      wrapper={wrapper}
      card={card}
      hovered={hoveredPoints[0] ?? null}
      worst={worst}
      told={selectedPoints.length > 0 ? selectedPoints : hoveredPoints}
      small={small}
      covered={covered}
    />
  );
}

/** Where a pointer would aim at a seat: the middle of its pan, else nearer its edges. */
function pointsOfSeat({ seats, seatIndex }: RoomScene, id: string | null): Vec3[] {
  const index = id === null ? undefined : seatIndex.get(id);
  return index === undefined ? [] : seatPoints(seats[index]);
}

function useAims(scene: RoomScene, all: boolean): { selected: Aim | null; others: Aim[] } {
  const { shape, seats, selection, loudspeakers } = scene;
  return useMemo(() => {
    const of = (device: Parameters<typeof aimOf>[0]) => aimOf(device, shape.faces, shape.ids, seats);
    const pointing = ['loudspeaker', 'microphone', 'talker'].includes(selection?.kind ?? '');
    const device = pointing ? pointingOf(scene, selection?.id ?? '') : null;
    return {
      selected: device === null ? null : of(device),
      others: all
        ? loudspeakers.flatMap(({ device: other }) => {
            const aim = other === device ? null : of(other);
            return aim === null ? [] : [aim];
          })
        : [],
    };
  }, [scene, shape, seats, selection, loudspeakers, all]);
}
