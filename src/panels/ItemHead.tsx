import { useEffect, useRef } from 'react';
import { Action } from '../controls/Action';
import { TextField } from '../controls/TextField';
import { rename } from '../layout/edits';
import { type Ref, sameRef } from '../layout/ref';
import type { Layout } from '../layout/schema';
import { useScheme, useSession } from '../session/session';
import { bind, editOnce } from './binding';
import { Row } from './Fields';

/** Title of a panel: id, label, and the way back to the venue. */
export function ItemHead({ title, label = '', what }: { title: string; label?: string; what?: string }) {
  const select = useSession((session) => session.select);
  return (
    <header className="item-head">
      <h2>{title}</h2>
      <span className="item-title">{label === '' ? (what ?? '') : label}</span>
      <Action className="item-back" onPress={() => select(null)}>
        Venue
      </Action>
    </header>
  );
}

/** The panels there is one of, as ways from one to the other. */
export function Ways({ current }: { current: 'venue' | 'scheme' | 'system' | 'routing' }) {
  const select = useSession((session) => session.select);
  const scheme = useScheme();
  const ways: [typeof current, string, Ref | null][] = [
    ['venue', 'Venue', null],
    ['scheme', `Scheme ${scheme.id}`, { kind: 'scheme', id: scheme.id }],
    ['system', 'System', { kind: 'system', id: '' }],
    ['routing', 'Routing', { kind: 'routing', id: '' }],
  ];
  return (
    <nav className="item-ways" aria-label="Whole layout">
      {ways.map(([kind, label, ref]) => (
        <button type="button" className="view" key={kind} aria-pressed={kind === current} onClick={() => select(ref)}>
          {label}
        </button>
      ))}
    </nav>
  );
}

/** Ids up to this many letters fit beside a label. */
const LONG_ID = 8;

let focusedAfterRename: string | null = null;

interface NamedProps {
  item: Ref;
  label: string;
  /** Everything of this kind, for ids already taken. */
  taken: readonly { id: string }[];
  setLabel?: (layout: Layout, label: string) => Layout;
}

/** Id and label to type. The id is settled by Enter or leaving, and everything that points to it follows. */
export function NameRow({ item, label, taken, setLabel }: NamedProps) {
  const schemeId = useSession((session) => session.schemeId);
  // A long id needs a row of its own to be read whole.
  const long = item.id.length > LONG_ID;
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (focusedAfterRename === item.id) box.current?.querySelector('input')?.focus();
    focusedAfterRename = null;
  }, [item.id]);
  const refuse = (id: string) => {
    if (id.trim() === '') return 'An id has at least one character.';
    return taken.some((other) => other.id === id.trim() && other.id !== item.id) ? `“${id.trim()}” is taken.` : null;
  };
  const setId = (typed: string) => {
    const id = typed.trim();
    if (id === item.id) return;
    editOnce(`Rename ${item.id} to ${id}`, (layout) => rename(layout, schemeId, item, id));
    // Settled by Enter the field still has the focus, and its panel is about to be made anew under the new id.
    focusedAfterRename = document.activeElement instanceof HTMLInputElement ? id : null;
    const session = useSession.getState();
    if (item.kind === 'talker' && session.talkerId === item.id) session.showTalker(id);
    if (item.kind === 'scheme') session.showScheme(id);
    if (sameRef(session.selection, item)) session.select({ kind: item.kind, id });
  };
  const idField = (
    <div ref={box} className={long ? 'full' : undefined}>
      <TextField label="Id" {...(!long && { name: 'id' })} value={item.id} refuse={refuse} onChange={setId} />
    </div>
  );
  const labelField = setLabel !== undefined && (
    <TextField
      className={long ? 'full' : 'wide'}
      label="Label"
      value={label}
      placeholder="Label"
      live
      {...bind<string>(`Label ${item.id}`, `${item.kind}.${item.id}.label`, setLabel)}
    />
  );
  if (!long) {
    return (
      <Row what="Name" at={['id', 'label']}>
        {idField}
        {labelField}
      </Row>
    );
  }
  return (
    <>
      <Row what="Id" at={['id']}>
        {idField}
      </Row>
      {setLabel !== undefined && (
        <Row what="Label" at={['label']}>
          {labelField}
        </Row>
      )}
    </>
  );
}
