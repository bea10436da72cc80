import { type Draft, produce } from 'immer';
import { QuantityField, type QuantityFieldProps } from '../controls/QuantityField';
import { TextField } from '../controls/TextField';
import type { Layout, SeatBlock } from '../layout/schema';
import { seatsOf } from '../layout/seating';
import { count } from '../report/figures';
import { useLayout } from '../session/session';
import { bind } from './binding';
import { LengthField, OtherProblems, Row } from './Fields';
import { ItemHead, NameRow } from './ItemHead';
import { readOmitted, sayOmitted } from './omitted-seats';
import { AXES, MOST_M } from './PlaceRows';

/** The layout with a block of seats changed. */
function editBlock(layout: Layout, id: string, change: (block: Draft<SeatBlock>) => void): Layout {
  return produce(layout, (draft) => {
    const block = draft.venue.seating.find((part) => part.id === id);
    if (block?.kind === 'block') change(block);
  });
}

type NumberKey = 'facing' | 'rows' | 'columns' | 'rowSpacing' | 'seatSpacing' | 'rise' | 'earHeight';

export function BlockPanel({ block }: { block: SeatBlock }) {
  const { venue } = useLayout();
  const seats = seatsOf([block]).length;
  const write = (key: NumberKey, label: string) =>
    bind<number | null>(label, `seating.${block.id}.${key}`, (layout, value) =>
      editBlock(layout, block.id, (draft) => {
        if (value !== null) draft[key] = value;
      }),
    );
  const length = (key: NumberKey, label: string, name: string, min: number, max: number, step = 0.05) => (
    <LengthField
      label={label}
      name={name}
      value={block[key]}
      min={min}
      max={max}
      step={step}
      {...write(key, `${label} of ${block.id}`)}
    />
  );
  const number = (
    key: NumberKey,
    label: string,
    rest: Pick<QuantityFieldProps, 'min' | 'max' | 'unit' | 'digits' | 'whole'>,
  ) => (
    <QuantityField
      label={label}
      name={label.toLowerCase()}
      value={block[key]}
      {...rest}
      {...write(key, `${label} of ${block.id}`)}
    />
  );
  const positive = 0.01;
  return (
    <>
      <ItemHead title={block.id} label={block.label} what="Seating block" />
      <OtherProblems shown={['id', 'label', 'origin', 'omit']} />
      <div className="item-fields">
        <NameRow
          item={{ kind: 'seating', id: block.id }}
          label={block.label}
          taken={venue.seating}
          setLabel={(layout, label) =>
            editBlock(layout, block.id, (draft) => {
              draft.label = label;
            })
          }
        />
        <Row what="Seat 1-1" at={['origin']}>
          {AXES.map((axis, i) => (
            <LengthField
              key={axis}
              label={`Floor under seat 1 of row 1, ${axis}`}
              name={axis}
              value={block.origin[i]}
              min={-MOST_M}
              max={MOST_M}
              {...bind<number | null>(`Move ${block.id}`, `seating.${block.id}.origin.${axis}`, (layout, value) =>
                editBlock(layout, block.id, (draft) => {
                  if (value !== null) draft.origin[i] = value;
                }),
              )}
            />
          ))}
        </Row>
        <Row what="Size" columns={2}>
          {number('rows', 'Rows', { min: 1, max: 1000, digits: 0, whole: true })}
          {number('columns', 'Columns', { min: 1, max: 1000, digits: 0, whole: true })}
        </Row>
        <Row what="Spacing" columns={2}>
          {length('rowSpacing', 'Row spacing', 'rows', positive, 100)}
          {length('seatSpacing', 'Seat spacing', 'seats', positive, 100)}
        </Row>
        <Row what="Rows" columns={2}>
          {length('rise', 'Rise from row to row', 'rise', -10, 10, 0.01)}
          <LengthField
            label="Radius of row 1"
            name="radius"
            value={block.radius}
            min={positive}
            max={10000}
            nullable
            none="straight"
            start={10}
            {...bind<number | null>(`Radius of ${block.id}`, `seating.${block.id}.radius`, (layout, value) =>
              editBlock(layout, block.id, (draft) => {
                draft.radius = value;
              }),
            )}
          />
        </Row>
        <Row what="People" columns={2}>
          {number('facing', 'Facing', { min: -360, max: 360, unit: '°' })}
          {length('earHeight', 'Ear height', 'ears', 0, 10)}
        </Row>
        <Row what="No seat" at={['omit']} columns={1}>
          <TextField
            label="Seats left out, such as aisles"
            value={sayOmitted(block)}
            placeholder="such as 1-3, 2-3"
            multiline={block.omit.length > 6}
            refuse={(text) => {
              const omitted = readOmitted(block, text);
              return omitted.ok ? null : omitted.why;
            }}
            {...bind<string>(`Seats left out of ${block.id}`, `seating.${block.id}.omit`, (layout, text) =>
              editBlock(layout, block.id, (draft) => {
                const omitted = readOmitted(block, text);
                if (omitted.ok) draft.omit = omitted.ids;
              }),
            )}
          />
        </Row>
      </div>
      <p className="item-note">
        {count(seats, 'seat')}. Row 1 is nearest the front, rows step back from where people face, seats step to their
        left.
      </p>
    </>
  );
}
