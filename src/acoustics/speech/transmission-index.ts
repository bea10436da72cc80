import { BAND_COUNT } from '../bands';
import { dbOfPower, powerOfDb } from '../level';

/** Modulation frequencies 10^(n/10) Hz, n = −2…11: 0.63 … 12.5 Hz (IEC 60268-16:2020, Annex A). */
export const MODULATION_HZ: readonly number[] = Array.from({ length: 14 }, (_, i) => 10 ** ((i - 2) / 10));
const MODULATION_COUNT = MODULATION_HZ.length;
const MODULATION_RAD_PER_S = Float64Array.from(MODULATION_HZ, (frequencyHz) => 2 * Math.PI * frequencyHz);
const CELL_COUNT = BAND_COUNT * MODULATION_COUNT;
/** Discrete arrivals summed at once. */
const BATCH = 4;

/** Octave weights α (IEC 60268-16:2020, Table A.1). */
export const OCTAVE_WEIGHTS: readonly number[] = [0.085, 0.127, 0.23, 0.233, 0.309, 0.224, 0.173];

/** Redundancy corrections β between a band and the next one up (IEC 60268-16:2020, Table A.1). */
export const REDUNDANCY_CORRECTIONS: readonly number[] = [0.085, 0.078, 0.065, 0.011, 0.047, 0.095];

/** Absolute reception thresholds in dB (IEC 60268-16:2020, Table A.3). */
export const RECEPTION_THRESHOLDS_DB: readonly number[] = [46, 27, 12, 6.5, 7.5, 8, 12];
const THRESHOLD_POWERS = Float64Array.from(RECEPTION_THRESHOLDS_DB, powerOfDb);

/** Time constant of a 60 dB decay: energy falls as e^(−13.8155 t/T). */
const DECAY_NEPERS = 6 * Math.LN10;

/**
 * Gathers the sound arriving at one seat and gives its speech transmission index by the indirect method.
 * One instance serves any number of seats in turn and allocates nothing after it is made.
 */
export interface TransmissionIndex {
  /** Forgets the seat before. */
  reset(): void;
  /** A discrete arrival at `timeS`: seven energies (10^(level/10)) at energies[at … at+6]. */
  add(timeS: number, energies: Float64Array, at: number): void;
  /** A diffuse remainder that sets in at `startS` and decays by 60 dB in decayS[band] seconds. */
  addDiffuse(startS: number, energies: Float64Array, at: number, decayS: Float64Array): void;
  /** The index, 0…1, in the seven given noise powers; 0 where there is no speech. Fills `mti`. */
  finish(noisePowers: Float64Array): number;
  /** Modulation transfer indices of the seven bands after `finish`. */
  readonly mti: Float64Array;
  /** What the room alone leaves of the modulation, [band][frequency], stride 14: no noise, masking or threshold. */
  modulationsInQuiet(): Float64Array;
}

/**
 * m(F) = |Σ E_i e^(−j2πF t_i) + Σ E_k e^(−j2πF t_k)/(1 + j2πF T/13.8155)| / (ΣE + I_noise + I_masking + I_threshold)
 * (IEC 60268-16:2020, C.3: the Fourier transform of the squared impulse response; a decaying exponential for the
 * diffuse part). Only the modulus counts, so times are taken from the first arrival added, which may be in any order.
 */
