import { type Draft, produce } from 'immer';
import { Action } from '../controls/Action';
import { TextField } from '../controls/TextField';
import { freeId } from '../layout/edits';
import type { Layout, SeatList } from '../layout/schema';
import { seatsOf } from '../layout/seating';
import { useLayout } from '../session/session';
import { bind, editOnce } from './binding';
import { LengthField, OtherProblems, Row } from './Fields';
import { ItemHead, NameRow } from './ItemHead';
import { AXES, MOST_M } from './PlaceRows';

function editList(layout: Layout, id: string, change: (list: Draft<SeatList>) => void): Layout {
  return produce(layout, (draft) => {
    const list = draft.venue.seating.find((part) => part.id === id);
    if (list?.kind === 'list') change(list);
  });
}

/** Seats that stand one by one. */
export function SeatListPanel({ list }: { list: SeatList }) {
  const { venue } = useLayout();
  return (
    <>
      <ItemHead title={list.id} label={list.label} what="Seats one by one" />
      <OtherProblems shown={['id', 'label', 'earHeight']} />
      <div className="item-fields">
        <NameRow
          item={{ kind: 'seating', id: list.id }}
          label={list.label}
          taken={venue.seating}
          setLabel={(layout, label) =>
            editList(layout, list.id, (draft) => {
              draft.label = label;
            })
          }
        />
        <Row what="People" at={['earHeight']} columns={2}>
          <LengthField
            label="Ear height"
            name="ears"
            value={list.earHeight}
            min={0}
            max={10}
            step={0.05}
            {...bind<number | null>(`Ear height of ${list.id}`, `seating.${list.id}.earHeight`, (layout, value) =>
              editList(layout, list.id, (draft) => {
                if (value !== null) draft.earHeight = value;
              }),
            )}
          />
        </Row>
      </div>
      <section className="item-section" aria-label={`Seats of ${list.id}`}>
        <h3>
          Seats
          <Action onPress={() => addSeat(list, seatsOf(venue.seating))}>Add seat</Action>
        </h3>
        <div className="grid-rows" data-grid="seats">
          <span className="grid-head">id</span>
          {AXES.map((axis) => (
            <span className="grid-head" key={axis}>
              {axis}
            </span>
          ))}
          <span className="grid-head">ears</span>
          <span />
          {list.seats.map((_, i) => (
            // biome-ignore lint/suspicious/noArrayIndexKey: a seat's id is typed here, so its place in the list names it.
            <SeatRow list={list} index={i} key={i} />
          ))}
        </div>
      </section>
    </>
  );
}

/** A seat beside the last one. */
function addSeat(list: SeatList, taken: readonly { id: string }[]): void {
  const last = list.seats.at(-1);
  const id = freeId(taken, `${list.id}${list.seats.length + 1}`);
  editOnce(`Add seat ${id}`, (layout) =>
    editList(layout, list.id, (draft) => {
      const [x, y, z] = last?.position ?? [0, 0, 0];
      draft.seats.push({ id, position: [last === undefined ? x : Number((x + 0.6).toFixed(3)), y, z] });
    }),
  );
}

function SeatRow({ list, index }: { list: SeatList; index: number }) {
  const { venue } = useLayout();
  const seat = list.seats[index];
  const change = (layout: Layout, alter: (draft: Draft<SeatList['seats'][number]>) => void) =>
    editList(layout, list.id, (draft) => {
      if (draft.seats[index]?.id === seat.id) alter(draft.seats[index]);
    });
  const refuse = (typed: string) => {
    const id = typed.trim();
    if (id === '') return 'An id has at least one character.';
    const taken = id !== seat.id && seatsOf(venue.seating).some((other) => other.id === id);
    return taken ? `“${id}” is taken.` : null;
  };
  return (
    <>
      <TextField
        label={`Id of seat ${index + 1}`}
        value={seat.id}
        refuse={refuse}
        onChange={(id) =>
          editOnce(`Rename ${seat.id} to ${id.trim()}`, (layout) =>
            change(layout, (draft) => {
              draft.id = id.trim();
            }),
          )
        }
      />
      {AXES.map((axis, i) => (
        <LengthField
          key={axis}
          label={`Seat ${seat.id} ${axis}`}
          value={seat.position[i]}
          min={-MOST_M}
          max={MOST_M}
          {...bind<number | null>(`Move seat ${seat.id}`, `seat.${seat.id}.${axis}`, (layout, value) =>
            change(layout, (draft) => {
              if (value !== null) draft.position[i] = value;
            }),
          )}
        />
      ))}
      <LengthField
        label={`Ear height of seat ${seat.id}`}
        value={seat.earHeight ?? null}
        min={0}
        max={10}
        step={0.05}
        nullable
        start={list.earHeight}
        {...bind<number | null>(`Ear height of seat ${seat.id}`, `seat.${seat.id}.ears`, (layout, value) =>
          change(layout, (draft) => {
            if (value === null) delete draft.earHeight;
            else draft.earHeight = value;
          }),
        )}
      />
      <Action
        look="use"
        className="grid-remove"
        label={`Delete seat ${seat.id}`}
        onPress={() =>
          editOnce(`Delete seat ${seat.id}`, (layout) =>
            editList(layout, list.id, (draft) => {
              draft.seats = draft.seats.filter((other) => other.id !== seat.id);
            }),
          )
        }
      >
        ×
      </Action>
    </>
  );
}
