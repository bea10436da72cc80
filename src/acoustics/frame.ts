import { vec3 } from 'gl-matrix';

/**
 * A device's own axes in room coordinates, nine numbers: forward u, left v, up w.
 * Pan turns counter-clockwise seen from above, 0 along +x; tilt is up positive; roll turns
 * about the aim axis, right-handed. Angles in radians.
 */
export function deviceFrame(panRad: number, tiltRad: number, rollRad: number): Float64Array {
  const forward: vec3 = [Math.cos(tiltRad) * Math.cos(panRad), Math.cos(tiltRad) * Math.sin(panRad), Math.sin(tiltRad)];
  const level: vec3 = [-Math.sin(panRad), Math.cos(panRad), 0];
  const upright = vec3.cross([0, 0, 0], forward, level);
  const frame = new Float64Array(9);
  frame.set(forward, 0);
  frame.set(turned(level, Math.cos(rollRad), upright, Math.sin(rollRad)), 3);
  frame.set(turned(upright, Math.cos(rollRad), level, -Math.sin(rollRad)), 6);
  return frame;
}

/** a·scaleA + b·scaleB. Plain arrays: gl-matrix's own vectors have 32 bits, too few for rooms. */
const turned = (a: vec3, scaleA: number, b: vec3, scaleB: number): vec3 =>
  vec3.scaleAndAdd([0, 0, 0], vec3.scale([0, 0, 0], a, scaleA), b, scaleB);

/** Pan and tilt (radians) that aim along a direction; a vertical aim keeps the pan given. */
export function aimAngles(x: number, y: number, z: number, keptPanRad: number): { panRad: number; tiltRad: number } {
  const flat = Math.hypot(x, y);
  const panRad = flat < 1e-9 * Math.abs(z) ? keptPanRad : Math.atan2(y, x);
  return { panRad, tiltRad: Math.atan2(z, flat) };
}
