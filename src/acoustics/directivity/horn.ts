import { BAND_COUNT, CENTRES_HZ } from '../bands';
import { HORN_FLOOR_POWER, type Pattern } from './pattern';

/** Keele, What's so sacred about exponential horns?, Audio Eng. Soc. preprint 1038, 1975: 1e6 degree inch hertz. */
const KEELE_DEGREE_METRE_HERTZ = 25_400;
const NEPERS_PER_DB = Math.LN10 / 10;

/**
 * Horn known by its nominal full −6 dB angles and its mouth, at band centres, floor −20 dB:
 * D_dB = −6 (θ/θ₆)³, θ₆ the superellipse of fourth order through the half angles (our choice, which keeps the nominal
 * angles and comes within about 1 dB of Molloy's Q).
 *
 * @param horizontalDeg, verticalDeg full angles in degrees, at most 360
 * @param mouthWidthM, mouthHeightM  mouth in metres, which sets down to where the angles hold
 */
export function createHorn(
  horizontalDeg: number,
  verticalDeg: number,
  mouthWidthM: number,
  mouthHeightM: number,
): Pattern {
  const toHalfRad = Math.PI / 360;
  const inverseH = Float64Array.from(CENTRES_HZ, (f) => 1 / (coverageDeg(horizontalDeg, mouthWidthM, f) * toHalfRad));
  const inverseV = Float64Array.from(CENTRES_HZ, (f) => 1 / (coverageDeg(verticalDeg, mouthHeightM, f) * toHalfRad));
  return {
    axisymmetric: false,
    powers(u, v, w, out, at) {
      const sine = Math.hypot(v, w);
      const thetaRad = Math.atan2(sine, u);
      const cosClock = sine < 1e-9 ? 1 : v / sine;
      const sinClock = sine < 1e-9 ? 0 : w / sine;
      for (let b = 0; b < BAND_COUNT; b++) {
        const h2 = (cosClock * inverseH[b]) ** 2;
        const v2 = (sinClock * inverseV[b]) ** 2;
        const ratio = thetaRad * Math.sqrt(Math.sqrt(h2 * h2 + v2 * v2));
        out[at + b] = Math.max(HORN_FLOOR_POWER, Math.exp(-6 * NEPERS_PER_DB * ratio * ratio * ratio));
      }
    },
  };
}

/** Lowest frequency at which a mouth of this size still holds the nominal full angle (Keele 1975). */
export function controlFrequencyHz(angleDeg: number, mouthM: number): number {
  return KEELE_DEGREE_METRE_HERTZ / (angleDeg * mouthM);
}

/** Full −6 dB angle in degrees at a frequency: nominal down to the control frequency, wider in proportion below it. */
export function coverageDeg(angleDeg: number, mouthM: number, frequencyHz: number): number {
  const controlHz = controlFrequencyHz(angleDeg, mouthM);
  return frequencyHz >= controlHz ? angleDeg : Math.min(360, (angleDeg * controlHz) / frequencyHz);
}
