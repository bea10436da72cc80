import { createFaces } from '../../../src/acoustics/room/faces';
import { shellVolume } from '../../../src/acoustics/room/shell';
import { acousticFaces, box, flat } from '../../support/layouts';
import { field, fieldOfRoomConstant, onAxis, pairInField, SOUND_SPEED, surfaces } from '../../support/rooms';
import type { PublishedRow } from '../row';

const EARGLE = 'Eargle & Foreman, Sound System Design Reference Manual, 1999';

/** Distance at which direct and diffuse sound are equal. */
const criticalDistance = (roomConstantM2: number, directivityFactor: number, meanAbsorption: number): number =>
  1 /
  Math.sqrt(
    pairInField(fieldOfRoomConstant(roomConstantM2, meanAbsorption), onAxis(0, directivityFactor), onAxis(1))
      .diffuse[0],
  );

/**
 * The handbooks' factor 24 ln 10 / c is 0.1611 at 343 m/s; the model's 55.26 / 343.2 is 0.1610: 0.06 %.
 */
const shoebox = acousticFaces(box(8, 5, 3), 0.2);
const decay: PublishedRow[] = [
  {
    quantity: 'Sabine decay of 8 × 5 × 3 m, absorption 0.2',
    compute: () => field(shoebox, shellVolume(shoebox), { model: 'sabine' }).decayS[3],
    value: 0.611825,
    tolerance: 0.0007 * 0.611825,
    unit: 's',
    source: 'closed form: Sabine, 24 ln 10 / 343 · V / (S α)',
  },
  {
    quantity: 'Eyring decay of 8 × 5 × 3 m, absorption 0.2',
    compute: () => field(shoebox, shellVolume(shoebox)).decayS[3],
    value: 0.548369,
    tolerance: 0.0007 * 0.548369,
    unit: 's',
    source: 'closed form: Eyring, 24 ln 10 / 343 · V / (−S ln(1 − α))',
  },
];

const concrete = [0.01, 0.01, 0.015, 0.02, 0.02, 0.02, 0.02];
const gypsum = [0.29, 0.1, 0.05, 0.04, 0.07, 0.09, 0.09];
const untreated = field(surfaces([34.653, concrete], [107.675, gypsum]), 105.565, { model: 'sabine' });

/** Printed to 0.01 s from a constant of 0.049 s/ft and sums rounded to whole sabins: 0.7 %. */
const everest: PublishedRow[] = [0.54, 1.53, 2.87, 3.39, 2.06, 1.63].map((seconds, band) => ({
  quantity: `decay of an untreated room of 3,728 ft³ in octave ${band + 1}`,
  compute: () => untreated.decayS[band],
  value: seconds,
  tolerance: 0.007 * seconds,
  unit: 's',
  source: 'Everest, The Master Handbook of Acoustics, 4th ed., fig. 7-22, example 1',
}));

const office = field(
  surfaces([12.39, 0.05], [12.39, 0.02], [10.9, 0.04], [10.9, 0.04], [6.55, 0.04], [6.55, 0.04]),
  29.75,
  { model: 'sabine' },
);
const statistics: PublishedRow[] = [
  {
    quantity: 'absorption area of the example room at 1 kHz',
    compute: () => office.absorptionAreaM2[3],
    value: 2.26,
    tolerance: 0.005,
    unit: 'm²',
    source: 'EN 12354-6:2003, Annex E',
  },
  {
    quantity: 'decay of the example room at 1 kHz',
    compute: () => office.decayS[3],
    value: 2.1,
    tolerance: 0.05,
    unit: 's',
    source: 'EN 12354-6:2003, Annex E',
  },
  {
    quantity: 'room constant of 100 m² at 0.2',
    compute: () => field(surfaces([100, 0.2]), 100).roomConstantM2[3],
    value: 25,
    tolerance: 1e-6,
    unit: 'm²',
    source: 'Bies, Hansen & Howard, Engineering Noise Control, 5th ed., eq. 6.44',
  },
  {
    quantity: 'room constant of 440 m² at 0.2',
    compute: () => field(surfaces([440, 0.2]), 485).roomConstantM2[3],
    value: 110,
    tolerance: 0.5,
    unit: 'm²',
    source: `${EARGLE}, p. 66`,
  },
  {
    quantity: 'room constant of 440 m² at 0.4',
    compute: () => field(surfaces([440, 0.4]), 485).roomConstantM2[3],
    value: 293,
    tolerance: 0.5,
    unit: 'm²',
    source: `${EARGLE}, p. 66`,
  },
];

