import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkStructure } from '../../src/layout/check';
import { add, duplicate, remove, rename, setSend } from '../../src/layout/edits';
import { type History, record, redo, startHistory, undo } from '../../src/layout/history';
import { readLayout } from '../../src/layout/read';
import type { Ref } from '../../src/layout/ref';
import type { Layout } from '../../src/layout/schema';
import { answer } from '../../src/predict/request';
import { smallLayout } from '../support/layouts';

const KINDS = ['talker', 'microphone', 'loudspeaker', 'seating', 'finish', 'face', 'scheme'] as const;

const edit = fc.record({
  what: fc.constantFrom('add', 'duplicate', 'remove', 'rename', 'send'),
  kind: fc.constantFrom(...KINDS),
  pick: fc.nat(50),
  name: fc.constantFrom('A', 'B', 'm1', 'l1', 'chair', 'x-1', '1', 'wall'),
  gain: fc.constantFrom(null, 0, -6),
});
type Edit = typeof edit extends fc.Arbitrary<infer T> ? T : never;

function listed(layout: Layout, kind: (typeof KINDS)[number]): readonly { id: string }[] {
  const [scheme] = layout.schemes;
  return {
    talker: layout.venue.talkers,
    seating: layout.venue.seating,
    finish: layout.venue.finishes,
    face: layout.venue.faces,
    scheme: layout.schemes,
    microphone: scheme.microphones,
    loudspeaker: scheme.loudspeakers,
  }[kind];
}

function edited(layout: Layout, { what, kind, pick, name, gain }: Edit): Layout {
  const [scheme] = layout.schemes;
  const list = listed(layout, kind);
  const ref: Ref = { kind, id: list.length === 0 ? 'nothing' : list[pick % list.length].id };
  switch (what) {
    case 'add':
      if (kind === 'finish' || kind === 'face' || kind === 'scheme') return layout;
      return add(layout, scheme.id, kind, [3, 3, 0]).layout;
    case 'duplicate':
      return duplicate(layout, scheme.id, ref)?.layout ?? layout;
    case 'remove':
      return remove(layout, scheme.id, ref);
    case 'rename':
      return rename(layout, scheme.id, ref, name);
    case 'send': {
      const [microphones, loudspeakers] = [scheme.microphones, scheme.loudspeakers];
      if (microphones.length === 0 || loudspeakers.length === 0) return layout;
      const [m, l] = [microphones[pick % microphones.length], loudspeakers[pick % loudspeakers.length]];
      return setSend(layout, scheme.id, m.id, l.id, gain);
    }
  }
}

test('any run of edits leaves a layout that reads, names nothing that is not there, and can be undone and redone (seed 71)', {
  timeout: 60_000,
}, () => {
  fc.assert(
    fc.property(fc.array(edit, { minLength: 1, maxLength: 25 }), (edits) => {
      const start = smallLayout();
      let history: History = startHistory(start);
      for (const one of edits) history = record(history, edited(history.layout, one), one.what);
      const end = history.layout;

      const read = readLayout(JSON.parse(JSON.stringify(end)));
      expect(read).toEqual({ ok: true, value: end, problems: [] });
      expect(checkStructure(end).filter(({ severity }) => severity === 'error')).toEqual([]);

      const steps = history.past.length;
      for (let i = 0; i < steps; i++) history = undo(history);
      expect(history.layout).toBe(start);
      for (let i = 0; i < steps; i++) history = redo(history);
      expect(history.layout).toBe(end);
    }),
    { seed: 71, numRuns: 150 },
  );
});

test('what edits leave is predicted, or its problems are said (seed 72)', { timeout: 60_000 }, () => {
  fc.assert(
    fc.property(fc.array(edit, { minLength: 1, maxLength: 8 }), (edits) => {
      const layout = edits.reduce(edited, smallLayout());
      const { problems, prediction } = answer({ revision: 1, layout, schemeIds: layout.schemes.map(({ id }) => id) });
      expect(prediction === null).toBe(problems.some(({ severity }) => severity === 'error'));
    }),
    { seed: 72, numRuns: 30 },
  );
});
