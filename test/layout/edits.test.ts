import { describe, expect, test } from 'vitest';
import { checkLayout } from '../../src/layout/check';
import {
  add,
  duplicate,
  editMicrophone,
  editTalker,
  freeId,
  remove,
  rename,
  sendGain,
  setSend,
  whyKept,
} from '../../src/layout/edits';
import { readLayout } from '../../src/layout/read';
import type { Layout } from '../../src/layout/schema';
import { seatsOf } from '../../src/layout/seating';
import { loudspeaker, microphone, scheme, smallLayout } from '../support/layouts';

/** Two schemes alike, with routing, so that an edit of one can be seen to leave the other alone. */
function twoSchemes(): Layout {
  const one = (id: string) =>
    scheme(id, {
      microphones: [microphone('m1', [1.6, 2.9, 1.3]), microphone('m2', [1.6, 2, 1.3])],
      loudspeakers: [loudspeaker('l1', [2, 5, 2]), loudspeaker('l2', [2, 1, 2], { host: 'wall1' })],
      routing: [
        { microphone: 'm1', loudspeaker: 'l1', gain: null },
        { microphone: 'm2', loudspeaker: 'l1', gain: -3 },
      ],
    });
  return { ...smallLayout(), schemes: [one('A'), one('B')] };
}

/** An edit must leave a layout that reads and passes its checks. */
function expectSound(layout: Layout): void {
  expect(readLayout(JSON.parse(JSON.stringify(layout))).ok).toBe(true);
  expect(checkLayout(layout).filter(({ severity }) => severity === 'error')).toEqual([]);
}

describe('rename', () => {
  test.each(['microphone', 'loudspeaker'] as const)('a %s takes its routing along, in its own scheme only', (kind) => {
    const from = kind === 'microphone' ? 'm1' : 'l1';
    const layout = rename(twoSchemes(), 'A', { kind, id: from }, 'new');
    expect(layout.schemes[0].routing[0][kind]).toBe('new');
    expect(layout.schemes[1].routing[0][kind]).toBe(from);
    expectSound(layout);
  });

  test('a face takes its hosted devices along, in every scheme', () => {
    const layout = rename(twoSchemes(), 'A', { kind: 'face', id: 'wall1' }, 'stage wall');
    expect(layout.schemes.map(({ loudspeakers }) => loudspeakers[1].host)).toEqual(['stage wall', 'stage wall']);
    expectSound(layout);
  });

  test('a finish takes its faces along', () => {
    const layout = rename(twoSchemes(), 'A', { kind: 'finish', id: 'wall' }, 'plaster');
    expect(new Set(layout.venue.faces.map(({ finish }) => finish))).toEqual(new Set(['plaster']));
    expectSound(layout);
  });

  test('a block takes its omitted seats along', () => {
    const start = smallLayout();
    const block = start.venue.seating[0];
    if (block.kind === 'block') block.omit = ['A-1-2'];
    const layout = rename(start, 'A', { kind: 'seating', id: 'A' }, 'Stalls');
    expect(seatsOf(layout.venue.seating).map(({ id }) => id)).not.toContain('Stalls-1-2');
    expect(seatsOf(layout.venue.seating)).toHaveLength(5);
    expect(checkLayout(layout)).toEqual([]);
  });

  test('to a taken or empty id, or of a thing that is not there, changes nothing', () => {
    const layout = twoSchemes();
    expect(rename(layout, 'A', { kind: 'microphone', id: 'm1' }, 'm2')).toBe(layout);
    expect(rename(layout, 'A', { kind: 'microphone', id: 'm1' }, '')).toBe(layout);
    expect(rename(layout, 'A', { kind: 'microphone', id: 'm9' }, 'x')).toBe(layout);
    expect(rename(layout, 'Z', { kind: 'microphone', id: 'm1' }, 'x')).toBe(layout);
  });
});

describe('remove', () => {
  test('a microphone takes its routing with it and leaves the other scheme alone', () => {
    const layout = remove(twoSchemes(), 'A', { kind: 'microphone', id: 'm1' });
    expect(layout.schemes[0].microphones.map(({ id }) => id)).toEqual(['m2']);
    expect(layout.schemes[0].routing).toEqual([{ microphone: 'm2', loudspeaker: 'l1', gain: -3 }]);
    expect(layout.schemes[1].routing).toHaveLength(2);
    expectSound(layout);
  });

  test('the last scheme and a finish in use are kept, and why is said', () => {
    const layout = smallLayout();
    expect(remove(layout, 'A', { kind: 'scheme', id: 'A' })).toBe(layout);
    expect(remove(layout, 'A', { kind: 'finish', id: 'wall' })).toBe(layout);
    expect(whyKept(layout, { kind: 'scheme', id: 'A' })).toMatch(/at least one scheme/);
    expect(whyKept(layout, { kind: 'finish', id: 'wall' })).toMatch(/^wall is on floor, ceiling/);
    expect(whyKept(layout, { kind: 'talker', id: 't' })).toBeNull();
  });
});

