import { BAND_COUNT } from '../acoustics/bands';
import { A_WEIGHTS, powerOfDb } from '../acoustics/level';
import { type LoopInput, type LoopLimit, limitAlone, loopLimit, loopMatrix } from '../acoustics/loop/limit';
import { directToScattered, peakAllowanceDb, peakChances } from '../acoustics/loop/peaks';
import { spectralRadius } from '../acoustics/loop/perron';
import { heardPowers, shares } from '../acoustics/loop/shares';
import { createPairPaths, type Source, type Terminal } from '../acoustics/paths/finder';
import type { Rung, RungLoop, WorkingPoint } from './prediction';
import type { PreparedScheme, PreparedTalker, PreparedVenue } from './prepare';

/** Power gains of every source to every receiver on each rung: [source][receiver], times bands but for `distance`. */
export type RungGains = Record<Rung, Float64Array> & {
  /** Geometric lengths, metres. */
  lengthsM: Float64Array;
};

/** Paths between few devices, kept whole: talkers and loudspeakers to microphones. */
export function rungGains(venue: PreparedVenue, sources: readonly Source[], receivers: readonly Terminal[]): RungGains {
  const pairs = sources.length * receivers.length;
  const gains: RungGains = {
    distance: new Float64Array(pairs),
    directivity: new Float64Array(pairs * BAND_COUNT),
    room: new Float64Array(pairs * BAND_COUNT),
    lengthsM: new Float64Array(pairs),
  };
  const paths = createPairPaths();
  sources.forEach((source, i) => {
    receivers.forEach((receiver, j) => {
      const pair = i * receivers.length + j;
      venue.finder.find(source, receiver, paths);
      gains.distance[pair] = paths.distanceGain;
      gains.directivity.set(paths.direct, pair * BAND_COUNT);
      gains.room.set(paths.total, pair * BAND_COUNT);
      gains.lengthsM[pair] = paths.lengthM;
    });
  });
  return gains;
}

/** One rung of one talker's loop. */
export interface RungState {
  loop: RungLoop;
  input: LoopInput;
  limit: LoopLimit;
  /** w: [microphone]. */
  share: Float64Array;
  /** T: [microphone][band]; one band on the distance rung. */
  talkerGains: Float64Array;
}

/** Loops of all three rungs for one talker. `toMicrophones` is talker by microphone. */
export function talkerLoops(
  venue: PreparedVenue,
  scheme: PreparedScheme,
  talker: PreparedTalker,
  talkerIndex: number,
  toMicrophones: RungGains,
  inputs: Record<Rung, LoopInput>,
  idleLimits: Record<Rung, number | null>,
): Record<Rung, RungState> {
  const M = scheme.microphones.length;
  const one = (rung: Rung): RungState => {
    const bands = rung === 'distance' ? 1 : BAND_COUNT;
    const talkerGains = toMicrophones[rung].slice(talkerIndex * M * bands, (talkerIndex + 1) * M * bands);
    const input = inputs[rung];
    const heard = heardOn(rung, venue, scheme, talker, talkerGains);
    const { open, sharing } = scheme;
    const share = shares({ microphones: M, open, sharing, ...heard });
    const limit = loopLimit(input, share);
    const idle = scheme.gainSharing && !scheme.sharing.includes(1) ? limit.limitDb : idleLimits[rung];
    const loop: RungLoop = {
      limitDb: limit.limitDb,
      idleLimitDb: idle,
      openMicrophoneCostDb: limit.openMicrophoneCostDb,
      pauseCostDb: limit.limitDb === null ? null : Math.max(0, limit.limitDb - (idle ?? limit.limitDb)),
      limitingBand: limit.limitingBand,
      bandLimitsDb: limit.bandLimitsDb,
      crosspoints: limit.crosspoints,
    };
    return { loop, input, limit, share, talkerGains };
  };
  return { distance: one('distance'), directivity: one('directivity'), room: one('room') };
}

/** The loop of each rung, the same for all talkers. `returns` is loudspeaker by microphone. */
export function loopInputs(scheme: PreparedScheme, returns: RungGains): Record<Rung, LoopInput> {
  return {
    distance: loopInput(scheme, returns, 'distance', 1),
    directivity: loopInput(scheme, returns, 'directivity', BAND_COUNT),
    room: loopInput(scheme, returns, 'room', BAND_COUNT),
  };
}

