import reference from '../../../data/reference/directivity.json';
import talker from '../../../data/reference/talker-directivity.json';
import { firstOrderPressure } from '../../../src/acoustics/directivity/first-order';
import { controlFrequencyHz, createHorn } from '../../../src/acoustics/directivity/horn';
import { directivityFactors } from '../../../src/acoustics/directivity/integrate';
import type { Pattern } from '../../../src/acoustics/directivity/pattern';
import { createSpeech } from '../../../src/acoustics/directivity/speech';
import { dbOfPower } from '../../../src/acoustics/level';
import type { PublishedRow } from '../row';

const RAD = Math.PI / 180;

/** Angles and efficiencies are those of the bare formula, since the floor of −25 dB fills the nulls. */
const firstOrder: PublishedRow[] = reference.firstOrder.rows.flatMap((row) => {
  const { name, alpha } = row;
  const efficiency = () => 1 / directivityFactors(unfloored(alpha))[0];
  const levelAt = (deg: number) => dbOfPower(firstOrderPressure(alpha, Math.cos(deg * RAD)) ** 2);
  return [
    check(`${name}: random energy efficiency`, efficiency, row.efficiency, 0.00006, ''),
    check(`${name}: directivity index`, () => -dbOfPower(efficiency()), row.indexDb, 0.0051, 'dB'),
    check(`${name}: distance factor`, () => efficiency() ** -0.5, row.distanceFactor, 0.00051, ''),
    check(`${name}: full angle to half power`, () => 2 * angleDeg(alpha, Math.SQRT1_2), row.fullAngle3Deg, 0.051, '°'),
    check(`${name}: full angle to half pressure`, () => 2 * angleDeg(alpha, 0.5), row.fullAngle6Deg, 0.051, '°'),
    check(`${name}: angle of the null`, () => angleDeg(alpha, 0), row.nullDeg, 0.0051, '°'),
    check(`${name}: level at 90°`, () => levelAt(90), row.at90Db, 0.0051, 'dB'),
    check(`${name}: level at 180°`, () => levelAt(180), row.at180Db, 0.0051, 'dB'),
  ].flat();
});

const speech: PublishedRow[] = talker.anglesDeg.flatMap((deg, row) =>
  talker.levelsDb[row].slice(0, 7).map((value, band) => ({
    quantity: `speech directivity at ${deg}°, ${talker.bandsHz[band]} Hz${value < -25 ? ' (floored)' : ''}`,
    compute: () => dbOfPower(powersAt(createSpeech(), deg, 0)[band]),
    // The program lets no pattern fall below −25 dB.
    value: Math.max(-25, value),
    tolerance: 1e-9,
    unit: 'dB',
    source: talker.origin,
  })),
);

const spun: PublishedRow[] = talker.spun.directivityIndexDb.map((value, band) => ({
  quantity: `directivity index of speech, ${talker.bandsHz[band]} Hz`,
  compute: () => dbOfPower(directivityFactors(createSpeech())[band]),
  value,
  tolerance: 0.0051,
  unit: 'dB',
  source: talker.spun.origin,
}));

const { keele, molloy, measured } = reference.horn;
const control: PublishedRow = {
  quantity: `lowest frequency at which ${keele.mouthM} m hold ${keele.angleDeg}°`,
  compute: () => controlFrequencyHz(keele.angleDeg, keele.mouthM),
  value: keele.frequencyHz,
  tolerance: 0.5,
  unit: 'Hz',
  source: keele.origin,
};
/** The program's horn is a model of its own: it is to come within about 1 dB of these. */
const horns: PublishedRow[] = [molloy, measured].flatMap(({ origin, rows }) =>
  rows.map(({ horizontalDeg, verticalDeg, indexDb }) => ({
    quantity: `directivity index of a ${horizontalDeg}° × ${verticalDeg}° horn`,
    compute: () => dbOfPower(directivityFactors(createHorn(horizontalDeg, verticalDeg, 1, 1))[6]),
    value: indexDb,
    tolerance: 1.1,
    unit: 'dB',
    source: origin,
  })),
);
const edges: PublishedRow[] = [0, 90, 180, 270].map((clockDeg) => ({
  quantity: `90° × 40° horn at half its nominal angle, clock angle ${clockDeg}°`,
  compute: () => dbOfPower(powersAt(createHorn(90, 40, 1, 1), clockDeg % 180 === 0 ? 45 : 20, clockDeg)[6]),
  value: -6,
  tolerance: 1e-9,
  unit: 'dB',
  source: 'common practice: nominal coverage is the full angle between the −6 dB directions',
}));

export const rows: PublishedRow[] = [...firstOrder, ...speech, ...spun, control, ...horns, ...edges];

/** No row where no figure exists, as the null of an omnidirectional microphone. */
function check(
  quantity: string,
  compute: () => number,
  value: number | null,
  tolerance: number,
  unit: string,
): PublishedRow[] {
  return value === null ? [] : [{ quantity, compute, value, tolerance, unit, source: reference.firstOrder.origin }];
}

function unfloored(alpha: number): Pattern {
  return {
    axisymmetric: true,
    powers: (u, _v, _w, out, at) => out.fill(firstOrderPressure(alpha, u) ** 2, at, at + 7),
  };
}

/** Angle where the pressure first falls to a value, by bisection on the program's own formula. */
function angleDeg(alpha: number, pressure: number): number {
  let low = 0;
  let high = 180;
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2;
    if (firstOrderPressure(alpha, Math.cos(middle * RAD)) > pressure) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

function powersAt(pattern: Pattern, thetaDeg: number, clockDeg: number): Float64Array {
  const out = new Float64Array(7);
  const sine = Math.sin(thetaDeg * RAD);
  pattern.powers(Math.cos(thetaDeg * RAD), sine * Math.cos(clockDeg * RAD), sine * Math.sin(clockDeg * RAD), out, 0);
  return out;
}