export function createTransmissionIndex(): TransmissionIndex {
  const totals = new Float64Array(BAND_COUNT);
  const mti = new Float64Array(BAND_COUNT);
  const modulations = new Float64Array(CELL_COUNT);
  const discrete = createSums();
  // Diffuse remainders are summed as if they were discrete; the one factor that makes them decay comes last.
  const diffuse = createSums();
  const decay = createDecayFactors();
  const { speech, real, lag } = discrete;
  let originS = Number.NaN;

  function sinceFirst(timeS: number): number {
    if (Number.isNaN(originS)) originS = timeS;
    return timeS - originS;
  }

  function foldDiffuse(): void {
    diffuse.settle();
    for (let b = 0, cell = 0; b < BAND_COUNT; b++) {
      speech[b] += diffuse.speech[b];
      for (let f = 0; f < MODULATION_COUNT; f++, cell++) {
        const lagging = decay.lags[cell];
        real[cell] += decay.shares[cell] * (diffuse.real[cell] - lagging * diffuse.lag[cell]);
        lag[cell] += decay.shares[cell] * (diffuse.lag[cell] + lagging * diffuse.real[cell]);
      }
    }
    diffuse.clear();
  }

  function divideBy(powers: Float64Array): Float64Array {
    for (let b = 0, cell = 0; b < BAND_COUNT; b++) {
      for (let f = 0; f < MODULATION_COUNT; f++, cell++) {
        const size = Math.sqrt(real[cell] * real[cell] + lag[cell] * lag[cell]);
        modulations[cell] = size === 0 ? 0 : size / powers[b];
      }
    }
    return modulations;
  }

  return {
    mti,
    reset() {
      discrete.clear();
      diffuse.clear();
      originS = Number.NaN;
    },
    add: (timeS, energies, at) => discrete.add(sinceFirst(timeS), energies, at),
    addDiffuse(startS, energies, at, decayS) {
      if (!decay.isOf(decayS)) {
        foldDiffuse();
        decay.set(decayS);
      }
      diffuse.add(sinceFirst(startS), energies, at);
    },
    finish(noisePowers) {
      discrete.settle();
      foldDiffuse();
      auditoryPowers(speech, noisePowers, totals);
      return indexOf(divideBy(totals), mti);
    },
    modulationsInQuiet() {
      discrete.settle();
      foldDiffuse();
      return divideBy(speech).slice();
    },
  };
}

/**
 * Energies of arrivals, [band], and their complex sums, [band][frequency], stride 14, as real − j·lag: both parts grow
 * from positive sines. Arrivals wait until there are four, so that each cell is fetched and stored once for four.
 */
function createSums() {
  const speech = new Float64Array(BAND_COUNT);
  const real = new Float64Array(CELL_COUNT);
  const lag = new Float64Array(CELL_COUNT);
  const cos = new Float64Array(BATCH * MODULATION_COUNT);
  const sin = new Float64Array(BATCH * MODULATION_COUNT);
  const energy = new Float64Array(BATCH * BAND_COUNT);
  let waiting = 0;

  /** Takes in what waits. */
  function settle(): void {
    if (waiting === 0) return;
    const [c0, c1, c2, c3] = [0, 1, 2, 3].map((i) => i * MODULATION_COUNT);
    for (let b = 0, cell = 0; b < BAND_COUNT; b++) {
      const e0 = energy[b];
      const e1 = energy[BAND_COUNT + b];
      const e2 = energy[2 * BAND_COUNT + b];
      const e3 = energy[3 * BAND_COUNT + b];
      speech[b] += e0 + e1 + e2 + e3;
      for (let f = 0; f < MODULATION_COUNT; f++, cell++) {
        real[cell] += e0 * cos[c0 + f] + e1 * cos[c1 + f] + e2 * cos[c2 + f] + e3 * cos[c3 + f];
        lag[cell] += e0 * sin[c0 + f] + e1 * sin[c1 + f] + e2 * sin[c2 + f] + e3 * sin[c3 + f];
      }
    }
    energy.fill(0);
    waiting = 0;
  }

  return {
    speech,
    real,
    lag,
    settle,
    add(delayS: number, energies: Float64Array, at: number): void {
      phasesAt(delayS, cos, sin, waiting * MODULATION_COUNT);
      for (let b = 0; b < BAND_COUNT; b++) energy[waiting * BAND_COUNT + b] = energies[at + b];
      if (++waiting === BATCH) settle();
    },
    clear(): void {
      speech.fill(0);
      real.fill(0);
      lag.fill(0);
      energy.fill(0);
      waiting = 0;
    },
  };
}

/** y = 2πF·T/13.8155 and 1/(1 + y²) of each cell, kept for the decay they are of. */
function createDecayFactors() {
  const lags = new Float64Array(CELL_COUNT);
  const shares = new Float64Array(CELL_COUNT);
  const known = new Float64Array(BAND_COUNT).fill(Number.NaN);
  return {
    lags,
    shares,
    isOf(decayS: Float64Array): boolean {
      for (let b = 0; b < BAND_COUNT; b++) if (known[b] !== decayS[b]) return false;
      return true;
    },
    set(decayS: Float64Array): void {
      known.set(decayS);
      for (let b = 0, cell = 0; b < BAND_COUNT; b++) {
        for (let f = 0; f < MODULATION_COUNT; f++, cell++) {
          lags[cell] = (MODULATION_RAD_PER_S[f] * decayS[b]) / DECAY_NEPERS;
          shares[cell] = 1 / (1 + lags[cell] * lags[cell]);
        }
      }
    },
  };
}

