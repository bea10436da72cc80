import { type DOMAttributes, useEffect, useRef } from 'react';
import { useMove } from 'react-aria/useMove';
import { nudge, type QuantityRule } from './quantity-text';

/** Pixels of dragging for one step. */
const PX_PER_STEP = 4;

export interface ScrubOptions {
  value: number;
  step: number;
  rule: Pick<QuantityRule, 'min' | 'max' | 'whole'>;
  disabled: boolean;
  onMove: (value: number) => void;
  onEnd: (value: number) => void;
  onCancel: () => void;
}

/** Props that make an element a handle: dragging it sideways or up changes a value; Shift is coarse, Alt fine. */
export function useScrub(options: ScrubOptions): DOMAttributes<HTMLElement> {
  const drag = useRef<{ from: number; steps: number; last: number; given: boolean } | null>(null);
  const latest = useRef(options);
  latest.current = options;

  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key !== 'Escape' || drag.current === null || drag.current.given) return;
      event.stopPropagation();
      drag.current.given = true;
      latest.current.onCancel();
    };
    window.addEventListener('keydown', onKeyDown, true);
    return () => window.removeEventListener('keydown', onKeyDown, true);
  }, []);

  const { moveProps } = useMove({
    onMoveStart(event) {
      if (event.pointerType === 'keyboard' || options.disabled) return;
      drag.current = { from: options.value, steps: 0, last: options.value, given: false };
    },
    onMove(event) {
      const current = drag.current;
      if (current === null || current.given) return;
      const size = event.shiftKey ? 10 : event.altKey ? 0.1 : 1;
      current.steps += ((event.deltaX - event.deltaY) / PX_PER_STEP) * size;
      const whole = event.altKey ? Math.round(current.steps * 10) / 10 : Math.round(current.steps);
      const next = nudge(current.from, whole, options.step, options.rule);
      if (next === current.last) return;
      current.last = next;
      options.onMove(next);
    },
    onMoveEnd() {
      const current = drag.current;
      drag.current = null;
      if (current !== null && !current.given && current.last !== current.from) options.onEnd(current.last);
    },
  });
  return moveProps as DOMAttributes<HTMLElement>;
}
