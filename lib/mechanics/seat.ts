/**
 * Speed change at a point of a rigid vehicle: that of the mass centre plus the change of the yaw rate times the lever arm.
 * `forward`, `left` m/s and `seat` m in vehicle axes (x forward, y left, ISO 8855) from the mass centre; `yawRateChange` rad/s.
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
