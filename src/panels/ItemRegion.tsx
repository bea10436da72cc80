import { useCallback, useMemo, useRef, useState } from 'react';
import '../controls/controls.css';
import { canCopy, duplicate, remove, whyKept } from '../layout/edits';
import { useLayout, useScheme, useSession } from '../session/session';
import { editOnce } from './binding';
import { FindBar } from './FindBar';
import { ItemDetail } from './ItemDetail';
import { ItemList } from './ItemList';
import './item.css';
import './item-tables.css';
import { keyOf, type ListedGroup, listedRef, listGroups, searchGroups } from './item-list';
import { addSomewhere, type NewKind } from './place-new';

/** Everything in the layout above, the selected thing with its numbers below. */
export default function ItemRegion() {
  const layout = useLayout();
  const scheme = useScheme();
  const selection = useSession((session) => session.selection);
  const select = useSession((session) => session.select);
  const [query, setQuery] = useState('');
  const listRef = useRef<HTMLDivElement>(null);

  const groups = useSame(useMemo(() => searchGroups(listGroups(layout, scheme), query), [layout, scheme, query]));
  const listed = listedRef(layout, selection);
  const selected = listed !== null && groups.some((group) => group.kind === listed.kind) ? keyOf(listed) : null;
  const whyNotCopied = canCopy(selection) ? null : 'Select a talker, microphone, loudspeaker, seating or finish first.';
  const whyNotDeleted = selection === null || !canCopy(selection) ? whyNotCopied : whyKept(layout, selection);
  return (
    <aside className="item" aria-label="Item">
      <FindBar
        query={query}
        whyNotCopied={whyNotCopied}
        whyNotDeleted={whyNotDeleted}
        onQuery={setQuery}
        onEnterList={() => focusList(listRef.current)}
        onAdd={addThing}
        onDuplicate={duplicateSelected}
        onDelete={deleteSelected}
      />
      <ItemList
        groups={groups}
        searching={query.trim() !== ''}
        selected={selected}
        listRef={listRef}
        onSelect={useCallback((ref) => select(ref), [select])}
        onDelete={deleteSelected}
        onDuplicate={duplicateSelected}
      />
      <ItemDetail />
    </aside>
  );
}

/** Into the list: onto its first match, or the row it was on. */
function focusList(list: HTMLElement | null): void {
  const rows = list?.querySelectorAll<HTMLElement>('[role="row"]');
  const row = [...(rows ?? [])].find((candidate) => candidate.classList.contains('one')) ?? rows?.[0];
  row?.focus();
}

function addThing(kind: NewKind): void {
  const { schemeId, selection, select, history } = useSession.getState();
  const made = addSomewhere(history.layout, schemeId, kind, selection);
  editOnce(`Add ${made.ref.id}`, () => made.layout);
  select(made.ref);
}

function duplicateSelected(): void {
  const { schemeId, selection, select, showScheme, history } = useSession.getState();
  if (!canCopy(selection)) return;
  const made = duplicate(history.layout, schemeId, selection);
  if (made === null) return;
  editOnce(`Duplicate ${selection.id}`, () => made.layout);
  if (made.ref.kind === 'scheme') showScheme(made.ref.id);
  select(made.ref);
}

/** Deletes what is selected and selects its neighbour in the file, so that the keyboard keeps its place. */
function deleteSelected(): void {
  const { schemeId, selection, select, history } = useSession.getState();
  const { layout } = history;
  if (!canCopy(selection) || whyKept(layout, selection) !== null) return;
  const scheme = layout.schemes.find((candidate) => candidate.id === schemeId) ?? layout.schemes[0];
  const items = listGroups(layout, scheme).find((group) => group.kind === selection.kind)?.items ?? [];
  const at = items.findIndex((item) => item.ref.id === selection.id);
  const neighbour = items[at + 1] ?? items[at - 1];
  editOnce(`Delete ${selection.id}`, (before) => remove(before, schemeId, selection));
  select(neighbour?.ref ?? null);
}

/** The same list as long as it says the same, so that it is not drawn anew for every step of a drag. */
function useSame(groups: ListedGroup[]): ListedGroup[] {
  const kept = useRef({ text: '', groups });
  const text = JSON.stringify(groups);
  if (text !== kept.current.text) kept.current = { text, groups };
  return kept.current.groups;
}
