import type { CameraHandle } from './CameraRig';
import type { ViewKind } from './views';

/** Views by digit, in the order of the bar. */
const DIGITS: readonly ViewKind[] = ['orbit', 'plan', 'long-section', 'cross-section', 'seat', 'aim'];

const TURN_RAD = Math.PI / 36;
const PAN_SHARE = 0.06;
const ZOOM = 1.12;

/** What the keys of the drawing do. True where the key was one of them. */
export function roomKey(
  event: { key: string; shiftKey: boolean; ctrlKey: boolean; metaKey: boolean; altKey: boolean },
  camera: CameraHandle,
  showView: (kind: ViewKind) => void,
): boolean {
  if (event.ctrlKey || event.metaKey || event.altKey) return false;
  const digit = DIGITS[Number(event.key) - 1];
  if (digit !== undefined) showView(digit);
  else if (event.key === 'Home') showView('orbit');
  else if (event.key === '+' || event.key === '=') camera.zoom(ZOOM);
  else if (event.key === '-' || event.key === '_') camera.zoom(1 / ZOOM);
  else {
    const arrow = ARROWS[event.key];
    if (arrow === undefined) return false;
    const [right, up] = arrow;
    if (event.shiftKey) camera.pan(right * PAN_SHARE, up * PAN_SHARE);
    else camera.orbit(right * TURN_RAD, up * TURN_RAD);
  }
  return true;
}

const ARROWS: Readonly<Record<string, readonly [number, number]>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, 1],
  ArrowDown: [0, -1],
};
