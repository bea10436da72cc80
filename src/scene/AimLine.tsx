import { Line } from '@react-three/drei';
import type { Aim } from './aim';
import type { ThemeColours } from './theme-colours';

interface AimLineProps {
  /** Of the device selected, null for none. */
  aim: Aim | null;
  /** Of the other loudspeakers, where they are asked for. */
  others: readonly Aim[];
  colours: ThemeColours;
}

/** Where devices aim: the selected one in the accent, the others faintly and all in one draw. */
export default function AimLine({ aim, others, colours }: AimLineProps) {
  return (
    <>
      {others.length > 0 && (
        <Line
          points={others.flatMap(({ from, to }) => [from, to])}
          segments
          color={colours.css['hair-2']}
          lineWidth={1}
          transparent
          opacity={0.75}
        />
      )}
      {aim !== null && (
        <Line
          points={[aim.from, aim.to]}
          color={colours.css.accent}
          lineWidth={1.6}
          depthTest={false}
          renderOrder={3}
        />
      )}
    </>
  );
}
