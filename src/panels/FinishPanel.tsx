import { Action } from '../controls/Action';
import { FindChoice } from '../controls/FindChoice';
import { TextField } from '../controls/TextField';
import { CATALOGUE_FINISHES } from '../layout/catalogue';
import { facesOf } from '../layout/geometry';
import type { Finish } from '../layout/schema';
import { figure } from '../report/figures';
import { useLayout, useSession } from '../session/session';
import { bind, editOnce } from './binding';
import { OctaveFields, OtherProblems, Row, Said } from './Fields';
import { editFinish } from './finish-edits';
import { ItemHead, NameRow } from './ItemHead';

export function FinishPanel({ finish }: { finish: Finish }) {
  const { venue } = useLayout();
  const select = useSession((session) => session.select);
  const covered = venue.faces.filter((face) => face.finish === finish.id);
  const faces = facesOf({ faces: covered, finishes: venue.finishes });
  const areaM2 = faces.areas.reduce((sum, area, face) => sum + area * (faces.twoSided[face] ? 2 : 1), 0);
  const takeOver = (id: string) => {
    const taken = CATALOGUE_FINISHES.find((candidate) => candidate.id === id);
    if (taken === undefined) return;
    editOnce(`Make ${finish.id} ${taken.label}`, (layout) =>
      editFinish(layout, finish.id, (draft) => {
        draft.label = taken.label;
        draft.source = taken.source;
        draft.absorption = [...taken.absorption];
      }),
    );
  };
  return (
    <>
      <ItemHead title={finish.id} label={finish.label} what="Finish" />
      <OtherProblems shown={['id', 'label', 'source', 'absorption']} />
      <div className="item-fields">
        <NameRow
          item={{ kind: 'finish', id: finish.id }}
          label={finish.label}
          taken={venue.finishes}
          setLabel={(layout, label) =>
            editFinish(layout, finish.id, (draft) => {
              draft.label = label;
            })
          }
        />
        <Row what="Source" at={['source']}>
          <TextField
            className="full"
            label="Source of the figures"
            value={finish.source}
            placeholder="Test report or publication"
            multiline
            live
            {...bind<string>(`Source of ${finish.id}`, `finish.${finish.id}.source`, (layout, source) =>
              editFinish(layout, finish.id, (draft) => {
                draft.source = source;
              }),
            )}
          />
        </Row>
        <Row what="Take">
          <FindChoice
            className="full"
            label="Take a finish from the catalogue"
            placeholder="one from the catalogue"
            value=""
            options={CATALOGUE_FINISHES.map(({ id, label, absorption }) => ({
              id,
              label,
              detail: figure(absorption[3], 2),
            }))}
            onChange={takeOver}
          />
        </Row>
      </div>
      <section className="item-section" aria-label="Absorption">
        <h3>Absorption coefficient</h3>
        <OctaveFields
          label="Absorption"
          values={finish.absorption}
          min={0}
          max={1}
          step={0.01}
          digits={2}
          onChange={(band, value, phase) =>
            bind<number>(`Absorption of ${finish.id}`, `finish.${finish.id}.${band}`, (layout, absorption) =>
              editFinish(layout, finish.id, (draft) => {
                draft.absorption[band] = absorption;
              }),
            ).onChange(value, phase)
          }
          onCancel={() => useSession.getState().cancelEdit()}
        />
      </section>
      <dl className="said">
        <Said what="Area covered" unit="m²">
          {figure(areaM2)}
        </Said>
      </dl>
      {covered.length > 0 && (
        <p className="item-note">
          On{' '}
          {covered.map((face, i) => (
            <span key={face.id}>
              {i > 0 && ', '}
              <Action look="use" onPress={() => select({ kind: 'face', id: face.id })}>
                {face.id}
              </Action>
            </span>
          ))}
          .
        </p>
      )}
    </>
  );
}
