import { type KeyboardEvent, useCallback, useEffect, useLayoutEffect, useRef, useState } from 'react';
import { count } from '../report/figures';
import type { CameraHandle } from './CameraRig';
import Legend from './Legend';
import PlanDrawing from './PlanDrawing';
import RoomBar from './RoomBar';
import RoomBoundary from './RoomBoundary';
import RoomCanvas from './RoomCanvas';
import { roomKey } from './room-keys';
import { type RoomScene, useRoomScene } from './use-room-scene';
import type { ViewChoice, ViewKind } from './views';
import { probeGraphics } from './webgl-probe';
import './room.css';

/** Narrower or lower than this, the legend has no room over the drawing and goes below it, pixels. */
const WIDE_PX = 800;
const HIGH_PX = 300;
/** What the legend, and what other regions lay over the drawing, take on its right, pixels. */
const ASIDE_PX = 308;
const LEGEND_PX = 128;

/** The room: ways of looking, the drawing, and its title block. */
export default function RoomView() {
  const scene = useRoomScene();
  const section = useRef<HTMLElement>(null);
  const wrapper = useRef<HTMLDivElement>(null);
  const camera = useRef<CameraHandle>(null);
  const size = useSizeOf(section);
  const [view, setView] = useState<ViewChoice>({ kind: 'orbit', id: '' });
  const [aimLines, setAimLines] = useState(false);
  const [graphics, setGraphics] = useState(graphicsAtFirst);
  const toPlan = useCallback(() => setGraphics('none'), []);
  const strip = size.width < WIDE_PX || size.height < HIGH_PX;
  const rightPx = strip ? 0 : ASIDE_PX;
  const drawing = useSizeOf(wrapper);
  const flat = graphics === 'none';
  const showView = (kind: ViewKind) => {
    const { selection } = scene;
    if (kind === 'seat' && selection?.kind !== 'seat') return;
    if (kind === 'aim' && !['loudspeaker', 'microphone', 'talker'].includes(selection?.kind ?? '')) return;
    setView({ kind, id: kind === 'seat' || kind === 'aim' ? (selection?.id ?? '') : '' });
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.target !== wrapper.current || camera.current === null) return;
    if (roomKey(event, camera.current, showView)) event.preventDefault();
  };
  const plan = (
    <PlanDrawing
      scene={scene}
      widthPx={drawing.width}
      heightPx={drawing.height}
      rightPx={rightPx}
      aimLines={aimLines}
    />
  );
  return (
    <section className="room" aria-label="Room" ref={section}>
      <RoomBar scene={scene} view={view} onView={setView} aimLines={aimLines} onAimLines={setAimLines} flat={flat} />
      <div
        className="room-drawing"
        ref={wrapper}
        role="application"
        // biome-ignore lint/a11y/noNoninteractiveTabindex: the drawing is turned with the arrow keys
        tabIndex={0}
        aria-label={summaryOf(scene, flat)}
        onKeyDown={onKeyDown}
        data-renderer={flat ? 'drawing' : 'webgl'}
        data-selected={scene.selection === null ? '' : `${scene.selection.kind}:${scene.selection.id}`}
        data-seats-short={scene.predicted === null ? '' : scene.figures.shortCount}
      >
        {flat ? (
          plan
        ) : (
          <RoomBoundary fallback={plan} onFailure={toPlan}>
            <RoomCanvas
              scene={scene}
              view={view}
              aimLines={aimLines}
              software={graphics === 'software'}
              rightPx={rightPx}
              legendPx={strip ? 0 : LEGEND_PX}
              wrapper={wrapper}
              camera={camera}
              onLost={toPlan}
            />
          </RoomBoundary>
        )}
      </div>
      <Legend scene={scene} strip={strip} />
    </section>
  );
}

/** The address may ask for the plan, so that it can be seen where 3D would do. */
function graphicsAtFirst(): ReturnType<typeof probeGraphics> {
  return new URLSearchParams(location.search).get('view') === 'plan-drawing' ? 'none' : probeGraphics();
}

function summaryOf({ layout, figures, predicted }: RoomScene, flat: boolean): string {
  const { judgedCount, shortCount } = figures;
  const served =
    predicted === null
      ? `${count(figures.short.length, 'seat')}, not predicted yet`
      : `${judgedCount - shortCount} of ${count(judgedCount, 'seat')} served`;
  const keys = 'Arrows turn, Shift and arrows move, plus and minus zoom, Home shows all, 1 to 6 choose a view.';
  return `${layout.name || 'The room'}${flat ? ' in plan' : ''}, ${served}.${flat ? '' : ` ${keys}`}`;
}

function useSizeOf(element: { current: HTMLElement | null }): { width: number; height: number } {
  const [size, setSize] = useState({ width: 0, height: 0 });
  useLayoutEffect(() => {
    if (element.current !== null) setSize({ width: element.current.clientWidth, height: element.current.clientHeight });
  }, [element]);
  useEffect(() => {
    const watched = element.current;
    if (watched === null) return;
    const observer = new ResizeObserver(() => setSize({ width: watched.clientWidth, height: watched.clientHeight }));
    observer.observe(watched);
    return () => observer.disconnect();
  }, [element]);
  return size;
}
