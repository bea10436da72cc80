import { type FocusEvent, type KeyboardEvent, useEffect, useId, useRef, useState } from 'react';
import { figure, NO_FIGURE } from '../report/figures';
import { nudge, type QuantityRule, readQuantity, stepsOfKey } from './quantity-text';
import { useScrub } from './use-scrub';

/** `live`: under way, to be joined with what follows; `commit`: this is it. */
export type Phase = 'live' | 'commit';

export interface QuantityFieldProps {
  /** Accessible name, such as "Place x". */
  label: string;
  /** Short visible name; dragging it changes the value. */
  name?: string;
  value: number | null;
  unit?: string;
  digits?: number;
  /** What one press of an arrow key adds. */
  step?: number;
  min: number;
  max: number;
  whole?: boolean;
  /** An empty field means none, said as `none`. */
  nullable?: boolean;
  none?: string;
  /** What nudging starts from where there is no value. */
  start?: number;
  parse?: (text: string) => number | null;
  format?: (value: number) => string;
  disabled?: boolean;
  className?: string;
  onChange: (value: number | null, phase: Phase) => void;
  /** The value of before is wanted back. */
  onCancel: () => void;
}

/**
 * A number to type with its unit, nudge with keys or drag by its name. What is typed is sent live while it is valid;
 * Enter or leaving settles it, Escape takes it back. Looking at a value never changes it.
 */
export function QuantityField(props: QuantityFieldProps) {
  const { label, name, value, unit = '', digits = 1, step = 1, nullable = false, none = NO_FIGURE } = props;
  const format = props.format ?? ((shown: number) => figure(shown, digits));
  const say = (shown: number) => `${format(shown)}${unit === '' || unit === '°' ? unit : ` ${unit}`}`;
  const { min, max, whole = false, parse } = props;
  const rule: QuantityRule = {
    min,
    max,
    whole,
    nullable,
    say: (end) => say(end).replace(/\.0+(?= |$)/, ''),
    ...(parse && { parse }),
  };

  const whyId = useId();
  const [typed, setTyped] = useState<string | null>(null);
  const [why, setWhy] = useState<string | null>(null);
  // True from the first live value to the one that settles it; a ref, because blur may follow in the same event.
  const underWay = useRef(false);
  const input = useRef<HTMLInputElement>(null);
  const latest = useRef(props);
  latest.current = props;

  const send = (next: number | null, phase: Phase) => {
    underWay.current = phase === 'live';
    props.onChange(next, phase);
  };
  // A field that goes away under someone's hands (another thing was selected) settles what it has sent.
  useEffect(
    () => () => {
      if (underWay.current) latest.current.onChange(latest.current.value, 'commit');
      underWay.current = false;
    },
    [],
  );
  const takeBack = () => {
    if (underWay.current) props.onCancel();
    underWay.current = false;
  };
  const type = (text: string) => {
    setTyped(text);
    const reading = readQuantity(text, rule);
    if (reading.ok) send(reading.value, 'live');
    else takeBack();
    setWhy(reading.ok || reading.unfinished ? null : reading.why);
  };
  const settle = () => {
    if (typed !== null) {
      const reading = readQuantity(typed, rule);
      if (!reading.ok) return setWhy(reading.why);
      send(reading.value, 'commit');
      setTyped(null);
    } else if (underWay.current) send(value, 'commit');
  };
  const move = (steps: number) => {
    const reading = typed === null ? null : readQuantity(typed, rule);
    const from = (reading?.ok ? reading.value : value) ?? props.start ?? Math.min(max, Math.max(min, 0));
    setTyped(null);
    setWhy(null);
    send(nudge(from, steps, step, rule), 'live');
  };
  const cancel = () => {
    takeBack();
    setTyped(null);
    setWhy(null);
  };
  const scrub = useScrub({
    value: value ?? props.start ?? Math.min(max, Math.max(min, 0)),
    step,
    rule,
    disabled: props.disabled ?? false,
    onMove: (next) => {
      setTyped(null);
      setWhy(null);
      send(next, 'live');
    },
    onEnd: (last) => send(last, 'commit'),
    onCancel: cancel,
  });

  const onKeyDown = (event: KeyboardEvent) => {
    const steps = stepsOfKey(event.key, event.shiftKey, event.altKey);
    if (steps !== null) move(steps);
    else if (event.key === 'Enter') settle();
    else if (event.key === 'Escape' && (typed !== null || underWay.current)) cancel();
    else return;
    event.preventDefault();
    event.stopPropagation();
    // Ready to be typed over, once the value is drawn.
    if (event.key !== 'Enter' || typed !== null) requestAnimationFrame(() => input.current?.select());
  };
  const shown = typed ?? (value === null ? '' : format(value));
  return (
    <label className={`field ${props.className ?? ''}`} data-invalid={why !== null || undefined}>
      <span>
        {name !== undefined && (
          <span className="field-name" aria-hidden="true" {...scrub}>
            {name}
          </span>
        )}
        <input
          ref={input}
          role="spinbutton"
          type="text"
          inputMode="text"
          autoComplete="off"
          spellCheck={false}
          aria-label={label}
          aria-valuenow={value ?? undefined}
          aria-valuemin={min}
          aria-valuemax={max}
          aria-valuetext={value === null ? (nullable ? none : 'no value') : say(value)}
          aria-invalid={why !== null}
          aria-describedby={why === null ? undefined : whyId}
          data-dirty={typed !== null || undefined}
          disabled={props.disabled}
          placeholder={none}
          value={shown}
          onChange={(event) => type(event.target.value)}
          onFocus={(event: FocusEvent<HTMLInputElement>) => event.target.select()}
          onBlur={settle}
          onKeyDown={onKeyDown}
        />
        {unit !== '' && (shown !== '' || /\d/.test(none)) && <i className="u">{unit}</i>}
      </span>
      {why !== null && (
        <em className="field-why" id={whyId} role="alert">
          {why}
        </em>
      )}
    </label>
  );
}
