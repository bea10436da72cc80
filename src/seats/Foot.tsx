import { useMemo } from 'react';
import type { SchemePrediction } from '../predict/prediction';
import { figure, marginFigure, NO_FIGURE, signedFigure } from '../report/figures';
import { summarise } from '../report/quantities';
import { useSession } from '../session/session';
import type { SeatRow } from './rows';

interface FootProps {
  all: readonly SeatRow[];
  kept: readonly SeatRow[];
  scheme: SchemePrediction | null;
  stale: boolean;
  /** Takes the filter and the choice of a block away. */
  onShowAll: () => void;
}

/** What the rows shown come to, and what a reader should know about them. */
export default function Foot({ all, kept, scheme, stale, onShowAll }: FootProps) {
  const talkerId = useSession((session) => session.talkerId);
  const summary = useMemo(
    () =>
      scheme === null
        ? null
        : summarise(
            scheme,
            talkerId,
            kept.map((row) => row.seat),
          ),
    [scheme, talkerId, kept],
  );
  if (summary === null) return <div className="seats-foot" />;
  const worst = kept.find((row) => row.seat === summary.worstSeat);
  return (
    <div className="seats-foot">
      <span>
        Worst{' '}
        <b>
          {worst?.id ?? NO_FIGURE} {worst !== undefined && marginFigure(summary.worstMarginDb)}
        </b>
        <span className="u">dB</span>
      </span>
      <span>
        Mean <b>{signedFigure(summary.meanMarginDb)}</b>
        <span className="u">dB</span>
      </span>
      <span>
        Spread <b>{figure(summary.spreadDb)}</b>
        <span className="u">dB</span>
      </span>
      <span>
        Short <b>{`${summary.short} of ${summary.judged}`}</b>
      </span>
      <span className="wide-only">
        STI from <b>{figure(summary.stiFrom, 2)}</b> to <b>{figure(summary.stiTo, 2)}</b>
      </span>
      <Aside all={all} kept={kept} stale={stale} onShowAll={onShowAll} />
    </div>
  );
}

function Aside({ all, kept, stale, onShowAll }: Omit<FootProps, 'scheme'>) {
  const selection = useSession((session) => session.selection);
  if (stale) return <span className="dimmed seats-aside seats-stale">as before the last change</span>;
  const has = (rows: readonly SeatRow[]) => rows.some((row) => row.id === selection?.id);
  if (selection?.kind === 'seat' && has(all) && !has(kept)) {
    return (
      <span className="seats-aside" role="status">
        {selection.id} is selected but filtered out.
        <button type="button" className="seats-link" onClick={onShowAll}>
          Show all
        </button>
      </span>
    );
  }
  const own = kept.filter((row) => row.own);
  if (own.length === 0) return null;
  const said = own.length === 1 ? sayOwn(own[0]) : `${own.length} seats are a talker’s own`;
  return <span className="dimmed seats-aside wide-only">{said}</span>;
}

const sayOwn = ({ id, talker }: SeatRow): string =>
  id === talker ? `${id} is the talker’s own seat` : `${id} is where ${talker} sits`;
