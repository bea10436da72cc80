import { aimDirection } from '../layout/aim';
import type { Ref } from '../layout/ref';
import { sameRef } from '../layout/ref';
import type { Vec3 } from '../layout/schema';
import { aimOf, type Pointing } from './aim';
import { loudspeakerShape } from './device-shapes';
import { crowdedTags, type LabelSpec, labelList } from './label-list';
import { type LabelArea, placeLabels } from './place-labels';
import type { PlanFrame } from './plan-frame';
import type { RoomScene } from './use-room-scene';

interface PlanDevicesProps {
  scene: RoomScene;
  frame: PlanFrame;
  aimLines: boolean;
  onPick: (ref: Ref) => void;
}

/** Loudspeakers, microphones and talkers in plan, each with a line the way it points. */
export function PlanDevices({ scene, frame, aimLines, onPick }: PlanDevicesProps) {
  const { loudspeakers, microphones, layout, selection, shape, seats } = scene;
  const on = (kind: Ref['kind'], id: string) => (sameRef(selection, { kind, id }) ? ' room-plan-on' : '');
  const press = (kind: Ref['kind'], id: string) => () => onPick({ kind, id });
  return (
    <>
      {loudspeakers.map(({ device, pattern }) => {
        const [x, y] = frame.at(device.position);
        const aim = aimLines || on('loudspeaker', device.id) ? aimOf(device, shape.faces, shape.ids, seats) : null;
        const look = `room-plan-can${on('loudspeaker', device.id)}`;
        return (
          // biome-ignore lint/a11y/noStaticElementInteractions: its bubble is a button
          <g key={device.id} className={look} onClick={press('loudspeaker', device.id)}>
            {aim !== null && <path className="room-plan-aim" d={lineOf(frame, aim.from, aim.to)} />}
            {pattern?.type === 'flush-piston' ? (
              <>
                <circle cx={x} cy={y} r={Math.max(4, frame.pixelsPerM * (pattern.diameter / 2 + 0.04))} />
                <path d={`M${x - 4} ${y}h8M${x} ${y - 4}v8`} />
              </>
            ) : (
              <>
                {loudspeakerShape(device, pattern).surfaces.map(({ outline }, i) => (
                  // biome-ignore lint/suspicious/noArrayIndexKey: surfaces of one device keep their order
                  <polygon key={i} points={frame.points(outline)} />
                ))}
                <path d={lineOf(frame, device.position, ahead(device, 0.5))} />
              </>
            )}
            <circle className="room-plan-grip" cx={x} cy={y} r={9} />
          </g>
        );
      })}
      {microphones.map(({ device }) => {
        const [x, y] = frame.at(device.position);
        return (
          // biome-ignore lint/a11y/noStaticElementInteractions: its tag is a button
          <g
            key={device.id}
            className={`room-plan-microphone${on('microphone', device.id)}`}
            onClick={press('microphone', device.id)}
          >
            <path d={lineOf(frame, device.position, ahead(device, 0.24))} />
            <circle cx={x} cy={y} r={2.4} />
            <circle className="room-plan-grip" cx={x} cy={y} r={7} />
          </g>
        );
      })}
      {layout.venue.talkers.map((talker) => {
        const [x, y] = frame.at(talker.position);
        return (
          // biome-ignore lint/a11y/noStaticElementInteractions: its name is a button
          <g
            key={talker.id}
            className={`room-plan-talker${on('talker', talker.id)}`}
            onClick={press('talker', talker.id)}
          >
            <path d={lineOf(frame, talker.position, ahead(talker, 0.42))} />
            <circle cx={x} cy={y} r={Math.max(4, 0.13 * frame.pixelsPerM)} />
          </g>
        );
      })}
    </>
  );
}

function ahead(device: Pointing, distanceM: number): Vec3 {
  const forward = aimDirection(device);
  return device.position.map((value, axis) => value + distanceM * forward[axis]) as Vec3;
}

function lineOf(frame: PlanFrame, from: Vec3, to: Vec3): string {
  const [a, b] = [frame.at(from), frame.at(to)];
  return `M${a[0].toFixed(1)} ${a[1].toFixed(1)}L${b[0].toFixed(1)} ${b[1].toFixed(1)}`;
}

interface PlanLabelsProps {
  scene: RoomScene;
  frame: PlanFrame;
  area: LabelArea;
  onPick: (ref: Ref) => void;
}

/** The lettering over the plan, placed by the width its letters take. */
export function PlanLabels({ scene, frame, area, onPick }: PlanLabelsProps) {
  const labels = labelList(scene, null, []);
  const points = labels.map((label) => frame.at(label.at));
  const crowded = crowdedTags(labels, points);
  const boxes = labels.map((label, i) => {
    const [xPx, yPx] = points[i];
    const [widthPx, heightPx] = [label.look === 'bubble' ? bubbleWidth(label.text) : 6.4 * label.text.length, 18];
    const [left, right] = [-widthPx - 9, 9];
    return {
      xPx,
      yPx,
      widthPx,
      heightPx,
      needed: label.on || label.look === 'worst',
      places: crowded.has(i)
        ? []
        : ([
            [right, -heightPx - 3],
            [left, -heightPx - 3],
            [right, 3],
            [left, 3],
            [-widthPx / 2, -heightPx - 12],
            [-widthPx / 2, 12],
          ] satisfies [number, number][]),
    };
  });
  const places = placeLabels(boxes, area);
  return (
    <div className="room-labels">
      {labels.map((label, i) => (
        <PlanLabel key={label.key} label={label} place={places[i]} onPick={onPick} />
      ))}
    </div>
  );
}

const bubbleWidth = (text: string): number => Math.max(20, 10 + 6 * text.length);

interface PlanLabelProps {
  label: LabelSpec;
  place: readonly [number, number] | null;
  onPick: (ref: Ref) => void;
}

function PlanLabel({ label: { look, text, name, ref, on }, place, onPick }: PlanLabelProps) {
  if (place === null || ref === null) return null;
  return (
    <button
      type="button"
      className={`room-label room-label-${look}`}
      data-on={on || undefined}
      data-ref={`${ref.kind}:${ref.id}`}
      aria-label={name}
      aria-pressed={on}
      title={name}
      style={{ transform: `translate(${Math.round(place[0])}px, ${Math.round(place[1])}px)`, visibility: 'visible' }}
      onClick={() => onPick(ref)}
    >
      {text}
    </button>
  );
}
