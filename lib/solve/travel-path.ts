import type { TimedPath, TimedPose } from '@/lib/geometry/timed-path';
import type { Vec } from '@/lib/geometry/vector';
import { slidingWheels } from '@/lib/mechanics/sliding';
import { type TyreMotion, travelToRest } from '@/lib/mechanics/spin';
import type { Pose, Separation } from '@/lib/mechanics/spin-backwards';
import { cos, sin } from '@/lib/numerics/elementary';

/** Equal stretches of time that a travel is sampled by. */
const STRETCHES = 120;

/** Where a travel begins: s after first contact, pose, and what the vehicle moves at. */
export interface TravelStart {
  time: number;
  from: Pose;
  separation: Separation;
}

/** An accepted state of the simulation: s after the start; x, y, heading, vx, vy, yaw rate. */
interface State {
  t: number;
  y: Float64Array;
}

/** A travel from its start to rest, sampled evenly in time. `error` as in travelToRest. */
export function travelPath(motion: TyreMotion, start: TravelStart, error: number): TimedPath {
  const states = simulated(motion, start, error);
  const end = states[states.length - 1].t;
  const stateAt = between(motion, states);
  const poses: TimedPose[] = [];
  const wheels: TimedPath['wheels'] = motion.vehicle.wheels.map(() => ({ points: [], sliding: [] }));
  const take = (t: number): void => {
    const y = stateAt(t);
    poses.push(poseOf(start.time + t, y));
    wheelPoints(motion, y).forEach((point, i) => wheels[i].points.push(point));
  };
  take(0);
  for (let k = 1; k <= STRETCHES && end > 0; k++) {
    const middle = (end * (k - 0.5)) / STRETCHES;
    slidingWheels(motion, middle, stateAt(middle)).forEach((slides, i) => wheels[i].sliding.push(slides));
    take((end * k) / STRETCHES);
  }
  return { poses, wheels };
}

function simulated(motion: TyreMotion, { from, separation }: TravelStart, error: number): State[] {
  const states: State[] = [];
  const { vx, vy, w } = separation;
  travelToRest(motion, [from.x, from.y, from.heading, vx, vy, w], error, (t, y) =>
    states.push({ t, y: Float64Array.from(y) }),
  );
  return states;
}

/**
 * The state at a time, for times that never fall: cubic Hermite within the step. Braking sets in at the end of a step, so
 * both derivatives are taken as before the end.
 */
function between(motion: TyreMotion, states: readonly State[]): (t: number) => Float64Array {
  let k = 1;
  const [slopes, slopesThen] = [new Float64Array(6), new Float64Array(6)];
  return (t) => {
    if (states.length === 1) return states[0].y;
    while (k < states.length - 1 && states[k].t < t) k++;
    const [from, to] = [states[k - 1], states[k]];
    const h = to.t - from.t;
    const s = (t - from.t) / h;
    motion.derivative(from.t, from.y, slopes);
    motion.derivative(from.t, to.y, slopesThen);
    const [a, b] = [s * s * (3 - 2 * s), s * (1 - s)];
    return from.y.map((y, i) => y + a * (to.y[i] - y) + b * h * ((1 - s) * slopes[i] - s * slopesThen[i]));
  };
}

const poseOf = (time: number, y: Float64Array): TimedPose => ({
  time,
  x: y[0],
  y: y[1],
  heading: y[2],
  speed: Math.sqrt(y[3] * y[3] + y[4] * y[4]),
});

function wheelPoints({ vehicle }: TyreMotion, y: Float64Array): Vec[] {
  const [c, s] = [cos(y[2]), sin(y[2])];
  return vehicle.wheels.map((wheel) => [y[0] + c * wheel.x - s * wheel.y, y[1] + s * wheel.x + c * wheel.y]);
}
