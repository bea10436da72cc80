import { CENTRES_HZ } from './bands';

/** The state of the air in a room. */
export interface Air {
  temperatureC: number;
  /** Relative humidity, 0…100. */
  humidityPercent: number;
  /** Static pressure; 101.325 at sea level. */
  pressureKPa: number;
}

const REFERENCE_PRESSURE_KPA = 101.325;
const REFERENCE_TEMPERATURE_K = 293.15;
const TRIPLE_POINT_K = 273.16;
const ZERO_CELSIUS_K = 273.15;

/** Speed of sound in m/s at a temperature in °C: 343.2·√(T/293.15), T in kelvin (ISO 9613-1:1993, Annex A). */
export function soundSpeed(temperatureC: number): number {
  return 343.2 * Math.sqrt((temperatureC + ZERO_CELSIUS_K) / REFERENCE_TEMPERATURE_K);
}

/**
 * Attenuation of the seven bands in dB per metre, at the exact band centres: the standard's own tables are
 * computed there, and nominal frequencies are up to 1.3 % off. Positive: what one metre of air takes away.
 */
export function airAttenuationDbPerM(air: Air): Float64Array {
  return Float64Array.from(CENTRES_HZ, (frequencyHz) => airAttenuationDbPerMAt(frequencyHz, air));
}

/**
 * Attenuation of a pure tone in dB per metre (ISO 9613-1:1993, eqs 3–5).
 * Valid to ±10 % for −20…50 °C, 0.05…5 % molar water vapour, below 200 kPa and 4·10⁻⁴…10 Hz/Pa (clause 7).
 */
export function airAttenuationDbPerMAt(frequencyHz: number, air: Air): number {
  const kelvin = air.temperatureC + ZERO_CELSIUS_K;
  const t = kelvin / REFERENCE_TEMPERATURE_K;
  const p = air.pressureKPa / REFERENCE_PRESSURE_KPA;
  const h = waterVapourPercent(air, kelvin, p);
  const f2 = frequencyHz * frequencyHz;

  // Relaxation frequencies in Hz: eq. (3) oxygen, eq. (4) nitrogen.
  const oxygenHz = p * (24 + (4.04e4 * h * (0.02 + h)) / (0.391 + h));
  const nitrogenHz = (p / Math.sqrt(t)) * (9 + 280 * h * Math.exp(-4.17 * (t ** (-1 / 3) - 1)));

  // Eq. (5): classical and rotational absorption, then vibrational relaxation of the two gases.
  const classical = (1.84e-11 / p) * Math.sqrt(t);
  const oxygen = (0.01275 * Math.exp(-2239.1 / kelvin)) / (oxygenHz + f2 / oxygenHz);
  const nitrogen = (0.1068 * Math.exp(-3352 / kelvin)) / (nitrogenHz + f2 / nitrogenHz);
  return 8.686 * f2 * (classical + t ** -2.5 * (oxygen + nitrogen));
}

/** Molar concentration of water vapour in percent (ISO 9613-1:1993, Annex B). */
function waterVapourPercent(air: Air, kelvin: number, relativePressure: number): number {
  const saturation = 10 ** (-6.8346 * (TRIPLE_POINT_K / kelvin) ** 1.261 + 4.6151);
  return (air.humidityPercent * saturation) / relativePressure;
}
