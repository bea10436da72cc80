import table from '../../../data/reference/air-absorption.json';
import { airAttenuationDbPerM, airAttenuationDbPerMAt, soundSpeed } from '../../../src/acoustics/air';
import { CENTRES_HZ, NOMINAL_HZ } from '../../../src/acoustics/bands';
import type { PublishedRow } from '../row';

/** Three-figure values: half a per cent is the rounding of the shortest of them. */
const precise: PublishedRow[] = table.precise.rows.flatMap(({ temperatureC, humidityPercent, dbPerKm, origin }) =>
  dbPerKm.map((value, band) => ({
    quantity: `air attenuation at ${temperatureC} °C, ${humidityPercent} %, ${NOMINAL_HZ[band]} Hz`,
    compute: () => 1000 * airAttenuationDbPerM({ temperatureC, humidityPercent, pressureKPa: table.pressureKPa })[band],
    value,
    tolerance: 0.005 * value,
    unit: 'dB/km',
    source: origin,
  })),
);

/**
 * Printed to 0.1 dB/km, from 100 on to 1 dB/km; 63 Hz and up at exact centres. The table is rounded a second time from
 * three figures (4.15 to 4.1), so half a unit of the third figure, 0.005, comes on top of half a printed unit.
 */
const rounded: PublishedRow[] = table.rounded.rows.flatMap(({ temperatureC, humidityPercent, dbPerKm }) =>
  dbPerKm.map((value, column) => ({
    quantity: `air attenuation at ${temperatureC} °C, ${humidityPercent} %, ${table.rounded.bandsHz[column]} Hz, rounded`,
    compute: () => {
      const frequencyHz = column === 0 ? CENTRES_HZ[0] / 10 ** 0.3 : CENTRES_HZ[column - 1];
      return 1000 * airAttenuationDbPerMAt(frequencyHz, { temperatureC, humidityPercent, pressureKPa: 101.325 });
    },
    value,
    tolerance: value < 100 ? 0.055 : 0.5,
    unit: 'dB/km',
    source: table.rounded.origin,
  })),
);

export const rows: PublishedRow[] = [
  {
    quantity: 'speed of sound at 20 °C',
    compute: () => soundSpeed(20),
    value: 343.2,
    tolerance: 0.001,
    unit: 'm/s',
    source: 'ISO 9613-1:1993, Annex A',
  },
  {
    quantity: 'speed of sound at 0 °C',
    compute: () => soundSpeed(0),
    value: 331.3,
    tolerance: 0.1,
    unit: 'm/s',
    source: 'from memory (handbook value of dry air)',
  },
  ...precise,
  ...rounded,
];
