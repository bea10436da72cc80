import { QuantityField } from '../controls/QuantityField';
import { Toggle } from '../controls/Toggle';
import { sendGain, setSend } from '../layout/edits';
import { useScheme } from '../session/session';
import { bind, editOnce } from './binding';

/** Range of a gain in the layout, dB. */
export const GAIN_DB = { min: -200, max: 100 } as const;

interface SendsProps {
  /** The end whose sends are shown. */
  kind: 'microphone' | 'loudspeaker';
  id: string;
}

/** Every device at the other end: sent or not, and at what gain. */
export function SendsTable({ kind, id }: SendsProps) {
  const scheme = useScheme();
  const others = kind === 'microphone' ? scheme.loudspeakers : scheme.microphones;
  const pair = (other: string): [string, string] => (kind === 'microphone' ? [id, other] : [other, id]);
  const sent = others.filter((other) => sendGain(scheme, ...pair(other.id)) !== null).length;
  const direction = kind === 'microphone' ? 'Sent to' : 'Fed by';
  if (others.length === 0) return null;
  return (
    <section className="item-section" aria-label={`${direction}, ${id}`}>
      <h3>
        {direction}
        <span>
          {sent} of {others.length}
        </span>
      </h3>
      <ul className="sends">
        {others.map((other) => {
          const [microphone, loudspeaker] = pair(other.id);
          const gain = sendGain(scheme, microphone, loudspeaker);
          const words = `${microphone} to ${loudspeaker}`;
          return (
            <li key={other.id}>
              <Toggle
                label={`Send ${words}`}
                value={gain !== null}
                onChange={(on) =>
                  editOnce(`${on ? 'Send' : 'Do not send'} ${words}`, (layout) =>
                    setSend(layout, scheme.id, microphone, loudspeaker, on ? 0 : null),
                  )
                }
              >
                <span className="id">{other.id}</span>
                <span className="sends-label">{other.label}</span>
              </Toggle>
              <SendField microphone={microphone} loudspeaker={loudspeaker} gain={gain} unit="dB" />
            </li>
          );
        })}
      </ul>
    </section>
  );
}

/** Gain of one crosspoint; empty where it is not sent. */
export function SendField(props: { microphone: string; loudspeaker: string; gain: number | null; unit?: string }) {
  const { microphone, loudspeaker, gain, unit = '' } = props;
  const schemeId = useScheme().id;
  return (
    <QuantityField
      label={`Gain from ${microphone} to ${loudspeaker}`}
      value={gain}
      unit={unit}
      {...GAIN_DB}
      nullable
      none="–"
      {...bind<number | null>(
        `Send ${microphone} to ${loudspeaker}`,
        `send.${microphone}.${loudspeaker}`,
        (layout, value) => setSend(layout, schemeId, microphone, loudspeaker, value),
      )}
    />
  );
}
