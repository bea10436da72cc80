import { useFrame } from '@react-three/fiber';
import { useMemo, useRef } from 'react';
import type { Group } from 'three';
import { type DimensionString, floorRegister, seenLevel } from './floor-marks';
import type { RoomShape } from './room-shape';
import ThinLines from './ThinLines';
import type { ThemeColours } from './theme-colours';

interface FloorMarksProps {
  shape: RoomShape;
  dimensions: readonly DimensionString[];
  colours: ThemeColours;
}

/** The metre register on the floors and the dimension strings beside the room. */
export default function FloorMarks({ shape, dimensions, colours }: FloorMarksProps) {
  const register = useMemo(() => floorRegister(shape), [shape]);
  const strings = useMemo(() => dimensions.flatMap(({ from, to }) => [from, to]), [dimensions]);
  const ticks = useMemo(() => dimensions.flatMap((dimension) => dimension.ticks), [dimensions]);
  const group = useRef<Group>(null);
  useFrame(({ camera }) => {
    if (group.current !== null) group.current.visible = !seenLevel(camera);
  });
  return (
    <>
      <ThinLines points={register} colour={colours.css.hair} />
      <group ref={group}>
        <ThinLines points={strings} colour={colours.css['ink-3']} />
        <ThinLines points={ticks} colour={colours.css['ink-2']} />
      </group>
    </>
  );
}
