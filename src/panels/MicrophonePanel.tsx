import { Toggle } from '../controls/Toggle';
import { editMicrophone } from '../layout/edits';
import type { Microphone } from '../layout/schema';
import { talkerLabel } from '../layout/talker-label';
import { figure } from '../report/figures';
import { lengthFigure, lengthUnit } from '../report/units';
import { useLayout, useScheme, useSchemePrediction, useSession } from '../session/session';
import { type DeviceRef, editOnce } from './binding';
import { ModelRows } from './DeviceRows';
import { Directivity } from './Directivity';
import { loopShare, nearestTalker } from './device-figures';
import { OtherProblems, Row, Said } from './Fields';
import { ItemHead, NameRow } from './ItemHead';
import { AimRow, PlaceRow, TurnRow, useAim } from './PlaceRows';
import { SendsTable } from './SendsTable';

export function MicrophonePanel({ microphone }: { microphone: Microphone }) {
  const { id } = microphone;
  const scheme = useScheme();
  const item: DeviceRef = { kind: 'microphone', id };
  const toggle = (key: 'open' | 'automix', words: string, value: boolean) =>
    editOnce(words, (layout) =>
      editMicrophone(layout, scheme.id, id, (draft) => {
        draft[key] = value;
      }),
    );
  return (
    <>
      <ItemHead title={id} label={microphone.label} what="Microphone" />
      <OtherProblems shown={['id', 'label', 'model', 'host', 'position', 'pan', 'tilt', 'roll']} />
      <div className="item-fields">
        <NameRow
          item={item}
          label={microphone.label}
          taken={scheme.microphones}
          setLabel={(layout, label) =>
            editMicrophone(layout, scheme.id, id, (draft) => {
              draft.label = label;
            })
          }
        />
        <ModelRows item={item} device={microphone} />
        <PlaceRow device={microphone} item={item} />
        <TurnRow device={microphone} item={item} />
        <AimRow device={microphone} item={item} />
        <Row what="Signal" columns={2}>
          <Toggle value={microphone.open} onChange={(on) => toggle('open', `${on ? 'Open' : 'Close'} ${id}`, on)}>
            Open
          </Toggle>
          <Toggle
            value={microphone.automix}
            onChange={(on) => toggle('automix', `${on ? 'Share' : 'Do not share'} gain with ${id}`, on)}
          >
            Shares gain
          </Toggle>
        </Row>
      </div>
      <Figures microphone={microphone} />
      <SendsTable kind="microphone" id={id} />
      <Directivity model={microphone.model} />
    </>
  );
}

function Figures({ microphone }: { microphone: Microphone }) {
  const layout = useLayout();
  const { units, talkerId } = useSession();
  const prediction = useSchemePrediction();
  const met = useAim(microphone);
  const nearest = nearestTalker(layout.venue.talkers, microphone.position);
  const share = prediction === null ? null : loopShare(prediction, talkerId, 'microphone', microphone.id);
  return (
    <dl className="said">
      {met !== null && (
        <Said what={`Aim meets ${met.faceId} at`} unit={lengthUnit(units)}>
          {lengthFigure(met.distanceM, units)}
        </Said>
      )}
      {nearest !== null && (
        <Said what={`Nearest talker, ${nearest.talker.label || nearest.talker.id}`} unit={lengthUnit(units)}>
          {lengthFigure(nearest.distanceM, units)}
        </Said>
      )}
      {share !== null && (
        <Said what={`Share of the loop, ${talkerLabel(layout, share.talkerId)} talking`} unit="%">
          {figure(100 * share.share, 0)}
        </Said>
      )}
    </dl>
  );
}
