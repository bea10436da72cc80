import type { RoomField } from '../../../src/acoustics/room/decay';
import { parseLayout } from '../../../src/formats/layout-json';
import { predictionJson } from '../../../src/predict/prediction-json';
import { predict } from '../../../src/predict/run';
import { runPredict } from '../../support/command-line';
import { projectText } from '../../support/files';
import { type Json, loudspeaker, microphone, scheme, smallLayout, talker } from '../../support/layouts';
import { fieldOfRoomConstant, onAxis, pairInField } from '../../support/rooms';
import type { PublishedRow } from '../row';

const EARGLE = 'Eargle & Foreman, Sound System Design Reference Manual, 1999';
const FILE = 'data/reference/outdoor-gain.layout.json';

/** Run here and not in a test, whose time is limited. */
const printed = runPredict([FILE, '--as', 'json']).stdout;

/** The two ways a person gets figures: the program itself, and its command line. */
const ways: [name: string, prediction: () => Json][] = [
  [
    'in the program',
    once(() => {
      const outcome = parseLayout(projectText(FILE));
      if (!outcome.ok) throw new Error(JSON.stringify(outcome.problems));
      return predictionJson(outcome.value, predict(outcome.value));
    }),
  ],
  ['on the command line', once(() => JSON.parse(printed))],
];

function once(make: () => Json): () => Json {
  let made: Json;
  return () => {
    made ??= make();
    return made;
  };
}

const talkerOf = (prediction: Json, id: string) =>
  prediction.schemes.find((candidate: Json) => candidate.id === id).talkers[0];
const distanceOf = (prediction: Json, id = 'A') => talkerOf(prediction, id).seats[0].distance;

/** 70 dB at the microphone, 1 m from the talker, falls to 53 dB at the listener. */
const outdoor: PublishedRow[] = ways.flatMap(([way, prediction]) => {
  const row = (quantity: string, compute: () => number, value: number, tolerance = 0.2): PublishedRow => ({
    quantity: `outdoor example ${way}: ${quantity}`,
    compute,
    value,
    tolerance,
    unit: 'dB',
    source: `${EARGLE}, pp. 34–36`,
  });
  // Needed gain is 70 − 20 log 3 less the unaided level.
  const unaided = () => 70 - 20 * Math.log10(3) - distanceOf(prediction()).needed_dB;
  return [
    row('unaided level at the listener', unaided, 53),
    row('level with the system at its limit', () => unaided() + distanceOf(prediction()).potential_dB, 66.5),
    row('greatest gain', () => distanceOf(prediction()).potential_dB, 13.5),
    row('gain with 6 dB margin', () => distanceOf(prediction()).potential_dB - 6, 7.5),
    row('gain needed to hear as if at 3 m', () => distanceOf(prediction()).needed_dB, 7.5),
    row('what is left: gain with 6 dB margin just covers the need', () => distanceOf(prediction()).margin_dB, 0),
    row(
      'an element 6 dB down towards the other',
      () => {
        const gain = (id: string) => talkerOf(prediction(), id).seats[0].directivity.potential_dB;
        return gain('B') - gain('A');
      },
      6,
    ),
    row(
      'microphone moved from 1 m to 0.16 m',
      () => distanceOf(prediction(), 'C').potential_dB - distanceOf(prediction(), 'A').potential_dB,
      16,
    ),
  ];
});

/** N open microphones at one distance from one loudspeaker, on the distance rung of a whole prediction. */
function limitOf(openMicrophones: number): number {
  const layout = smallLayout();
  const around = (i: number, n: number): [number, number, number] => {
    const turn = (2 * Math.PI * i) / n;
    return [4 + Math.cos(turn), 3 + Math.sin(turn), 1.5];
  };
  const microphones = Array.from({ length: openMicrophones }, (_, i) =>
    microphone(`m${i}`, around(i, openMicrophones)),
  );
  layout.venue.reflectionOrder = 0;
  layout.venue.talkers = [talker('t', [1, 1, 1.5])];
  layout.schemes = [scheme('A', { microphones, loudspeakers: [loudspeaker('l', [4, 3, 2])] })];
  return predict(layout).schemes[0].talkers[0].loop.distance.limitDb ?? Number.NaN;
}

const openMicrophones: PublishedRow[] = [
  ...[2, 4, 8, 20].map((n) => ({
    quantity: `change of the limit from 1 to ${n} open microphones`,
    compute: () => limitOf(n) - limitOf(1),
    value: -10 * Math.log10(n),
    tolerance: 1e-6,
    unit: 'dB',
    source: 'common practice: −10 log N',
  })),
  ...(
    [
      [1, 2, -3],
      [1, 4, -6],
      [1, 8, -9],
      [4, 9, -3.5],
      [1, 20, -13],
    ] as const
  ).map(([from, to, value]) => ({
    quantity: `change of the limit from ${from} to ${to} open microphones, as printed`,
    compute: () => limitOf(to) - limitOf(from),
    value,
    tolerance: 0.05,
    unit: 'dB',
    source: 'common practice, as printed in guides to automatic mixing',
  })),
];

