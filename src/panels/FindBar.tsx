import type { KeyboardEvent } from 'react';
import { Button, Menu, MenuItem, MenuTrigger, Popover } from 'react-aria-components';
import { Action } from '../controls/Action';
import type { NewKind } from './place-new';

const NEW: readonly { id: NewKind; label: string }[] = [
  { id: 'talker', label: 'Talker' },
  { id: 'microphone', label: 'Microphone' },
  { id: 'loudspeaker', label: 'Loudspeaker' },
  { id: 'seating', label: 'Seating block' },
];

export interface FindBarProps {
  query: string;
  /** Why the selection cannot be copied or deleted, null where it can. */
  whyNotCopied: string | null;
  whyNotDeleted: string | null;
  onQuery: (query: string) => void;
  /** Leads from the search into the list. */
  onEnterList: () => void;
  onAdd: (kind: NewKind) => void;
  onDuplicate: () => void;
  onDelete: () => void;
}

/** Search of the list, and what can be done with its things. */
export function FindBar(props: FindBarProps) {
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'ArrowDown' || event.key === 'Enter') props.onEnterList();
    else if (event.key === 'Escape' && props.query !== '') props.onQuery('');
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  return (
    <div className="find">
      <input
        type="search"
        aria-label="Find in this layout"
        placeholder="Find in this layout"
        autoComplete="off"
        spellCheck={false}
        value={props.query}
        onChange={(event) => props.onQuery(event.target.value)}
        onKeyDown={onKeyDown}
      />
      <MenuTrigger>
        <Button className="act">Add</Button>
        <Popover offset={1}>
          <Menu className="menu" aria-label="Add" onAction={(key) => props.onAdd(key as NewKind)}>
            {NEW.map(({ id, label }) => (
              <MenuItem key={id} id={id}>
                {label}
              </MenuItem>
            ))}
          </Menu>
        </Popover>
      </MenuTrigger>
      <Action why={props.whyNotCopied} onPress={props.onDuplicate}>
        Duplicate
      </Action>
      <Action why={props.whyNotDeleted} onPress={props.onDelete}>
        Delete
      </Action>
    </div>
  );
}
