import { describe, expect, test } from 'vitest';
import { checkLayout } from '../../src/layout/check';
import { sayProblem } from '../../src/layout/problem';
import type { DeviceModel, Layout, Send } from '../../src/layout/schema';
import {
  box,
  loudspeaker,
  lShape,
  microphone,
  panel,
  scheme,
  smallLayout,
  talker,
  withVenue,
} from '../support/layouts';

function problems(change: (layout: Layout) => void, severity: 'error' | 'caution' = 'error'): string[] {
  const layout = smallLayout();
  change(layout);
  return checkLayout(layout)
    .filter((problem) => problem.severity === severity)
    .map(sayProblem);
}

const table = (more: object = {}): DeviceModel => ({
  id: 'own',
  label: '',
  kind: 'loudspeaker',
  pattern: {
    type: 'table',
    theta: [0, 90, 180],
    phi: [0],
    levels: Array.from({ length: 7 }, () => [[0], [-6], [-12]]),
    ...more,
  } as DeviceModel['pattern'],
});

test('a sound layout has nothing to say', () => {
  expect(checkLayout(smallLayout())).toEqual([]);
});

describe('names that lead nowhere', () => {
  test.each<[string, (layout: Layout) => void, RegExp]>([
    [
      'a finish',
      (l) => {
        l.venue.faces[2].finish = 'velvet';
      },
      /^venue\.faces\[2\]\.finish: "velvet" is not a finish of this layout; known: wall; name one of these or add it\.$/,
    ],
    [
      'a talker model',
      (l) => {
        l.venue.talkers[0].model = 'orator';
      },
      /^venue\.talkers\[0\]\.model: "orator" is not a talker model .*; known: talker, talker-point;/,
    ],
    [
      'a microphone model',
      (l) => {
        l.schemes[0].microphones[0].model = 'cardoid';
      },
      /^schemes\[0\]\.microphones\[0\]\.model: "cardoid" is not a microphone model .*known: omni, /,
    ],
    [
      'a model of another kind',
      (l) => {
        l.schemes[0].loudspeakers[0].model = 'omni';
      },
      /^schemes\[0\]\.loudspeakers\[0\]\.model: "omni" is a microphone; a loudspeaker model belongs here; name another/,
    ],
    [
      'a host',
      (l) => {
        l.schemes[0].loudspeakers[0].host = 'roof';
      },
      /^schemes\[0\]\.loudspeakers\[0\]\.host: "roof" is not a face of this layout; known: floor, ceiling, wall1/,
    ],
    [
      'a routed microphone',
      (l) => l.schemes[0].routing.push({ microphone: 'x', loudspeaker: 'l', gain: 0 }),
      /^schemes\[0\]\.routing\[0\]\.microphone: "x" is not a microphone of this layout; known: m;/,
    ],
    [
      'a routed loudspeaker',
      (l) => l.schemes[0].routing.push({ microphone: 'm', loudspeaker: 'y', gain: null }),
      /^schemes\[0\]\.routing\[0\]\.loudspeaker: "y" is not a loudspeaker of this layout; known: l;/,
    ],
  ])('%s', (_, change, expected) => {
    const said = problems(change);
    expect(said).toHaveLength(1);
    expect(said[0]).toMatch(expected);
  });
});

