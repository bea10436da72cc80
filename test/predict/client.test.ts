import { expect, test } from 'vitest';
import { createPredictor, type WorkerPort } from '../../src/predict/client';
import type { PredictAnswer, PredictRequest } from '../../src/predict/request';
import { smallLayout } from '../support/layouts';

/** A worker that does nothing until told to. */
class PretendedWorker implements WorkerPort {
  onmessage: WorkerPort['onmessage'] = null;
  onerror: WorkerPort['onerror'] = null;
  asked: PredictRequest[] = [];
  terminated = false;
  postMessage(request: PredictRequest): void {
    this.asked.push(request);
  }
  terminate(): void {
    this.terminated = true;
  }
  answer(revision = this.asked.at(-1)?.revision ?? 0): void {
    const data: PredictAnswer = { revision, problems: [], prediction: null };
    this.onmessage?.({ data } as MessageEvent<PredictAnswer>);
  }
  fail(message: string): void {
    this.onerror?.({ message } as ErrorEvent);
  }
}

function setUp() {
  const workers: PretendedWorker[] = [];
  const answered: string[] = [];
  const failures: string[] = [];
  const predictor = createPredictor(
    () => {
      workers.push(new PretendedWorker());
      return workers[workers.length - 1];
    },
    (_, asked) => answered.push(asked.schemeIds.join()),
    (message) => failures.push(message),
  );
  const ask = (name: string) => predictor.request(smallLayout(), [name]);
  return { workers, answered, failures, predictor, ask };
}

test('no worker is started before something is asked', () => {
  const { workers, ask } = setUp();
  expect(workers).toHaveLength(0);
  ask('a');
  expect(workers).toHaveLength(1);
});

test('while one is under way only the newest waits', () => {
  const { workers, answered, ask } = setUp();
  for (const name of ['a', 'b', 'c', 'd']) ask(name);
  const [worker] = workers;
  expect(worker.asked.map(({ schemeIds }) => schemeIds[0])).toEqual(['a']);
  worker.answer();
  expect(worker.asked.map(({ schemeIds }) => schemeIds[0])).toEqual(['a', 'd']);
  worker.answer();
  expect(answered).toEqual(['a', 'd']);
  expect(worker.asked).toHaveLength(2);
});

test('revisions rise', () => {
  const { workers, ask } = setUp();
  ask('a');
  workers[0].answer();
  ask('b');
  const [first, second] = workers[0].asked;
  expect(second.revision).toBeGreaterThan(first.revision);
});

test('an answer to something else is dropped', () => {
  const { workers, answered, ask } = setUp();
  ask('a');
  workers[0].answer(999);
  expect(answered).toEqual([]);
});

test('after a failure a new worker takes the request that waited', () => {
  const { workers, answered, failures, ask } = setUp();
  ask('a');
  ask('b');
  workers[0].fail('out of memory');
  expect(failures).toEqual(['out of memory']);
  expect(workers[0].terminated).toBe(true);
  expect(workers[1].asked.map(({ schemeIds }) => schemeIds[0])).toEqual(['b']);
  workers[1].answer();
  expect(answered).toEqual(['b']);
});

test('a stopped predictor says nothing more, and can be asked again', () => {
  const { workers, answered, predictor, ask } = setUp();
  ask('a');
  ask('b');
  predictor.stop();
  expect(workers[0].terminated).toBe(true);
  workers[0].answer(1);
  expect(answered).toEqual([]);
  ask('c');
  workers[1].answer();
  expect(answered).toEqual(['c']);
});
