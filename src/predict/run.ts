import { BAND_COUNT } from '../acoustics/bands';
import { dbOfPower } from '../acoustics/level';
import type { Source } from '../acoustics/paths/finder';
import { findModel } from '../layout/catalogue';
import type { DeviceKind, Layout, Scheme } from '../layout/schema';
import { idleLimits, loopInputs, rungGains, talkerLoops, workingPoint } from './loop-stage';
import type { Prediction, SchemePrediction, TalkerPrediction } from './prediction';
import { type PreparedScheme, type PreparedVenue, prepareScheme, prepareVenue } from './prepare';
import { seatFigures, type TalkerLoop, type TalkerSeats } from './seat-stage';

/** Level kept free for the crests of speech, dB (common practice). */
const CREST_DB = 12;

/**
 * Predicts a layout that passed `checkLayout`: every seat, every talker, the schemes asked for (all by default).
 * Pure: the same layout gives the same prediction, in a worker, in node or in a test.
 */
export function predict(layout: Layout, schemeIds?: readonly string[]): Prediction {
  const venue = prepareVenue(layout);
  const { field } = venue;
  return {
    venue: {
      volumeM3: field.volumeM3,
      surfaceM2: field.surfaceM2,
      decayS: field.decayS,
      roomConstantM2: field.roomConstantM2,
      airDbPerM: venue.airDbPerM,
      soundSpeedMS: venue.soundSpeedMS,
      noiseDba: venue.noiseDba,
    },
    seats: venue.seats,
    schemes: layout.schemes
      .filter((scheme) => schemeIds === undefined || schemeIds.includes(scheme.id))
      .map((scheme) => predictScheme(layout, scheme, venue)),
  };
}

function predictScheme(layout: Layout, scheme: Scheme, venue: PreparedVenue): SchemePrediction {
  const prepared = prepareScheme(layout, scheme, venue);
  const { loudspeakers } = prepared;
  const loops = loopsOf(venue, prepared);
  const figures = seatFigures(venue, prepared, loops, layout.need);
  const talkers = loops.map((loop, t) => talkerPrediction(venue, prepared, loop, figures[t], t));
  return {
    id: scheme.id,
    models: modelsUsed(layout, scheme, venue),
    talkers,
    microphoneIds: prepared.microphoneIds,
    loudspeakerIds: loudspeakers.map((loudspeaker) => loudspeaker.id),
    ...worstTalkers(talkers, venue.seats.length),
  };
}

/** The loop of each talker: few paths, all kept. */
export function loopsOf(venue: PreparedVenue, scheme: PreparedScheme): TalkerLoop[] {
  const sourcesOf = (list: readonly { source: Source }[]) => list.map((item) => item.source);
  const toMicrophones = rungGains(venue, sourcesOf(venue.talkers), scheme.microphones);
  const returns = rungGains(venue, sourcesOf(scheme.loudspeakers), scheme.microphones);
  const inputs = loopInputs(scheme, returns);
  const idle = idleLimits(venue, scheme, inputs);
  const M = scheme.microphones.length;
  return venue.talkers.map((talker, t) => {
    const states = talkerLoops(venue, scheme, talker, t, toMicrophones, inputs, idle);
    return {
      talker,
      states,
      point: workingPoint(venue, scheme, states),
      lengthsM: toMicrophones.lengthsM.slice(t * M, (t + 1) * M),
    };
  });
}

function talkerPrediction(
  venue: PreparedVenue,
  scheme: PreparedScheme,
  loop: TalkerLoop,
  figures: TalkerSeats,
  index: number,
): TalkerPrediction {
  const seatCount = venue.seats.length;
  const ownSeat = venue.ownSeat.slice(index * seatCount, (index + 1) * seatCount);
  const { states } = loop;
  return {
    id: loop.talker.id,
    levelDba: loop.talker.levelDba,
    loop: { distance: states.distance.loop, directivity: states.directivity.loop, room: states.room.loop },
    working: loop.point,
    seats: figures.seats,
    room: figures.room,
    ownSeat,
    headroom: scheme.loudspeakers.map((_, l) => headroom(scheme, figures.working, l)),
    proposedDelayMs: Array.from(figures.holdS, (seconds) => (Number.isNaN(seconds) ? null : 1000 * seconds)),
    uniformity: uniformity(figures.room.totalDba, ownSeat),
  };
}

