import { type Draft, produce } from 'immer';
import { noiseLevelsOfNr } from '../acoustics/speech/noise';
import { Choice } from '../controls/Choice';
import { QuantityField } from '../controls/QuantityField';
import { TextField } from '../controls/TextField';
import type { Layout } from '../layout/schema';
import { figure } from '../report/figures';
import { useLayout, useSession } from '../session/session';
import { bind, editOnce } from './binding';
import { LengthField, OctaveFields, OctaveFigures, Row, Said } from './Fields';
import { Ways } from './ItemHead';
import { RoomCharts } from './RoomCharts';

const AIR = [
  { key: 'temperature', name: 'temp', label: 'Temperature', unit: '°C', min: -50, max: 60, step: 1 },
  { key: 'humidity', name: 'RH', label: 'Relative humidity', unit: '%', min: 0, max: 100, step: 5 },
  { key: 'pressure', name: 'p', label: 'Air pressure', unit: 'kPa', min: 10, max: 200, step: 0.5 },
] as const;

const cancel = () => useSession.getState().cancelEdit();
const change = (layout: Layout, alter: (draft: Draft<Layout>) => void) => produce(layout, alter);
/** A field of the whole layout. */
const write = <T,>(label: string, mark: string, alter: (draft: Draft<Layout>, value: T) => void) =>
  bind<T>(label, mark, (layout, value) => change(layout, (draft) => alter(draft, value)));

/** What is shown with nothing selected: the room as a whole and what is asked of it. */
export function VenuePanel() {
  const layout = useLayout();
  const { venue } = layout;
  const predicted = useSession((session) => session.prediction?.venue);
  return (
    <>
      <Ways current="venue" />
      <div className="item-fields">
        <Row what="Name">
          <TextField
            className="full"
            label="Name of the layout"
            value={layout.name}
            live
            {...write<string>('Name the layout', 'layout.name', (draft, name) => {
              draft.name = name;
            })}
          />
        </Row>
        <Row what="Notes">
          <TextField
            className="full"
            label="Notes"
            value={layout.notes}
            multiline
            live
            {...write<string>('Notes', 'layout.notes', (draft, notes) => {
              draft.notes = notes;
            })}
          />
        </Row>
        <NeedRow />
        <Row what="Air">
          {AIR.map(({ key, ...air }) => (
            <QuantityField
              key={key}
              {...air}
              digits={key === 'pressure' ? 1 : 0}
              value={venue.air[key]}
              {...write<number | null>(air.label, `venue.air.${key}`, (draft, value) => {
                if (value !== null) draft.venue.air[key] = value;
              })}
            />
          ))}
        </Row>
        <Row what="Room" columns={2}>
          <QuantityField
            label="Volume, empty for that of the shell"
            name="volume"
            value={venue.volume}
            unit="m³"
            digits={0}
            step={10}
            min={0.1}
            max={1e7}
            nullable
            none={predicted === undefined ? 'from shell' : figure(predicted.volumeM3, 0)}
            start={predicted === undefined ? 100 : Math.round(predicted.volumeM3)}
            {...write<number | null>('Volume', 'venue.volume', (draft, value) => {
              draft.venue.volume = value;
            })}
          />
          <QuantityField
            label="Reflection order"
            name="reflections"
            value={venue.reflectionOrder}
            digits={0}
            min={0}
            max={3}
            whole
            {...write<number | null>('Reflection order', 'venue.reflectionOrder', (draft, value) => {
              if (value !== null) draft.venue.reflectionOrder = value;
            })}
          />
        </Row>
      </div>
      <NoiseSection />
      <DecaySection />
      <RoomCharts />
    </>
  );
}

function NeedRow() {
  const { need } = useLayout();
  const kinds = [
    { id: 'distance', label: 'Distance' },
    { id: 'noise', label: 'Above noise' },
  ];
  const setKind = (kind: string) =>
    editOnce('What every seat needs', (layout) =>
      change(layout, (draft) => {
        // A voice as near as 3 m, or 25 dB above the noise: common practice to begin with.
        draft.need = kind === 'noise' ? { kind: 'noise', signalToNoise: 25 } : { kind: 'distance', metres: 3 };
      }),
    );
  return (
    <Row what="Need" columns={2}>
      <Choice label="What every seat needs" value={need.kind} options={kinds} onChange={setKind} />
      {need.kind === 'distance' ? (
        <LengthField
          label="To hear as if at"
          name="as at"
          value={need.metres}
          min={0.01}
          max={1000}
          {...write<number | null>('Distance to hear as if at', 'need.metres', (draft, value) => {
            if (value !== null) draft.need = { kind: 'distance', metres: value };
          })}
        />
      ) : (
        <QuantityField
          label="Signal to noise"
          name="by"
          value={need.signalToNoise}
          unit="dB"
          min={-50}
          max={100}
          {...write<number | null>('Signal to noise', 'need.signalToNoise', (draft, value) => {
            if (value !== null) draft.need = { kind: 'noise', signalToNoise: value };
          })}
        />
      )}
    </Row>
  );
}

