/**
 * The way into the page. The worker is started before anything else is even read, because the browser fetches its
 * script only when this thread has time: the prediction and the page then come up side by side.
 */
const createWorker = () => new Worker(new URL('../predict/worker.ts', import.meta.url), { type: 'module' });

let ready: Worker | null = createWorker();

void import('./boot').then(({ boot }) =>
  boot(() => {
    const worker = ready ?? createWorker();
    ready = null;
    return worker;
  }),
);

export {};
