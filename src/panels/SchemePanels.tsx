import { TextField } from '../controls/TextField';
import { editScheme, sendGain } from '../layout/edits';
import { count } from '../report/figures';
import { useLayout, useScheme } from '../session/session';
import { bind } from './binding';
import { OtherProblems, Row } from './Fields';
import { NameRow, Ways } from './ItemHead';
import { LoopFigures } from './LoopFigures';
import { SendField } from './SendsTable';

/** Name and notes of the scheme shown. */
export function SchemePanel() {
  const { schemes } = useLayout();
  const scheme = useScheme();
  return (
    <>
      <Ways current="scheme" />
      <OtherProblems shown={['id', 'label', 'notes']} />
      <div className="item-fields">
        <NameRow
          item={{ kind: 'scheme', id: scheme.id }}
          label={scheme.label}
          taken={schemes}
          setLabel={(layout, label) =>
            editScheme(layout, scheme.id, (draft) => {
              draft.label = label;
            })
          }
        />
        <Row what="Notes" at={['notes']}>
          <TextField
            className="full"
            label="Notes on the scheme"
            placeholder="Why this scheme"
            value={scheme.notes ?? ''}
            multiline
            live
            {...bind<string>(`Notes on scheme ${scheme.id}`, `scheme.${scheme.id}.notes`, (layout, notes) =>
              editScheme(layout, scheme.id, (draft) => {
                if (notes === '') delete draft.notes;
                else draft.notes = notes;
              }),
            )}
          />
        </Row>
      </div>
      <p className="item-note">
        {count(scheme.microphones.length, 'microphone')}, {count(scheme.loudspeakers.length, 'loudspeaker')}.
      </p>
      <LoopFigures />
    </>
  );
}

/** Every crosspoint of the scheme; an empty one is not sent. */
export function RoutingPanel() {
  const scheme = useScheme();
  const { microphones, loudspeakers } = scheme;
  const pairs = microphones.flatMap((m) => loudspeakers.map((l) => sendGain(scheme, m.id, l.id)));
  return (
    <>
      <Ways current="routing" />
      <OtherProblems shown={[]} />
      <p className="item-note">
        Gain in dB from each microphone to each loudspeaker; empty is not sent.{' '}
        {pairs.filter((gain) => gain !== null).length} of {count(pairs.length, 'pair')} sent.
      </p>
      {pairs.length > 0 && (
        // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls must be reachable by keyboard.
        <section className="routing" aria-label="Routing" tabIndex={0}>
          <table>
            <thead>
              <tr>
                <td />
                {loudspeakers.map((loudspeaker) => (
                  <th scope="col" key={loudspeaker.id} title={loudspeaker.label}>
                    {loudspeaker.id}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {microphones.map((microphone) => (
                <tr key={microphone.id}>
                  <th scope="row" title={microphone.label}>
                    {microphone.id}
                  </th>
                  {loudspeakers.map((loudspeaker) => (
                    <td key={loudspeaker.id}>
                      <SendField
                        microphone={microphone.id}
                        loudspeaker={loudspeaker.id}
                        gain={sendGain(scheme, microphone.id, loudspeaker.id)}
                      />
                    </td>
                  ))}
                </tr>
              ))}
            </tbody>
          </table>
        </section>
      )}
    </>
  );
}
