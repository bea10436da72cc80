import { answer, type PredictRequest } from './request';

/** The worker's shell: one request in, one answer out, its figures handed over without a copy. */
self.onmessage = (event: MessageEvent<PredictRequest>) => {
  const result = answer(event.data);
  self.postMessage(result, { transfer: buffersOf(result) });
};

/** Every buffer of a value, each once. Typed arrays that are views of one buffer would otherwise be listed twice. */
function buffersOf(value: unknown, found = new Set<ArrayBuffer>()): ArrayBuffer[] {
  if (ArrayBuffer.isView(value)) found.add(value.buffer as ArrayBuffer);
  else if (typeof value === 'object' && value !== null) for (const item of Object.values(value)) buffersOf(item, found);
  return [...found];
}
