import { Action } from '../controls/Action';
import { seatsOf } from '../layout/seating';
import { talkerLabel } from '../layout/talker-label';
import { RUNGS } from '../predict/prediction';
import { figure, marginFigure, NO_FIGURE } from '../report/figures';
import { RUNG_LABELS } from '../report/quantities';
import { lengthText } from '../report/units';
import { useLayout, useSchemePrediction, useSession } from '../session/session';
import { ItemHead } from './ItemHead';

/** One seat: where it is, and what it gets from every talker on all three rungs. */
export function SeatPanel({ id }: { id: string }) {
  const layout = useLayout();
  const { units, select } = useSession();
  const seats = useSession((session) => session.prediction?.seats);
  const scheme = useSchemePrediction();
  const seat = seatsOf(layout.venue.seating).find((candidate) => candidate.id === id);
  // The prediction may be of the layout before the last edit: its seats are known by id only.
  const index = seats?.findIndex((candidate) => candidate.id === id) ?? -1;
  if (seat === undefined) return null;
  const block = layout.venue.seating[seat.seating];
  const [x, y, z] = seat.ear.map((c) => lengthText(c, units));
  return (
    <>
      <ItemHead title={id} what="Seat" />
      <p className="item-note">
        In{' '}
        <Action look="use" onPress={() => select({ kind: 'seating', id: block.id })}>
          {block.label || block.id}
        </Action>
        , ears at {x}, {y}, {z}.
      </p>
      {scheme === null || index < 0 ? (
        <p className="item-note">Not predicted yet.</p>
      ) : (
        scheme.talkers.map((talker) => (
          <section className="item-section" key={talker.id} aria-label={`${talkerLabel(layout, talker.id)} talking`}>
            <h3>
              {talkerLabel(layout, talker.id)} talking
              {talker.ownSeat[index] === 1 && <span>own seat, not judged</span>}
            </h3>
            <table className="rung-table">
              <thead>
                <tr>
                  <th scope="col">dB</th>
                  <th scope="col">potential</th>
                  <th scope="col">needed</th>
                  <th scope="col">margin</th>
                </tr>
              </thead>
              <tbody>
                {RUNGS.map((rung) => (
                  <tr key={rung}>
                    <th scope="row">{RUNG_LABELS[rung]}</th>
                    <td>{figure(talker.seats[rung].potentialDb[index])}</td>
                    <td>{figure(talker.seats[rung].neededDb[index])}</td>
                    <td className="strong">{marginFigure(talker.seats[rung].marginDb[index])}</td>
                  </tr>
                ))}
              </tbody>
            </table>
            <dl className="seat-figures">
              {(
                [
                  ['level', figure(talker.room.totalDba[index]), 'dBA'],
                  ['S/N', figure(talker.room.signalToNoiseDb[index]), 'dB'],
                  ['STI', figure(talker.room.sti[index], 2), ''],
                  ['gap', figure(talker.room.arrivalGapMs[index]), 'ms'],
                  ['by', scheme.loudspeakerIds[talker.room.servedBy[index]] ?? NO_FIGURE, ''],
                ] as const
              ).map(([name, value, unit]) => (
                <div key={name}>
                  <dt>{name}</dt>
                  <dd>
                    {value}
                    {unit !== '' && <span className="u">{unit}</span>}
                  </dd>
                </div>
              ))}
            </dl>
          </section>
        ))
      )}
    </>
  );
}