describe('ids given twice', () => {
  const send: Send = { microphone: 'm', loudspeaker: 'l', gain: -3 };
  test.each<[string, (layout: Layout) => void, string]>([
    ['faces', (l) => l.venue.faces.push({ ...panel(4, 1, 2, 2), id: 'floor' }), 'venue.faces[6].id: "floor"'],
    ['finishes', (l) => l.venue.finishes.push({ ...l.venue.finishes[0] }), 'venue.finishes[1].id: "wall"'],
    ['talkers', (l) => l.venue.talkers.push(talker('t', [3, 3, 1])), 'venue.talkers[1].id: "t"'],
    ['schemes', (l) => l.schemes.push(scheme('A')), 'schemes[1].id: "A"'],
    [
      'microphones',
      (l) => l.schemes[0].microphones.push(microphone('m', [3, 3, 1])),
      'schemes[0].microphones[1].id: "m"',
    ],
    [
      'loudspeakers',
      (l) => l.schemes[0].loudspeakers.push(loudspeaker('l', [3, 3, 1])),
      'schemes[0].loudspeakers[1].id: "l"',
    ],
    ['models', (l) => l.models.push(table(), table()), 'models[1].id: "own"'],
    [
      'seats of a block and a list',
      (l) =>
        l.venue.seating.push({
          id: 'B',
          label: '',
          kind: 'list',
          earHeight: 1.2,
          seats: [{ id: 'A-1-2', position: [3, 3, 0] }],
        }),
      'venue.seating[1]: "A-1-2"',
    ],
  ])('%s', (_, change, place) => {
    expect(problems(change)).toEqual([`${place} is given twice; ids are unique; give one of them another id.`]);
  });

  test('one name in different lists is no clash', () => {
    const change = (layout: Layout) => {
      layout.venue.talkers[0].id = 'm';
      layout.schemes.push(scheme('B'));
    };
    expect(problems(change)).toEqual([]);
  });

  test('a routing pair listed twice', () => {
    expect(problems((l) => l.schemes[0].routing.push(send, { ...send, gain: null }))).toEqual([
      'schemes[0].routing[1]: m to l is listed twice; a routing pair is listed once; take one of them out.',
    ]);
  });
});

describe('faces', () => {
  test.each<[string, (layout: Layout) => void, RegExp]>([
    [
      'a corner 11 mm off the plane of the others by symmetry',
      (l) => {
        // Raising one corner of four by 44 mm puts each 11 mm off their mean plane.
        l.venue.faces[0].corners[0] = [0, 0, 0.044];
      },
      /^venue\.faces\[0\]\.corners\[\d\]: not planar: this corner lies 11 mm off the face; all corners within 10 mm/,
    ],
    [
      'an outline that crosses itself',
      (l) => {
        l.venue.faces.push({
          ...panel(4, 1, 3, 2),
          corners: [
            [4, 1, 0],
            [4, 3, 2],
            [4, 3, 0],
            [4, 1, 1.5],
          ],
        });
      },
      /^venue\.faces\[6\]\.corners: the edges after corners \d and \d cross; an outline that does not cross itself;/,
    ],
    [
      'no area',
      (l) => {
        l.venue.faces[1].corners = [
          [0, 0, 3],
          [1, 0, 3],
          [2, 0, 3],
        ];
      },
      /^venue\.faces\[1\]\.corners: the corners enclose no area;/,
    ],
    [
      'a corner twice',
      (l) => {
        l.venue.faces[0].corners.splice(1, 0, [0, 0, 0]);
      },
      /^venue\.faces\[0\]\.corners\[\d\]: the same point as the corner before; each corner once; remove it\.$/,
    ],
    [
      'an open shell without a volume',
      (l) => {
        l.venue.faces.splice(1, 1);
      },
      /^venue\.faces\[\d\]: the shell is open along the edge from \[.*, 3\] to \[.*, 3\] and 3 more; every edge is met once in each direction; close the shell or give "volume" in m³\.$/,
    ],
    [
      'an inside-out shell',
      (l) => {
        for (const face of l.venue.faces) face.corners.reverse();
      },
      /^venue\.faces: the shell is inside out; corners counter-clockwise seen from inside; reverse/,
    ],
    [
      'one face turned the wrong way round',
      (l) => {
        l.venue.faces[4].corners.reverse();
      },
      /^venue\.faces\[\d\]: the shell is open along the edge/,
    ],
    [
      'no faces',
      (l) => {
        l.venue.faces = [];
      },
      /^venue\.faces: there are no faces; the faces that close the room, sides: 1;/,
    ],
    [
      'no faces, though a volume is given',
      (l) => {
        l.venue.faces = [];
        l.venue.volume = 100;
      },
      /^venue\.faces: there are no faces;/,
    ],
    [
      'only free-standing faces and no volume',
      (l) => {
        l.venue.faces = [panel(4, 1, 3, 2)];
      },
      /^venue\.faces: no face belongs to the shell; .*; add them or give "volume"\.$/,
    ],
  ])('%s', (_, change, expected) => {
    const said = problems(change);
    expect(said).toHaveLength(1);
    expect(said[0]).toMatch(expected);
  });

  test('a corner 9 mm off, an open shell with a volume, and an L with a panel in it are accepted', () => {
    const bent = (l: Layout) => {
      l.venue.faces[0].corners[0] = [0, 0, 0.036];
      l.venue.volume = 144;
    };
    expect(problems(bent)).toEqual([]);
    const open = (l: Layout) => {
      l.venue.faces.splice(1, 1);
      l.venue.volume = 144;
    };
    expect(problems(open)).toEqual([]);
    const venue = { faces: [...lShape(), panel(2, 0.5, 2, 2)], seating: [], talkers: [talker('t', [1, 5, 1.5])] };
    const layout = { ...withVenue(venue), schemes: [scheme('A', { microphones: [], loudspeakers: [] })] };
    expect(checkLayout(layout)).toEqual([]);
  });
});

