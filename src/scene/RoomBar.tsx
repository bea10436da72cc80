import { type RefObject, useLayoutEffect, useRef, useState } from 'react';
import { Button, Menu, MenuItem, MenuTrigger, Popover } from 'react-aria-components';
import { NOMINAL_HZ } from '../acoustics/bands';
import { octaveFigure } from '../report/figures';
import { QUANTITIES, type QuantityId } from '../report/quantities';
import { useSession } from '../session/session';
import Pick from './Pick';
import type { RoomScene } from './use-room-scene';
import { VIEW_ICONS } from './view-icons';
import type { ViewChoice, ViewKind } from './views';

interface RoomBarProps {
  scene: RoomScene;
  view: ViewChoice;
  onView: (view: ViewChoice) => void;
  aimLines: boolean;
  onAimLines: (shown: boolean) => void;
  /** Drawn in plan only: ways of looking do nothing. */
  flat: boolean;
}

/** How much is left out to fit: 0 nothing, 1 the names of picks, 2 names of views, 3 what a menu can hold. */
const MOST_CROWDED = 4;

/** The head of the room: ways of looking on the left, what is shown on the right. */
export default function RoomBar({ scene, view, onView, aimLines, onAimLines, flat }: RoomBarProps) {
  const { selection, layout } = scene;
  const bar = useRef<HTMLDivElement>(null);
  const seat = selection?.kind === 'seat' ? selection.id : null;
  const device = ['microphone', 'loudspeaker', 'talker'].includes(selection?.kind ?? '') ? selection : null;
  const quantityId = useSession((session) => session.quantity);
  const crowded = useCrowding(bar, `${seat} ${device?.id} ${quantityId} ${scene.talkerId} ${flat}`);
  const views = layout.venue.views;
  const short = crowded >= 2;
  const button = (kind: Exclude<ViewKind, 'saved'>, text: string, id = '', enabled = true) => (
    <button
      type="button"
      className="view"
      aria-pressed={view.kind === kind && (kind !== 'seat' || view.id === id)}
      aria-label={text}
      title={text}
      disabled={!enabled}
      onClick={() => onView({ kind, id })}
    >
      {VIEW_ICONS[kind]}
      {labelOf(kind, text, crowded)}
    </button>
  );
  return (
    <div className="bar room-bar" ref={bar} role="toolbar" aria-label="Room view" data-crowded={crowded}>
      {!flat && (
        <>
          {button('orbit', 'Orbit')}
          {button('plan', 'Plan')}
          {button('long-section', 'Long section')}
          {button('cross-section', 'Cross section')}
          {button('seat', `From ${seat ?? 'a seat'}`, seat ?? '', seat !== null)}
          {button('aim', `Along the aim of ${device?.id ?? 'a device'}`, device?.id ?? '', device !== null)}
          {crowded < 3 && views.length > 0 && (
            <SavedViews views={views} text={short ? 'Views' : 'Saved views'} onView={onView} />
          )}
        </>
      )}
      <span className="gap" />
      <ShownPicks scene={scene} quiet={crowded >= 1} octave={crowded < 3} />
      {crowded < 3 || flat ? (
        <button type="button" className="view" aria-pressed={aimLines} onClick={() => onAimLines(!aimLines)}>
          Aim lines
        </button>
      ) : (
        <MoreMenu views={views} onView={onView} aimLines={aimLines} onAimLines={onAimLines} />
      )}
    </div>
  );
}

/** Icons stand alone where the words have no room; the word of the view in use goes last. */
function labelOf(kind: ViewKind, text: string, crowded: number): string | null {
  if (crowded < 2) return text;
  if (crowded === 2) return kind === 'long-section' || kind === 'cross-section' || kind === 'aim' ? null : text;
  return crowded === 3 && (kind === 'orbit' || kind === 'plan') ? text : null;
}