describe('duplicate', () => {
  test('a microphone stands beside its original, routed alike', () => {
    const made = duplicate(twoSchemes(), 'A', { kind: 'microphone', id: 'm1' });
    if (made === null) throw new Error('not made');
    const { microphones, routing } = made.layout.schemes[0];
    expect(made.ref).toEqual({ kind: 'microphone', id: 'm3' });
    expect(microphones.map(({ id }) => id)).toEqual(['m1', 'm3', 'm2']);
    expect(microphones[1].position).toEqual([1.6, 3.4, 1.3]);
    expect(routing).toContainEqual({ microphone: 'm3', loudspeaker: 'l1', gain: null });
    expectSound(made.layout);
  });

  test('a scheme takes the next letter', () => {
    const made = duplicate(twoSchemes(), 'A', { kind: 'scheme', id: 'A' });
    expect(made?.layout.schemes.map(({ id }) => id)).toEqual(['A', 'C', 'B']);
  });

  test('seats of a copied block or list have ids of their own, however many there are', () => {
    const start = smallLayout();
    start.venue.seating.push({
      id: 'C',
      label: '',
      kind: 'list',
      earHeight: 1.2,
      seats: Array.from({ length: 25 }, (_, i) => ({ id: `C${i + 1}`, position: [2 + i / 5, 5, 0] })),
    });
    let layout = start;
    for (const id of ['A', 'C', 'C']) {
      const made = duplicate(layout, 'A', { kind: 'seating', id });
      if (made === null) throw new Error('not made');
      layout = made.layout;
    }
    expectSound(layout);
    expect(seatsOf(layout.venue.seating)).toHaveLength(2 * 6 + 3 * 25);
  });

  test('a face or a thing that is not there has no copy', () => {
    expect(duplicate(smallLayout(), 'A', { kind: 'talker', id: 'x' })).toBeNull();
    expect(duplicate(smallLayout(), 'A', { kind: 'face', id: 'floor' })).toBeNull();
  });
});

describe('routing', () => {
  test('a crosspoint is listed only where it differs from 0 dB', () => {
    const send = (layout: Layout, gain: number | null) => setSend(layout, 'A', 'm1', 'l2', gain);
    const listed = (layout: Layout) => layout.schemes[0].routing.filter(({ loudspeaker: l }) => l === 'l2');
    const start = twoSchemes();
    expect(sendGain(start.schemes[0], 'm1', 'l2')).toBe(0);
    expect(send(start, 0)).toBe(start);
    const lowered = send(start, -6);
    expect(listed(lowered)).toEqual([{ microphone: 'm1', loudspeaker: 'l2', gain: -6 }]);
    const off = send(lowered, null);
    expect(listed(off)).toEqual([{ microphone: 'm1', loudspeaker: 'l2', gain: null }]);
    expect(sendGain(off.schemes[0], 'm1', 'l2')).toBeNull();
    expect(listed(send(off, 0))).toEqual([]);
  });
});

test.each(['talker', 'microphone', 'loudspeaker', 'seating'] as const)('a new %s is complete and sound', (kind) => {
  const { layout, ref } = add(smallLayout(), 'A', kind, [3, 4, 0]);
  expect(ref.kind).toBe(kind);
  expectSound(layout);
  const read = readLayout(JSON.parse(JSON.stringify(layout)));
  expect(read.ok && read.value).toEqual(layout);
});

test('an edit shares what it does not touch and leaves the original as it was', () => {
  const layout = twoSchemes();
  const before = JSON.stringify(layout);
  const next = editMicrophone(layout, 'A', 'm1', (m) => {
    m.pan = 90;
  });
  expect(JSON.stringify(layout)).toBe(before);
  expect(next.venue).toBe(layout.venue);
  expect(next.schemes[1]).toBe(layout.schemes[1]);
  expect(next.schemes[0].microphones[0].pan).toBe(90);
  expect(editTalker(layout, 'nobody', (t) => t.position.reverse())).toBe(layout);
});

test('the first free id', () => {
  const taken = [{ id: 'm1' }, { id: 'm2' }, { id: 'chair' }];
  expect(freeId(taken, 'm1')).toBe('m3');
  expect(freeId(taken, 'm7')).toBe('m7');
  expect(freeId(taken, 'chair')).toBe('chair1');
});
