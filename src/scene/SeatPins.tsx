import { useFrame } from '@react-three/fiber';
import { useEffect, useMemo, useRef } from 'react';
import { BufferAttribute, BufferGeometry, CanvasTexture, type Group, type PointsMaterial, Vector3 } from 'three';
import type { Vec3 } from '../layout/schema';
import { type SeatFigures, seatColour } from './seat-figures';
import { pinOf } from './seat-geometry';
import ThinLines from './ThinLines';
import type { RoomScene } from './use-room-scene';

/** With more short seats than this only the worst carries a pin: a forest hides what it should show. */
const MANY = 24;

/** From straight above nothing hides a seat, and its pin would only cover it. */
const STEEP = 0.97;

/** How high above its floor the head of a short seat's pin stands, metres. */
export const PIN_HEIGHT_M = 1.95;

/** Whether a seat carries a pin: it falls short, and few do or it is the worst. */
export const isPinned = ({ short, shortCount, worst }: SeatFigures, index: number): boolean =>
  short[index] === 1 && (shortCount <= MANY || index === worst);

/** A pin on each seat that falls short, so that nothing can hide it. */
export default function SeatPins({ scene }: { scene: RoomScene }) {
  const { seats, figures, quantity, colours } = scene;
  const pins = useMemo(() => {
    const short = seats.flatMap((seat, index) => (isPinned(figures, index) ? [{ seat, index }] : []));
    const lines = short.map(({ seat }) => pinOf(seat, PIN_HEIGHT_M) as [Vec3, Vec3]);
    const fills = short.flatMap(
      ({ index }) => seatColour(figures, index, quantity, colours) ?? colours.linear['card-floor'],
    );
    return { lines: lines.flat(), heads: lines.map(([, head]) => head), fills: new Float32Array(fills) };
  }, [seats, figures, quantity, colours]);
  const geometry = useMemo(() => {
    const made = new BufferGeometry();
    made.setAttribute('position', new BufferAttribute(new Float32Array(pins.heads.flat()), 3));
    made.setAttribute('color', new BufferAttribute(pins.fills, 3));
    return made;
  }, [pins]);
  useEffect(() => () => geometry.dispose(), [geometry]);
  const group = useRef<Group>(null);
  useFrame(({ camera }) => {
    camera.getWorldDirection(looking);
    if (group.current !== null) group.current.visible = looking.z > -STEEP;
  });
  if (pins.heads.length === 0) return null;
  return (
    <group ref={group}>
      <ThinLines points={pins.lines} colour={colours.css.ink} />
      <Wedges geometry={geometry} sizePx={HEAD_PX + 4} colour={colours.css.mark} order={5} />
      <Wedges geometry={geometry} sizePx={HEAD_PX} colour={null} order={6} />
    </group>
  );
}

/** Size of a pin's head on the screen, pixels. */
const HEAD_PX = 16;

const looking = new Vector3();

interface WedgesProps {
  geometry: BufferGeometry;
  sizePx: number;
  /** Null for the colour of each seat. */
  colour: string | null;
  order: number;
}

function Wedges({ geometry, sizePx, colour, order }: WedgesProps) {
  const material = useRef<PointsMaterial>(null);
  const texture = useMemo(wedgeTexture, []);
  useEffect(() => () => texture.dispose(), [texture]);
  // Points are sized in pixels of the canvas, which has fewer of them while the view moves.
  useFrame(({ gl }) => {
    if (material.current !== null) material.current.size = sizePx * gl.getPixelRatio();
  });
  return (
    <points geometry={geometry} renderOrder={order}>
      <pointsMaterial
        ref={material}
        key={colour === null ? 'own' : 'one'}
        map={texture}
        vertexColors={colour === null}
        color={colour ?? '#ffffff'}
        sizeAttenuation={false}
        alphaTest={0.5}
        depthTest={false}
        transparent
      />
    </points>
  );
}

/** A wedge pointing down about the middle of the picture. */
function wedgeTexture(): CanvasTexture {
  const canvas = document.createElement('canvas');
  canvas.width = 64;
  canvas.height = 64;
  const context = canvas.getContext('2d');
  if (context !== null) {
    context.fillStyle = '#ffffff';
    context.beginPath();
    context.moveTo(4, 14);
    context.lineTo(60, 14);
    context.lineTo(32, 62);
    context.fill();
  }
  return new CanvasTexture(canvas);
}