function ShownPicks({ scene, quiet, octave }: { scene: RoomScene; quiet: boolean; octave: boolean }) {
  const { showQuantity, showTalker, showOctave } = useSession.getState();
  const octaveIndex = useSession((session) => session.octave);
  const talkers = scene.layout.venue.talkers.map(({ id, label }) => ({
    id: `talker ${id}`,
    text: label.split(',')[0] || id,
  }));
  return (
    <>
      <Pick
        label="Show"
        quiet={quiet}
        options={QUANTITIES.map(({ id, label }) => ({ id, text: label }))}
        value={scene.quantity.id}
        onChange={(id) => showQuantity(id as QuantityId)}
      />
      <Pick
        label="Talker"
        quiet={quiet}
        options={[{ id: 'worst', text: quiet ? 'Worst talker' : 'Worst' }, ...talkers]}
        value={scene.talkerId === null ? 'worst' : `talker ${scene.talkerId}`}
        onChange={(id) => showTalker(id === 'worst' ? null : id.replace('talker ', ''))}
      />
      {octave && (
        <Pick
          label="Octave"
          quiet={quiet}
          options={NOMINAL_HZ.map((hz, index) => ({ id: String(index), text: octaveFigure(hz) }))}
          value={String(octaveIndex)}
          onChange={(id) => showOctave(Number(id))}
        />
      )}
    </>
  );
}

type Views = RoomScene['layout']['venue']['views'];

interface SavedViewsProps {
  views: Views;
  text: string;
  onView: (view: ViewChoice) => void;
}

function SavedViews({ views, text, onView }: SavedViewsProps) {
  return (
    <MenuTrigger>
      <Button className="pick" aria-label="Saved views">
        {text}
      </Button>
      <Popover placement="bottom start">
        <Menu className="menu" items={views} onAction={(id) => onView({ kind: 'saved', id: String(id) })}>
          {({ id, label }) => <MenuItem id={id}>{label || id}</MenuItem>}
        </Menu>
      </Popover>
    </MenuTrigger>
  );
}

interface MoreMenuProps {
  views: Views;
  onView: (view: ViewChoice) => void;
  aimLines: boolean;
  onAimLines: (shown: boolean) => void;
}

/** What has no room on the bar. */
function MoreMenu({ views, onView, aimLines, onAimLines }: MoreMenuProps) {
  const octave = useSession((session) => session.octave);
  const { showOctave } = useSession.getState();
  return (
    <MenuTrigger>
      <Button className="pick">More</Button>
      <Popover placement="bottom end">
        <Menu className="menu" aria-label="More">
          <MenuItem onAction={() => onAimLines(!aimLines)}>{aimLines ? 'Hide aim lines' : 'Show aim lines'}</MenuItem>
          {views.map(({ id, label }) => (
            <MenuItem key={id} onAction={() => onView({ kind: 'saved', id })}>
              View: {label || id}
            </MenuItem>
          ))}
          {NOMINAL_HZ.map((hz, index) => (
            <MenuItem key={hz} onAction={() => showOctave(index)}>
              Octave {octaveFigure(hz)}
              {index === octave && <span className="dimmed">shown</span>}
            </MenuItem>
          ))}
        </Menu>
      </Popover>
    </MenuTrigger>
  );
}

/** The least that has to be left out for the bar to fit, found by trying, anew after each change of its width or words. */
function useCrowding(bar: RefObject<HTMLElement | null>, words: string): number {
  const [fit, setFit] = useState({ words, widthPx: 0, crowded: 0 });
  useLayoutEffect(() => {
    const element = bar.current;
    if (element === null) return;
    const observer = new ResizeObserver(() => {
      const widthPx = element.clientWidth;
      setFit((now) => (now.widthPx === widthPx ? now : { ...now, widthPx, crowded: 0 }));
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, [bar]);
  useLayoutEffect(() => {
    const element = bar.current;
    if (element === null) return;
    if (fit.words !== words) setFit({ words, widthPx: element.clientWidth, crowded: 0 });
    else if (fit.crowded < MOST_CROWDED && element.scrollWidth > element.clientWidth) {
      setFit({ ...fit, crowded: fit.crowded + 1 });
    }
  }, [bar, words, fit]);
  return fit.crowded;
}
