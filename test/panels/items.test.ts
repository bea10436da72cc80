import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { checkLayout } from '../../src/layout/check';
import { cautionAt } from '../../src/layout/problem';
import { readLayout } from '../../src/layout/read';
import type { Layout, SeatBlock } from '../../src/layout/schema';
import { laid } from '../../src/panels/DeviceRows';
import { cover, finishesToTake, halfWay } from '../../src/panels/finish-edits';
import { keyOf, listedRef, listGroups, refOf, searchGroups } from '../../src/panels/item-list';
import { readOmitted, sayOmitted } from '../../src/panels/omitted-seats';
import { addSomewhere } from '../../src/panels/place-new';
import { placeOf, problemsAt, problemsOn } from '../../src/panels/problems-of';

function worked(name: string): Layout {
  const file = new URL(`../../data/layouts/${name}.layout.json`, import.meta.url);
  const outcome = readLayout(JSON.parse(readFileSync(file, 'utf8')));
  if (!outcome.ok) throw new Error(name);
  return outcome.value;
}
const council = worked('council-chamber');
const errors = (layout: Layout) => checkLayout(layout).filter((problem) => problem.severity === 'error');

describe('addSomewhere', () => {
  const kinds = ['talker', 'microphone', 'loudspeaker', 'seating'] as const;

  it.each(['council-chamber', 'meeting-room', 'recital-hall'])('places every kind inside %s', (name) => {
    const layout = worked(name);
    for (const kind of kinds) {
      for (const selection of [null, { kind: 'talker' as const, id: layout.venue.talkers[0].id }]) {
        const made = addSomewhere(layout, layout.schemes[0].id, kind, selection);
        expect(errors(made.layout), `${kind} with ${selection?.id}`).toEqual([]);
      }
    }
  });

  it('puts a microphone before the talker selected, facing the mouth', () => {
    const talker = council.venue.talkers[1];
    const made = addSomewhere(council, 'A', 'microphone', { kind: 'talker', id: talker.id });
    const microphone = made.layout.schemes[0].microphones.find((candidate) => candidate.id === made.ref.id);
    if (microphone === undefined) throw new Error('no microphone');
    const away = Math.hypot(...[0, 1, 2].map((axis) => microphone.position[axis] - talker.position[axis]));
    expect(away).toBeLessThan(0.5);
    const turn = ((microphone.pan - talker.pan) % 360) + 360;
    expect(Math.abs((turn % 360) - 180)).toBeLessThan(2);
  });

  it('works in a layout without a room', () => {
    const bare: Layout = { ...council, venue: { ...council.venue, faces: [], seating: [], talkers: [] } };
    const made = addSomewhere(bare, 'A', 'loudspeaker', null);
    expect(made.layout.schemes[0].loudspeakers.at(-1)?.position).toEqual([0, 0, 2.5]);
  });
});

describe('listGroups', () => {
  const groups = listGroups(council, council.schemes[0]);

  it('lists everything by kind', () => {
    expect(groups.map((group) => [group.kind, group.items.length])).toEqual([
      ['talker', council.venue.talkers.length],
      ['microphone', council.schemes[0].microphones.length],
      ['loudspeaker', council.schemes[0].loudspeakers.length],
      ['seating', council.venue.seating.length],
      ['face', council.venue.faces.length],
      ['finish', council.venue.finishes.length],
    ]);
    expect(groups[3].total).toBe('78 seats');
  });

  it('finds by id, label and model, every word of the query', () => {
    const found = (query: string) =>
      searchGroups(groups, query).flatMap((group) => group.items.map((item) => item.ref.id));
    expect(found('m-s1')).toEqual(['m-s1']);
    expect(found('CEILING unit arc')).toEqual(['c2', 'c3']);
    expect(found('nothing like this')).toEqual([]);
    expect(found(' ')).toHaveLength(groups.reduce((sum, group) => sum + group.items.length, 0));
  });

  it('leads from a key to its thing and back, whatever is in the id', () => {
    const ref = { kind: 'talker' as const, id: 'a:b c' };
    expect(refOf(keyOf(ref))).toEqual(ref);
  });

  it('shows the block of a selected seat', () => {
    expect(listedRef(council, { kind: 'seat', id: 'P-2-3' })).toEqual({ kind: 'seating', id: 'P' });
    expect(listedRef(council, { kind: 'seat', id: 'none' })).toBeNull();
  });
});

describe('problemsAt', () => {
  it('takes the problems of one thing and no other', () => {
    const place = placeOf(council, 'A', { kind: 'loudspeaker', id: 'c2' });
    expect(place).toBe('schemes[0].loudspeakers[1]');
    const problems = [`${place}.position`, `${place}`, 'schemes[0].loudspeakers[10].position', 'schemes[0].system'].map(
      (path) => cautionAt(path, 'found', '', ''),
    );
    const own = problemsAt(problems, place ?? '');
    expect(own.map(({ at }) => at)).toEqual(['position', '']);
    expect(problemsOn(own, ['position']).map(({ at }) => at)).toEqual(['position']);
    expect(problemsOn(own, ['posit'])).toEqual([]);
  });
});

describe('seats left out', () => {
  const block = council.venue.seating.find((part): part is SeatBlock => part.kind === 'block') as SeatBlock;

  it('reads what it says', () => {
    expect(block.omit.length).toBeGreaterThan(0);
    expect(readOmitted(block, sayOmitted(block))).toEqual({ ok: true, ids: block.omit });
  });

  it('takes whole ids and row-column, once each', () => {
    expect(readOmitted(block, 'P-2-3 2-3; 1-4')).toEqual({ ok: true, ids: ['P-2-3', 'P-1-4'] });
  });

  it('says which is no seat', () => {
    expect(readOmitted(block, '2-3, 9-99')).toMatchObject({ ok: false, why: expect.stringContaining('9-99') });
  });
});

describe('laying and covering', () => {
  it('lays a device so that nothing is said against it', () => {
    const layout = laid(council, 'A', { kind: 'microphone', id: 'm-chair' }, 'front-wall');
    const microphone = layout.schemes[0].microphones.find((candidate) => candidate.id === 'm-chair');
    expect(microphone?.host).toBe('front-wall');
    expect(checkLayout(layout).filter((problem) => problem.path.includes('microphones[0]'))).toEqual([]);
  });

  it('takes a finish from the catalogue as it covers a face with it', () => {
    const [finish] = finishesToTake(council);
    const layout = cover(council, 'floor', finish.id);
    expect(layout.venue.finishes.filter((candidate) => candidate.id === finish.id)).toEqual([finish]);
    expect(layout.venue.faces.find((face) => face.id === 'floor')?.finish).toBe(finish.id);
    expect(cover(council, 'floor', 'no such finish')).toBe(council);
  });

  it('adds a corner half way to the next one, the first following the last', () => {
    expect(
      halfWay(
        [
          [0, 0, 0],
          [2, 0, 0],
          [2, 4, 1],
        ],
        2,
      ),
    ).toEqual([1, 2, 0.5]);
  });
});
