import { useMemo, useState } from 'react';
import type { Ref } from '../layout/ref';
import { useSession } from '../session/session';
import HoverCard from './HoverCard';
import { PlanDevices, PlanLabels } from './PlanDevices';
import PlanRoom from './PlanRoom';
import PlanSeats from './PlanSeats';
import { planFrame } from './plan-frame';
import type { RoomScene } from './use-room-scene';
import './plan.css';

interface PlanDrawingProps {
  scene: RoomScene;
  widthPx: number;
  heightPx: number;
  /** Pixels on the right that the drawing keeps clear. */
  rightPx: number;
  aimLines: boolean;
}

/** The room in plan, for browsers that offer no 3D: plainer, but the same seats, figures and choices. */
export default function PlanDrawing({ scene, widthPx, heightPx, rightPx, aimLines }: PlanDrawingProps) {
  const { shape, selection } = scene;
  const [pointed, setPointed] = useState<string | null>(null);
  const { select, hoverSeat } = useSession.getState();
  const frame = useMemo(() => planFrame(shape, widthPx, heightPx, rightPx), [shape, widthPx, heightPx, rightPx]);
  const onHover = (id: string | null) => {
    setPointed(id);
    hoverSeat(id);
  };
  const onPick = (ref: Ref | null) => select(ref);
  const index = pointed === null ? undefined : scene.seatIndex.get(pointed);
  const place = index === undefined ? null : frame.at(scene.seats[index].floor);
  const selectedFace = selection?.kind === 'face' ? selection.id : null;
  return (
    <>
      <svg
        className="room-plan"
        width={widthPx}
        height={heightPx}
        aria-hidden="true"
        onClick={(event) => event.target === event.currentTarget && onPick(null)}
        onKeyDown={(event) => event.key === 'Escape' && onPick(null)}
      >
        <PlanRoom scene={scene} frame={frame} selectedFace={selectedFace} onPick={onPick} />
        <PlanSeats scene={scene} frame={frame} pointed={pointed} onHover={onHover} onPick={onPick} />
        <PlanDevices scene={scene} frame={frame} aimLines={aimLines} onPick={onPick} />
      </svg>
      <PlanLabels scene={scene} frame={frame} area={{ widthPx, heightPx, covered: [] }} onPick={onPick} />
      {pointed !== null && place !== null && (
        <HoverCard
          scene={scene}
          seatId={pointed}
          across={place[0] + 270 > widthPx ? 'left' : 'right'}
          upright={place[1] < heightPx / 2 ? 'below' : 'above'}
          style={{ transform: `translate(${place[0]}px, ${place[1]}px)`, visibility: 'visible' }}
        />
      )}
      <p className="room-note">Drawn in plan: this browser offers no 3D</p>
    </>
  );
}