/** What is left of 13.4 dB of potential gain after each usual stability margin, where nothing is needed. */
function leftAfter(stabilityMargin: number): number {
  const outcome = parseLayout(projectText(FILE));
  if (!outcome.ok) throw new Error('not read');
  const layout = outcome.value;
  layout.need = { kind: 'distance', metres: 7 };
  layout.schemes[0].system.stabilityMargin = stabilityMargin;
  const { potentialDb, marginDb } = predict(layout, ['A']).schemes[0].talkers[0].seats.distance;
  return potentialDb[0] - marginDb[0];
}

const stability: PublishedRow[] = [6, 12].map((marginDb) => ({
  quantity: `gain kept back by a stability margin of ${marginDb} dB`,
  compute: () => leftAfter(marginDb),
  value: marginDb,
  tolerance: 1e-9,
  unit: 'dB',
  source: 'common practice: 6 dB for an equalised system, 12 dB for one that is not',
}));

const doubling: PublishedRow[] = [2, 4, 8].map((distanceM) => ({
  quantity: `fall of direct sound from ${distanceM / 2} to ${distanceM} m`,
  compute: () => {
    const open = fieldOfRoomConstant(1000);
    const at = (r: number) => pairInField(open, onAxis(0), onAxis(r)).direct[3];
    return 10 * Math.log10(at(distanceM / 2) / at(distanceM));
  },
  value: 6.02,
  tolerance: 0.001,
  unit: 'dB',
  source: 'closed form: inverse square law, 20 log 2',
}));

/**
 * Indoors the manual draws direct and reverberant sound on a level chart and reads whole decibels; we add the powers.
 * Room constants follow from its critical distances, R = 16π D_c²/Q.
 */
const roomOf = (criticalDistanceM: number, directivityFactor: number): RoomField =>
  fieldOfRoomConstant((16 * Math.PI * criticalDistanceM ** 2) / directivityFactor);
const db = (power: number): number => 10 * Math.log10(power);

// Talker of directivity factor 2 and critical distance 1 m, 70 dB direct at 0.6 m; loudspeaker of 4 and so 1.4 m.
const small = roomOf(1, 2);
const atSmall = (q: number, r: number) => pairInField(small, onAxis(0, q), onAxis(r)).total[3];
const talkerLevel = 70 + 20 * Math.log10(0.6);
const smallMicrophone = () => talkerLevel + db(atSmall(2, 0.6));
const smallUnaided = () => talkerLevel + db(atSmall(2, 4.2));
const smallSystem = () => smallMicrophone() + db(atSmall(4, 4.8) / atSmall(4, 1.4));

// Talker of factor 2 and critical distance 2 m. The loudspeaker's listener and microphone both hear its reverberant
// field, which the manual takes for equal; the talker's own reverberant field at the microphone is left out there.
const medium = roomOf(2, 2);
const mediumUnaided = () => talkerLevel + db(pairInField(medium, onAxis(0, 2), onAxis(12)).total[3]);

// The same with the listeners in the reverberant field of a distributed system.
const distributedUnaided = (criticalDistanceM: number) =>
  talkerLevel + db(pairInField(roomOf(criticalDistanceM, 2), onAxis(0, 2), onAxis(1)).diffuse[3]);

const indoorRow = (quantity: string, page: string, compute: () => number, value: number, tolerance: number) => ({
  quantity: `indoor example: ${quantity}`,
  compute,
  value,
  tolerance,
  unit: 'dB',
  source: `${EARGLE}, ${page}`,
});

const indoor: PublishedRow[] = [
  indoorRow('small room, talker at the microphone', 'pp. 61–62', smallMicrophone, 71, 0.5),
  indoorRow('small room, unaided at the listener', 'pp. 61–62', smallUnaided, 65.4, 0.5),
  // 68.7 here: the manual reads the direct part off the chart as too small to count.
  indoorRow('small room, with the system', 'pp. 61–62', smallSystem, 68, 0.75),
  indoorRow('small room, potential gain', 'pp. 61–62', () => smallSystem() - smallUnaided(), 2.6, 0.5),
  indoorRow('medium room, unaided at the listener', 'p. 64', mediumUnaided, 60, 0.5),
  indoorRow('medium room, potential gain', 'p. 64', () => 70 - mediumUnaided(), 10, 0.5),
  // Unaided levels and gains are both printed in whole decibels, so a gain may be off by more than half a one.
  indoorRow('distributed, critical distance 2.0 m, unaided', 'pp. 66–67', () => distributedUnaided(2), 59, 0.6),
  indoorRow('distributed, critical distance 3.4 m, unaided', 'pp. 66–67', () => distributedUnaided(3.4), 55, 0.5),
  indoorRow('distributed, 2.0 m, gain with 6 dB margin', 'pp. 66–67', () => 70 - distributedUnaided(2) - 6, 5, 0.6),
  indoorRow('distributed, 3.4 m, gain with 6 dB margin', 'pp. 66–67', () => 70 - distributedUnaided(3.4) - 6, 9, 0.5),
  ...[2, 3.4].map((criticalDistanceM) =>
    indoorRow(
      `distributed, ${criticalDistanceM} m, gain by the rule 20 log D_c − 20 log D_s − 6`,
      'p. 68',
      () => 70 - distributedUnaided(criticalDistanceM) - 6,
      20 * Math.log10(criticalDistanceM) - 20 * Math.log10(0.6) - 6,
      1e-6,
    ),
  ),
];

export const rows: PublishedRow[] = [...outdoor, ...openMicrophones, ...stability, ...doubling, ...indoor];
