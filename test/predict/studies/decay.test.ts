import { describe, expect, test } from 'vitest';
import { predict } from '../../../src/predict/run';
import { studyDecay } from '../../../src/predict/studies/decay';
import { smallLayout } from '../../support/layouts';

describe('who absorbs what', () => {
  const layout = smallLayout();
  const { contributions, treatments } = studyDecay(layout);
  const { decayS } = predict(layout).venue;

  test('the shares of finishes and air sum to one in every octave', () => {
    for (let b = 0; b < 7; b++) {
      expect(contributions.reduce((sum, part) => sum + part.share[b], 0)).toBeCloseTo(1, 9);
    }
  });

  test('the areas of the finishes sum to the surface of the room', () => {
    const areaM2 = contributions.reduce((sum, part) => sum + part.areaM2, 0);
    expect(areaM2).toBeCloseTo(predict(layout).venue.surfaceM2, 6);
  });

  test('covering a face never lengthens the decay, and the best one first', () => {
    for (const { decayS: covered } of treatments) {
      for (let b = 0; b < 7; b++) expect(covered[b]).toBeLessThanOrEqual(decayS[b] + 1e-12);
    }
    const at500 = treatments.map((treatment) => treatment.decayS[2]);
    expect(at500).toEqual([...at500].sort((a, b) => a - b));
    expect(at500[0]).toBeLessThan(decayS[2]);
  });

  test('what it says of a face is what painting that face with such a finish gives', () => {
    const best = treatments[0];
    const painted = structuredClone(layout);
    painted.venue.finishes.push({ id: 'good', label: '', source: '', absorption: [0.9, 0.9, 0.9, 0.9, 0.9, 0.9, 0.9] });
    for (const face of painted.venue.faces) if (face.id === best.face) face.finish = 'good';
    const found = predict(painted).venue.decayS;
    for (let b = 0; b < 7; b++) expect(best.decayS[b]).toBeCloseTo(found[b], 9);
  });
});
