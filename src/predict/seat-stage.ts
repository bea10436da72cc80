import { BAND_COUNT } from '../acoustics/bands';
import { A_WEIGHTS, aWeightedPower, dbOfPower, powerOfDb } from '../acoustics/level';
import { loudspeakerFeeds } from '../acoustics/loop/feeds';
import { createPairPaths, type PairPaths } from '../acoustics/paths/finder';
import { createTransmissionIndex } from '../acoustics/speech/transmission-index';
import type { Need } from '../layout/schema';
import type { RungState } from './loop-stage';
import type { RoomSeats, Rung, RungSeats, WorkingPoint } from './prediction';
import { RUNGS } from './prediction';
import type { PreparedScheme, PreparedTalker, PreparedVenue } from './prepare';

/** What one talker's sound through the system is made of, before a seat is known. */
interface TalkerDrive {
  talker: PreparedTalker;
  wantedDba: number;
  /** 10^(level/10) of the talker's dBA: its power in the distance rung's one pseudo-band. */
  flatPower: number;
  /** Lower of limit and idle limit less the stability margin does not depend on the seat. dB; null without a loop. */
  rungs: Record<Rung, { limitPower: number; pauseCostDb: number; feeds: Float64Array } | null>;
  /** Power spectrum fed to each loudspeaker at working gain (room rung): [loudspeaker][band], 1 m re on axis. */
  working: Float64Array;
  /** Seconds from the talker's mouth to each loudspeaker's output through its strongest microphone; NaN where unfed. */
  leadS: Float64Array;
  /** Total delay that keeps the talker first at every seat a loudspeaker serves so far: [loudspeaker], seconds; NaN for none. */
  holdS: Float64Array;
  seats: Record<Rung, RungSeats>;
  room: RoomSeats;
}

/** All seats of one talker; `working` and `holdS` as in the drive. */
export type TalkerSeats = Pick<TalkerDrive, 'seats' | 'room' | 'working' | 'holdS'>;

/** What the seats of a scheme need to know of one talker's loop. */
export interface TalkerLoop {
  talker: PreparedTalker;
  states: Record<Rung, RungState>;
  point: WorkingPoint;
  /** Talker to microphones, metres. */
  lengthsM: Float64Array;
}

/**
 * Every figure of every seat, all talkers of one scheme in one pass over the seats: the paths of a seat are found once,
 * serve all talkers and are then forgotten, so memory does not grow with seats × loudspeakers.
 */
export function seatFigures(
  venue: PreparedVenue,
  scheme: PreparedScheme,
  loops: readonly TalkerLoop[],
  need: Need,
): TalkerSeats[] {
  const drives = loops.map((loop) => createDrive(venue, scheme, loop, need));
  const sources = scheme.loudspeakers.map((loudspeaker) => loudspeaker.source);
  const fromLoudspeakers = sources.map(createPairPaths);
  const fromTalker = createPairPaths();
  const figure = createSeatFigure(venue, scheme, need);
  venue.listeners.forEach((listener, seat) => {
    for (let l = 0; l < sources.length; l++) venue.finder.find(sources[l], listener, fromLoudspeakers[l]);
    for (const drive of drives) {
      venue.finder.find(drive.talker.source, listener, fromTalker);
      figure(drive, seat, fromTalker, fromLoudspeakers);
    }
  });
  return drives;
}

function createDrive(venue: PreparedVenue, scheme: PreparedScheme, loop: TalkerLoop, need: Need): TalkerDrive {
  const { talker, states, point } = loop;
  const seatCount = venue.listeners.length;
  const L = scheme.loudspeakers.length;
  const rung = (name: Rung) => {
    const state = states[name];
    if (state.loop.limitDb === null) return null;
    return {
      limitPower: powerOfDb(state.loop.limitDb),
      pauseCostDb: state.loop.pauseCostDb ?? 0,
      feeds: feedsOf(scheme, state),
    };
  };
  const rungs = { distance: rung('distance'), directivity: rung('directivity'), room: rung('room') };
  const working = new Float64Array(L * BAND_COUNT);
  if (rungs.room !== null && point.workingGainDb !== null) {
    const gain = powerOfDb(point.workingGainDb);
    working.set(rungs.room.feeds.map((feed, i) => gain * feed * talker.powers[i % BAND_COUNT]));
  }
  return {
    talker,
    wantedDba:
      need.kind === 'distance' ? talker.levelDba - 20 * Math.log10(need.metres) : venue.noiseDba + need.signalToNoise,
    flatPower: powerOfDb(talker.levelDba),
    rungs,
    working,
    leadS: leads(venue, scheme, loop),
    holdS: new Float64Array(L).fill(Number.NaN),
    seats: {
      distance: createRungSeats(seatCount),
      directivity: createRungSeats(seatCount),
      room: createRungSeats(seatCount),
    },
    room: createRoomSeats(seatCount),
  };
}

