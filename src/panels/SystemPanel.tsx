import { Choice } from '../controls/Choice';
import { QuantityField, type QuantityFieldProps } from '../controls/QuantityField';
import { editScheme } from '../layout/edits';
import type { System } from '../layout/schema';
import { useScheme, useSession } from '../session/session';
import { bind, editOnce } from './binding';
import { OctaveFields, OtherProblems, Row } from './Fields';
import { Ways } from './ItemHead';
import { DELAY_MS } from './LoudspeakerPanel';
import { GAIN_DB } from './SendsTable';

type NumberKey = 'stabilityMargin' | 'highPassHz' | 'latency' | 'delayHold';

/** What the scheme's electronics do to every microphone and loudspeaker. */
export function SystemPanel() {
  const scheme = useScheme();
  const { system } = scheme;
  const write = (key: NumberKey, label: string) =>
    bind<number | null>(label, `system.${key}`, (layout, value) =>
      editScheme(layout, scheme.id, (draft) => {
        if (value !== null) draft.system[key] = value;
      }),
    );
  const number = (
    key: NumberKey,
    label: string,
    rest: Pick<QuantityFieldProps, 'name' | 'unit' | 'min' | 'max' | 'digits' | 'step'>,
  ) => <QuantityField label={label} value={system[key]} {...rest} {...write(key, label)} />;
  return (
    <>
      <Ways current="system" />
      <OtherProblems shown={[]} />
      <div className="item-fields">
        <Row what="Kept" columns={1}>
          {number('stabilityMargin', 'Stability margin', { name: 'stability margin', unit: 'dB', min: 0, max: 60 })}
        </Row>
        <Row what="" columns={1}>
          <QuantityField
            label="Run below the limit, empty to run at the margin"
            name="run below the limit by"
            value={system.belowLimit}
            unit="dB"
            min={0.1}
            max={100}
            nullable
            none="the margin"
            start={system.stabilityMargin || 6}
            {...bind<number | null>('Below the limit', 'system.belowLimit', (layout, value) =>
              editScheme(layout, scheme.id, (draft) => {
                draft.system.belowLimit = value;
              }),
            )}
          />
        </Row>
        <Row what="Sharing" columns={1}>
          <Choice
            label="Automatic mixing"
            value={system.automix}
            options={[
              { id: 'off', label: 'Off: open microphones add up' },
              { id: 'gain-sharing', label: 'Gain sharing' },
            ]}
            onChange={(id) =>
              editOnce(id === 'off' ? 'No gain sharing' : 'Gain sharing', (layout) =>
                editScheme(layout, scheme.id, (draft) => {
                  draft.system.automix = id as System['automix'];
                }),
              )
            }
          />
        </Row>
        <Row what="Time" columns={2}>
          {number('latency', 'Latency', { name: 'latency', unit: 'ms', ...DELAY_MS })}
          {number('delayHold', 'Delay hold', { name: 'hold', unit: 'ms', ...DELAY_MS })}
        </Row>
        <Row what="Filter" columns={1}>
          {number('highPassHz', 'High-pass, 0 for none', {
            name: 'high-pass, 0 for none',
            unit: 'Hz',
            min: 0,
            max: 5000,
            digits: 0,
            step: 5,
          })}
        </Row>
      </div>
      <section className="item-section" aria-label="Equaliser">
        <h3>
          Equaliser <span>dB</span>
        </h3>
        <OctaveFields
          label="Equaliser"
          values={system.equaliser}
          {...GAIN_DB}
          step={0.5}
          digits={1}
          onChange={(band, value, phase) =>
            bind<number>('Equaliser', `system.equaliser.${band}`, (layout, gain) =>
              editScheme(layout, scheme.id, (draft) => {
                draft.system.equaliser[band] = gain;
              }),
            ).onChange(value, phase)
          }
          onCancel={() => useSession.getState().cancelEdit()}
        />
      </section>
      <p className="item-note">
        The margin is kept below the gain at which the loop rings. Hold is how long after the talker’s own sound a
        loudspeaker’s is to arrive.
      </p>
    </>
  );
}
