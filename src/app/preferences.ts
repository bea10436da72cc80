import { useSession } from '../session/session';

/** What this browser remembers of how a person likes the page. Never part of a file. */
interface Preferences {
  units?: 'metric' | 'imperial';
  theme?: 'light' | 'dark';
}

const KEY = 'gainwright-preferences';

/** Takes up remembered preferences, the system's own where none are, and remembers changes. */
export function keepPreferences(): void {
  const { units, theme } = read();
  const dark = window.matchMedia('(prefers-color-scheme: dark)').matches;
  const asked = new URLSearchParams(window.location.search).get('theme');
  const session = useSession.getState();
  session.setUnits(units === 'imperial' ? 'imperial' : 'metric');
  session.setTheme(asked === 'dark' || asked === 'light' ? asked : (theme ?? (dark ? 'dark' : 'light')));
  apply();
  useSession.subscribe((now, before) => {
    if (now.theme === before.theme && now.units === before.units) return;
    apply();
    write({ units: now.units, theme: now.theme });
  });
}

function apply(): void {
  document.documentElement.dataset.theme = useSession.getState().theme;
}

/** Storage may be closed to the page; then nothing is remembered. */
function read(): Preferences {
  try {
    const value: unknown = JSON.parse(localStorage.getItem(KEY) ?? '{}');
    return typeof value === 'object' && value !== null ? (value as Preferences) : {};
  } catch {
    return {};
  }
}

function write(preferences: Preferences): void {
  try {
    localStorage.setItem(KEY, JSON.stringify(preferences));
  } catch {
    // Nothing to do: the choice holds until the page is closed.
  }
}
