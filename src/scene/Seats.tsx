import { Line } from '@react-three/drei';
import { useThree } from '@react-three/fiber';
import { useEffect, useLayoutEffect, useMemo } from 'react';
import { BufferAttribute, BufferGeometry, DoubleSide } from 'three';
import type { PickTargets } from './Picking';
import { neutralSeat, seatColour } from './seat-figures';
import {
  createSeatGeometry,
  type SeatGeometry,
  seatOutline,
  servedEdge,
  TRIANGLES_A_SEAT,
  wedgeOutline,
  writeSeat,
} from './seat-geometry';
import type { RoomScene } from './use-room-scene';

/** Above so many seats their edges cost more than they show. */
const MOST_EDGED = 2500;
/** Up to so many wedges are edged with a heavy line. */
const MOST_HEAVY = 400;

interface SeatsProps {
  scene: RoomScene;
  hovered: string | null;
  targets: PickTargets;
}

/** All seats in one mesh, coloured by the quantity shown; recolouring rewrites it in place. */
export default function Seats({ scene, hovered, targets }: SeatsProps) {
  const { seats, figures, quantity, colours } = scene;
  const invalidate = useThree((three) => three.invalidate);
  const count = seats.length;
  const made = useMemo(() => {
    const arrays = createSeatGeometry(count);
    return { arrays, mesh: meshGeometry(arrays), edges: edgeGeometry(arrays) };
  }, [count]);
  useEffect(
    () => () => {
      made.mesh.dispose();
      made.edges.dispose();
    },
    [made],
  );
  useLayoutEffect(() => {
    const neutral = neutralSeat(colours);
    seats.forEach((seat, index) => {
      const colour = seatColour(figures, index, quantity, colours);
      const short = figures.short[index] === 1;
      const fill = colour ?? neutral;
      const edge = short
        ? colours.linear.mark
        : colour === null
          ? colours.linear['hair-2']
          : servedEdge(fill, colours.linear.ink);
      writeSeat(made.arrays, index, seat, { short, fill, edge });
    });
    for (const geometry of [made.mesh, made.edges]) {
      geometry.attributes.position.needsUpdate = true;
      geometry.attributes.color.needsUpdate = true;
      geometry.computeBoundingSphere();
    }
    invalidate();
  }, [made, seats, figures, quantity, colours, invalidate]);
  return (
    <>
      <mesh
        geometry={made.mesh}
        ref={(mesh) => {
          targets.seats = mesh === null ? null : { mesh, ownerOf: (face) => Math.floor(face / TRIANGLES_A_SEAT) };
        }}
      >
        <meshBasicMaterial
          vertexColors
          side={DoubleSide}
          polygonOffset
          polygonOffsetFactor={1}
          polygonOffsetUnits={1}
        />
      </mesh>
      {count <= MOST_EDGED && (
        <lineSegments geometry={made.edges}>
          <lineBasicMaterial vertexColors />
        </lineSegments>
      )}
      <WedgeEdges scene={scene} />
      <Outline scene={scene} id={seats[figures.worst]?.id ?? null} width={1.8} colour={colours.css.mark} />
      <Outline scene={scene} id={hovered} width={2} colour={colours.css.ink} />
      <Outline
        scene={scene}
        id={scene.selection?.kind === 'seat' ? scene.selection.id : null}
        width={2.6}
        colour={colours.css.accent}
      />
    </>
  );
}

function WedgeEdges({ scene: { seats, figures, colours } }: { scene: RoomScene }) {
  const points = useMemo(
    () =>
      seats.flatMap((seat, index) => {
        if (!figures.short[index]) return [];
        const [a, b, c] = wedgeOutline(seat);
        return [a, b, b, c, c, a];
      }),
    [seats, figures],
  );
  if (points.length === 0 || points.length > 6 * MOST_HEAVY) return null;
  return <Line points={points} segments color={colours.css.mark} lineWidth={1.6} />;
}

interface OutlineProps {
  scene: RoomScene;
  id: string | null;
  width: number;
  colour: string;
}

function Outline({ scene: { seats, seatIndex, figures }, id, width, colour }: OutlineProps) {
  const index = id === null ? undefined : seatIndex.get(id);
  if (index === undefined) return null;
  return (
    <Line
      points={seatOutline(seats[index], figures.short[index] === 1)}
      segments
      color={colour}
      lineWidth={width}
      depthTest={false}
      renderOrder={4}
    />
  );
}

function meshGeometry(arrays: SeatGeometry): BufferGeometry {
  const geometry = new BufferGeometry();
  geometry.setAttribute('position', new BufferAttribute(arrays.positions, 3));
  geometry.setAttribute('color', new BufferAttribute(arrays.colours, 3));
  geometry.setIndex(new BufferAttribute(arrays.indices, 1));
  return geometry;
}

function edgeGeometry(arrays: SeatGeometry): BufferGeometry {
  const geometry = new BufferGeometry();
  geometry.setAttribute('position', new BufferAttribute(arrays.edges, 3));
  geometry.setAttribute('color', new BufferAttribute(arrays.edgeColours, 3));
  return geometry;
}
