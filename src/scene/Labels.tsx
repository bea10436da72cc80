import type { RefObject } from 'react';
import type { Ref } from '../layout/ref';
import type { LabelSpec } from './label-list';

interface LabelsProps {
  labels: readonly LabelSpec[];
  /** Filled with the elements, by key, for whoever puts them in their place. */
  elements: RefObject<Map<string, HTMLElement>>;
  onPick: (ref: Ref) => void;
}

/** The lettering over the drawing. Names of things are buttons that select them. */
export default function Labels({ labels, elements, onPick }: LabelsProps) {
  return (
    <div className="room-labels">
      {labels.map(({ key, look, text, name, ref, on }) => {
        const keep = (element: HTMLElement | null) => {
          if (element === null) elements.current.delete(key);
          else elements.current.set(key, element);
        };
        const shown = { className: `room-label room-label-${look}`, 'data-on': on || undefined, ref: keep };
        if (ref === null) {
          return (
            <span key={key} {...shown} aria-hidden={look === 'dimension' || undefined}>
              {text}
            </span>
          );
        }
        return (
          <button
            key={key}
            type="button"
            {...shown}
            data-ref={`${ref.kind}:${ref.id}`}
            aria-label={name}
            aria-pressed={look === 'aim-point' ? undefined : on}
            title={name}
            onClick={() => onPick(ref)}
          >
            {text}
          </button>
        );
      })}
    </div>
  );
}
