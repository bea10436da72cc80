import { useEffect, useMemo } from 'react';
import { BufferAttribute, BufferGeometry } from 'three';
import type { Vec3 } from '../layout/schema';

interface ThinLinesProps {
  /** Ends of the lines, in pairs. */
  points: readonly Vec3[];
  colour: string;
  opacity?: number;
  /** Lengths of dash and gap, metres. */
  dash?: readonly [number, number];
}

/** Lines one pixel wide, all in one draw. They are never picked. */
export default function ThinLines({ points, colour, opacity = 1, dash }: ThinLinesProps) {
  const geometry = useMemo(() => lineGeometry(points, dash !== undefined), [points, dash]);
  useEffect(() => () => geometry.dispose(), [geometry]);
  return (
    <lineSegments geometry={geometry}>
      {dash === undefined ? (
        <lineBasicMaterial color={colour} transparent={opacity < 1} opacity={opacity} />
      ) : (
        <lineDashedMaterial
          color={colour}
          transparent={opacity < 1}
          opacity={opacity}
          dashSize={dash[0]}
          gapSize={dash[1]}
        />
      )}
    </lineSegments>
  );
}

function lineGeometry(points: readonly Vec3[], dashed: boolean): BufferGeometry {
  const geometry = new BufferGeometry();
  geometry.setAttribute('position', new BufferAttribute(new Float32Array(points.flat()), 3));
  if (!dashed) return geometry;
  const distances = new Float32Array(points.length);
  for (let i = 1; i < points.length; i += 2) {
    const [a, b] = [points[i - 1], points[i]];
    distances[i] = Math.hypot(b[0] - a[0], b[1] - a[1], b[2] - a[2]);
  }
  geometry.setAttribute('lineDistance', new BufferAttribute(distances, 1));
  return geometry;
}
