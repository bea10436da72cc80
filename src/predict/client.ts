import type { PredictAnswer, PredictRequest } from './request';

/** What a predictor needs of a worker; a test gives it a pretended one. */
export interface WorkerPort {
  postMessage(request: PredictRequest): void;
  onmessage: ((event: MessageEvent<PredictAnswer>) => void) | null;
  onerror: ((event: ErrorEvent) => void) | null;
  terminate(): void;
}

export interface Predictor {
  /** Asks for a prediction. While the worker is busy only the newest request waits; answers overtaken by one are dropped. */
  request(layout: PredictRequest['layout'], schemeIds: readonly string[]): void;
  stop(): void;
}

/** Predicts in a worker. `onFailure` is told of our own bugs; the worker is then started anew. */
export function createPredictor(
  createWorker: () => WorkerPort,
  onAnswer: (answer: PredictAnswer, asked: PredictRequest) => void,
  onFailure: (message: string) => void,
): Predictor {
  let revision = 0;
  let worker: WorkerPort | null = null;
  let running: PredictRequest | null = null;
  let waiting: PredictRequest | null = null;

  function send(request: PredictRequest): void {
    worker ??= start();
    running = request;
    worker.postMessage(request);
  }

  function start(): WorkerPort {
    const started = createWorker();
    started.onmessage = ({ data }) => {
      const asked = running;
      running = null;
      const next = waiting;
      waiting = null;
      if (next !== null) send(next);
      // While a drag goes on, each finished answer is shown even though a newer request is under way.
      if (asked !== null && data.revision === asked.revision) onAnswer(data, asked);
    };
    started.onerror = (event) => {
      started.terminate();
      worker = null;
      running = null;
      const next = waiting;
      waiting = null;
      onFailure(event.message);
      if (next !== null) send(next);
    };
    return started;
  }

  return {
    request(layout, schemeIds) {
      const request: PredictRequest = { revision: ++revision, layout, schemeIds };
      if (running === null) send(request);
      else waiting = request;
    },
    stop() {
      worker?.terminate();
      worker = null;
      running = null;
      waiting = null;
    },
  };
}
