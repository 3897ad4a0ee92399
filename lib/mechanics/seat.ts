/**
 * Delta-V at a point of a rigid vehicle, m/s in vehicle axes (x forward, y left): that of the mass centre plus the
 * change of yaw rate (rad/s) times the lever arm (m). Rigid-vehicle kinematics, not the motion of an occupant.
 */
export const seatDeltaV = (
  forward: number,
  left: number,
  yawRateChange: number,
  seat: { x: number; y: number },
): { forward: number; left: number } => ({
  forward: forward - yawRateChange * seat.y,
  left: left + yawRateChange * seat.x,
});
