import { useSession } from '../session/session';
import { type Action, allActions } from './actions';

/** Runs actions by their keys, anywhere on the page. Keys without Ctrl, ⌘ or Alt are left to the regions. */
export function listenForShortcuts(openPalette: () => void): () => void {
  const pressed = (event: KeyboardEvent) => {
    if (event.defaultPrevented) return;
    const keys = keysOf(event);
    if (keys === 'Mod+k') {
      event.preventDefault();
      openPalette();
      return;
    }
    // Undo inside a field one types in is the field's own.
    if (isTyping(event.target) && (keys === 'Mod+z' || keys === 'Mod+Shift+z' || keys === 'Mod+y')) return;
    const action = allActions().find((candidate) => candidate.keys?.includes(keys));
    if (action === undefined) return;
    event.preventDefault();
    runAction(action);
  };
  window.addEventListener('keydown', pressed);
  return () => window.removeEventListener('keydown', pressed);
}

export function runAction(action: Action): void {
  if ((action.unavailable?.(useSession.getState()) ?? null) === null) action.run();
}

function keysOf(event: KeyboardEvent): string {
  const parts = [];
  if (event.ctrlKey || event.metaKey) parts.push('Mod');
  if (event.altKey) parts.push('Alt');
  if (event.shiftKey) parts.push('Shift');
  parts.push(event.key.length === 1 ? event.key.toLowerCase() : event.key);
  return parts.join('+');
}

/** A field with text that is not settled yet keeps its own undo. */
function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLTextAreaElement || (target instanceof HTMLInputElement && target.dataset.dirty === 'true')
  );
}

/** Keys as a person reads them on this machine. */
export function sayKeys(keys: string): string {
  const mac = /Mac|iPhone|iPad/.test(navigator.platform);
  return keys
    .split('+')
    .map((key) => (key === 'Mod' ? (mac ? '⌘' : 'Ctrl') : key.length === 1 ? key.toUpperCase() : key))
    .join(mac ? '' : ' ');
}
