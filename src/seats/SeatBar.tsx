import { useId } from 'react';
import { Button, ListBox, ListBoxItem, Popover, Select, SelectValue } from 'react-aria-components';
import type { Seating } from '../layout/schema';
import { useSession } from '../session/session';
import ColumnsMenu from './ColumnsMenu';
import { KNOWN_NAMES } from './filter';
import type { SeatGrid } from './seat-grid';

interface SeatBarProps {
  grid: SeatGrid;
  blocks: readonly Seating[];
  blockId: string | null;
  onBlock: (id: string | null) => void;
  shown: number;
  of: number;
  marked: number;
  problem: string | null;
  /** What was just done, said for a moment. */
  done: string;
  onCopy: () => void;
  onSave: () => void;
}

/** The head of the table: which seats, which columns, and ways to take them away. */
export default function SeatBar(props: SeatBarProps) {
  const { grid, blocks, blockId, onBlock, shown, of, marked, problem, done, onCopy, onSave } = props;
  return (
    <div className="bar seats-bar">
      <h2>Seats</h2>
      <FilterField problem={problem} />
      <BlockPick blocks={blocks} blockId={blockId} onBlock={onBlock} />
      <span className="dimmed seats-shown" role="status">
        {of > 0 && `${shown} of ${of} shown`}
        {marked > 0 && `, ${marked} marked`}
      </span>
      <span className="gap" />
      <span className="dimmed seats-done" role="status">
        {done}
      </span>
      <ColumnsMenu grid={grid} />
      <button
        type="button"
        className="act"
        disabled={shown === 0}
        title={marked > 0 ? 'Copy the rows marked' : 'Copy all rows shown'}
        onClick={onCopy}
      >
        Copy
      </button>
      <button type="button" className="act" disabled={shown === 0} title="Save all rows shown" onClick={onSave}>
        Save CSV
      </button>
    </div>
  );
}

function FilterField({ problem }: { problem: string | null }) {
  const filter = useSession((session) => session.seatFilter);
  const setFilter = useSession((session) => session.setSeatFilter);
  const whyId = useId();
  return (
    <div className="seats-filter" data-invalid={problem !== null || undefined}>
      <input
        aria-label="Filter"
        placeholder="margin < 0"
        autoComplete="off"
        spellCheck={false}
        value={filter}
        aria-invalid={problem !== null}
        aria-describedby={problem === null ? undefined : whyId}
        onChange={(event) => setFilter(event.target.value)}
        onKeyDown={(event) => {
          if (event.key !== 'Escape' || filter === '') return;
          event.stopPropagation();
          setFilter('');
        }}
      />
      {filter !== '' && (
        <button type="button" className="seats-clear" aria-label="Clear the filter" onClick={() => setFilter('')}>
          ×
        </button>
      )}
      {problem !== null && (
        <p className="seats-why" id={whyId} role="status">
          <strong>{problem}</strong> {KNOWN_NAMES}
        </p>
      )}
    </div>
  );
}

/** Key of the choice that leaves every block in; a block's own key has its place before its id, and is never this. */
const ALL = 'all';

function BlockPick({ blocks, blockId, onBlock }: Pick<SeatBarProps, 'blocks' | 'blockId' | 'onBlock'>) {
  const items = [{ key: ALL, id: null as string | null, label: 'All' }].concat(
    blocks.map((part, i) => ({ key: `${i} ${part.id}`, id: part.id, label: part.label || part.id })),
  );
  const chosen = items.find((item) => item.id === blockId) ?? items[0];
  return (
    <Select
      aria-label="Block"
      value={chosen.key}
      onChange={(key) => onBlock(items.find((item) => item.key === key)?.id ?? null)}
    >
      <Button className="pick">
        <small>Block</small>
        <SelectValue>{chosen.label}</SelectValue>
      </Button>
      <Popover offset={1}>
        <ListBox className="menu" aria-label="Block" items={items}>
          {(item) => (
            <ListBoxItem id={item.key} textValue={item.label}>
              {item.label}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </Select>
  );
}
