import { airAttenuationDbPerM, soundSpeed } from '../acoustics/air';
import { BAND_COUNT } from '../acoustics/bands';
import { createPattern } from '../acoustics/directivity/create-pattern';
import { directivityFactors } from '../acoustics/directivity/integrate';
import type { Pattern } from '../acoustics/directivity/pattern';
import { aWeightedDb, powerOfDb } from '../acoustics/level';
import { highPassPowers } from '../acoustics/loop/filter';
import { createListener, type Device } from '../acoustics/paths/device';
import { createPathFinder, type PathFinder, type Source, type Terminal } from '../acoustics/paths/finder';
import { type RoomField, roomField } from '../acoustics/room/decay';
import type { Faces } from '../acoustics/room/faces';
import { shellVolume } from '../acoustics/room/shell';
import { noiseLevelsOfNr } from '../acoustics/speech/noise';
import { talkerLevelsDb, VOCAL_EFFORT_DBA } from '../acoustics/speech/spectra';
import { frameOf } from '../layout/aim';
import { findModel } from '../layout/catalogue';
import { facesOf } from '../layout/geometry';
import type { DeviceKind, DeviceModel, Layout, Scheme, Talker, Venue } from '../layout/schema';
import { type Seat, seatsOf } from '../layout/seating';

/** A seat nearer than this to a talker is the talker's own, metres. */
const OWN_SEAT_M = 0.5;

export interface PreparedTalker {
  id: string;
  source: Source;
  levelDba: number;
  /** Power spectrum at 1 m on axis, seven bands. */
  powers: Float64Array;
}

/** The venue in the terms of the acoustics: everything that does not depend on the scheme. */
export interface PreparedVenue {
  soundSpeedMS: number;
  airDbPerM: Float64Array;
  field: RoomField;
  reflectionOrder: number;
  finder: PathFinder;
  noisePowers: Float64Array;
  noiseDba: number;
  talkers: PreparedTalker[];
  seats: Seat[];
  listeners: Terminal[];
  /** 1 where the seat is the talker's own: [talker][seat]. */
  ownSeat: Uint8Array;
  /** Index of each face by its id, for hosts. */
  faceIndex: ReadonlyMap<string, number>;
  models: ModelLibrary;
}

export interface PreparedLoudspeaker {
  id: string;
  source: Source;
  model: DeviceModel;
  delayMs: number;
}

/** One scheme in the terms of the acoustics. */
export interface PreparedScheme {
  id: string;
  microphoneIds: string[];
  microphones: Terminal[];
  loudspeakers: PreparedLoudspeaker[];
  /** [microphone], 1 where open. */
  open: Uint8Array;
  /** [microphone], 1 where open and taking part in gain sharing. */
  sharing: Uint8Array;
  gainSharing: boolean;
  /** κ with the equaliser: [loudspeaker][microphone][band]. */
  routing: Float64Array;
  /** κ without it: [loudspeaker][microphone]. */
  flatRouting: Float64Array;
  /** h, seven bands. */
  filter: Float64Array;
  system: Scheme['system'];
}

/** Patterns and their directivity factors, kept by what they are made from: making one is dear, most layouts repeat few. */
export interface ModelLibrary {
  get(model: DeviceModel): { pattern: Pattern; factors: Float64Array };
}

const MOST_KEPT = 200;
const kept = new Map<string, { pattern: Pattern; factors: Float64Array }>();

function createModelLibrary(soundSpeedMS: number): ModelLibrary {
  return {
    get(model) {
      const key = `${soundSpeedMS} ${JSON.stringify(model.pattern)}`;
      let made = kept.get(key);
      if (made === undefined) {
        const pattern = createPattern(model.pattern, soundSpeedMS);
        made = { pattern, factors: directivityFactors(pattern) };
        if (kept.size >= MOST_KEPT) kept.clear();
        kept.set(key, made);
      }
      return made;
    },
  };
}

/** Speed of sound and attenuation of the venue's air. */
export function airOf({ air }: Pick<Venue, 'air'>): { soundSpeedMS: number; airDbPerM: Float64Array } {
  return {
    soundSpeedMS: soundSpeed(air.temperature),
    airDbPerM: airAttenuationDbPerM({
      temperatureC: air.temperature,
      humidityPercent: air.humidity,
      pressureKPa: air.pressure,
    }),
  };
}

/** The venue's diffuse field with the faces given: its own, or changed ones. */
export function fieldOf(venue: Venue, faces: Faces): RoomField {
  const { soundSpeedMS, airDbPerM } = airOf(venue);
  return roomField(faces, venue.volume ?? shellVolume(faces), airDbPerM, soundSpeedMS, venue.decay);
}

