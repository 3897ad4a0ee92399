import { travelToRest } from '@/lib/mechanics/spin';
import type { Separation, Target } from '@/lib/mechanics/spin-backwards';

/** A moment of simulated travel: s since first touch, mass centre m, heading rad (not wrapped), velocity m/s, yaw rate rad/s. */
export interface Moment {
  t: number;
  x: number;
  y: number;
  heading: number;
  vx: number;
  vy: number;
  w: number;
}

/** Parts that the travel is cut into, of equal time. */
const PARTS = 120;

/** The travel from a separation to rest at equal intervals of time, its beginning and its end included. */
export function travelPath(target: Target, { vx, vy, w }: Separation, elapsed: number): Moment[] {
  const states: Moment[] = [];
  const { from } = target;
  travelToRest(target.motion, [from.x, from.y, from.heading, vx, vy, w], target.error, (t, y) =>
    states.push({ t, x: y[0], y: y[1], heading: y[2], vx: y[3], vy: y[4], w: y[5] }),
  );
  const end = states[states.length - 1].t;
  let next = 1;
  return Array.from({ length: PARTS + 1 }, (_, i) => {
    const t = (end * i) / PARTS;
    while (next < states.length - 1 && states[next].t < t) next++;
    const moment = states.length > 1 ? between(states[next - 1], states[next], t) : states[0];
    return { ...moment, t: t + elapsed };
  });
}

/** Cubic Hermite between two states for the pose, straight lines for the velocities. */
function between(a: Moment, b: Moment, t: number): Moment {
  const h = b.t - a.t;
  const s = h > 0 ? (t - a.t) / h : 0;
  const [rise, bow] = [s * s * (3 - 2 * s), h * s * (1 - s)];
  const pose = (p: number, q: number, dp: number, dq: number): number =>
    p + rise * (q - p) + bow * ((1 - s) * dp - s * dq);
  const line = (p: number, q: number): number => p + s * (q - p);
  return {
    t,
    x: pose(a.x, b.x, a.vx, b.vx),
    y: pose(a.y, b.y, a.vy, b.vy),
    heading: pose(a.heading, b.heading, a.w, b.w),
    vx: line(a.vx, b.vx),
    vy: line(a.vy, b.vy),
    w: line(a.w, b.w),
  };
}
