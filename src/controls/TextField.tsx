import { type KeyboardEvent, useEffect, useId, useRef, useState } from 'react';
import type { Phase } from './QuantityField';

export interface TextFieldProps {
  /** Accessible name. */
  label: string;
  /** Short visible name. */
  name?: string;
  value: string;
  placeholder?: string;
  /** Why a text is not accepted, null where it is. */
  refuse?: (text: string) => string | null;
  /** Sends each text while typing, not only the last. */
  live?: boolean;
  multiline?: boolean;
  className?: string;
  onChange: (value: string, phase: Phase) => void;
  onCancel?: () => void;
}

/** A text to type. Enter or leaving settles it, Escape takes it back; what is not accepted stays until mended. */
export function TextField(props: TextFieldProps) {
  const { label, name, value, refuse, live = false, multiline = false } = props;
  const whyId = useId();
  const [typed, setTyped] = useState<string | null>(null);
  const [why, setWhy] = useState<string | null>(null);
  const underWay = useRef(false);
  // What is typed and not settled, at once: a field may go away before it is drawn again.
  const pending = useRef(false);

  const takeBack = () => {
    if (underWay.current) props.onCancel?.();
    underWay.current = false;
  };
  const type = (text: string) => {
    pending.current = true;
    setTyped(text);
    const reason = refuse?.(text) ?? null;
    setWhy(text === '' ? null : reason);
    if (reason !== null) takeBack();
    else if (live) {
      underWay.current = true;
      props.onChange(text, 'live');
    }
  };
  const settle = () => {
    if (typed === null || !pending.current) return;
    const reason = refuse?.(typed) ?? null;
    if (reason !== null) return setWhy(reason);
    pending.current = false;
    if (typed !== value || underWay.current) props.onChange(typed, 'commit');
    underWay.current = false;
    setTyped(null);
    setWhy(null);
  };
  // A field that goes away under someone's hands (another thing was selected) keeps what was typed.
  const settleLast = useRef(settle);
  settleLast.current = settle;
  useEffect(() => () => settleLast.current(), []);
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'Enter' && !(multiline && !event.ctrlKey && !event.metaKey)) settle();
    else if (event.key === 'Escape' && typed !== null) {
      takeBack();
      pending.current = false;
      setTyped(null);
      setWhy(null);
    } else return;
    event.preventDefault();
    event.stopPropagation();
  };
  const shared = {
    'aria-invalid': why !== null,
    'aria-describedby': why === null ? undefined : whyId,
    'data-dirty': typed !== null || undefined,
    className: 'txt',
    placeholder: props.placeholder,
    value: typed ?? value,
    onBlur: settle,
    onKeyDown,
  };
  return (
    // biome-ignore lint/a11y/noLabelWithoutControl: the field in it is one of two.
    <label
      className={`field ${multiline ? 'tall' : ''} ${props.className ?? ''}`}
      data-invalid={why !== null || undefined}
    >
      <span>
        {name !== undefined && (
          <span className="field-name" aria-hidden="true">
            {name}
          </span>
        )}
        {multiline ? (
          <textarea {...shared} aria-label={label} rows={3} onChange={(event) => type(event.target.value)} />
        ) : (
          <input
            {...shared}
            aria-label={label}
            type="text"
            autoComplete="off"
            spellCheck={false}
            onChange={(event) => type(event.target.value)}
          />
        )}
      </span>
      {why !== null && (
        <em className="field-why" id={whyId} role="alert">
          {why}
        </em>
      )}
    </label>
  );
}
