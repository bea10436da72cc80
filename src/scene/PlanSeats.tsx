import { memo } from 'react';
import type { Ref } from '../layout/ref';
import { cssColour } from './colour-scale';
import type { PlanFrame } from './plan-frame';
import { neutralSeat, seatColour } from './seat-figures';
import { seatOutline, wedgeOutline } from './seat-geometry';
import type { RoomScene } from './use-room-scene';

interface PlanSeatsProps {
  scene: RoomScene;
  frame: PlanFrame;
  pointed: string | null;
  onHover: (id: string | null) => void;
  onPick: (ref: Ref) => void;
}

/** Seats in plan: a square with its back where served, a wedge where short. */
export default function PlanSeats({ scene, frame, pointed, onHover, onPick }: PlanSeatsProps) {
  const { selection, seats, seatIndex } = scene;
  const picked = selection?.kind === 'seat' ? seatIndex.get(selection.id) : undefined;
  const hovered = pointed === null ? undefined : seatIndex.get(pointed);
  const marks = [
    { index: hovered, look: 'room-plan-pointed' },
    { index: picked, look: 'room-plan-picked' },
  ];
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: the table of seats is the way with keys
    <g
      onPointerOver={(event) => onHover(seatAt(event.target))}
      onPointerOut={() => onHover(null)}
      onClick={(event) => {
        const id = seatAt(event.target);
        if (id !== null) onPick({ kind: 'seat', id });
      }}
    >
      <AllSeats scene={scene} frame={frame} />
      {marks.map(
        ({ index, look }) =>
          index !== undefined && (
            <polygon
              key={look}
              className={look}
              points={frame.points(seatPoints(scene, index))}
              data-seat={seats[index].id}
            />
          ),
      )}
    </g>
  );
}

const seatAt = (target: EventTarget): string | null =>
  target instanceof SVGElement ? (target.dataset.seat ?? null) : null;

const AllSeats = memo(({ scene, frame }: { scene: RoomScene; frame: PlanFrame }) => {
  const { seats, figures, quantity, colours } = scene;
  const neutral = neutralSeat(colours);
  return seats.map((seat, index) => {
    const colour = seatColour(figures, index, quantity, colours);
    const short = figures.short[index] === 1;
    const fill = cssColour(colour ?? neutral);
    return (
      <g key={seat.id}>
        <polygon
          className={short ? 'room-plan-seat short' : 'room-plan-seat'}
          fill={fill}
          points={frame.points(seatPoints(scene, index))}
          data-seat={seat.id}
        />
        {!short && <polyline className="room-plan-back" points={frame.points(seatOutline(seat, false).slice(6, 8))} />}
      </g>
    );
  });
});

function seatPoints({ seats, figures }: RoomScene, index: number) {
  if (figures.short[index]) return wedgeOutline(seats[index]);
  const ends = seatOutline(seats[index], false);
  return [ends[0], ends[2], ends[4], ends[6]];
}
