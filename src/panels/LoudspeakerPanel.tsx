import { Action } from '../controls/Action';
import { QuantityField } from '../controls/QuantityField';
import { editLoudspeaker, setDelays } from '../layout/edits';
import type { Loudspeaker } from '../layout/schema';
import { talkerLabel } from '../layout/talker-label';
import { figure } from '../report/figures';
import { loudspeakerFigures, proposedDelays } from '../report/loudspeaker-figures';
import { lengthFigure, lengthUnit } from '../report/units';
import { useLayout, useScheme, useSchemePrediction, useSession } from '../session/session';
import { bind, type DeviceRef, editOnce } from './binding';
import { ModelRows } from './DeviceRows';
import { Directivity } from './Directivity';
import { loopShare } from './device-figures';
import { OtherProblems, Row, Said } from './Fields';
import { ItemHead, NameRow } from './ItemHead';
import { AimRow, PlaceRow, TurnRow, useAim } from './PlaceRows';
import { GAIN_DB, SendsTable } from './SendsTable';

/** Range of a delay in the layout, ms. */
export const DELAY_MS = { min: 0, max: 10000 } as const;

export function LoudspeakerPanel({ loudspeaker }: { loudspeaker: Loudspeaker }) {
  const { id } = loudspeaker;
  const scheme = useScheme();
  const item: DeviceRef = { kind: 'loudspeaker', id };
  const signal = (key: 'gain' | 'delay', label: string) =>
    bind<number | null>(label, `loudspeaker.${id}.${key}`, (layout, value) =>
      editLoudspeaker(layout, scheme.id, id, (draft) => {
        if (value !== null) draft[key] = value;
      }),
    );
  return (
    <>
      <ItemHead title={id} label={loudspeaker.label} what="Loudspeaker" />
      <OtherProblems shown={['id', 'label', 'model', 'host', 'position', 'pan', 'tilt', 'roll', 'gain', 'delay']} />
      <div className="item-fields">
        <NameRow
          item={item}
          label={loudspeaker.label}
          taken={scheme.loudspeakers}
          setLabel={(layout, label) =>
            editLoudspeaker(layout, scheme.id, id, (draft) => {
              draft.label = label;
            })
          }
        />
        <ModelRows item={item} device={loudspeaker} />
        <PlaceRow device={loudspeaker} item={item} />
        <TurnRow device={loudspeaker} item={item} />
        <AimRow device={loudspeaker} item={item} />
        <Row what="Signal" at={['gain', 'delay']} columns={2}>
          <QuantityField
            label="Gain"
            name="gain"
            value={loudspeaker.gain}
            unit="dB"
            {...GAIN_DB}
            {...signal('gain', `Gain of ${id}`)}
          />
          <QuantityField
            label="Delay"
            name="delay"
            value={loudspeaker.delay}
            unit="ms"
            {...DELAY_MS}
            {...signal('delay', `Delay ${id}`)}
          />
        </Row>
      </div>
      <Figures loudspeaker={loudspeaker} />
      <SendsTable kind="loudspeaker" id={id} />
      <Directivity model={loudspeaker.model} />
    </>
  );
}

function Figures({ loudspeaker }: { loudspeaker: Loudspeaker }) {
  const { id } = loudspeaker;
  const layout = useLayout();
  const scheme = useScheme();
  const { units, talkerId } = useSession();
  const prediction = useSchemePrediction();
  const met = useAim(loudspeaker);
  const { delay, level } =
    prediction === null ? { delay: null, level: null } : loudspeakerFigures(prediction, talkerId, id);
  const share = prediction === null ? null : loopShare(prediction, talkerId, 'loudspeaker', id);
  const use = (proposedMs: number) =>
    editOnce(`Delay ${id} by ${figure(proposedMs)} ms`, (before) =>
      editLoudspeaker(before, scheme.id, id, (draft) => {
        draft.delay = Math.min(DELAY_MS.max, Math.ceil(10 * proposedMs) / 10);
      }),
    );
  const adoptAll = () => {
    if (prediction === null) return;
    const delays = proposedDelays(prediction, talkerId);
    editOnce('Use all proposed delays', (before) => setDelays(before, scheme.id, delays));
  };
  return (
    <dl className="said">
      {met !== null && (
        <Said what={`Aim meets ${met.faceId} at`} unit={lengthUnit(units)}>
          {lengthFigure(met.distanceM, units)}
        </Said>
      )}
      {delay !== null && (
        <Said
          what={
            <>
              Delay that keeps {talkerLabel(layout, delay.talkerId)} first by {figure(scheme.system.delayHold, 0)} ms{' '}
              <Action look="use" label="Use this delay" onPress={() => use(delay.proposedMs)}>
                Use
              </Action>{' '}
              <Action look="use" label="Use the proposed delay of every loudspeaker" onPress={adoptAll}>
                Use all
              </Action>
            </>
          }
          unit="ms"
        >
          {figure(delay.proposedMs)}
        </Said>
      )}
      {level !== null && (
        <>
          <Said what={`Level at 1 m, ${talkerLabel(layout, level.talkerId)} talking`} unit="dB">
            {figure(level.levelDb)}
          </Said>
          <Said what="Headroom, after 12 dB for crests" unit="dB">
            {figure(level.headroomDb)}
          </Said>
          <Said what="Power asked" unit="W">
            {figure(level.powerW, level.powerW !== null && level.powerW < 0.1 ? 4 : 2)}
          </Said>
        </>
      )}
      {share !== null && (
        <Said what={`Share of the loop, most from ${share.through}`} unit="%">
          {figure(100 * share.share, 0)}
        </Said>
      )}
    </dl>
  );
}
