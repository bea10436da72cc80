import { VOCAL_EFFORT_DBA } from '../acoustics/speech/spectra';
import { Choice } from '../controls/Choice';
import { QuantityField } from '../controls/QuantityField';
import { editTalker } from '../layout/edits';
import type { Talker } from '../layout/schema';
import { figure } from '../report/figures';
import { lengthFigure, lengthUnit } from '../report/units';
import { useLayout, useScheme, useSession } from '../session/session';
import { bind, type DeviceRef, editOnce } from './binding';
import { ModelField } from './DeviceRows';
import { Directivity } from './Directivity';
import { OtherProblems, Row, Said } from './Fields';
import { ItemHead, NameRow } from './ItemHead';
import { AimRow, PlaceRow, TurnRow, useAim } from './PlaceRows';

const EFFORTS: readonly { id: Talker['effort']; label: string }[] = [
  { id: 'relaxed', label: 'Relaxed' },
  { id: 'normal', label: 'Normal' },
  { id: 'raised', label: 'Raised' },
  { id: 'loud', label: 'Loud' },
  { id: 'very-loud', label: 'Very loud' },
];

export function TalkerPanel({ talker }: { talker: Talker }) {
  const layout = useLayout();
  const units = useSession((session) => session.units);
  const scheme = useScheme();
  const item: DeviceRef = { kind: 'talker', id: talker.id };
  const own = talker.level ?? null;
  const met = useAim(talker);
  const nearest = nearestMicrophone(scheme.microphones, talker.position);
  return (
    <>
      <ItemHead title={talker.id} label={talker.label} what="Talker" />
      <OtherProblems shown={['id', 'label', 'position', 'model', 'pan', 'tilt', 'effort', 'level']} />
      <div className="item-fields">
        <NameRow
          item={item}
          label={talker.label}
          taken={layout.venue.talkers}
          setLabel={(before, label) =>
            editTalker(before, talker.id, (draft) => {
              draft.label = label;
            })
          }
        />
        <Row what="Model" at={['model']}>
          <ModelField item={item} model={talker.model} wide />
        </Row>
        <PlaceRow device={talker} item={item} />
        <TurnRow device={talker} item={item} />
        <AimRow device={talker} item={item} />
        <Row what="Voice" at={['effort', 'level']} columns={2}>
          <Choice
            label="Effort"
            name="effort"
            value={talker.effort}
            options={EFFORTS.map((effort) => ({ ...effort, detail: `${VOCAL_EFFORT_DBA[effort.id]} dBA` }))}
            onChange={(id) =>
              editOnce(
                `${talker.id} talks ${EFFORTS.find((effort) => effort.id === id)?.label.toLowerCase()}`,
                (before) =>
                  editTalker(before, talker.id, (draft) => {
                    draft.effort = id as Talker['effort'];
                  }),
              )
            }
          />
          <QuantityField
            label="Own level at 1 m, instead of the effort's"
            name="own"
            value={own}
            unit="dBA"
            min={0}
            max={150}
            nullable
            none={figure(VOCAL_EFFORT_DBA[talker.effort], 0)}
            start={VOCAL_EFFORT_DBA[talker.effort]}
            {...bind<number | null>(`Level of ${talker.id}`, `talker.${talker.id}.level`, (before, level) =>
              editTalker(before, talker.id, (draft) => {
                if (level === null) delete draft.level;
                else draft.level = level;
              }),
            )}
          />
        </Row>
      </div>
      <dl className="said">
        <Said what="Level at 1 m" unit="dBA">
          {figure(own ?? VOCAL_EFFORT_DBA[talker.effort])}
        </Said>
        {met !== null && (
          <Said what={`Aim meets ${met.faceId} at`} unit={lengthUnit(units)}>
            {lengthFigure(met.distanceM, units)}
          </Said>
        )}
        {nearest !== null && (
          <Said what={`Nearest microphone, ${nearest.id}`} unit={lengthUnit(units)}>
            {lengthFigure(nearest.distanceM, units)}
          </Said>
        )}
      </dl>
      <Directivity model={talker.model} />
    </>
  );
}

function nearestMicrophone(
  microphones: readonly { id: string; position: readonly number[] }[],
  from: readonly number[],
) {
  let nearest: { id: string; distanceM: number } | null = null;
  for (const { id, position } of microphones) {
    const distanceM = Math.hypot(...[0, 1, 2].map((axis) => position[axis] - from[axis]));
    if (nearest === null || distanceM < nearest.distanceM) nearest = { id, distanceM };
  }
  return nearest;
}
