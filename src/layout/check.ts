import type { Faces } from '../acoustics/room/faces';
import { CATALOGUE_MODELS } from './catalogue';
import { checkFaces } from './check-faces';
import { checkPlaces } from './check-places';
import { checkSize } from './check-size';
import { facesOf } from './geometry';
import { cautionAt, errorAt, type Problem } from './problem';
import type { DeviceKind, DeviceModel, Layout, Scheme } from './schema';
import { type Seat, seatsOf } from './seating';

/**
 * What the schema cannot see: names that lead nowhere, ids given twice, faces that are not flat, things outside the
 * room. Errors first, in file order. A layout with errors is not predicted.
 */
export function checkLayout(layout: Layout): Problem[] {
  const faces: Faces = facesOf(layout.venue);
  const structure = checkStructure(layout, faces);
  // Places are only judged in a room that stands.
  if (structure.some((problem) => problem.severity === 'error')) return errorsFirst(structure);
  return errorsFirst([...structure, ...checkPlaces(layout, faces, seatsOf(layout.venue.seating))]);
}

/** The part of `checkLayout` without which a layout cannot even be shown: names, ids and faces. */
export function checkStructure(layout: Layout, faces: Faces = facesOf(layout.venue)): Problem[] {
  const tooLarge = checkSize(layout);
  if (tooLarge.length > 0) return tooLarge;
  const seats = seatsOf(layout.venue.seating);
  return [
    ...repeatedIds(layout, seats),
    ...layout.venue.faces.flatMap((face, i) =>
      layout.venue.finishes.some((finish) => finish.id === face.finish)
        ? []
        : [unknown(`venue.faces[${i}].finish`, face.finish, 'a finish', ids(layout.venue.finishes))],
    ),
    ...layout.venue.talkers.flatMap((talker, i) =>
      checkModel(layout, `venue.talkers[${i}].model`, talker.model, 'talker'),
    ),
    ...layout.schemes.flatMap((scheme, i) => checkScheme(layout, scheme, `schemes[${i}]`)),
    ...layout.models.flatMap((model, i) => [
      ...checkTable(model, `models[${i}].pattern`),
      ...checkCap(model, `models[${i}].pattern`),
    ]),
    ...unusedOmissions(layout),
    ...checkFaces(layout.venue, faces),
  ];
}

const errorsFirst = (problems: readonly Problem[]): Problem[] => [
  ...problems.filter((problem) => problem.severity === 'error'),
  ...problems.filter((problem) => problem.severity === 'caution'),
];

const ids = (list: readonly { id: string }[]): string[] => list.map((item) => item.id);

function unknown(path: string, found: string, what: string, known: readonly string[]): Problem {
  const list =
    known.length === 0
      ? 'there is none yet'
      : `known: ${known.slice(0, 12).join(', ')}${known.length > 12 ? ', …' : ''}`;
  return errorAt(path, `"${found}" is not ${what} of this layout`, list, 'name one of these or add it');
}

function repeatedIds(layout: Layout, seats: readonly Seat[]): Problem[] {
  const { venue } = layout;
  const lists: [string, readonly { id: string }[]][] = [
    ['venue.finishes', venue.finishes],
    ['venue.faces', venue.faces],
    ['venue.seating', venue.seating],
    ['venue.talkers', venue.talkers],
    ['venue.views', venue.views],
    ['schemes', layout.schemes],
    ['models', layout.models],
    ...layout.schemes.flatMap((scheme, i): [string, readonly { id: string }[]][] => [
      [`schemes[${i}].microphones`, scheme.microphones],
      [`schemes[${i}].loudspeakers`, scheme.loudspeakers],
    ]),
  ];
  const inLists = lists.flatMap(([path, list]) =>
    list.flatMap((item, i) =>
      list.findIndex((other) => other.id === item.id) < i ? [repeated(`${path}[${i}].id`, item.id)] : [],
    ),
  );
  const seen = new Map<string, number>();
  const inSeats = seats.flatMap((seat) => {
    const earlier = seen.get(seat.id);
    seen.set(seat.id, seat.seating);
    return earlier === undefined ? [] : [repeated(`venue.seating[${seat.seating}]`, seat.id)];
  });
  return [...inLists, ...inSeats.slice(0, 1)];
}

const repeated = (path: string, id: string): Problem =>
  errorAt(path, `"${id}" is given twice`, 'ids are unique', 'give one of them another id');

function checkModel(layout: Layout, path: string, id: string, kind: DeviceKind): Problem[] {
  const model = layout.models.find((own) => own.id === id) ?? CATALOGUE_MODELS.find((other) => other.id === id);
  if (model?.kind === kind) return [];
  if (model !== undefined) {
    return [errorAt(path, `"${id}" is a ${model.kind}`, `a ${kind} model belongs here`, 'name another model')];
  }
  const known = [...layout.models, ...CATALOGUE_MODELS].filter((other) => other.kind === kind);
  return [unknown(path, id, `a ${kind} model`, ids(known))];
}

