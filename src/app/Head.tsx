import { Button, Menu, MenuItem, MenuTrigger, Popover } from 'react-aria-components';
import { useSession } from '../session/session';
import { duplicateScheme, toggleTheme } from './actions';
import { openFile, saveFile } from './files';
import { sayKeys } from './shortcuts';
import { openVenue, VENUES } from './venues';

/** Name, schemes, and what can be done to the whole. */
export default function Head({ openPalette }: { openPalette: () => void }) {
  const name = useSession((session) => session.history.layout.name);
  const unsaved = useSession((session) => session.history.layout !== session.saved);
  const select = useSession((session) => session.select);
  return (
    <header className="head">
      <span className="head-name">Gainwright</span>
      <button type="button" className="head-layout" onClick={() => select(null)} title="Show the venue">
        {name || 'Untitled'}
        {unsaved && <span className="head-unsaved"> (not saved)</span>}
      </button>
      <Schemes />
      <div className="head-acts">
        <UndoRedo />
        <span className="head-sep" />
        <OpenMenu />
        <button type="button" className="act" onClick={() => void saveFile()}>
          Save
        </button>
        <span className="head-sep" />
        <UnitsPair />
        <button type="button" className="act" onClick={toggleTheme} aria-label="Light or dark">
          <svg viewBox="0 0 16 16" aria-hidden="true">
            <circle cx="8" cy="8" r="5.5" />
            <path d="M8 2.5a5.5 5.5 0 0 1 0 11z" fill="currentColor" />
          </svg>
        </button>
        <button type="button" className="act" onClick={openPalette}>
          <span className="wide-only">Find an action</span> <span className="dimmed">{sayKeys('Mod+k')}</span>
        </button>
      </div>
    </header>
  );
}

function Schemes() {
  const schemes = useSession((session) => session.history.layout.schemes);
  const schemeId = useSession((session) => session.schemeId);
  const { showScheme, select } = useSession.getState();
  return (
    <nav className="head-schemes" aria-label="Schemes">
      {schemes.map((scheme) => (
        <button
          key={scheme.id}
          type="button"
          className="scheme"
          aria-pressed={scheme.id === schemeId}
          aria-label={`Scheme ${scheme.id}${scheme.label === '' ? '' : `: ${scheme.label}`}`}
          title={scheme.label}
          onClick={() => (scheme.id === schemeId ? select({ kind: 'scheme', id: scheme.id }) : showScheme(scheme.id))}
        >
          <i>{scheme.id}</i>
          <span className="scheme-label">{scheme.label}</span>
        </button>
      ))}
      <button type="button" className="act wide-only" onClick={duplicateScheme}>
        Duplicate
      </button>
    </nav>
  );
}

function UndoRedo() {
  const last = useSession((session) => session.history.past.at(-1)?.label);
  const next = useSession((session) => session.history.future[0]?.label);
  const { undo, redo } = useSession.getState();
  return (
    <>
      <button
        type="button"
        className="act"
        aria-label={last === undefined ? 'Undo' : `Undo: ${last}`}
        title={last && `Undo: ${last}`}
        disabled={last === undefined}
        onClick={undo}
      >
        <svg viewBox="0 0 16 16" aria-hidden="true">
          <path d="M5 3 2 6l3 3M2 6h7a4.5 4.5 0 0 1 0 9H6" />
        </svg>
      </button>
      <button
        type="button"
        className="act"
        aria-label={next === undefined ? 'Redo' : `Redo: ${next}`}
        title={next && `Redo: ${next}`}
        disabled={next === undefined}
        onClick={redo}
      >
        <svg viewBox="0 0 16 16" aria-hidden="true">
          <path d="m11 3 3 3-3 3M14 6H7a4.5 4.5 0 0 0 0 9h3" />
        </svg>
      </button>
    </>
  );
}

function OpenMenu() {
  return (
    <MenuTrigger>
      <Button className="act">Open</Button>
      <Popover className="menu" placement="bottom start">
        <Menu aria-label="Open" onAction={(key) => (key === 'file' ? void openFile() : void openVenue(Number(key)))}>
          <MenuItem id="file">A layout file…</MenuItem>
          {VENUES.map((venue, i) => (
            <MenuItem key={venue.fileName} id={String(i)}>
              Worked venue: {venue.label}
            </MenuItem>
          ))}
        </Menu>
      </Popover>
    </MenuTrigger>
  );
}

function UnitsPair() {
  const units = useSession((session) => session.units);
  const { setUnits } = useSession.getState();
  return (
    // biome-ignore lint/a11y/useSemanticElements: two buttons of one choice, not a form's fieldset
    <span className="head-pair" role="group" aria-label="Units">
      <button type="button" aria-pressed={units === 'metric'} onClick={() => setUnits('metric')}>
        m
      </button>
      <button
        type="button"
        aria-pressed={units === 'imperial'}
        aria-label="feet and inches"
        onClick={() => setUnits('imperial')}
      >
        ft-in
      </button>
    </span>
  );
}
