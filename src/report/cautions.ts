import type { Problem } from '../layout/problem';
import type { Layout, Scheme } from '../layout/schema';
import { talkerLabel } from '../layout/talker-label';
import type { Prediction } from '../predict/prediction';
import { figure } from './figures';

/** Occupational exposure: 85 dBA for 8 hours, halved for each 3 dB (NIOSH REL, Publication 98-126). */
export const exposureMinutes = (levelDba: number): number => 480 / 2 ** ((levelDba - 85) / 3);

/** What is not predicted, said wherever results are handed on. */
export const NOT_MODELLED: readonly string[] = [
  'Diffraction: a face blocks a path wholly, or not at all.',
  'Single frequencies: figures are octave-band means; the peak allowance says how far narrow peaks stand above them.',
  "The room's own sound at the microphones does not lengthen the decay heard at the seats.",
  'Absorption at 8 kHz repeats 4 kHz where a finish has no published value.',
];

/** Cautions of one scheme: what the file checks found, what this prediction shows, and what always holds. */
export function cautions(
  layout: Layout,
  scheme: Scheme,
  prediction: Prediction,
  problems: readonly Problem[],
): string[] {
  return [
    ...problems.filter((problem) => problem.severity === 'caution').map((problem) => sayCaution(problem)),
    ...ofPrediction(layout, scheme, prediction),
    ...(scheme.loudspeakers.some((loudspeaker) => loudspeaker.position[2] > 2)
      ? ['Overhead loads are to be designed, fixed and inspected by qualified people under local codes.']
      : []),
    'A system that warns or evacuates people is designed under its own codes, not here.',
    'Ringing at full gain can be far louder than speech: raise gain with care, nobody near a loudspeaker.',
    'These are predictions with their assumptions, to be verified on site.',
  ];
}

function sayCaution(problem: Problem): string {
  const detail = [problem.expected, problem.remedy].filter((part) => part !== '').join('; ');
  return `${problem.found}${detail === '' ? '' : ` (${detail})`}.`.replace(/^./, (first) => first.toUpperCase());
}

function ofPrediction(layout: Layout, scheme: Scheme, prediction: Prediction): string[] {
  const predicted = prediction.schemes.find((candidate) => candidate.id === scheme.id);
  if (predicted === undefined) return [];
  const said: string[] = [];
  for (const talker of predicted.talkers) {
    const label = talkerLabel(layout, talker.id);
    if (talker.working.belowPeakAllowance) {
      const kept = scheme.system.belowLimit ?? scheme.system.stabilityMargin;
      said.push(
        `${figure(kept)} dB below ringing does not cover the loop's peaks (${figure(talker.working.peakAllowanceDb)} dB) with ${label}.`,
      );
    }
    talker.headroom.forEach(({ headroomDb }, l) => {
      if (headroomDb !== null && headroomDb < 0) {
        said.push(
          `${predicted.loudspeakerIds[l]} is asked for ${figure(-headroomDb)} dB more than it can give with ${label}.`,
        );
      }
    });
  }
  let loudest = Number.NEGATIVE_INFINITY;
  for (const talker of predicted.talkers) {
    for (const levelDba of talker.room.totalDba) if (levelDba > loudest) loudest = levelDba;
  }
  if (loudest >= 85) {
    const minutes = exposureMinutes(loudest);
    said.push(
      `${figure(loudest)} dBA at the loudest seat: occupational guidance allows ${figure(minutes, 0)} minutes a day (NIOSH).`,
    );
  }
  return said;
}
