import type { LocalSeparation, SpinSlots, SpinStart, VehicleSlots } from '@/lib/evidence/problem';
import type { VehicleState } from '@/lib/mechanics/impact-backwards';
import { brakingWithRolling } from '@/lib/mechanics/wheel';
import { type Pose, type Missed, type Target, farthest, invertFrom, missOf } from '@/lib/mechanics/spin-backwards';
import { cos, sin } from '@/lib/numerics/elementary';
import { roadUnder } from './road';

/** Position error, m, that a simulation of a draw aims at. */
export const DRAW_ERROR = 5e-5;
/** A draw meets its rest pose when it comes this near, m and rad: a fraction of what any survey can tell. */
const DRAW_MET = 5e-4;
const MOST_STEPS = 12;
/** Farther from the pose than this, m and rad, a simulation may err by so many times more. */
const FAR = 0.01;
const ROUGHER = 10;
/** Longest step of a search over the size of the separation and one more, m/s and rad/s. */
const BOLDEST = 0.15;
/** How often a step that leads away from the pose is shortened. */
const MOST_SHORTER = 3;
/** Where the coarse simulation is too uneven to search on, m. */
const FINER_ERROR = 1e-6;

/** When and where the travel of a draw begins: the pose, and the time since first touch, s. */
export interface Departing {
  from: Pose;
  elapsed: number;
}

/** The target of one draw: the vehicle under its tyres as drawn, where its travel begins and its pose at rest. */
export function targetOf(
  inputs: readonly Float64Array[],
  k: number,
  slots: VehicleSlots,
  spin: SpinSlots,
  body: VehicleState,
  { from, elapsed }: Departing,
  error: number,
): Target {
  const { rest } = spin;
  if (!rest) throw new Error('only a measured rest pose can be worked backwards');
  return {
    motion: roadUnder(inputs, k, slots, body, elapsed),
    from,
    to: { x: inputs[rest.x][k], y: inputs[rest.y][k], heading: inputs[rest.heading][k] },
    error,
  };
}

/** A pose carried on by a way and a turn in the axes of its heading, m and rad. */
export function carriedOn({ x, y, heading }: Pose, [forward, left, turn]: readonly number[]): Pose {
  const [c, s] = [cos(heading), sin(heading)];
  return { x: x + forward * c - left * s, y: y + forward * s + left * c, heading: heading + turn };
}

/** The way and the turn from one pose to another in the axes of the first, m and rad. */
export function wayBetween(from: Pose, to: Pose): [number, number, number] {
  const [c, s] = [cos(from.heading), sin(from.heading)];
  const [dx, dy] = [to.x - from.x, to.y - from.y];
  return [dx * c + dy * s, dy * c - dx * s, to.heading - from.heading];
}

const times = (m: readonly (readonly number[])[], v: readonly number[]): number[] =>
  m.map((row) => row[0] * v[0] + row[1] * v[1] + row[2] * v[2]);

/**
 * The separation of one draw: from the central one and its linear answer to the rest pose, improved by Broyden's method
 * (1965) with the central Jacobian to begin with; where that does not meet the pose, on a finer simulation, and at last by the
 * damped least squares of the central answer. The velocity is left in `body`; false where the rest pose is not met.
 */
export function separateDraw(target: Target, spin: SpinSlots, body: VehicleState): boolean {
  const { start } = spin;
  if (!start) return false;
  const from = turned(predicted(target, start), target.from.heading);
  const inverse = turnedRows(start.inverse, target.from.heading);
  const finer = { ...target, error: FINER_ERROR };
  const separation = broyden(target, from, inverse) ?? broyden(finer, from, inverse) ?? leastSquares(finer, from);
  if (!separation) return false;
  [body.vx, body.vy, body.wMeasured] = separation;
  return true;
}

/** A separation that was found, in world axes, and for what. */
export interface Met {
  target: Target;
  vx: number;
  vy: number;
  w: number;
}

/** As far as a separation is shifted with the beginning of its travel instead of found anew, m and rad. */
const NEAR = 0.02;

export const isNear = (a: Pose, b: Pose): boolean => farthest(a, b) < NEAR;

/** A separation shifted to travel that begins nearby, by the central answer to the rest pose: (vx, vy, w) in world axes. */
export function shifted({ target, vx, vy, w }: Met, from: Pose, start: SpinStart): number[] {
  const before = wayBetween(target.from, target.to);
  const by = times(
    start.inverse,
    wayBetween(from, target.to).map((d, i) => d - before[i]),
  );
  const [c, s] = [cos(target.from.heading), sin(target.from.heading)];
  const local = { forward: vx * c + vy * s + by[0], left: vy * c - vx * s + by[1], w: w + by[2] };
  return turned(local, from.heading);
}

