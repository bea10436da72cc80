import type { CSSProperties, Ref } from 'react';
import { talkerLabel } from '../layout/talker-label';
import { RUNGS } from '../predict/prediction';
import { figure, marginFigure } from '../report/figures';
import { RUNG_LABELS, seatStanding } from '../report/quantities';
import type { RoomScene } from './use-room-scene';

interface HoverCardProps {
  scene: RoomScene;
  seatId: string;
  cardRef?: Ref<HTMLDivElement>;
  style?: CSSProperties;
  /** The side of the seat that it stands on. */
  across?: 'left' | 'right';
  upright?: 'above' | 'below';
}

/** What a seat pointed at has to say: its figure, its three margins, its talker and its loudspeaker. */
export default function HoverCard(props: HoverCardProps) {
  const { scene, seatId, cardRef, style, across = 'right', upright = 'above' } = props;
  const index = scene.seatIndex.get(seatId);
  if (index === undefined) return null;
  return (
    <div className="room-card" ref={cardRef} style={style} data-across={across} data-upright={upright}>
      <i className="room-card-leader" />
      <div className="room-card-sheet">
        <Figures scene={scene} index={index} />
      </div>
    </div>
  );
}

function Figures({ scene, index }: { scene: RoomScene; index: number }) {
  const { seats, figures, quantity, predicted, talkerId, layout } = scene;
  const seatInPrediction = figures.predicted[index];
  const head = <strong>{seats[index].id}</strong>;
  if (predicted === null || seatInPrediction < 0) {
    return (
      <p>
        {head} <span className="dimmed">not predicted yet</span>
      </p>
    );
  }
  const standing = seatStanding(predicted, talkerId, seatInPrediction);
  if (standing.talker < 0) {
    return (
      <p>
        {head} <span className="dimmed">not judged: no talker but its own</span>
      </p>
    );
  }
  const talker = predicted.talkers[standing.talker];
  const label = talkerLabel(layout, talker.id);
  const servedBy = talker.room.servedBy[seatInPrediction];
  return (
    <>
      <p className="room-card-head">
        {head}
        <span className="room-card-figure">
          {quantity.id === 'margin'
            ? marginFigure(figures.marginDb[index])
            : figure(figures.value[index], quantity.digits)}
          <span className="u">{quantity.unit}</span>
        </span>
        <span className="dimmed">{verdictOf(standing.judged, standing.short)}</span>
      </p>
      <dl>
        {RUNGS.map((rung) => (
          <div key={rung}>
            <dt>{RUNG_LABELS[rung]}</dt>
            <dd>
              {marginFigure(talker.seats[rung].marginDb[seatInPrediction])}
              <span className="u">dB</span>
            </dd>
          </div>
        ))}
      </dl>
      <p className="room-card-foot">
        {talkerId === null ? 'Worst for' : 'For'} {label}
        {servedBy >= 0 && `; served by ${predicted.loudspeakerIds[servedBy]}`}
      </p>
    </>
  );
}

function verdictOf(judged: boolean, short: boolean): string {
  if (!judged) return 'its own talker';
  return short ? 'short' : 'served';
}
