import { formatLayout, parseLayout } from '../formats/layout-json';
import { checkStructure } from '../layout/check';
import { type Problem, sayProblem } from '../layout/problem';
import { useSession } from '../session/session';
import { dismiss, tell } from './notice';

/** A file of a layout is far smaller; anything larger is refused before it is read. */
const MOST_BYTES = 50e6;
const TYPES = [{ description: 'Gainwright layout', accept: { 'application/json': ['.json' as const] } }];

/** Where the open layout was last saved, so that saving again asks nothing. */
let handle: FileSystemFileHandle | null = null;

export const unsaved = (): boolean => {
  const { history, saved } = useSession.getState();
  return history.layout !== saved;
};

/** Asks which file to open. */
export async function openFile(): Promise<void> {
  if (navigator.userActivation?.isActive === false) {
    tell(
      'Open a layout',
      ['Layouts are files whose names end in .layout.json.'],
      [{ label: 'Choose a file', main: true, run: () => void openFile() }, { label: 'Cancel' }],
    );
    return;
  }
  if (!('showOpenFilePicker' in window)) {
    const file = await pickWithInput();
    if (file !== null) await openPicked(file, null);
    return;
  }
  const picked = await unlessCancelled(window.showOpenFilePicker({ types: TYPES }));
  if (picked !== null) await openPicked(await picked[0].getFile(), picked[0]);
}

/**
 * A browser lets a page ask for a file only just after a press it counts as the person's, and some do not count their
 * own shortcut keys: then a button is offered first. True where it was.
 */
function askFirst(title: string, line: string, ask: () => Promise<unknown>): boolean {
  if (navigator.userActivation?.isActive !== false) return false;
  tell(title, [line], [{ label: 'Choose a file', main: true, run: () => void ask() }, { label: 'Cancel' }]);
  return true;
}

function pickWithInput(): Promise<File | null> {
  const input = document.createElement('input');
  input.type = 'file';
  input.accept = '.json,application/json';
  return new Promise((resolve) => {
    input.onchange = () => resolve(input.files?.[0] ?? null);
    input.oncancel = () => resolve(null);
    input.click();
  });
}

/** Opens a file, asking first where it would replace unsaved work. A file that cannot be opened changes nothing. */
export async function openPicked(file: File, from: FileSystemFileHandle | null): Promise<void> {
  if (file.size > MOST_BYTES) {
    tell(`${file.name} was not opened`, [`It is larger than ${MOST_BYTES / 1e6} MB, which no layout is.`, KEPT]);
    return;
  }
  const outcome = parseLayout(await file.text());
  const problems = outcome.ok ? [...outcome.problems, ...checkStructure(outcome.value)] : outcome.problems;
  const errors = problems.filter((problem) => problem.severity === 'error');
  if (!outcome.ok || errors.length > 0) {
    tell(`${file.name} was not opened`, [...sayFirst(errors), KEPT]);
    return;
  }
  const open = () => {
    handle = from;
    useSession.getState().open(outcome.value, file.name);
    const cautions = outcome.problems.filter((problem) => problem.severity === 'caution');
    if (cautions.length > 0) tell(`${file.name} is open, but not all of it was understood`, sayFirst(cautions));
  };
  if (!unsaved()) open();
  else {
    tell(
      'Keep the changes to the open layout?',
      [`Opening ${file.name} replaces it.`],
      [
        { label: 'Save first', main: true, run: () => void saveFile().then((done) => done && open()) },
        { label: 'Open without saving', run: open },
        { label: 'Cancel' },
      ],
    );
  }
}

const KEPT = 'The open layout was left as it was.';
const MOST_LINES = 6;

function sayFirst(problems: readonly Problem[]): string[] {
  const lines = problems.slice(0, MOST_LINES).map(sayProblem);
  return problems.length > MOST_LINES ? [...lines, `and ${problems.length - MOST_LINES} more.`] : lines;
}

/** Saves where the layout was last saved or opened, asking for a place the first time. True when saved. */
export async function saveFile(elsewhere = false): Promise<boolean> {
  const { history, fileName } = useSession.getState();
  const text = formatLayout(history.layout);
  const name = fileName || `${slug(history.layout.name)}.layout.json`;
  if (!('showSaveFilePicker' in window)) {
    download(text, name);
    useSession.getState().markSaved(name);
    return true;
  }
  if (handle === null || elsewhere) {
    if (
      askFirst('Save the layout', `It will be saved where you choose, as ${name} at first.`, () => saveFile(elsewhere))
    ) {
      return false;
    }
    handle = (await unlessCancelled(window.showSaveFilePicker({ suggestedName: name, types: TYPES }))) ?? handle;
    if (handle === null) return false;
  }
  try {
    // The browser writes beside the file and swaps on close, so a failed save leaves the old one whole.
    const stream = await handle.createWritable();
    await stream.write(text);
    await stream.close();
  } catch (error) {
    tell(
      'Not saved',
      [(error as Error).message, 'The file on disk is as it was; the layout is still open here.'],
      [{ label: 'Save elsewhere', main: true, run: () => void saveFile(true) }, { label: 'Close' }],
    );
    return false;
  }
  useSession.getState().markSaved(handle.name);
  dismiss();
  return true;
}

function download(text: string, name: string): void {
  const url = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(url), 10000);
}

const slug = (name: string): string =>
  name
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '') || 'untitled';

/** A picker's answer, null where the person closed it. */
async function unlessCancelled<T>(picking: Promise<T>): Promise<T | null> {
  try {
    return await picking;
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') return null;
    throw error;
  }
}

/** Lets a layout file be dropped anywhere on the page, and keeps the page from being left with unsaved work unasked. */
export function listenForFiles(): () => void {
  const over = (event: DragEvent) => {
    if (event.dataTransfer?.types.includes('Files')) event.preventDefault();
  };
  const drop = (event: DragEvent) => {
    const file = event.dataTransfer?.files[0];
    if (file === undefined) return;
    event.preventDefault();
    void openPicked(file, null);
  };
  const leave = (event: BeforeUnloadEvent) => {
    if (unsaved()) event.preventDefault();
  };
  window.addEventListener('dragover', over);
  window.addEventListener('drop', drop);
  window.addEventListener('beforeunload', leave);
  return () => {
    window.removeEventListener('dragover', over);
    window.removeEventListener('drop', drop);
    window.removeEventListener('beforeunload', leave);
  };
}
