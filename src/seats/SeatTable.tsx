import { type ReactNode, useEffect, useState } from 'react';
import { useSession } from '../session/session';
import CopyByHand from './CopyByHand';
import Foot from './Foot';
import Grid from './Grid';
import { rowsCsv, rowsTsv } from './rows-text';
import SeatBar from './SeatBar';
import { columnOf, useSeatGrid } from './seat-grid';
import { copyText, saveText, seatsFileName } from './take-rows';
import { useMarks } from './use-marks';
import { useSeatRows } from './use-seat-rows';
import './seats.css';

/** How long the table says what it has done. */
const SAID_FOR_MS = 4000;

/** Every seat with its figures: sort, filter, choose columns, take rows away. Joined to the selection both ways. */
export default function SeatTable() {
  const [wantedBlock, setBlock] = useState<string | null>(null);
  const seating = useSession((session) => session.predictedLayout?.venue.seating);
  const blockId = seating?.some((part) => part.id === wantedBlock) ? wantedBlock : null;
  const { all, kept, scheme, stale, problem } = useSeatRows(blockId);
  const { grid, sorted } = useSeatGrid(kept);
  const marks = useMarks();
  const [done, setDone] = useState('');
  useEffect(() => {
    if (done === '') return;
    const timer = setTimeout(() => setDone(''), SAID_FOR_MS);
    return () => clearTimeout(timer);
  }, [done]);
  const [byHand, setByHand] = useState<string | null>(null);

  const columns = grid.getVisibleLeafColumns().map((column) => columnOf(column.id));
  const marked = marks.ids.size === 0 ? [] : sorted.filter((row) => marks.ids.has(row.id));
  const taken = marked.length > 0 ? marked : sorted;

  const copy = async () => {
    const text = rowsTsv(columns, taken);
    if (await copyText(text)) setDone(`Copied ${taken.length === 1 ? '1 row' : `${taken.length} rows`}`);
    else setByHand(text);
  };
  const save = () => {
    const { history, schemeId } = useSession.getState();
    saveText(rowsCsv(columns, sorted), seatsFileName(history.layout.name, scheme?.id ?? schemeId));
  };
  const showAll = () => {
    useSession.getState().setSeatFilter('');
    setBlock(null);
  };
  const empty = whyEmpty(sorted.length, all.length, scheme !== null, showAll);
  return (
    <section className="seats" aria-label="Seats">
      <SeatBar
        grid={grid}
        blocks={seating ?? []}
        blockId={blockId}
        onBlock={setBlock}
        shown={sorted.length}
        of={all.length}
        marked={marked.length}
        problem={problem}
        done={done}
        onCopy={() => void copy()}
        onSave={save}
      />
      <Grid
        grid={grid}
        rows={sorted}
        columns={columns}
        marks={marks}
        empty={empty}
        all={all}
        onCopy={() => void copy()}
      />
      <Foot all={all} kept={kept} scheme={scheme} stale={stale} onShowAll={showAll} />
      {byHand !== null && <CopyByHand text={byHand} close={() => setByHand(null)} />}
    </section>
  );
}

function whyEmpty(shown: number, of: number, predicted: boolean, showAll: () => void): ReactNode {
  if (shown > 0) return null;
  if (!predicted) return 'Seats are shown once the layout is predicted.';
  if (of === 0) return 'No seats yet: add a seating block.';
  return (
    <>
      No seat is like that.
      <button type="button" className="seats-link" onClick={showAll}>
        Show all
      </button>
    </>
  );
}