/** A layout that passed `checkLayout`, ready to compute. */
export function prepareVenue(layout: Layout): PreparedVenue {
  const { venue } = layout;
  const { soundSpeedMS, airDbPerM } = airOf(venue);
  const faces = facesOf(venue);
  const field = fieldOf(venue, faces);
  const finder = createPathFinder({ faces, field, airDbPerM, reflectionOrder: venue.reflectionOrder });
  const models = createModelLibrary(soundSpeedMS);
  const noiseLevels = 'nr' in venue.noise ? noiseLevelsOfNr(venue.noise.nr) : Float64Array.from(venue.noise.levels);
  const seats = seatsOf(venue.seating);
  const talkers = venue.talkers.map((talker) => prepareTalker(layout, talker, finder, models));
  return {
    soundSpeedMS,
    airDbPerM,
    field,
    reflectionOrder: venue.reflectionOrder,
    finder,
    noisePowers: noiseLevels.map(powerOfDb),
    noiseDba: aWeightedDb(noiseLevels),
    talkers,
    seats,
    listeners: seats.map((seat) => finder.receiver(createListener(...seat.ear))),
    ownSeat: ownSeats(venue.talkers, seats),
    faceIndex: new Map(venue.faces.map((face, i) => [face.id, i])),
    models,
  };
}

function prepareTalker(layout: Layout, talker: Talker, finder: PathFinder, models: ModelLibrary): PreparedTalker {
  const levelDba = talker.level ?? VOCAL_EFFORT_DBA[talker.effort];
  const device = createDevice(
    { ...talker, roll: 0, host: null },
    modelOf(layout, talker.model, 'talker'),
    models,
    null,
  );
  return { id: talker.id, source: finder.source(device), levelDba, powers: talkerLevelsDb(levelDba).map(powerOfDb) };
}

function ownSeats(talkers: readonly Talker[], seats: readonly Seat[]): Uint8Array {
  const own = new Uint8Array(talkers.length * seats.length);
  talkers.forEach(({ position }, t) => {
    seats.forEach(({ ear }, s) => {
      const apart = Math.hypot(ear[0] - position[0], ear[1] - position[1], ear[2] - position[2]);
      if (apart < OWN_SEAT_M) own[t * seats.length + s] = 1;
    });
  });
  return own;
}

export function prepareScheme(layout: Layout, scheme: Scheme, venue: PreparedVenue): PreparedScheme {
  const { system } = scheme;
  const place = (device: Placed, kind: DeviceKind) =>
    createDevice(device, modelOf(layout, device.model, kind), venue.models, venue.faceIndex);
  const gainSharing = system.automix === 'gain-sharing';
  const flatRouting = routingGains(scheme);
  const equaliser = system.equaliser.map(powerOfDb);
  const routing = new Float64Array(flatRouting.length * BAND_COUNT);
  flatRouting.forEach((gain, i) => {
    for (let b = 0; b < BAND_COUNT; b++) routing[i * BAND_COUNT + b] = gain * equaliser[b];
  });
  return {
    id: scheme.id,
    microphoneIds: scheme.microphones.map((microphone) => microphone.id),
    microphones: scheme.microphones.map((microphone) => venue.finder.receiver(place(microphone, 'microphone'))),
    loudspeakers: scheme.loudspeakers.map((loudspeaker) => ({
      id: loudspeaker.id,
      source: venue.finder.source(place(loudspeaker, 'loudspeaker')),
      model: modelOf(layout, loudspeaker.model, 'loudspeaker'),
      delayMs: loudspeaker.delay,
    })),
    open: Uint8Array.from(scheme.microphones, (microphone) => (microphone.open ? 1 : 0)),
    sharing: Uint8Array.from(scheme.microphones, ({ open, automix }) => (gainSharing && open && automix ? 1 : 0)),
    gainSharing,
    routing,
    flatRouting,
    filter: highPassPowers(system.highPassHz),
    system,
  };
}

interface Placed {
  position: [number, number, number];
  pan: number;
  tilt: number;
  roll: number;
  model: string;
  host: string | null;
}

function createDevice(
  placed: Placed,
  model: DeviceModel,
  models: ModelLibrary,
  faceIndex: ReadonlyMap<string, number> | null,
): Device {
  const { pattern, factors } = models.get(model);
  const [x, y, z] = placed.position;
  return {
    x,
    y,
    z,
    frame: frameOf(placed),
    pattern,
    directivityFactors: factors,
    host: placed.host === null ? -1 : (faceIndex?.get(placed.host) ?? -1),
  };
}

function modelOf(layout: Layout, id: string, kind: DeviceKind): DeviceModel {
  const model = findModel(layout, id, kind);
  if (model === undefined) throw new Error(`No ${kind} model "${id}": the layout was not checked.`);
  return model;
}

/** Crosspoint and loudspeaker gain as power, [loudspeaker][microphone]; a pair not listed is sent at 0 dB. */
function routingGains(scheme: Scheme): Float64Array {
  const listed = new Map(scheme.routing.map((send) => [`${send.loudspeaker}\n${send.microphone}`, send.gain]));
  return Float64Array.from(
    scheme.loudspeakers.flatMap((loudspeaker) =>
      scheme.microphones.map((microphone) => {
        const gainDb = listed.get(`${loudspeaker.id}\n${microphone.id}`);
        return gainDb === null ? 0 : powerOfDb((gainDb ?? 0) + loudspeaker.gain);
      }),
    ),
  );
}