function NoiseSection() {
  const { noise } = useLayout().venue;
  const noiseDba = useSession((session) => session.prediction?.venue.noiseDba);
  const kinds = [
    { id: 'nr', label: 'Noise rating' },
    { id: 'levels', label: 'By octave' },
  ];
  const setKind = (kind: string) =>
    editOnce('How noise is given', (layout) =>
      change(layout, (draft) => {
        if (kind === 'nr') draft.venue.noise = { nr: 'nr' in noise ? noise.nr : Math.round(noise.levels[3]) };
        else if ('nr' in noise)
          draft.venue.noise = { levels: Array.from(noiseLevelsOfNr(noise.nr), (level) => Number(level.toFixed(1))) };
      }),
    );
  return (
    <section className="item-section" aria-label="Noise">
      <div className="item-fields">
        <Row what="Noise" columns={2}>
          <Choice
            label="How noise is given"
            value={'nr' in noise ? 'nr' : 'levels'}
            options={kinds}
            onChange={setKind}
          />
          {'nr' in noise ? (
            <QuantityField
              label="Noise rating"
              name="NR"
              value={noise.nr}
              digits={0}
              min={-20}
              max={130}
              {...write<number | null>('Noise rating', 'venue.noise.nr', (draft, value) => {
                if (value !== null) draft.venue.noise = { nr: value };
              })}
            />
          ) : null}
        </Row>
      </div>
      {'levels' in noise && (
        <OctaveFields
          label="Noise level"
          unit="dB"
          values={noise.levels}
          min={-100}
          max={200}
          step={1}
          digits={1}
          onChange={(band, value, phase) =>
            write<number>('Noise level', `venue.noise.${band}`, (draft, level) => {
              if ('levels' in draft.venue.noise) draft.venue.noise.levels[band] = level;
            }).onChange(value, phase)
          }
          onCancel={cancel}
        />
      )}
      {noiseDba !== undefined && (
        <dl className="said">
          <Said what="Noise, A-weighted" unit="dBA">
            {figure(noiseDba)}
          </Said>
        </dl>
      )}
    </section>
  );
}

const DECAYS = [
  { id: 'eyring', label: 'Eyring' },
  { id: 'sabine', label: 'Sabine' },
  { id: 'given', label: 'Given, by octave' },
];

function DecaySection() {
  const { decay } = useLayout().venue;
  const predicted = useSession((session) => session.prediction?.venue);
  const setModel = (model: string) =>
    editOnce('Decay', (layout) =>
      change(layout, (draft) => {
        const seconds = Array.from(predicted?.decayS ?? new Float64Array(7).fill(1), (s) =>
          Math.min(100, Math.max(0.01, Number(s.toFixed(2)))),
        );
        draft.venue.decay =
          model === 'given' ? { model, seconds } : { model: model === 'sabine' ? 'sabine' : 'eyring' };
      }),
    );
  return (
    <section className="item-section" aria-label="Decay">
      <div className="item-fields">
        <Row what="Decay" columns={2}>
          <Choice label="Decay" value={decay.model} options={DECAYS} onChange={setModel} />
        </Row>
      </div>
      {decay.model === 'given' && (
        <OctaveFields
          label="Decay time"
          unit="s"
          values={decay.seconds}
          min={0.01}
          max={100}
          step={0.05}
          digits={2}
          onChange={(band, value, phase) =>
            write<number>('Decay time', `venue.decay.${band}`, (draft, seconds) => {
              if (draft.venue.decay.model === 'given') draft.venue.decay.seconds[band] = seconds;
            }).onChange(value, phase)
          }
          onCancel={cancel}
        />
      )}
      {predicted !== undefined && (
        <OctaveFigures
          rows={[
            { name: 'T', unit: 's', values: predicted.decayS, digits: 2 },
            { name: 'R', unit: 'm²', values: predicted.roomConstantM2, digits: 0 },
          ]}
        />
      )}
      <p className="item-note">T is the decay time, R the room constant.</p>
    </section>
  );
}