function checkScheme(layout: Layout, scheme: Scheme, path: string): Problem[] {
  const faces = new Set(ids(layout.venue.faces));
  const checkHost = (at: string, host: string | null) =>
    host === null || faces.has(host) ? [] : [unknown(`${at}.host`, host, 'a face', ids(layout.venue.faces))];
  const pairs = scheme.routing.map((send) => `${send.microphone}\n${send.loudspeaker}`);
  return [
    ...scheme.microphones.flatMap((microphone, i) => [
      ...checkModel(layout, `${path}.microphones[${i}].model`, microphone.model, 'microphone'),
      ...checkHost(`${path}.microphones[${i}]`, microphone.host),
    ]),
    ...scheme.loudspeakers.flatMap((loudspeaker, i) => [
      ...checkModel(layout, `${path}.loudspeakers[${i}].model`, loudspeaker.model, 'loudspeaker'),
      ...checkHost(`${path}.loudspeakers[${i}]`, loudspeaker.host),
    ]),
    ...scheme.routing.flatMap((send, i) => {
      const at = `${path}.routing[${i}]`;
      const problems: Problem[] = [];
      if (!scheme.microphones.some((m) => m.id === send.microphone)) {
        problems.push(unknown(`${at}.microphone`, send.microphone, 'a microphone', ids(scheme.microphones)));
      }
      if (!scheme.loudspeakers.some((l) => l.id === send.loudspeaker)) {
        problems.push(unknown(`${at}.loudspeaker`, send.loudspeaker, 'a loudspeaker', ids(scheme.loudspeakers)));
      }
      if (pairs.indexOf(pairs[i]) < i) {
        const pair = `${send.microphone} to ${send.loudspeaker}`;
        problems.push(errorAt(at, `${pair} is listed twice`, 'a routing pair is listed once', 'take one of them out'));
      }
      return problems;
    }),
  ];
}

/** A radiating cap fits on its sphere. */
function checkCap(model: DeviceModel, path: string): Problem[] {
  const { pattern } = model;
  if (pattern.type !== 'cap-on-sphere' && pattern.type !== 'column') return [];
  if (pattern.cap <= pattern.sphere) return [];
  return [
    errorAt(`${path}.cap`, 'the cap is larger than its sphere', `at most ${pattern.sphere} m`, 'enter diameters'),
  ];
}

/** A table's levels must have the shape its angles say, rising angles, and 0 dB on its axis. */
function checkTable(model: DeviceModel, path: string): Problem[] {
  const { pattern } = model;
  if (pattern.type !== 'table') return [];
  const { theta, phi, levels } = pattern;
  const rising = (angles: readonly number[]) => angles.every((angle, i) => i === 0 || angle > angles[i - 1]);
  if (theta[0] !== 0 || !rising(theta)) {
    return [errorAt(`${path}.theta`, 'the angles do not rise from 0', 'rising angles, 0° first', 'sort the rows')];
  }
  if (!rising(phi) || phi[phi.length - 1] - phi[0] >= 360) {
    return [
      errorAt(`${path}.phi`, 'the angles do not rise within one turn', 'rising angles within 360°', 'sort the columns'),
    ];
  }
  for (const [b, rows] of levels.entries()) {
    if (rows.length !== theta.length || rows.some((row) => row.length !== phi.length)) {
      const expected = `${theta.length} rows of ${phi.length} levels`;
      return [
        errorAt(`${path}.levels[${b}]`, 'rows or columns are missing', expected, 'one level for each pair of angles'),
      ];
    }
    if (rows[0].some((level) => Math.abs(level) > 1e-9)) {
      return [
        errorAt(
          `${path}.levels[${b}][0]`,
          'the 0° row is not 0 dB',
          'levels relative to on-axis',
          'subtract it from its band',
        ),
      ];
    }
  }
  if (pattern.planes) {
    const clock = phi.map((angle) => ((angle % 360) + 360) % 360);
    const has = (...wanted: number[]) => clock.some((angle) => wanted.includes(angle));
    if (clock.some((angle) => angle % 90 !== 0) || !has(0, 180) || !has(90, 270)) {
      return [
        errorAt(
          `${path}.phi`,
          `found ${phi.join(', ')}`,
          'half-planes at multiples of 90°, one horizontal and one vertical',
          '',
        ),
      ];
    }
  }
  return [];
}

function unusedOmissions(layout: Layout): Problem[] {
  return layout.venue.seating.flatMap((part, i) => {
    if (part.kind !== 'block') return [];
    const possible = new Set(seatsOf([{ ...part, omit: [] }]).map((seat) => seat.id));
    return part.omit.flatMap((id, k) =>
      possible.has(id)
        ? []
        : [
            cautionAt(
              `venue.seating[${i}].omit[${k}]`,
              `"${id}" is not a seat of this block`,
              `ids look like ${part.id}-1-1`,
              '',
            ),
          ],
    );
  });
}
