import { useMemo } from 'react';
import { type DimensionString, floorRegister } from './floor-marks';
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
  return (
    <>
      <ThinLines points={register} colour={colours.css.hair} />
      <ThinLines points={strings} colour={colours.css['ink-3']} />
      <ThinLines points={ticks} colour={colours.css['ink-2']} />
    </>
  );
}