/** Level at 1 m at working gain, unweighted, against the model's maximum less the crest allowance, and the power asked. */
function headroom(scheme: PreparedScheme, working: Float64Array, l: number): TalkerPrediction['headroom'][number] {
  let power = 0;
  for (let b = 0; b < BAND_COUNT; b++) power += working[l * BAND_COUNT + b];
  const { maximum, sensitivity } = scheme.loudspeakers[l].model;
  const levelDb = power > 0 ? dbOfPower(power) : null;
  return {
    levelDb,
    headroomDb: levelDb === null || maximum === undefined ? null : maximum - CREST_DB - levelDb,
    powerW: sensitivity === undefined ? null : power / 10 ** (sensitivity / 10),
  };
}

/** Spread (max − min) and population standard deviation of the total level over judged seats. */
function uniformity(totalDba: Float64Array, ownSeat: Uint8Array): TalkerPrediction['uniformity'] {
  const levels = totalDba.filter((level, seat) => !ownSeat[seat] && Number.isFinite(level));
  if (levels.length === 0) return { spreadDb: null, deviationDb: null };
  const mean = levels.reduce((sum, level) => sum + level, 0) / levels.length;
  const square = levels.reduce((sum, level) => sum + (level - mean) ** 2, 0) / levels.length;
  // Sorting, because a large venue has more seats than a call takes arguments.
  levels.sort();
  return { spreadDb: levels[levels.length - 1] - levels[0], deviationDb: Math.sqrt(square) };
}

/** For each seat the talker with the lowest room margin, its own left out; a seat that cannot be served is the worst. */
function worstTalkers(
  talkers: readonly TalkerPrediction[],
  seatCount: number,
): Pick<SchemePrediction, 'worstTalker' | 'worstMarginDb'> {
  const worstTalker = new Int16Array(seatCount).fill(-1);
  const worstMarginDb = new Float64Array(seatCount).fill(Number.NaN);
  for (let seat = 0; seat < seatCount; seat++) {
    let least = Number.POSITIVE_INFINITY;
    talkers.forEach((talker, t) => {
      if (talker.ownSeat[seat]) return;
      const marginDb = talker.seats.room.marginDb[seat];
      const value = Number.isNaN(marginDb) ? Number.NEGATIVE_INFINITY : marginDb;
      if (worstTalker[seat] >= 0 && !(value < least - TIE_DB)) return;
      least = value;
      worstTalker[seat] = t;
      worstMarginDb[seat] = marginDb;
    });
  }
  return { worstTalker, worstMarginDb };
}

/** Margins closer than this are equal and the first talker is taken, dB. */
const TIE_DB = 1e-9;

/** Microphone, loudspeaker and talker models in order of first use, with their directivity indices. */
function modelsUsed(layout: Layout, scheme: Scheme, venue: PreparedVenue): SchemePrediction['models'] {
  const uses: [string, DeviceKind][] = [
    ...scheme.microphones.map(({ model }): [string, DeviceKind] => [model, 'microphone']),
    ...scheme.loudspeakers.map(({ model }): [string, DeviceKind] => [model, 'loudspeaker']),
    ...layout.venue.talkers.map(({ model }): [string, DeviceKind] => [model, 'talker']),
  ];
  const seen = new Map<string, DeviceKind>();
  for (const [id, kind] of uses) if (!seen.has(id)) seen.set(id, kind);
  return [...seen].flatMap(([id, kind]) => {
    const model = findModel(layout, id, kind);
    return model === undefined ? [] : [{ id, directivityIndexDb: venue.models.get(model).factors.map(dbOfPower) }];
  });
}
