import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { checkLayout } from '../../src/layout/check';
import type { Layout, Vec3 } from '../../src/layout/schema';
import { seatsOf } from '../../src/layout/seating';
import { expectSameFigures, figuresOf } from '../support/compare-predictions';
import { flat, smallLayout } from '../support/layouts';
import { mirror, moved, rotation, translation } from '../support/move-layout';
import { randomLayout } from '../support/random-layout';

const shift = fc.double({ min: -400, max: 400, noNaN: true });
const vector = fc.tuple(shift, shift, shift) as fc.Arbitrary<Vec3>;

describe('moving everything together changes no figure', { timeout: 60_000 }, () => {
  test('translation (seed 21)', () => {
    fc.assert(
      fc.property(randomLayout, vector, (layout, by) => {
        expectSameFigures(figuresOf(moved(layout, translation(by))), figuresOf(layout));
      }),
      { seed: 21, numRuns: 12 },
    );
  });

  test('rotation about the vertical, pans turned along (seed 22)', () => {
    fc.assert(
      fc.property(randomLayout, fc.double({ min: -180, max: 180, noNaN: true }), (layout, degrees) => {
        expectSameFigures(figuresOf(moved(layout, rotation(degrees))), figuresOf(layout));
      }),
      { seed: 22, numRuns: 12 },
    );
  });

  test('exchanging left and right, where all faces are alike (seed 23)', () => {
    fc.assert(
      fc.property(randomLayout, (layout) => {
        expectSameFigures(figuresOf(moved(layout, mirror)), figuresOf(layout));
      }),
      { seed: 23, numRuns: 12 },
    );
  });

  test('a block on arcs turns with its room', () => {
    const layout = smallLayout();
    const block = layout.venue.seating[0];
    if (block.kind === 'block') Object.assign(block, { radius: 4, facing: 150, rise: 0.1 });
    const turned = moved(layout, rotation(77));
    expect(checkLayout(turned)).toEqual([]);
    expectSameFigures(figuresOf(turned), figuresOf(layout));
    const { facingDeg } = seatsOf(turned.venue.seating)[4];
    expect(facingDeg).toBeCloseTo(seatsOf(layout.venue.seating)[4].facingDeg + 77, 9);
  });
});

/** The same layout with its lists in another order. */
function reordered(layout: Layout): Layout {
  const next = structuredClone(layout);
  for (const part of next.venue.seating) if (part.kind === 'list') part.seats.reverse();
  for (const scheme of next.schemes) {
    scheme.microphones.reverse();
    scheme.loudspeakers.reverse();
  }
  next.venue.talkers.reverse();
  return next;
}

test('the order in which things are listed changes no figure (seed 24)', { timeout: 60_000 }, () => {
  fc.assert(
    fc.property(randomLayout, (layout) => {
      expectSameFigures(figuresOf(reordered(layout)), figuresOf(layout));
    }),
    { seed: 24, numRuns: 12 },
  );
});

test('the order of faces changes no figure where all are alike (seed 25)', { timeout: 60_000 }, () => {
  fc.assert(
    fc.property(randomLayout, (layout) => {
      const next = structuredClone(layout);
      next.venue.faces.reverse();
      expectSameFigures(figuresOf(next), figuresOf(layout));
    }),
    { seed: 25, numRuns: 8 },
  );
});

test('the comparison would notice a moved microphone', () => {
  const layout = smallLayout();
  layout.venue.finishes[0].absorption = flat(0.3);
  const next = structuredClone(layout);
  next.schemes[0].microphones[0].position[0] += 0.001;
  expect(() => expectSameFigures(figuresOf(next), figuresOf(layout))).toThrow();
});
