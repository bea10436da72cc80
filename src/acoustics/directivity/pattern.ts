/**
 * How strongly a device sends or receives in each direction.
 *
 * Directions are unit vectors in the device's own frame: u forward (its aim), v to its left, w up.
 * Off-axis angle θ = acos u; clock angle φ = atan2(w, v), 0° left, 90° up, 0 where sin θ < 1e-9.
 */
export interface Pattern {
  /** Writes D², power relative to on-axis and after the floor, of the seven bands into out[at … at+6]. */
  powers(u: number, v: number, w: number, out: Float64Array, at: number): void;
  /** True where D² depends on θ alone. */
  readonly axisymmetric: boolean;
  /** Set where D² is finest in elevation: integrals then take rings about w, not about u. */
  readonly ringsAbout?: 'up' | undefined;
}

/** Describes a pattern: what a layout file says under `pattern`. Angles in degrees, lengths in metres, levels in dB. */
export type PatternSpec =
  | { type: 'point' }
  | { type: 'speech' }
  | { type: 'first-order'; alpha: number | number[] }
  | { type: 'tube'; length: number }
  | { type: 'boundary' }
  | { type: 'cap-on-sphere'; sphere: number; cap: number }
  | { type: 'horn'; horizontal: number; vertical: number; mouthWidth: number; mouthHeight: number }
  | { type: 'column'; drivers: number; spacing: number; steer: number; sphere: number; cap: number }
  | { type: 'flush-piston'; diameter: number }
  | { type: 'table'; theta: number[]; phi: number[]; levels: number[][][]; planes?: boolean | undefined };

/** Real nulls fill in: no pattern is taken below −25 dB, horns not below −20 dB (common practice). */
export const FLOOR_POWER = 10 ** (-25 / 10);
export const HORN_FLOOR_POWER = 10 ** (-20 / 10);
