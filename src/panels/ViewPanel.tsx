import { type Draft, produce } from 'immer';
import { TextField } from '../controls/TextField';
import type { Layout, SavedView } from '../layout/schema';
import { bind } from './binding';
import { LengthField, OtherProblems, Row } from './Fields';
import { ItemHead } from './ItemHead';
import { AXES, MOST_M } from './PlaceRows';

function editView(layout: Layout, id: string, change: (view: Draft<SavedView>) => void): Layout {
  return produce(layout, (draft) => {
    const view = draft.venue.views.find((candidate) => candidate.id === id);
    if (view !== undefined) change(view);
  });
}

/** A saved view: from where one looks, and at what. */
export function ViewPanel({ view }: { view: SavedView }) {
  const ends = [
    { key: 'eye', what: 'From' },
    { key: 'target', what: 'To' },
  ] as const;
  return (
    <>
      <ItemHead title={view.id} label={view.label} what="View" />
      <OtherProblems shown={['id', 'label', 'eye', 'target']} />
      <div className="item-fields">
        <Row what="Label" at={['label']}>
          <TextField
            className="full"
            label="Label"
            value={view.label}
            live
            {...bind<string>(`Label ${view.id}`, `view.${view.id}.label`, (layout, label) =>
              editView(layout, view.id, (draft) => {
                draft.label = label;
              }),
            )}
          />
        </Row>
        {ends.map(({ key, what }) => (
          <Row what={what} at={[key]} key={key}>
            {AXES.map((axis, i) => (
              <LengthField
                key={axis}
                label={`${what} ${axis}`}
                name={axis}
                value={view[key][i]}
                min={-MOST_M}
                max={MOST_M}
                {...bind<number | null>(`Move view ${view.id}`, `view.${view.id}.${key}.${axis}`, (layout, value) =>
                  editView(layout, view.id, (draft) => {
                    if (value !== null) draft[key][i] = value;
                  }),
                )}
              />
            ))}
          </Row>
        ))}
      </div>
    </>
  );
}
