import { NOMINAL_HZ } from '../acoustics/bands';
import type { Ref } from '../layout/ref';
import type { Layout, Scheme } from '../layout/schema';
import { talkerLabel } from '../layout/talker-label';
import type { Prediction, SchemePrediction } from '../predict/prediction';
import { amountFigure, count, figure, octaveFigure, plainFigure } from './figures';
import { summarise } from './quantities';

/** A piece of a sentence; one with a `ref` is a link to the thing it names. */
export interface Said {
  text: string;
  ref?: Ref;
  /** Shows only the seats that fall short. */
  filter?: 'short';
}

export interface Verdict {
  /** One sentence, always true for what is shown. */
  sentence: Said[];
  /** The peak allowance and whether the margin covers it; null without a loop. */
  peaks: { text: string; covered: boolean } | null;
}

/** What a scheme does, in one sentence on the room rung, for the talker chosen or (null) the worst of each seat. */
export function verdict(layout: Layout, scheme: Scheme, prediction: Prediction, chosen: string | null): Verdict {
  const predicted = prediction.schemes.find((candidate) => candidate.id === scheme.id);
  if (predicted === undefined) return { sentence: [{ text: 'Not predicted yet.' }], peaks: null };
  const name: Said = { text: `scheme ${scheme.id}`, ref: { kind: 'scheme', id: scheme.id } };
  const silent = whySilent(layout, scheme, predicted);
  if (silent !== null) return { sentence: [capital(name), { text: ` ${silent}` }], peaks: null };

  const summary = summarise(predicted, chosen);
  const limiting = mostCritical(predicted, chosen);
  const band = limiting?.loop.room.limitingBand ?? -1;
  const sentence: Said[] = [
    { text: 'Kept ' },
    { text: `${plainFigure(scheme.system.stabilityMargin)} dB`, ref: { kind: 'system', id: '' } },
    { text: ` below ringing at ${octaveFigure(NOMINAL_HZ[band])}, ` },
    name,
    { text: ' serves ' },
    { text: `${summary.judged - summary.short} of ${count(summary.judged, 'seat')}`, filter: 'short' },
  ];
  if (summary.worstSeat >= 0) sentence.push(...sayWorst(layout, prediction, predicted, summary));
  sentence.push({ text: '.' });
  return { sentence, peaks: sayPeaks(predicted, chosen, scheme) };
}

function whySilent(layout: Layout, scheme: Scheme, predicted: SchemePrediction): string | null {
  if (layout.venue.talkers.length === 0) return 'has no talker to hear: add one.';
  if (scheme.microphones.length === 0) return 'has no microphone: add one.';
  if (scheme.loudspeakers.length === 0) return 'has no loudspeaker: add one.';
  if (!scheme.microphones.some((microphone) => microphone.open)) return 'is silent: no microphone is open.';
  if (predicted.talkers.every((talker) => talker.loop.room.limitDb === null)) {
    return 'is silent: no open microphone is sent to a loudspeaker.';
  }
  if (predicted.worstTalker.length === 0) return 'has no seat to serve: add a seating block.';
  return null;
}

/** The talker whose loop may be raised least. */
function mostCritical(predicted: SchemePrediction, chosen: string | null) {
  const lowest = (talker: SchemePrediction['talkers'][number]) =>
    Math.min(
      talker.loop.room.limitDb ?? Number.POSITIVE_INFINITY,
      talker.loop.room.idleLimitDb ?? Number.POSITIVE_INFINITY,
    );
  const candidates = predicted.talkers.filter((talker) => chosen === null || talker.id === chosen);
  return candidates.reduce<(typeof candidates)[number] | null>(
    (worst, talker) => (worst === null || lowest(talker) < lowest(worst) ? talker : worst),
    null,
  );
}

function sayWorst(
  layout: Layout,
  prediction: Prediction,
  predicted: SchemePrediction,
  summary: ReturnType<typeof summarise>,
): Said[] {
  const seat: Said = {
    text: prediction.seats[summary.worstSeat].id,
    ref: { kind: 'seat', id: prediction.seats[summary.worstSeat].id },
  };
  const id = predicted.talkers[summary.worstTalker].id;
  const label = talkerLabel(layout, id);
  const talker: Said = { text: label, ref: { kind: 'talker', id } };
  const marginDb = summary.worstMarginDb;
  if (Number.isNaN(marginDb)) return [{ text: '; the worst, ' }, seat, { text: ', is not reached for ' }, talker];
  const standing =
    marginDb < 0 ? `, is ${amountFigure(marginDb)} dB short for ` : `, has ${amountFigure(marginDb)} dB in hand for `;
  return [{ text: '; the worst, ' }, seat, { text: standing }, talker];
}

function sayPeaks(predicted: SchemePrediction, chosen: string | null, scheme: Scheme): Verdict['peaks'] {
  const talker = mostCritical(predicted, chosen);
  const allowanceDb = talker?.working.peakAllowanceDb ?? null;
  if (talker === null || allowanceDb === null) return null;
  const covered = !talker.working.belowPeakAllowance;
  const kept = scheme.system.belowLimit ?? scheme.system.stabilityMargin;
  const text = covered
    ? `Peak allowance ${figure(allowanceDb)} dB: covered`
    : `Peak allowance ${figure(allowanceDb)} dB: ${figure(kept)} dB kept does not cover it`;
  return { text, covered };
}

const capital = (said: Said): Said => ({ ...said, text: said.text.charAt(0).toUpperCase() + said.text.slice(1) });

/** The sentence as plain text. */
export const plainSentence = (said: readonly Said[]): string => said.map((part) => part.text).join('');