function feedsOf(scheme: PreparedScheme, state: RungState): Float64Array {
  return loudspeakerFeeds({
    microphones: scheme.microphones.length,
    loudspeakers: scheme.loudspeakers.length,
    bands: state.input.bands,
    talkerToMicrophone: state.talkerGains,
    routing: state.input.routing,
    share: state.share,
    filter: state.input.filter,
  });
}

/** Travel to the microphone that feeds a loudspeaker most (A-weighted L·T·w·κ·h) and latency, [loudspeaker], seconds. */
function leads(venue: PreparedVenue, scheme: PreparedScheme, loop: TalkerLoop): Float64Array {
  const M = scheme.microphones.length;
  const { share, talkerGains, input } = loop.states.room;
  return Float64Array.from(scheme.loudspeakers, (_, l) => {
    let [most, nearest] = [0, -1];
    for (let m = 0; m < M; m++) {
      let fed = 0;
      for (let b = 0; b < BAND_COUNT; b++) {
        const gain = talkerGains[m * BAND_COUNT + b] * input.routing[(l * M + m) * BAND_COUNT + b] * share[m];
        fed += A_WEIGHTS[b] * loop.talker.powers[b] * gain * input.filter[b];
      }
      if (fed > most * (1 + TIE)) [most, nearest] = [fed, m];
    }
    if (nearest < 0) return Number.NaN;
    return loop.lengthsM[nearest] / venue.soundSpeedMS + scheme.system.latency / 1000;
  });
}

/** Relative difference below which the first in file order is taken. */
const TIE = 1e-9;

const figures = (count: number): Float64Array => new Float64Array(count).fill(Number.NaN);

function createRungSeats(count: number): RungSeats {
  return { potentialDb: figures(count), neededDb: figures(count), marginDb: figures(count) };
}

function createRoomSeats(count: number): RoomSeats {
  return {
    unaidedDba: figures(count),
    systemDba: figures(count),
    totalDba: figures(count),
    totalDb: figures(count * BAND_COUNT),
    signalToNoiseDb: figures(count),
    directToReverberantDb: figures(count),
    arrivalGapMs: figures(count),
    sti: figures(count),
    servedBy: new Int16Array(count).fill(-1),
  };
}

/** 10 log of a power; NaN, "no finite number", for 0. */
const finiteDb = (power: number): number => (power > 0 ? dbOfPower(power) : Number.NaN);

