import '@fontsource/barlow-semi-condensed/latin-400.css';
import '@fontsource/barlow-semi-condensed/latin-500.css';
import '@fontsource/barlow-semi-condensed/latin-600.css';
import '@fontsource-variable/newsreader/wght.css';
import '../controls/tokens.css';
import '../controls/base.css';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { startPredicting } from '../session/session';
import App from './App';
import { keepPreferences } from './preferences';
import { openFirst } from './venues';

/** Opens the worked venue, asks for its prediction and draws the page. */
export function boot(createWorker: () => Worker): void {
  keepPreferences();
  openFirst();
  startPredicting(createWorker);
  const root = document.getElementById('app');
  if (root === null) throw new Error('The page has no #app element.');
  createRoot(root).render(
    <StrictMode>
      <App />
    </StrictMode>,
  );
}
