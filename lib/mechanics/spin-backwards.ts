import { type Rest, type TyreMotion, travelToRest } from './spin';

/**
 * The separation velocity and yaw rate that lead to a measured rest pose, by damped least squares (Levenberg 1944,
 * Marquardt 1963) on the simulation of spin.ts. A rest pose need not fix them: from several starts several may be found.
 */

/** World velocity, m/s, and yaw rate, rad/s, at separation. */
export interface Separation {
  vx: number;
  vy: number;
  w: number;
}

export interface Pose {
  x: number;
  y: number;
  /** rad; the turn from contact to rest is the difference as written, not wrapped. */
  heading: number;
}

/** The largest difference between two poses: m, and rad of the heading. */
export const farthest = (a: Pose, b: Pose): number =>
  Math.max(Math.abs(a.x - b.x), Math.abs(a.y - b.y), Math.abs(a.heading - b.heading));

export interface Inversion {
  /** Whether the rest pose is met to within the tolerance; else what came nearest is answered. */
  met: boolean;
  separation: Separation;
  rest: Rest;
  /** Distance of the simulated from the measured rest: m, with the turn at one metre per radian. */
  miss: number;
}

/** Differences for the Jacobian, m/s and rad/s: well above the noise of an adaptive step. */
const NUDGE = 0.02;
const MOST_ROUNDS = 40;

/** What to meet: a vehicle under its tyres, from where, to where, and how exactly it is followed (m). */
export interface Target {
  motion: TyreMotion;
  from: Pose;
  to: Pose;
  error: number;
}

/** Rest pose simulated from a separation (vx, vy, w), less the measured one; its size at one metre per radian. */
export function missOf(
  { motion, from, to, error }: Target,
  s: readonly number[],
): { rest: Rest; r: number[]; size: number } {
  const rest = travelToRest(motion, [from.x, from.y, from.heading, s[0], s[1], s[2]], error);
  const r = [rest.x - to.x, rest.y - to.y, rest.heading - to.heading];
  const size = rest.outcome === 'rest' ? Math.sqrt(r[0] * r[0] + r[1] * r[1] + r[2] * r[2]) : Infinity;
  return { rest, r, size };
}

/** Change of the rest pose (rows x, y, heading) with vx, vy, w (columns), by central differences. */
export function jacobian(target: Target, s: readonly number[]): number[][] {
  const columns = [0, 1, 2].map((i) => {
    const [up, down] = [1, -1].map(
      (sign) =>
        missOf(
          target,
          s.map((v, k) => (k === i ? v + sign * NUDGE : v)),
        ).r,
    );
    return up.map((u, k) => (u - down[k]) / (2 * NUDGE));
  });
  return [0, 1, 2].map((row) => columns.map((column) => column[row]));
}

/** Solves a 3 by 3 system by Cramer's rule; null where it is singular. */
export function solve3(m: readonly (readonly number[])[], b: readonly number[]): number[] | null {
  const det = (p: readonly (readonly number[])[]): number =>
    p[0][0] * (p[1][1] * p[2][2] - p[1][2] * p[2][1]) -
    p[0][1] * (p[1][0] * p[2][2] - p[1][2] * p[2][0]) +
    p[0][2] * (p[1][0] * p[2][1] - p[1][1] * p[2][0]);
  const whole = det(m);
  if (whole === 0 || !Number.isFinite(whole)) return null;
  return [0, 1, 2].map((i) => det(m.map((row, k) => row.map((v, j) => (j === i ? b[k] : v)))) / whole);
}

/** The damped step: (J'J + lambda diag(J'J)) d = -J'r. */
function dampedStep(J: number[][], r: readonly number[], lambda: number): number[] | null {
  const JtJ = [0, 1, 2].map((i) => [0, 1, 2].map((j) => J[0][i] * J[0][j] + J[1][i] * J[1][j] + J[2][i] * J[2][j]));
  const Jtr = [0, 1, 2].map((i) => -(J[0][i] * r[0] + J[1][i] * r[1] + J[2][i] * r[2]));
  return solve3(
    JtJ.map((row, i) => row.map((v, j) => (i === j ? v * (1 + lambda) + 1e-12 : v))),
    Jtr,
  );
}

/** Least squares from one start. `error` as in travelToRest; a rest pose within `met` (m and rad) is met. */
export function invertFrom(target: Target, start: Separation, met: number): Inversion {
  let s = [start.vx, start.vy, start.w];
  let now = missOf(target, s);
  let lambda = 1e-3;
  for (let round = 0; round < MOST_ROUNDS && now.size > met; round++) {
    const J = jacobian(target, s);
    const better = lowered(target, s, now, J, lambda);
    if (!better) break;
    [s, now, lambda] = better;
  }
  const [vx, vy, w] = s;
  return { met: now.size <= met, separation: { vx, vy, w }, rest: now.rest, miss: now.size };
}

export type Missed = ReturnType<typeof missOf>;

/** A step that comes nearer, with more damping as long as none does; null where none is found. */
function lowered(
  target: Target,
  s: readonly number[],
  now: Missed,
  J: number[][],
  from: number,
): [number[], Missed, number] | null {
  for (let tries = 0, lambda = from; tries < 10; tries++, lambda *= 8) {
    const step = dampedStep(J, now.r, lambda);
    if (!step) continue;
    const trial = s.map((v, i) => v + step[i]);
    const then = missOf(target, trial);
    if (then.size < now.size) return [trial, then, Math.max(1e-12, lambda / 10)];
  }
  return null;
}