function createSeatFigure(venue: PreparedVenue, scheme: PreparedScheme, need: Need) {
  const L = scheme.loudspeakers.length;
  const transmission = createTransmissionIndex();
  const unaided = new Float64Array(BAND_COUNT);
  const system = new Float64Array(BAND_COUNT);
  const energies = new Float64Array(BAND_COUNT);
  const meanFreeTimeS = (4 * venue.field.volumeM3) / venue.field.surfaceM2 / venue.soundSpeedMS;
  const stabilityMarginDb = scheme.system.stabilityMargin;

  return function figure(
    drive: TalkerDrive,
    seat: number,
    fromTalker: PairPaths,
    fromLoudspeakers: readonly PairPaths[],
  ): void {
    for (const rung of RUNGS) judge(drive, rung, seat, fromTalker, fromLoudspeakers);
    hear(drive, seat, fromTalker, fromLoudspeakers);
  };

  /** Potential gain, needed gain and margin on one rung. */
  function judge(
    drive: TalkerDrive,
    rung: Rung,
    seat: number,
    fromTalker: PairPaths,
    fromLoudspeakers: readonly PairPaths[],
  ): void {
    const { talker, wantedDba } = drive;
    const state = drive.rungs[rung];
    const flat = rung === 'distance';
    const gains = (paths: PairPaths) => (rung === 'directivity' ? paths.direct : paths.total);
    // On the distance rung one pseudo-band carries the talker's dBA.
    const direct = flat ? drive.flatPower * fromTalker.distanceGain : weighted(talker.powers, gains(fromTalker));
    const unaidedDba = finiteDb(direct);
    const out = drive.seats[rung];
    out.neededDb[seat] =
      flat && need.kind === 'distance'
        ? -dbOfPower(fromTalker.distanceGain) - 20 * Math.log10(need.metres)
        : wantedDba - unaidedDba;
    if (state === null) return;
    let power = 0;
    for (let l = 0; l < L; l++) {
      if (flat) power += drive.flatPower * state.feeds[l] * fromLoudspeakers[l].distanceGain;
      else power += weighted(talker.powers, gains(fromLoudspeakers[l]), state.feeds, l * BAND_COUNT);
    }
    const systemDba = finiteDb(power * state.limitPower);
    out.potentialDb[seat] = systemDba - unaidedDba;
    out.marginDb[seat] = systemDba - state.pauseCostDb - stabilityMarginDb - wantedDba;
  }

  /** Levels, ratios, arrivals and intelligibility at working gain, on the room rung. */
  function hear(drive: TalkerDrive, seat: number, fromTalker: PairPaths, fromLoudspeakers: readonly PairPaths[]): void {
    const { talker, working, room } = drive;
    for (let b = 0; b < BAND_COUNT; b++) unaided[b] = talker.powers[b] * fromTalker.total[b];
    system.fill(0);
    let directPower = weighted(talker.powers, fromTalker.direct);
    let [strongest, server] = [0, -1];
    for (let l = 0; l < L; l++) {
      const paths = fromLoudspeakers[l];
      let power = 0;
      for (let b = 0; b < BAND_COUNT; b++) {
        const fed = working[l * BAND_COUNT + b];
        system[b] += fed * paths.total[b];
        power += A_WEIGHTS[b] * fed * paths.direct[b];
      }
      directPower += power;
      if (power > strongest * (1 + TIE)) [strongest, server] = [power, l];
    }
    const unaidedPower = aWeightedPower(unaided);
    const systemPower = aWeightedPower(system);
    const totalPower = unaidedPower + systemPower;
    room.unaidedDba[seat] = finiteDb(unaidedPower);
    room.systemDba[seat] = finiteDb(systemPower);
    room.totalDba[seat] = finiteDb(totalPower);
    for (let b = 0; b < BAND_COUNT; b++) room.totalDb[seat * BAND_COUNT + b] = finiteDb(unaided[b] + system[b]);
    room.signalToNoiseDb[seat] = finiteDb(totalPower) - venue.noiseDba;
    room.directToReverberantDb[seat] = finiteDb(directPower / (totalPower - directPower));
    room.servedBy[seat] = server;
    if (server >= 0) {
      const undelayedS =
        drive.leadS[server] + (fromLoudspeakers[server].lengthM - fromTalker.lengthM) / venue.soundSpeedMS;
      room.arrivalGapMs[seat] = 1000 * undelayedS + scheme.loudspeakers[server].delayMs;
      const wantedS = Math.max(0, scheme.system.delayHold / 1000 - undelayedS);
      if (!(drive.holdS[server] > wantedS)) drive.holdS[server] = wantedS;
    }
    room.sti[seat] = intelligibility(drive, fromTalker, fromLoudspeakers);
  }

  function intelligibility(drive: TalkerDrive, fromTalker: PairPaths, fromLoudspeakers: readonly PairPaths[]): number {
    transmission.reset();
    arrive(fromTalker, drive.talker.powers, 0, 0);
    for (let l = 0; l < L; l++) {
      // An unfed loudspeaker has no lead and nothing to add.
      if (Number.isNaN(drive.leadS[l])) continue;
      arrive(
        fromLoudspeakers[l],
        drive.working,
        l * BAND_COUNT,
        drive.leadS[l] + scheme.loudspeakers[l].delayMs / 1000,
      );
    }
    return transmission.finish(venue.noisePowers);
  }

  /** Adds a source's direct, reflected and diffuse sound; `spectrum` is its power at 1 m, `leadS` when it sets out. */
  function arrive(paths: PairPaths, spectrum: Float64Array, from: number, leadS: number): void {
    const at = (gains: Float64Array, offset: number) => {
      for (let b = 0; b < BAND_COUNT; b++) energies[b] = spectrum[from + b] * gains[offset + b];
    };
    const directS = leadS + paths.lengthM / venue.soundSpeedMS;
    at(paths.direct, 0);
    if (!paths.blocked) transmission.add(directS, energies, 0);
    for (let i = 0; i < paths.reflections; i++) {
      at(paths.reflected, i * BAND_COUNT);
      transmission.add(leadS + paths.reflectionLengthsM[i] / venue.soundSpeedMS, energies, 0);
    }
    at(paths.diffuse, 0);
    transmission.addDiffuse(directS + venue.reflectionOrder * meanFreeTimeS, energies, 0, venue.field.decayS);
  }
}

/** Σ_b A-weight · spectrum · gain (· feed). */
function weighted(spectrum: Float64Array, gains: Float64Array, feeds?: Float64Array, at = 0): number {
  let sum = 0;
  for (let b = 0; b < BAND_COUNT; b++)
    sum += A_WEIGHTS[b] * spectrum[b] * gains[b] * (feeds === undefined ? 1 : feeds[at + b]);
  return sum;
}
