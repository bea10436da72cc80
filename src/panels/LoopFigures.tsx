import { NOMINAL_HZ } from '../acoustics/bands';
import BandChart from '../controls/BandChart';
import { talkerLabel } from '../layout/talker-label';
import { RUNGS } from '../predict/prediction';
import { BAND_NAMES, figure, octaveFigure, signedFigure } from '../report/figures';
import { RUNG_LABELS } from '../report/quantities';
import { useLayout, useSchemePrediction, useSession } from '../session/session';
import { criticalTalker } from './device-figures';
import { Said } from './Fields';
import './room-charts.css';

/** How far the loop may be raised, by rung and by octave, and what it is worked at: for the talker shown or the most critical. */
export function LoopFigures() {
  const layout = useLayout();
  const talkerId = useSession((session) => session.talkerId);
  const prediction = useSchemePrediction();
  const talker = prediction === null ? null : criticalTalker(prediction, talkerId);
  if (prediction === null || talker === null || talker.loop.room.limitDb === null) return null;
  const { working, uniformity } = talker;
  return (
    <>
      <section className="item-section" aria-label="Loop">
        <h3>
          Loop, {talkerLabel(layout, talker.id)} talking <span>dB</span>
        </h3>
        <table className="charts-absorption">
          <thead>
            <tr>
              <th scope="col">Limit of gain</th>
              <th scope="col" className="n">
                talking
              </th>
              <th scope="col" className="n">
                in pauses
              </th>
              <th scope="col" className="n">
                others open
              </th>
            </tr>
          </thead>
          <tbody>
            {RUNGS.map((rung) => {
              const loop = talker.loop[rung];
              return (
                <tr key={rung}>
                  <th scope="row">{RUNG_LABELS[rung]}</th>
                  <td className="n">{figure(loop.limitDb)}</td>
                  <td className="n">{figure(loop.idleLimitDb)}</td>
                  <td className="n">{signedFigure(negative(loop.openMicrophoneCostDb))}</td>
                </tr>
              );
            })}
          </tbody>
        </table>
        <dl className="said">
          <Said what="Working gain" unit="dB">
            {figure(working.workingGainDb)}
          </Said>
          <Said what="What the loop adds there" unit="dB">
            {figure(working.regenerationDb)}
          </Said>
          <Said what="Peak allowance" unit="dB">
            {figure(working.peakAllowanceDb)}
          </Said>
          <Said what="Level over the seats, spread" unit="dB">
            {figure(uniformity.spreadDb)}
          </Said>
          <Said what="Level over the seats, deviation" unit="dB">
            {figure(uniformity.deviationDb)}
          </Said>
        </dl>
      </section>
      <section className="item-section" aria-label="Limit by octave">
        <h3>
          Limit by octave, rings first at {octaveFigure(NOMINAL_HZ[talker.loop.room.limitingBand])} <span>dB</span>
        </h3>
        <BandChart
          label="Limit by octave"
          unit="dB"
          series={[
            { label: RUNG_LABELS.room, values: talker.loop.room.bandLimitsDb },
            { label: RUNG_LABELS.directivity, values: talker.loop.directivity.bandLimitsDb, second: true },
          ]}
          bands={BAND_NAMES}
          write={(value) => figure(value, 0)}
        />
      </section>
    </>
  );
}

/** A cost as the change it makes. */
const negative = (cost: number | null): number | null => (cost === null ? null : -cost);
