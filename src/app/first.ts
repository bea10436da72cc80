import council from '../../data/layouts/council-chamber.layout.json';
import { readLayout } from '../layout/read';
import { useSession } from '../session/session';

/** Opens the worked venue every first visit begins with. */
export function openFirst(): void {
  const outcome = readLayout(council);
  if (outcome.ok) useSession.getState().open(outcome.value, 'council-chamber.layout.json');
}