/**
 * The index from modulation transfer values m laid out [band][frequency], stride 14, 125 Hz and 0.63 Hz first.
 * Values above 1 count as 1; the effective signal-to-noise ratio is limited to ±15 dB (IEC 60268-16:2020, Annex A).
 */
export function transmissionIndexOfModulations(m: ArrayLike<number>): { mti: Float64Array; sti: number } {
  const mti = new Float64Array(BAND_COUNT);
  const sti = indexOf(m, mti);
  return { mti, sti };
}

function indexOf(m: ArrayLike<number>, mti: Float64Array): number {
  let index = 0;
  for (let b = 0, cell = 0; b < BAND_COUNT; b++) {
    let sum = 0;
    for (let f = 0; f < MODULATION_COUNT; f++, cell++) sum += transmission(m[cell]);
    mti[b] = sum / MODULATION_COUNT;
    index += OCTAVE_WEIGHTS[b] * mti[b];
    if (b > 0) index -= REDUNDANCY_CORRECTIONS[b - 1] * Math.sqrt(mti[b - 1] * mti[b]);
  }
  return Math.min(1, Math.max(0, index));
}

/** Effective signal-to-noise ratio 10 log(m/(1 − m)), limited to ±15 dB and scaled to 0…1. */
function transmission(m: number): number {
  if (m >= 1) return 1;
  if (m <= 0) return 0;
  const effectiveDb = dbOfPower(m / (1 - m));
  return (Math.min(15, Math.max(-15, effectiveDb)) + 15) / 30;
}

/**
 * Writes speech + noise + masking by the band below + reception threshold of the seven bands, in power: what divides
 * the modulated speech. Masking comes from speech and noise together; 125 Hz has no band below it
 * (IEC 60268-16:2020, Annex A; worked in Annex M of the fourth edition, 2011).
 */
export function auditoryPowers(speechPowers: Float64Array, noisePowers: Float64Array, out: Float64Array): void {
  let below = 0;
  for (let b = 0; b < BAND_COUNT; b++) {
    const sound = speechPowers[b] + noisePowers[b];
    out[b] = sound + below * powerOfDb(maskingDb(dbOfPower(below))) + THRESHOLD_POWERS[b];
    below = sound;
  }
}

/** Masking of a band in dB re the level of the band below it (IEC 60268-16:2020, Annex A). */
export function maskingDb(levelBelowDb: number): number {
  if (levelBelowDb < 63) return 0.5 * levelBelowDb - 65;
  if (levelBelowDb < 67) return 1.8 * levelBelowDb - 146.9;
  if (levelBelowDb < 100) return 0.5 * levelBelowDb - 59.8;
  return -10;
}

/** One turn of cosine and sine in 4096 chords, which lie within (2π/4096)²/8 = 3·10⁻⁷ of the arc. */
const TURN_STEPS = 4096;
const COSINES = Float64Array.from({ length: TURN_STEPS + 1 }, (_, i) => Math.cos((2 * Math.PI * i) / TURN_STEPS));
const SINES = Float64Array.from({ length: TURN_STEPS + 1 }, (_, i) => Math.sin((2 * Math.PI * i) / TURN_STEPS));
const STEPS_PER_S = Float64Array.from(MODULATION_HZ, (frequencyHz) => TURN_STEPS * frequencyHz);

/** Cosine and sine of 2πF·delay for the fourteen frequencies, written from `at`; a table, because rooms ask for millions of them. */
function phasesAt(delayS: number, cos: Float64Array, sin: Float64Array, at: number): void {
  for (let f = 0; f < MODULATION_COUNT; f++) {
    const steps = delayS * STEPS_PER_S[f];
    const whole = Math.floor(steps);
    const part = steps - whole;
    const i = whole & (TURN_STEPS - 1);
    cos[at + f] = COSINES[i] + part * (COSINES[i + 1] - COSINES[i]);
    sin[at + f] = SINES[i] + part * (SINES[i + 1] - SINES[i]);
  }
}
