import { describe, expect, test } from 'vitest';
import type { Layout } from '../../src/layout/schema';
import { predict } from '../../src/predict/run';
import { cautions } from '../../src/report/cautions';
import { predictionText } from '../../src/report/prediction-text';
import { seatStanding, summarise } from '../../src/report/quantities';
import { plainSentence, verdict } from '../../src/report/verdict';
import { microphone, panel, scheme, smallLayout, talker } from '../support/layouts';

const sentence = (layout: Layout, chosen: string | null = null): string =>
  plainSentence(verdict(layout, layout.schemes[0], predict(layout), chosen).sentence);

const loud = (layout: Layout): Layout => ({ ...layout, need: { kind: 'noise', signalToNoise: 60 } });

function worstOf(layout: Layout): { id: string; marginDb: number } {
  const prediction = predict(layout);
  const margins = Array.from(prediction.schemes[0].worstMarginDb);
  const marginDb = Math.min(...margins);
  return { id: prediction.seats[margins.indexOf(marginDb)].id, marginDb };
}

describe('the verdict says', () => {
  test('that every seat is served, and what the worst has in hand', () => {
    const layout = smallLayout();
    layout.venue.talkers[0].label = 'Chair';
    const { id, marginDb } = worstOf(layout);
    expect(sentence(layout)).toBe(
      `Kept 6 dB below ringing at 125 Hz, scheme A serves 6 of 6 seats; the worst, ${id}, has ${marginDb.toFixed(1)} dB in hand for Chair.`,
    );
  });

  test('how short the worst is, by its id where it has no label', () => {
    const layout = loud(smallLayout());
    const { id, marginDb } = worstOf(layout);
    expect(sentence(layout)).toBe(
      `Kept 6 dB below ringing at 125 Hz, scheme A serves 0 of 6 seats; the worst, ${id}, is ${(-marginDb).toFixed(1)} dB short for t.`,
    );
  });

  test('a stability margin that is no whole number as it is', () => {
    const layout = smallLayout();
    layout.schemes[0].system.stabilityMargin = 7.5;
    expect(sentence(layout)).toMatch(/^Kept 7\.5 dB below ringing/);
  });

  test('the talker chosen, not the worst', () => {
    const layout = smallLayout();
    layout.venue.talkers.push(talker('far', [0.4, 0.4, 1.5], { label: 'Far' }));
    expect(sentence(layout)).toMatch(/ for Far\.$/);
    expect(sentence(layout, 't')).toMatch(/ for t\.$/);
  });

  test.each<[string, (layout: Layout) => void, string]>([
    [
      'no talker',
      (l) => {
        l.venue.talkers = [];
      },
      'Scheme A has no talker to hear: add one.',
    ],
    [
      'no microphone',
      (l) => {
        l.schemes[0].microphones = [];
      },
      'Scheme A has no microphone: add one.',
    ],
    [
      'no loudspeaker',
      (l) => {
        l.schemes[0].loudspeakers = [];
      },
      'Scheme A has no loudspeaker: add one.',
    ],
    [
      'all closed',
      (l) => {
        l.schemes[0].microphones[0].open = false;
      },
      'Scheme A is silent: no microphone is open.',
    ],
    [
      'nothing sent',
      (l) => {
        l.schemes[0].routing = [{ microphone: 'm', loudspeaker: 'l', gain: null }];
      },
      'Scheme A is silent: no open microphone is sent to a loudspeaker.',
    ],
    [
      'no seat',
      (l) => {
        l.venue.seating = [];
      },
      'Scheme A has no seat to serve: add a seating block.',
    ],
  ])('why nothing is heard: %s', (_, change, expected) => {
    const layout = smallLayout();
    change(layout);
    expect(sentence(layout)).toBe(expected);
  });

  test('that a seat is not reached', () => {
    const layout = smallLayout();
    // The talker speaks to a microphone that nothing reaches: every figure of a shielded seat is null.
    const prediction = predict(layout);
    const [one] = prediction.schemes;
    one.talkers[0].seats.room.marginDb[4] = Number.NaN;
    one.worstMarginDb[4] = Number.NaN;
    const said = plainSentence(verdict(layout, layout.schemes[0], prediction, null).sentence);
    expect(said).toMatch(/serves 5 of 6 seats; the worst, A-2-2, is not reached for t\.$/);
  });

  test('links to the things it names', () => {
    const layout = smallLayout();
    const { sentence: parts } = verdict(layout, layout.schemes[0], predict(layout), null);
    expect(parts.flatMap(({ ref }) => (ref === undefined ? [] : [`${ref.kind} ${ref.id}`]))).toEqual([
      'system ',
      'scheme A',
      `seat ${worstOf(layout).id}`,
      'talker t',
    ]);
    expect(parts.find(({ filter }) => filter === 'short')?.text).toBe('6 of 6 seats');
  });
});