const criticalDistances: PublishedRow[] = [
  // The print gives 2.0 where its own figures give 2.09 m.
  {
    quantity: 'critical distance of a talker (directivity index 3 dB), room constant 110 m²',
    compute: () => criticalDistance(110, 2, 0.2),
    value: 2,
    tolerance: 0.1,
    unit: 'm',
    source: `${EARGLE}, p. 66`,
  },
  {
    quantity: 'critical distance of a talker (directivity index 3 dB), room constant 293 m²',
    compute: () => criticalDistance(293, 2, 0.4),
    value: 3.4,
    tolerance: 0.05,
    unit: 'm',
    source: `${EARGLE}, p. 66`,
  },
  {
    quantity: 'critical distance, directivity factor 5, room constant 80 m²',
    compute: () => criticalDistance(80, 5, 0.2),
    value: Math.sqrt((5 * 80) / (16 * Math.PI)),
    tolerance: 1e-9,
    unit: 'm',
    source: 'closed form: √(QR/16π)',
  },
  ...[4, 8, 16].map((distanceM, doublings) => ({
    quantity: `direct-to-reverberant ratio at ${distanceM} m where the critical distance is 4 m`,
    compute: () => {
      // R = 16π r² / Q.
      const room = fieldOfRoomConstant(16 * Math.PI * 16, 0.2);
      const { direct, diffuse } = pairInField(room, onAxis(0), onAxis(distanceM));
      return 10 * Math.log10(direct[3] / diffuse[3]);
    },
    value: -6 * doublings,
    tolerance: 0.05,
    unit: 'dB',
    source: `${EARGLE}, p. 58`,
  })),
];

/** L_p − L at 1 m on axis in free field = 10 log(1/r² + (4π/Q)·4/R). */
const hopkinsStryker: PublishedRow[] = [0.5, 2, 5, 10].map((distanceM) => ({
  quantity: `level of a source of directivity factor 4 at ${distanceM} m, room constant 60 m², re 1 m on axis`,
  compute: () => 10 * Math.log10(pairInField(fieldOfRoomConstant(60, 0.3), onAxis(0, 4), onAxis(distanceM)).total[3]),
  value: 10 * Math.log10(1 / distanceM ** 2 + (4 * Math.PI * 4) / (4 * 60)),
  tolerance: 1e-9,
  unit: 'dB',
  source: 'closed form: Hopkins & Stryker, Proc. IRE 36, 315 (1948): L_W + 10 log(Q/4πr² + 4/R)',
}));

const tetrahedron = createFaces(
  [
    [0, 1, 2],
    [0, 3, 1],
    [0, 2, 3],
    [1, 3, 2],
  ].map((corners) => ({
    corners: corners.map(
      (corner) =>
        [
          [1, 1, 1],
          [1, -1, -1],
          [-1, 1, -1],
          [-1, -1, 1],
        ][corner],
    ),
    absorption: flat(0.1),
    sides: 1 as const,
  })),
);

const solids: PublishedRow[] = [
  {
    quantity: 'volume of a regular tetrahedron of edge 2√2 m',
    compute: () => Math.abs(shellVolume(tetrahedron)),
    value: 8 / 3,
    tolerance: 1e-12,
    unit: 'm³',
    source: 'closed form: a³/(6√2)',
  },
  {
    quantity: 'area of a regular tetrahedron of edge 2√2 m',
    compute: () => field(tetrahedron, 1).surfaceM2,
    value: Math.sqrt(3) * 8,
    tolerance: 1e-12,
    unit: 'm²',
    source: 'closed form: √3 a²',
  },
  {
    quantity: 'mean free path of 8 × 5 × 3 m as 4V/S, from the decay at small absorption',
    // Sabine: T = 13.8155 · (4V/S) / (c ᾱ) in the model's rounding of 24 ln 10.
    compute: () => (field(shoebox, 120, { model: 'sabine' }).decayS[3] * SOUND_SPEED * 0.2) / (55.26 / 4),
    value: (4 * 120) / 158,
    tolerance: 1e-9,
    unit: 'm',
    source: 'closed form: Kuttruff, Room Acoustics, 6th ed.: mean free path 4V/S',
  },
];

export const rows: PublishedRow[] = [
  ...decay,
  ...everest,
  ...statistics,
  ...criticalDistances,
  ...hopkinsStryker,
  ...solids,
];