/** The central separation, moved with the rest pose, the friction and the braking of the draw. */
function predicted(target: Target, start: SpinStart): LocalSeparation {
  const ahead = times(
    start.inverse,
    wayBetween(target.from, target.to).map((d, i) => d - start.reach[i]),
  );
  const friction = target.motion.ground.friction / start.friction - 1;
  const braking = meanBraking(target) / start.braking - 1;
  const [forward, left, w] = ahead.map((d, i) => d + friction * start.byFriction[i] + braking * start.byBraking[i]);
  return { forward: start.forward + forward, left: start.left + left, w: start.w + w };
}

/** Mean braking share of the wheels, rolling resistance included. */
export const meanBraking = ({ motion: { vehicle, ground } }: Target): number =>
  vehicle.wheels.reduce((sum, { braking }) => sum + brakingWithRolling(braking, ground.friction), 0) /
  vehicle.wheels.length;

function leastSquares(target: Target, [vx, vy, w]: readonly number[]): number[] | null {
  const { met, separation } = invertFrom(target, { vx, vy, w }, DRAW_MET);
  return met ? [separation.vx, separation.vy, separation.w] : null;
}

/** Into world axes. */
function turned({ forward, left, w }: LocalSeparation, heading: number): number[] {
  const [c, s] = [cos(heading), sin(heading)];
  return [forward * c - left * s, forward * s + left * c, w];
}

/** R M R', with R the turn by the heading: the inverse Jacobian in world axes. */
function turnedRows(m: readonly (readonly number[])[], heading: number): number[][] {
  const [c, s] = [cos(heading), sin(heading)];
  const right = m.map(([a, b, z]) => [a * c - b * s, a * s + b * c, z]);
  return [
    right[0].map((a, j) => a * c - right[1][j] * s),
    right[0].map((a, j) => a * s + right[1][j] * c),
    [...right[2]],
  ];
}

/**
 * Broyden's good method on the inverse; null where it does not meet the pose. Far from the pose the simulation is a rough one;
 * only a fine one can meet it.
 */
function broyden(target: Target, from: number[], inverse: number[][]): number[] | null {
  const H = inverse.map((row) => [...row]);
  const rough = { ...target, error: ROUGHER * target.error };
  let s = from;
  let by = rough;
  let now = missOf(by, s);
  for (let round = 0; round < MOST_STEPS; round++) {
    if (by === target && now.size <= DRAW_MET) return s;
    if (!Number.isFinite(now.size)) return null;
    by = now.size > FAR ? rough : target;
    const trial = shortened(by, s, now, boundedStep(H, s, now.r));
    improve(
      H,
      trial.step,
      trial.met.r.map((r, i) => r - now.r[i]),
    );
    s = s.map((v, i) => v + trial.step[i]);
    now = trial.met;
  }
  return null;
}

/** Newton's step with the inverse H, no longer than the separation allows. */
function boundedStep(H: number[][], s: readonly number[], r: readonly number[]): number[] {
  const step = times(H, r).map((d) => -d);
  const share = Math.min(1, (BOLDEST * (1 + Math.sqrt(squareOf(s)))) / Math.sqrt(squareOf(step)));
  return step.map((d) => share * d);
}

/** The step, or as much of it as comes nearest to the pose if the miss changes evenly along it. */
function shortened(target: Target, s: readonly number[], now: Missed, full: readonly number[]) {
  const enough = Math.max(now.size, 4 * ROUGHER * target.error);
  for (let share = 1, tries = 0; ; tries++) {
    const step = full.map((d) => share * d);
    const met = missOf(
      target,
      s.map((v, i) => v + step[i]),
    );
    if (met.size < enough || tries === MOST_SHORTER) return { step, met };
    share *= nearestShare(now.r, met.r);
  }
}

/** Where on the straight line from one miss to another the miss is least, kept to what is sensible. */
function nearestShare(from: readonly number[], to: readonly number[]): number {
  const change = to.map((v, i) => v - from[i]);
  const share = -(from[0] * change[0] + from[1] * change[1] + from[2] * change[2]) / squareOf(change);
  return Math.min(0.5, Math.max(0.05, share));
}

const squareOf = ([a, b, c]: readonly number[]): number => a * a + b * b + c * c;

/** Sherman and Morrison: H += (step - H change) step' H / (step' H change). */
function improve(H: number[][], step: readonly number[], change: readonly number[]): void {
  const Hc = times(H, change);
  const row = [0, 1, 2].map((j) => step[0] * H[0][j] + step[1] * H[1][j] + step[2] * H[2][j]);
  const scale = row[0] * change[0] + row[1] * change[1] + row[2] * change[2];
  if (Math.abs(scale) < 1e-12) return;
  for (let i = 0; i < 3; i++) for (let j = 0; j < 3; j++) H[i][j] += ((step[i] - Hc[i]) * row[j]) / scale;
}