test('the peak allowance is covered or not by what is kept below the limit', () => {
  const layout = smallLayout();
  const peaks = (belowLimit: number | null) => {
    layout.schemes[0].system.belowLimit = belowLimit;
    return verdict(layout, layout.schemes[0], predict(layout), null).peaks;
  };
  expect(peaks(20)?.covered).toBe(true);
  expect(peaks(20)?.text).toMatch(/^Peak allowance \d+\.\d dB: covered$/);
  expect(peaks(0.5)?.text).toMatch(/^Peak allowance \d+\.\d dB: 0\.5 dB kept does not cover it$/);
});

describe('the summary', () => {
  test('counts a seat of exactly 0 dB as served and one of no finite margin as short', () => {
    const prediction = predict(smallLayout());
    const [one] = prediction.schemes;
    one.talkers[0].seats.room.marginDb.set([0, -0.001, Number.NaN, 3, 3, 3]);
    expect([0, 1, 2, 3].map((seat) => seatStanding(one, null, seat).short)).toEqual([false, true, true, false]);
    expect(summarise(one, null)).toMatchObject({ judged: 6, short: 2, worstSeat: 2 });
    expect(summarise(one, null, [0, 1, 3])).toMatchObject({ judged: 3, short: 1, worstSeat: 1, worstMarginDb: -0.001 });
  });

  test('leaves out a talker’s own seat', () => {
    const layout = smallLayout();
    layout.venue.talkers[0].position = [4.9, 1.4, 1.2];
    const [one] = predict(layout).schemes;
    expect(summarise(one, null).judged).toBe(5);
    expect(summarise(one, 't').judged).toBe(5);
    expect(seatStanding(one, 't', 1)).toMatchObject({ talker: 0, judged: false, short: false });
  });
});

describe('cautions', () => {
  const saidOf = (layout: Layout) => cautions(layout, layout.schemes[0], predict(layout), []).join('\n');

  test('always say that this is a prediction, and name overhead loads only where there are any', () => {
    const layout = smallLayout();
    expect(saidOf(layout)).toMatch(/Overhead loads/);
    layout.schemes[0].loudspeakers[0].position[2] = 1.9;
    expect(saidOf(layout)).not.toMatch(/Overhead loads/);
    expect(saidOf(layout)).toMatch(/to be verified on site/);
  });

  test('say when the peaks are not covered, when a loudspeaker is asked for too much, and how long a level may last', () => {
    const layout = smallLayout();
    layout.venue.talkers[0].level = 110;
    layout.schemes[0].system.belowLimit = 0.5;
    const text = saidOf(layout);
    expect(text).toMatch(/^0\.5 dB below ringing does not cover the loop's peaks \(\d+\.\d dB\) with t\.$/m);
    expect(text).toMatch(/^l is asked for \d+\.\d dB more than it can give with t\.$/m);
    expect(text).toMatch(
      /^\d+\.\d dBA at the loudest seat: occupational guidance allows \d+ minutes a day \(NIOSH\)\.$/m,
    );
    expect(saidOf(smallLayout())).not.toMatch(/loudest seat/);
  });
});

test('the text names every scheme and its worst seats first', () => {
  const layout = smallLayout();
  layout.schemes.push(
    scheme('B', {
      label: 'Two microphones',
      microphones: [microphone('m', [1.6, 2.9, 1.3]), microphone('n', [2.4, 5, 1.8])],
    }),
  );
  layout.venue.faces.push(panel(3.5, 0.2, 2, 2));
  const prediction = predict(layout);
  const text = predictionText(layout, prediction, []);
  expect(text).toMatch(/^Small room$/m);
  expect(text).toMatch(/^Scheme A$/m);
  expect(text).toMatch(/^Scheme B: Two microphones\n=+$/m);
  const rows = [...text.matchAll(/^(A-\d-\d) +t /gm)].map(([, id]) => id);
  expect(rows).toHaveLength(12);
  const margins = rows
    .slice(0, 6)
    .map((id) => prediction.schemes[0].worstMarginDb[prediction.seats.findIndex((seat) => seat.id === id)]);
  expect([...margins].sort((a, b) => a - b)).toEqual(margins);
  expect(text.split('\n').every((line) => line.length <= 100 && line === line.trimEnd())).toBe(true);
});
