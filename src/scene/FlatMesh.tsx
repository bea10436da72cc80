import { type Ref, useEffect, useMemo } from 'react';
import { BufferAttribute, BufferGeometry, DoubleSide, FrontSide, type Mesh } from 'three';

interface FlatMeshProps {
  /** Corners of triangles, nine numbers each. */
  positions: Float32Array;
  /** Linear light, nine numbers a triangle. */
  colours: Float32Array;
  /** Seen from both sides, or only from the front. */
  bothSides: boolean;
  meshRef?: Ref<Mesh>;
}

/** Unlit triangles with the light painted on, all in one draw, set back a little so that edges lie on top. */
export default function FlatMesh({ positions, colours, bothSides, meshRef }: FlatMeshProps) {
  const geometry = useMemo(() => {
    const made = new BufferGeometry();
    made.setAttribute('position', new BufferAttribute(positions, 3));
    made.setAttribute('color', new BufferAttribute(colours, 3));
    return made;
  }, [positions, colours]);
  useEffect(() => () => geometry.dispose(), [geometry]);
  return (
    <mesh ref={meshRef} geometry={geometry}>
      <meshBasicMaterial
        vertexColors
        side={bothSides ? DoubleSide : FrontSide}
        polygonOffset
        polygonOffsetFactor={1}
        polygonOffsetUnits={2}
      />
    </mesh>
  );
}
