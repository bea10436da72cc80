import { NOMINAL_HZ } from '../acoustics/bands';
import type { Problem } from '../layout/problem';
import type { Layout, Scheme } from '../layout/schema';
import { talkerLabel } from '../layout/talker-label';
import { type Prediction, RUNGS, type Rung, type SchemePrediction } from '../predict/prediction';
import { cautions, NOT_MODELLED } from './cautions';
import { figure, marginFigure, octaveFigure, plainFigure } from './figures';
import { loudspeakerFigures, proposedDelays } from './loudspeaker-figures';
import { RUNG_LABELS, seatStanding } from './quantities';
import { plainSentence, verdict } from './verdict';

const WORST_SEATS = 10;
const WIDTH = 78;

/** The prediction as text to read at a terminal or paste into an e-mail: verdict, loop, worst seats, cautions. */
export function predictionText(layout: Layout, prediction: Prediction, problems: readonly Problem[]): string {
  const { venue } = prediction;
  const head = [
    layout.name,
    `${figure(venue.volumeM3, 0)} m³; decay ${figure(venue.decayS[2], 2)} s at 500 Hz; noise ${figure(venue.noiseDba)} dBA; ${sayNeed(layout)}`,
  ];
  const schemes = prediction.schemes.flatMap((predicted) => {
    const scheme = layout.schemes.find((candidate) => candidate.id === predicted.id);
    return scheme === undefined ? [] : ['', ...schemeText(layout, scheme, prediction, predicted, problems)];
  });
  return `${[...head, ...schemes, '', 'Not modelled', ...NOT_MODELLED.flatMap(bullet)].join('\n')}\n`;
}

function sayNeed(layout: Layout): string {
  const { need } = layout;
  return need.kind === 'distance'
    ? `every seat to hear as if at ${plainFigure(need.metres)} m`
    : `every seat to hear ${plainFigure(need.signalToNoise)} dB above the noise`;
}

function schemeText(
  layout: Layout,
  scheme: Scheme,
  prediction: Prediction,
  predicted: SchemePrediction,
  problems: readonly Problem[],
): string[] {
  const { sentence, peaks } = verdict(layout, scheme, prediction, null);
  const title = `Scheme ${scheme.id}${scheme.label === '' ? '' : `: ${scheme.label}`}`;
  return [
    title,
    '='.repeat(title.length),
    ...wrap(plainSentence(sentence)),
    ...(peaks === null ? [] : [`${peaks.text}.`]),
    '',
    ...loopTable(layout, predicted),
    '',
    ...loudspeakerTable(scheme, predicted),
    '',
    ...levelTable(layout, predicted),
    '',
    ...worstSeats(prediction, predicted, layout),
    '',
    'Cautions',
    ...cautions(layout, scheme, prediction, problems).flatMap(bullet),
  ];
}

/** Limit of each rung by talker, what the pauses and open microphones cost, and the octave that rings first. */
function loopTable(layout: Layout, predicted: SchemePrediction): string[] {
  const rows = predicted.talkers.flatMap((talker) =>
    RUNGS.map((rung: Rung, i) => {
      const loop = talker.loop[rung];
      const band = rung === 'distance' || loop.limitingBand < 0 ? '' : octaveFigure(NOMINAL_HZ[loop.limitingBand]);
      const label = talkerLabel(layout, talker.id);
      return [
        i === 0 ? label : '',
        RUNG_LABELS[rung],
        figure(loop.limitDb),
        figure(loop.idleLimitDb),
        figure(loop.openMicrophoneCostDb),
        rung === 'room' ? figure(talker.working.workingGainDb) : '',
        band,
      ];
    }),
  );
  const heads = ['Loop, dB', '', 'limit', 'in pauses', 'open mics', 'working', 'rings at'];
  return columns([heads, ...rows], [true, true, false, false, false, false, false]);
}

/** What each loudspeaker is asked for by the loudest talker, and the delay that keeps every talker first. */
function loudspeakerTable(scheme: Scheme, predicted: SchemePrediction): string[] {
  const proposed = proposedDelays(predicted, null);
  const rows = scheme.loudspeakers.map((loudspeaker, l) => {
    const { level } = loudspeakerFigures(predicted, null, loudspeaker.id);
    return [
      loudspeaker.id,
      figure(level?.levelDb ?? null),
      figure(level?.headroomDb ?? null),
      figure(level?.powerW ?? null, 3),
      figure(loudspeaker.delay),
      figure(proposed[l]),
    ];
  });
  const heads = ['Loudspeakers', 'dB at 1 m', 'headroom dB', 'power W', 'delay ms', 'proposed ms'];
  return columns([heads, ...rows], [true, false, false, false, false, false]);
}

/** How even the total level is over the seats, by talker. */
function levelTable(layout: Layout, predicted: SchemePrediction): string[] {
  const rows = predicted.talkers.map((talker) => [
    talkerLabel(layout, talker.id),
    figure(talker.uniformity.spreadDb),
    figure(talker.uniformity.deviationDb),
    figure(talker.working.regenerationDb),
    figure(talker.working.peakAllowanceDb),
  ]);
  const heads = ['Level over seats, dB', 'spread', 'deviation', 'regeneration', 'peak allowance'];
  return columns([heads, ...rows], [true, false, false, false, false]);
}

function worstSeats(prediction: Prediction, predicted: SchemePrediction, layout: Layout): string[] {
  const order = prediction.seats
    .map((_, seat) => ({ seat, standing: seatStanding(predicted, null, seat) }))
    .filter(({ standing }) => standing.judged)
    .sort((a, b) => lowFirst(a.standing.marginDb) - lowFirst(b.standing.marginDb))
    .slice(0, WORST_SEATS);
  const rows = order.map(({ seat, standing }) => {
    const talker = predicted.talkers[standing.talker];
    const label = talkerLabel(layout, talker.id);
    return [
      prediction.seats[seat].id,
      label,
      ...RUNGS.map((rung) => marginFigure(talker.seats[rung].marginDb[seat])),
      figure(talker.room.totalDba[seat]),
      figure(talker.room.signalToNoiseDb[seat]),
      figure(talker.room.sti[seat], 2),
      standing.short ? 'short' : '',
    ];
  });
  const heads = ['Worst seats', 'talker', 'distance', 'directivity', 'room dB', 'dBA', 'S/N dB', 'STI', ''];
  return columns([heads, ...rows], [true, true, false, false, false, false, false, false, true]);
}

const lowFirst = (marginDb: number): number => (Number.isNaN(marginDb) ? Number.NEGATIVE_INFINITY : marginDb);

/** Rows as aligned columns, `left` saying which are set flush left. */
function columns(rows: readonly (readonly string[])[], left: readonly boolean[]): string[] {
  const widths = left.map((_, c) => Math.max(...rows.map((row) => [...row[c]].length)));
  return rows.map((row) =>
    row
      .map((cell, c) => (left[c] ? cell.padEnd(widths[c]) : cell.padStart(widths[c])))
      .join('  ')
      .trimEnd(),
  );
}

function bullet(text: string): string[] {
  return wrap(text, WIDTH - 2).map((line, i) => (i === 0 ? `- ${line}` : `  ${line}`));
}

function wrap(text: string, width = WIDTH): string[] {
  const lines: string[] = [''];
  for (const word of text.split(' ')) {
    const last = lines[lines.length - 1];
    if (last !== '' && last.length + 1 + word.length > width) lines.push(word);
    else lines[lines.length - 1] = last === '' ? word : `${last} ${word}`;
  }
  return lines;
}
