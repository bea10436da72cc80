import { Action } from '../controls/Action';
import { Choice } from '../controls/Choice';
import { FindChoice } from '../controls/FindChoice';
import { facesOf } from '../layout/geometry';
import type { Ref } from '../layout/ref';
import type { Face } from '../layout/schema';
import { figure } from '../report/figures';
import { useLayout, useScheme, useSession } from '../session/session';
import { bind, editOnce } from './binding';
import { LengthField, OtherProblems, Row, Said } from './Fields';
import { cover, editFace, finishesToTake, halfWay } from './finish-edits';
import { ItemHead, NameRow } from './ItemHead';
import { AXES, MOST_M } from './PlaceRows';

const SIDES = [
  { id: '1', label: 'Part of the shell' },
  { id: '2', label: 'Free-standing, both sides' },
];

export function FacePanel({ face }: { face: Face }) {
  const layout = useLayout();
  const areaM2 = facesOf({ faces: [face], finishes: layout.venue.finishes }).areas[0];
  const finishes = [
    ...layout.venue.finishes.map(({ id, label }) => ({ id, label: label || id })),
    ...finishesToTake(layout).map(({ id, label }) => ({ id, label, detail: 'catalogue' })),
  ];
  return (
    <>
      <ItemHead title={face.id} what="Face" />
      <OtherProblems shown={['id', 'finish', 'sides', 'corners']} />
      <div className="item-fields">
        <NameRow item={{ kind: 'face', id: face.id }} label="" taken={layout.venue.faces} />
        <Row what="Finish" at={['finish']}>
          <FindChoice
            className="full"
            label="Finish"
            value={face.finish}
            options={finishes}
            onChange={(id) =>
              editOnce(`Cover ${face.id} with ${finishes.find((finish) => finish.id === id)?.label ?? id}`, (before) =>
                cover(before, face.id, id),
              )
            }
          />
        </Row>
        <Row what="Sides" at={['sides']}>
          <Choice
            className="full"
            label="Sides"
            value={String(face.sides)}
            options={SIDES}
            onChange={(id) =>
              editOnce(`Sides of ${face.id}`, (before) =>
                editFace(before, face.id, (draft) => {
                  draft.sides = id === '2' ? 2 : 1;
                }),
              )
            }
          />
        </Row>
      </div>
      <dl className="said">
        <Said what="Area of one side" unit="m²">
          {figure(areaM2)}
        </Said>
      </dl>
      <LyingHere faceId={face.id} />
      <Corners face={face} />
    </>
  );
}

/** Devices hosted by the face. */
function LyingHere({ faceId }: { faceId: string }) {
  const scheme = useScheme();
  const select = useSession((session) => session.select);
  const here: Ref[] = [
    ...scheme.microphones.filter((m) => m.host === faceId).map((m): Ref => ({ kind: 'microphone', id: m.id })),
    ...scheme.loudspeakers.filter((l) => l.host === faceId).map((l): Ref => ({ kind: 'loudspeaker', id: l.id })),
  ];
  if (here.length === 0) return null;
  return (
    <p className="item-note">
      On it:{' '}
      {here.map((ref, i) => (
        <span key={`${ref.kind} ${ref.id}`}>
          {i > 0 && ', '}
          <Action look="use" onPress={() => select(ref)}>
            {ref.id}
          </Action>
        </span>
      ))}
      .
    </p>
  );
}

/** The outline, in order round the face. */
function Corners({ face }: { face: Face }) {
  const last = face.corners.length - 1;
  const insert = (index: number) =>
    editOnce(`Add a corner to ${face.id}`, (layout) =>
      editFace(layout, face.id, (draft) => {
        draft.corners.splice(index + 1, 0, halfWay(face.corners, index));
      }),
    );
  const take = (index: number) =>
    editOnce(`Delete corner ${index + 1} of ${face.id}`, (layout) =>
      editFace(layout, face.id, (draft) => {
        draft.corners.splice(index, 1);
      }),
    );
  return (
    <section className="item-section" aria-label={`Corners of ${face.id}`}>
      <h3>
        Corners <Action onPress={() => insert(last)}>Add corner</Action>
      </h3>
      <div className="grid-rows" data-grid="corners">
        {face.corners.map((corner, i) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: a corner is known by its place in the outline alone.
          <fieldset className="grid-row" aria-label={`Corner ${i + 1}`} key={i}>
            <span className="grid-head">{i + 1}</span>
            {AXES.map((axis, k) => (
              <LengthField
                key={axis}
                label={`Corner ${i + 1} ${axis}`}
                name={axis}
                value={corner[k]}
                min={-MOST_M}
                max={MOST_M}
                {...bind<number | null>(
                  `Move corner ${i + 1} of ${face.id}`,
                  `face.${face.id}.${i}.${axis}`,
                  (layout, value) =>
                    editFace(layout, face.id, (draft) => {
                      if (value !== null && draft.corners[i] !== undefined) draft.corners[i][k] = value;
                    }),
                )}
              />
            ))}
            <Action
              look="use"
              className="grid-remove"
              label={`Add a corner after corner ${i + 1}`}
              onPress={() => insert(i)}
            >
              +
            </Action>
            <Action
              look="use"
              className="grid-remove"
              label={`Delete corner ${i + 1}`}
              why={face.corners.length <= 3 ? 'A face has at least three corners.' : null}
              onPress={() => take(i)}
            >
              ×
            </Action>
          </fieldset>
        ))}
      </div>
    </section>
  );
}