describe('places', () => {
  test.each<[string, (layout: Layout) => void, string]>([
    [
      'a talker outside',
      (l) => {
        l.venue.talkers[0].position = [-0.5, 3, 1.5];
      },
      'venue.talkers[0].position: t is outside the room; a place inside the shell; move it or the wall.',
    ],
    [
      'a microphone outside',
      (l) => {
        l.schemes[0].microphones[0].position = [1, 3, 3.2];
      },
      'schemes[0].microphones[0].position: m is outside the room; a place inside the shell; move it or the wall.',
    ],
    [
      'a loudspeaker outside',
      (l) => {
        l.schemes[0].loudspeakers[0].position = [8.5, 3, 2];
      },
      'schemes[0].loudspeakers[0].position: l is outside the room; a place inside the shell; move it or the wall.',
    ],
    [
      'seats outside',
      (l) => {
        const block = l.venue.seating[0];
        if (block.kind === 'block') block.rowSpacing = 4;
      },
      'venue.seating[0]: seat A-2-1 and 2 more are outside the room; ears inside the shell; move the block or omit the seat.',
    ],
    [
      'a talker on a microphone',
      (l) => {
        l.schemes[0].microphones[0].position = [1.2, 2.9, 1.419];
      },
      'schemes[0].microphones[0].position: t talks from inside m; at least 20 mm apart; move one of them.',
    ],
  ])('%s', (_, change, expected) => {
    expect(problems(change)).toEqual([expected]);
  });

  test('the notch of an L is outside, its arms are inside, and a skin of 10 mm is too', () => {
    const at = (x: number, y: number) => {
      const layout = withVenue({ faces: lShape(), seating: [], talkers: [talker('t', [x, y, 1.5])] });
      layout.schemes = [scheme('A', { microphones: [], loudspeakers: [] })];
      return checkLayout(layout).length;
    };
    expect([at(4, 4), at(5.9, 2.9), at(1, 5.9), at(3.009, 4), at(3.02, 4), at(6.009, 1)]).toEqual([1, 0, 0, 0, 1, 0]);
  });

  test('20 mm from talker to microphone is enough', () => {
    const change = (l: Layout) => {
      l.schemes[0].microphones[0].position = [1.2, 2.9, 1.4201];
    };
    expect(problems(change)).toEqual([]);
  });

  test('a hosted device off its plane or its normal is said, but predicted', () => {
    const change = (l: Layout) => {
      l.schemes[0].loudspeakers[0] = loudspeaker('l', [4, 3, 2.98], {
        model: 'ceiling-160',
        tilt: -88,
        host: 'ceiling',
      });
    };
    expect(problems(change)).toEqual([]);
    expect(problems(change, 'caution')).toEqual([
      'schemes[0].loudspeakers[0].position: l lies 20 mm off ceiling; a hosted device lies on its face; move it onto the plane.',
      'schemes[0].loudspeakers[0].pan: l aims 2.0° off the normal of ceiling; a hosted device aims along the normal; turn it.',
    ]);
  });

  test('a hosted device on its plane along its normal has nothing said', () => {
    const change = (l: Layout) => {
      l.schemes[0].loudspeakers[0] = loudspeaker('l', [4, 3, 3], { model: 'ceiling-160', tilt: -90, host: 'ceiling' });
    };
    expect([...problems(change), ...problems(change, 'caution')]).toEqual([]);
  });

  test('places are not judged in a room that does not stand', () => {
    const change = (l: Layout) => {
      l.venue.faces[2].finish = 'velvet';
      l.venue.talkers[0].position = [-5, 3, 1.5];
    };
    expect(problems(change)).toHaveLength(1);
  });
});

