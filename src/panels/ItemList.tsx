import { type KeyboardEvent, memo, type RefObject, useEffect, useRef, useState } from 'react';
import { Button, type Key, type Selection, Tree, TreeItem, TreeItemContent } from 'react-aria-components';
import type { Ref, RefKind } from '../layout/ref';
import { keyOf, type ListedGroup, type ListedItem, refOf } from './item-list';

export interface ItemListProps {
  groups: readonly ListedGroup[];
  /** Everything is open while searching. */
  searching: boolean;
  /** Key of the row selected, null for none. */
  selected: string | null;
  /** The element, so that the search field can lead into it. */
  listRef: RefObject<HTMLDivElement | null>;
  onSelect: (ref: Ref | null) => void;
  onDelete: () => void;
  onDuplicate: () => void;
}

const groupKey = (kind: RefKind): string => `group:${kind}`;

/** Everything in the layout, as groups that open. Arrows walk and open, letters jump, Delete and Ctrl D act. */
export const ItemList = memo(function ItemList(props: ItemListProps) {
  const { groups, searching, selected, listRef } = props;
  const [opened, setOpened] = useState<ReadonlySet<Key>>(new Set([groupKey('loudspeaker')]));
  // The group that a selection made elsewhere has opened; it closes again with the next one.
  const [sought, setSought] = useState<Key | null>(null);
  const groupKeys = groups.map((group) => groupKey(group.kind));
  const expanded: Key[] = searching ? groupKeys : [...opened, ...(sought === null ? [] : [sought])];

  // A selection made elsewhere opens its group and comes into view.
  const shown = useRef<string | null>(null);
  // After Delete or Ctrl D the keyboard goes where the selection goes.
  const follow = useRef(false);
  useEffect(() => {
    if (shown.current === selected) return;
    shown.current = selected;
    if (selected === null) return;
    const key = groupKey(refOf(selected).kind);
    setSought(key);
    // Its row is there after the group has opened.
    const frame = requestAnimationFrame(() => {
      const row = listRef.current?.querySelector<HTMLElement>(`[data-key="${CSS.escape(selected)}"]`);
      bringIntoView(row);
      if (follow.current) row?.focus({ preventScroll: true });
      follow.current = false;
    });
    return () => cancelAnimationFrame(frame);
  }, [selected, listRef]);

  const open = (keys: Iterable<Key>) => {
    if (searching) return;
    setSought(null);
    setOpened(new Set(keys));
  };
  const toggle = (key: Key) =>
    open(expanded.includes(key) ? expanded.filter((other) => other !== key) : [...expanded, key]);
  const select = (keys: Selection) => {
    const [key] = keys === 'all' ? [] : [...keys];
    // Walking over a group, which cannot be selected, leaves the selection as it is; Escape gives it up.
    if (key === undefined) return;
    shown.current = String(key);
    props.onSelect(refOf(String(key)));
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const deletes = event.key === 'Delete' || event.key === 'Backspace';
    const duplicates = event.key.toLowerCase() === 'd' && (event.ctrlKey || event.metaKey);
    follow.current = deletes || duplicates;
    if (deletes) props.onDelete();
    else if (duplicates) props.onDuplicate();
    else if (event.key === 'Escape' && selected !== null) props.onSelect(null);
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  return (
    <div className="list" onKeyDownCapture={onKeyDown}>
      <Tree
        ref={listRef}
        className="list-tree"
        aria-label="Everything in the layout"
        selectionMode="single"
        selectionBehavior="replace"
        selectedKeys={selected === null ? [] : [selected]}
        onSelectionChange={select}
        expandedKeys={expanded}
        onExpandedChange={open}
        disabledKeys={groupKeys}
        disabledBehavior="selection"
        renderEmptyState={() => <p className="list-none">Nothing found.</p>}
      >
        {groups.map((group) => (
          <TreeItem
            key={group.kind}
            id={groupKey(group.kind)}
            textValue={group.label}
            className="list-row group"
            onAction={() => toggle(groupKey(group.kind))}
          >
            <TreeItemContent>
              <Button slot="chevron" className="list-chevron" aria-label={`Open or close ${group.label}`}>
                <i aria-hidden="true" />
              </Button>
              <span>{group.label}</span>
              <span className="list-total">{group.total}</span>
            </TreeItemContent>
            {group.items.map(row)}
          </TreeItem>
        ))}
      </Tree>
    </div>
  );
});

/** Scrolls the list and nothing round it. */
function bringIntoView(row: HTMLElement | null | undefined): void {
  const list = row?.closest('.list');
  if (row == null || list == null) return;
  const [inner, outer] = [row.getBoundingClientRect(), list.getBoundingClientRect()];
  if (inner.top < outer.top) list.scrollTop -= outer.top - inner.top;
  else if (inner.bottom > outer.bottom) list.scrollTop += inner.bottom - outer.bottom;
}

function row({ ref, label, detail }: ListedItem) {
  return (
    <TreeItem key={keyOf(ref)} id={keyOf(ref)} textValue={`${ref.id} ${label}`} className="list-row one">
      <TreeItemContent>
        <span className="id">{ref.id}</span>
        <span className="list-label">{label}</span>
        <span className="u">{detail}</span>
      </TreeItemContent>
    </TreeItem>
  );
}
