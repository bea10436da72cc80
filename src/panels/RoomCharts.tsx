import { useMemo } from 'react';
import { NOMINAL_HZ } from '../acoustics/bands';
import { noiseLevelsOfNr } from '../acoustics/speech/noise';
import { talkerLevelsDb, VOCAL_EFFORT_DBA } from '../acoustics/speech/spectra';
import BandChart from '../controls/BandChart';
import { type Contribution, GOOD_ABSORBER, studyDecay } from '../predict/studies/decay';
import { BAND_NAMES, figure, octaveFigure } from '../report/figures';
import { useLayout, useSession } from '../session/session';
import './room-charts.css';

const MOST_ROWS = 8;

/** What the room does by octave: its decay, what absorbs, and how the voice stands against the noise. */
export function RoomCharts() {
  const venue = useSession((session) => session.prediction?.venue);
  if (venue === undefined) return null;
  return (
    <>
      <section className="item-section" aria-label="Decay by octave">
        <h3>
          Decay <span>s</span>
        </h3>
        <BandChart
          label="Decay by octave"
          unit="s"
          series={[{ label: 'Decay', values: venue.decayS }]}
          bands={BAND_NAMES}
          write={(value) => figure(value, 1)}
        />
      </section>
      <Absorption decayS={venue.decayS} />
      <VoiceAndNoise />
    </>
  );
}

/** Who absorbs how much at the octave shown, and which face would shorten the decay most if it were covered. */
function Absorption({ decayS }: { decayS: Float64Array }) {
  const layout = useLayout();
  const octave = useSession((session) => session.octave);
  const { select } = useSession.getState();
  const { contributions, treatments } = useMemo(() => studyDecay(layout, octave), [layout, octave]);
  const shown = contributions.slice(0, MOST_ROWS);
  const best = treatments[0];
  const octaveName = octaveFigure(NOMINAL_HZ[octave]);
  return (
    <section className="item-section" aria-label="What absorbs">
      <h3>What absorbs at {octaveName}</h3>
      <table className="charts-absorption">
        <thead>
          <tr>
            <th scope="col">Finish</th>
            <th scope="col" className="n">
              area m²
            </th>
            <th scope="col" className="n">
              absorbs m²
            </th>
            <th scope="col" className="n">
              share %
            </th>
          </tr>
        </thead>
        <tbody>
          {shown.map((part) => (
            <AbsorptionRow key={part.finish ?? 'air'} part={part} octave={octave} />
          ))}
        </tbody>
      </table>
      {best !== undefined && decayS[octave] - best.decayS[octave] > 0.005 && (
        <p className="say charts-say">
          Covering{' '}
          <button type="button" className="charts-link" onClick={() => select({ kind: 'face', id: best.face })}>
            {best.face}
          </button>{' '}
          ({figure(best.areaM2, 0)} m²) so that it absorbs {figure(GOOD_ABSORBER * 100, 0)} % would shorten the decay
          most, from {figure(decayS[octave], 2)} to {figure(best.decayS[octave], 2)} s.
        </p>
      )}
    </section>
  );
}

function AbsorptionRow({ part, octave }: { part: Contribution; octave: number }) {
  const { select } = useSession.getState();
  const { finish } = part;
  return (
    <tr>
      <th scope="row">
        {finish === null ? (
          part.label
        ) : (
          <button type="button" className="charts-link" onClick={() => select({ kind: 'finish', id: finish })}>
            {part.label}
          </button>
        )}
      </th>
      <td className="n">{finish === null ? '' : figure(part.areaM2, 0)}</td>
      <td className="n">{figure(part.absorptionM2[octave], 1)}</td>
      <td className="n">{figure(100 * part.share[octave], 0)}</td>
    </tr>
  );
}

/** Spectra of the talker shown (the first where none is chosen) at 1 m, and of the noise. */
function VoiceAndNoise() {
  const { talkers, noise } = useLayout().venue;
  const talkerId = useSession((session) => session.talkerId);
  const talker = talkers.find((candidate) => candidate.id === talkerId) ?? talkers[0];
  const noiseDb = 'nr' in noise ? noiseLevelsOfNr(noise.nr) : noise.levels;
  const series = [{ label: 'Noise', values: noiseDb, second: true }];
  if (talker !== undefined) {
    const levelDba = talker.level ?? VOCAL_EFFORT_DBA[talker.effort];
    series.unshift({ label: `${talker.label || talker.id} at 1 m`, values: talkerLevelsDb(levelDba), second: false });
  }
  return (
    <section className="item-section" aria-label="Voice and noise by octave">
      <h3>
        Voice and noise <span>dB</span>
      </h3>
      <BandChart
        label="Voice and noise by octave"
        unit="dB"
        series={series}
        bands={BAND_NAMES}
        least={20}
        write={(value) => figure(value, 0)}
      />
    </section>
  );
}
