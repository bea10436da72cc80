import reference from '../../../data/reference/directivity.json';
import { besselJ1 } from '../../../src/acoustics/directivity/bessel-j1';
import { capPressure } from '../../../src/acoustics/directivity/cap-on-sphere';
import { arrayFactor } from '../../../src/acoustics/directivity/column';
import { pistonRatio } from '../../../src/acoustics/directivity/flush-piston';
import { directivityFactors } from '../../../src/acoustics/directivity/integrate';
import { dbOfPower } from '../../../src/acoustics/level';
import type { PublishedRow } from '../row';

const RAD = Math.PI / 180;
const { piston, rigidSphere, capOnSphere } = reference;

const pistonLevels: PublishedRow[] = piston.anglesDeg.flatMap((deg, row) =>
  piston.ka.map((ka, column) => ({
    quantity: `baffled piston, ka = ${ka}, at ${deg}°`,
    compute: () => dbOfPower(pistonRatio(ka * Math.sin(deg * RAD)) ** 2),
    value: piston.levelsDb[row][column],
    tolerance: 0.0051,
    unit: 'dB',
    source: piston.origin,
  })),
);

/** By the program's own quadrature over the half sphere in front. */
const pistonIndices: PublishedRow[] = piston.ka.map((ka, i) => ({
  quantity: `baffled piston, ka = ${ka}: directivity index`,
  compute: () => indexDb((theta) => (theta > Math.PI / 2 ? 0 : pistonRatio(ka * Math.sin(theta)) ** 2)),
  value: piston.indexDb[i],
  tolerance: 0.001,
  unit: 'dB',
  source: piston.origin,
}));

const pistonNulls: PublishedRow[] = piston.nulls.map((value, i) => ({
  quantity: `null ${i + 1} of the baffled piston, ka sin θ`,
  compute: () => rootNear(besselJ1, value),
  value,
  tolerance: 0.000051,
  unit: '',
  source: 'closed form: zeros of J₁',
}));

const pistonPoints: PublishedRow[] = piston.points.map(({ x, levelDb }) => ({
  quantity: `baffled piston at ka sin θ = ${x}`,
  compute: () => dbOfPower(pistonRatio(x) ** 2),
  value: levelDb,
  tolerance: 0.0055,
  unit: 'dB',
  source: piston.origin,
}));

/** A cap of 0.1° stands for the point. */
const spheres: PublishedRow[] = rigidSphere.rows.flatMap(({ kR, levelsDb }) =>
  levelsDb.map((value, i) => ({
    quantity: `rigid sphere, kR = ${kR}, point on it and distant point ${rigidSphere.anglesDeg[i]}° apart`,
    compute: () => dbOfPower(capPressure(kR, 0.1 * RAD, rigidSphere.anglesDeg[i] * RAD) ** 2),
    value,
    tolerance: 0.0051,
    unit: 'dB',
    source: rigidSphere.origin,
  })),
);

const pressureDoubling: PublishedRow = {
  quantity: 'rigid sphere, kR = 200, point facing the distant source',
  compute: () => dbOfPower(capPressure(200, 0.01 * RAD, 0) ** 2),
  value: 6.02,
  tolerance: 0.05,
  unit: 'dB',
  source: 'closed form: pressure doubles before a large rigid body',
};

const caps: PublishedRow[] = capOnSphere.rows.flatMap(({ betaDeg, kR, levelsDb, indexDb: value }) => [
  ...levelsDb.map((level, i) => ({
    quantity: `cap of ${betaDeg}° on a sphere, kR = ${kR}, at ${capOnSphere.anglesDeg[i]}°`,
    compute: () => dbOfPower(capRatio(kR, betaDeg, capOnSphere.anglesDeg[i] * RAD)),
    value: level,
    tolerance: 0.0051,
    unit: 'dB',
    source: capOnSphere.origin,
  })),
  {
    quantity: `cap of ${betaDeg}° on a sphere, kR = ${kR}: directivity index`,
    compute: () => indexDb((theta) => capRatio(kR, betaDeg, theta)),
    value,
    tolerance: 0.0051,
    unit: 'dB',
    source: capOnSphere.origin,
  },
]);

/** n drivers have their first null where n x = π, and their main lobe, 1, at x = 0 and at every grating lobe. */
const arrays: PublishedRow[] = [4, 8, 16].flatMap((drivers) => [
  {
    quantity: `first null of ${drivers} drivers in a row, x = (ks/2) sin e`,
    compute: () => rootNear((x) => Math.sin(drivers * x) * arrayFactor(drivers, x), Math.PI / drivers),
    value: Math.PI / drivers,
    tolerance: 1e-6,
    unit: 'rad',
    source: 'closed form: sin(nx)/(n sin x), Olson, Elements of Acoustical Engineering',
  },
  {
    quantity: `mean power of ${drivers} drivers in a row over one period of x`,
    compute: () => meanOverPeriod((x) => arrayFactor(drivers, x) ** 2),
    value: 1 / drivers,
    tolerance: 1e-12,
    unit: '',
    source: 'closed form: mean of sin²(nx)/(n sin x)² (Fejér kernel) is 1/n',
  },
]);

export const rows: PublishedRow[] = [
  ...pistonLevels,
  ...pistonIndices,
  ...pistonNulls,
  ...pistonPoints,
  ...spheres,
  pressureDoubling,
  ...caps,
  ...arrays,
];

function capRatio(kR: number, betaDeg: number, thetaRad: number): number {
  return (capPressure(kR, betaDeg * RAD, thetaRad) / capPressure(kR, betaDeg * RAD, 0)) ** 2;
}

function indexDb(power: (thetaRad: number) => number): number {
  const factors = directivityFactors({
    axisymmetric: true,
    powers: (u, _v, _w, out, at) => out.fill(power(Math.acos(u)), at, at + 7),
  });
  return dbOfPower(factors[0]);
}

function rootNear(f: (x: number) => number, guess: number): number {
  let low = guess - 0.01;
  let high = guess + 0.01;
  const sign = Math.sign(f(low));
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2;
    if (Math.sign(f(middle)) === sign) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

function meanOverPeriod(f: (x: number) => number): number {
  const count = 200;
  let sum = 0;
  for (let i = 0; i < count; i++) sum += f(((i + 0.5) * Math.PI) / count);
  return sum / count;
}
