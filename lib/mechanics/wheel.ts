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

/** The braking share with rolling resistance as its floor. */
export const brakingWithRolling = (braking: number, friction: number): number =>
  Math.min(1, Math.max(braking, ROLLING / friction));

/** What a tyre can give under a load, a friction and a braking share: reckoned once for as long as these stay. */
export interface Grip {
  friction: number;
  /** Braking share, rolling resistance included, and its square. */
  braking: number;
  brakingSquared: number;
  /** Friction times load; the braking force; the most that braking leaves sideways, N. */
  most: number;
  drag: number;
  side: number;
  /** Cornering stiffness over `side`. */
  steepness: number;
}

/** `share`: braking without rolling resistance. */
export function gripOf(load: number, friction: number, share: number): Grip {
  const braking = brakingWithRolling(share, friction);
  const most = friction * load;
  const side = most * Math.sqrt(1 - braking * braking);
  return {
    friction,
    braking,
    brakingSquared: braking * braking,
    most,
    drag: braking * most,
    side,
    steepness: (CORNERING * load) / side,
  };
}

/**
 * Fiala's cubic (brush tyre, parabolic pressure): side force over the most that the tyre can give, for z = stiffness times
 * the tangent of the slip angle over that most. It slides from z = 3 on.
 */
export const sideShare = (z: number): number => (z < 3 ? z * (1 - z * (1 / 3 - z / 27)) : 1);

/**
 * Force on the hub, N, along and across the wheel, for the velocity (m/s) of the hub along and across it. Locked, or
 * sliding sideways: friction against the motion; else braking along and Fiala's side force under what braking leaves.
 */
export function tyreForce(along: number, across: number, grip: Grip, out: { along: number; across: number }): void {
  const squared = along * along + across * across;
  if (grip.brakingSquared * squared >= along * along) {
    const drag = -grip.most / Math.max(CREEP, Math.sqrt(squared));
    out.along = drag * along;
    out.across = drag * across;
    return;
  }
  const fade = squared < CREEP * CREEP ? Math.sqrt(squared) / CREEP : 1;
  const side = fade * grip.side * sideShare(grip.steepness * Math.abs(across / along));
  out.along = along > 0 ? -fade * grip.drag : fade * grip.drag;
  out.across = across > 0 ? -side : side;
}
