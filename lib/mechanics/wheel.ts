/**
 * The force that the road gives one tyre. Rolling resistance is a floor under the braking share; below CREEP the whole
 * force fades out so that a vehicle comes to rest instead of chattering.
 */

/** Rolling resistance, as a drag over the wheel load (from memory, trade range 0.01 to 0.02). */
export const ROLLING = 0.01;
/** Hub speed below which the force is scaled down, m/s. */
export const CREEP = 0.05;
/** Cornering stiffness over the wheel load, 1/rad. */
export const CORNERING = 8;

/** What a tyre is under: load N, friction, braking share of friction times load in [0, 1], cornering stiffness N/rad. */
export interface Tyre {
  load: number;
  friction: number;
  braking: number;
  stiffness: number;
}

/** The braking share with rolling resistance as its floor. */
export const brakingWithRolling = (braking: number, friction: number): number =>
  Math.min(1, Math.max(braking, ROLLING / friction));

/**
 * Fiala's cubic (brush tyre, parabolic pressure): side force, N, at the tangent of the slip angle, for a stiffness (N/rad)
 * and the most the tyre can give sideways (N).
 */
export function sideForce(tangent: number, stiffness: number, most: number): number {
  const z = (stiffness * tangent) / most;
  return z < 3 ? most * (z - (z * z) / 3 + (z * z * z) / 27) : most;
}

/**
 * Force on the hub, N, along and across the wheel, for the velocity (m/s) of the hub along and across it. Locked, or
 * sliding sideways: friction against the motion; else braking along and Fiala's side force under what braking leaves.
 */
export function tyreForce(along: number, across: number, tyre: Tyre, out: { along: number; across: number }): void {
  const speed = Math.sqrt(along * along + across * across);
  if (speed === 0) {
    out.along = 0;
    out.across = 0;
    return;
  }
  const most = tyre.friction * tyre.load;
  const fade = speed < CREEP ? speed / CREEP : 1;
  if (tyre.braking * speed >= Math.abs(along)) {
    const drag = (-most * fade) / speed;
    out.along = drag * along;
    out.across = drag * across;
    return;
  }
  const side = most * Math.sqrt(1 - tyre.braking * tyre.braking);
  const across0 = sideForce(Math.abs(across / along), tyre.stiffness, side);
  out.along = -fade * tyre.braking * most * Math.sign(along);
  out.across = -fade * across0 * Math.sign(across);
}
