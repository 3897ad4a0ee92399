import { cos, sin } from '@/lib/numerics/elementary';
import type { TyreMotion } from './spin';
import { CORNERING, brakingWithRolling } from './wheel';

/**
 * Whether each tyre slides as a whole at a state of the motion (x, y, heading, vx, vy, yaw rate), t s after separation:
 * its wheel is locked, or the slip angle is beyond that of Fiala's curve (wheel.ts). It is then that a tyre marks the road.
 */
export function slidingWheels({ vehicle, ground, onset }: TyreMotion, t: number, y: ArrayLike<number>): boolean[] {
  const [c, s] = [cos(y[2]), sin(y[2])];
  const [forward, left] = [y[3] * c + y[4] * s, y[4] * c - y[3] * s];
  return vehicle.wheels.map((wheel) => {
    const friction =
      ground.frictionAt?.(y[0] + c * wheel.x - s * wheel.y, y[1] + s * wheel.x + c * wheel.y) ?? ground.friction;
    const braking = brakingWithRolling(t < onset ? 0 : wheel.braking, friction);
    const [ahead, aside] = [forward - y[5] * wheel.y, left + y[5] * wheel.x];
    const [ct, st] = [cos(wheel.steer), sin(wheel.steer)];
    return slides(ahead * ct + aside * st, aside * ct - ahead * st, friction, braking);
  });
}

/** Of the velocity of the hub along and across the wheel, m/s; a wheel that stands does not slide. */
function slides(along: number, across: number, friction: number, braking: number): boolean {
  const speed = Math.sqrt(along * along + across * across);
  if (speed === 0) return false;
  if (braking * speed >= Math.abs(along)) return true;
  return CORNERING * Math.abs(across / along) >= 3 * friction * Math.sqrt(1 - braking * braking);
}