describe('tables of a model', () => {
  const levels = (rows: number[][]) => Array.from({ length: 7 }, () => rows);
  test.each<[string, object, RegExp]>([
    ['no 0° row', { theta: [10, 90, 180] }, /^models\[0\]\.pattern\.theta: the angles do not rise from 0;/],
    ['falling angles', { theta: [0, 180, 90] }, /^models\[0\]\.pattern\.theta: the angles do not rise/],
    [
      'missing rows',
      { levels: levels([[0], [-6]]) },
      /^models\[0\]\.pattern\.levels\[0\]: rows or columns are missing; 3 rows of 1 levels;/,
    ],
    [
      'a 0° row of −1 dB',
      { levels: levels([[-1], [-6], [-9]]) },
      /^models\[0\]\.pattern\.levels\[0\]\[0\]: the 0° row is not 0 dB;/,
    ],
    [
      'a whole turn twice',
      {
        phi: [0, 360],
        levels: levels([
          [0, 0],
          [-6, -6],
          [-9, -9],
        ]),
      },
      /^models\[0\]\.pattern\.phi: the angles do not rise within one turn;/,
    ],
    [
      'half-planes without a vertical one',
      { planes: true },
      /^models\[0\]\.pattern\.phi: found 0; half-planes at multiples of 90°/,
    ],
  ])('%s', (_, more, expected) => {
    const said = problems((l) => l.models.push(table(more)));
    expect(said).toHaveLength(1);
    expect(said[0]).toMatch(expected);
  });

  test('a table as it should be', () => {
    expect(problems((l) => l.models.push(table()))).toEqual([]);
  });

  test('a cap larger than its sphere', () => {
    const pattern = { type: 'cap-on-sphere', sphere: 0.2, cap: 0.21 } as const;
    expect(problems((l) => l.models.push({ id: 'own', label: '', kind: 'loudspeaker', pattern }))).toEqual([
      'models[0].pattern.cap: the cap is larger than its sphere; at most 0.2 m; enter diameters.',
    ]);
  });
});

describe('layouts that would stop the machine', () => {
  test('seats', () => {
    const change = (l: Layout) => {
      const block = l.venue.seating[0];
      if (block.kind === 'block') Object.assign(block, { rows: 1000, columns: 1000 });
    };
    expect(problems(change)).toEqual([
      'venue.seating[0]: 1000000 seats up to here; at most 100000 in all; give it fewer rows or columns.',
    ]);
  });

  test('image sources', () => {
    const change = (l: Layout) => {
      l.venue.reflectionOrder = 3;
      for (let i = 0; i < 200; i++) l.venue.faces.push({ ...panel(4, 1, 2, 2), id: `p${i}` });
    };
    const said = problems(change);
    expect(said).toHaveLength(1);
    expect(said[0]).toMatch(/^venue\.reflectionOrder: order 3 of 206 faces asks for \d+ image sources/);
  });
});

test('an omitted seat that is none is a caution', () => {
  const change = (l: Layout) => {
    const block = l.venue.seating[0];
    if (block.kind === 'block') block.omit = ['A-1-1', 'A-3-1'];
  };
  expect(problems(change)).toEqual([]);
  expect(problems(change, 'caution')).toEqual([
    'venue.seating[0].omit[1]: "A-3-1" is not a seat of this block; ids look like A-1-1.',
  ]);
});

test('a shell of many small faces is closed where edges are split', () => {
  const [floor, ceiling, ...walls] = box(8, 6, 3);
  const halves = [
    {
      ...floor,
      id: 'f1',
      corners: [
        [0, 0, 0],
        [3, 0, 0],
        [3, 6, 0],
        [0, 6, 0],
      ] as typeof floor.corners,
    },
    {
      ...floor,
      id: 'f2',
      corners: [
        [3, 0, 0],
        [8, 0, 0],
        [8, 6, 0],
        [3, 6, 0],
      ] as typeof floor.corners,
    },
  ];
  expect(checkLayout(withVenue({ faces: [...halves, ceiling, ...walls] }))).toEqual([]);
});