function loopInput(scheme: PreparedScheme, returns: RungGains, rung: Rung, bands: number): LoopInput {
  const [M, L] = [scheme.microphones.length, scheme.loudspeakers.length];
  // Paths run loudspeaker by microphone; the loop wants A[microphone][loudspeaker].
  const turned = new Float64Array(M * L * bands);
  for (let l = 0; l < L; l++) {
    for (let m = 0; m < M; m++) {
      for (let b = 0; b < bands; b++) turned[(m * L + l) * bands + b] = returns[rung][(l * M + m) * bands + b];
    }
  }
  const flat = rung === 'distance';
  return {
    microphones: M,
    loudspeakers: L,
    bands,
    returns: turned,
    routing: flat ? scheme.flatRouting : scheme.routing,
    filter: flat ? Float64Array.of(1) : scheme.filter,
  };
}

function heardOn(
  rung: Rung,
  venue: PreparedVenue,
  scheme: PreparedScheme,
  talker: PreparedTalker,
  talkerGains: Float64Array,
): { speech: Float64Array; noise: Float64Array } {
  if (rung === 'distance') {
    const [speech, noise] = [powerOfDb(talker.levelDba), powerOfDb(venue.noiseDba)];
    return {
      speech: talkerGains.map((gain) => gain * speech),
      noise: new Float64Array(talkerGains.length).fill(noise),
    };
  }
  const factors = scheme.microphones.map((microphone) => microphone.device.directivityFactors);
  return heardPowers(talker.powers, talkerGains, venue.noisePowers, factors, A_WEIGHTS);
}

/**
 * The limit of each rung when nobody speaks, the same for all talkers: shares by noise alone. Null without gain sharing
 * or where no open microphone takes part; a talker's own limit then holds in pauses too.
 */
export function idleLimits(
  venue: PreparedVenue,
  scheme: PreparedScheme,
  inputs: Record<Rung, LoopInput>,
): Record<Rung, number | null> {
  if (!scheme.sharing.includes(1)) return { distance: null, directivity: null, room: null };
  const { open, sharing } = scheme;
  const microphones = scheme.microphones.length;
  const silence = new Float64Array(microphones);
  const limitWith = (input: LoopInput, noise: Float64Array) =>
    limitAlone(input, shares({ microphones, open, sharing, speech: silence, noise }));
  // On the distance rung every microphone hears the same noise.
  const alike = new Float64Array(microphones).fill(1);
  const factors = scheme.microphones.map((microphone) => microphone.device.directivityFactors);
  const unheard = new Float64Array(microphones * BAND_COUNT);
  const { noise } = heardPowers(unheard, unheard, venue.noisePowers, factors, A_WEIGHTS);
  return {
    distance: limitWith(inputs.distance, alike),
    directivity: limitWith(inputs.directivity, noise),
    room: limitWith(inputs.room, noise),
  };
}

/** Working gain, what the loop adds there, and how far its peaks stand above its mean. Room rung. */
export function workingPoint(
  venue: PreparedVenue,
  scheme: PreparedScheme,
  { room, directivity }: Record<Rung, RungState>,
): WorkingPoint {
  const { limitDb, idleLimitDb } = room.loop;
  const { limitingBand, radii } = room.limit;
  if (limitDb === null || limitingBand < 0) {
    return { workingGainDb: null, regenerationDb: null, peakAllowanceDb: null, belowPeakAllowance: false };
  }
  const marginDb = scheme.system.belowLimit ?? scheme.system.stabilityMargin;
  const workingGainDb = Math.min(limitDb, idleLimitDb ?? limitDb) - marginDb;
  const left = 1 - radii[limitingBand] * powerOfDb(workingGainDb);
  const direct = directivity.input;
  const directRadius = spectralRadius(loopMatrix(direct, room.share, limitingBand), direct.microphones);
  const allowanceDb = peakAllowanceDb({
    ratio: directToScattered(radii[limitingBand], directRadius),
    chances: peakChances(venue.field.decayS, radii),
  });
  return {
    workingGainDb,
    regenerationDb: left > 1e-9 ? -10 * Math.log10(left) : null,
    peakAllowanceDb: allowanceDb,
    belowPeakAllowance: marginDb < allowanceDb,
  };
}
