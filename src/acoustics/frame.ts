/**
 * A device's own axes in room coordinates, nine numbers: forward u, left v, up w.
 * Pan turns counter-clockwise seen from above, 0 along +x; tilt is up positive; roll turns
 * about the aim axis, right-handed. Angles in radians.
 */
export function deviceFrame(panRad: number, tiltRad: number, rollRad: number): Float64Array {
  const [cp, sp] = [Math.cos(panRad), Math.sin(panRad)];
  const [ct, st] = [Math.cos(tiltRad), Math.sin(tiltRad)];
  const [cr, sr] = [Math.cos(rollRad), Math.sin(rollRad)];
  const u = [ct * cp, ct * sp, st];
  const v0 = [-sp, cp, 0];
  const w0 = [u[1] * v0[2] - u[2] * v0[1], u[2] * v0[0] - u[0] * v0[2], u[0] * v0[1] - u[1] * v0[0]];
  const frame = new Float64Array(9);
  for (let i = 0; i < 3; i++) {
    frame[i] = u[i];
    frame[3 + i] = v0[i] * cr + w0[i] * sr;
    frame[6 + i] = -v0[i] * sr + w0[i] * cr;
  }
  return frame;
}

/** Pan and tilt (radians) that aim along a direction; a vertical aim keeps the pan given. */
export function aimAngles(x: number, y: number, z: number, keptPanRad: number): { panRad: number; tiltRad: number } {
  const flat = Math.hypot(x, y);
  const panRad = flat < 1e-9 * Math.abs(z) ? keptPanRad : Math.atan2(y, x);
  return { panRad, tiltRad: Math.atan2(z, flat) };
}
