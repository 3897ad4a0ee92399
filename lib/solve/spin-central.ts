import { VEHICLE_IDS, type VehicleId } from '@/lib/casefile/schema';
import type { Problem, SpinSlots, SpinStart } from '@/lib/evidence/problem';
import type { Travels } from '@/lib/geometry/timed-path';
import { G } from '@/lib/mechanics/legs';
import type { VehicleState } from '@/lib/mechanics/impact-backwards';
import {
  type Inversion,
  type Separation,
  type Target,
  invertFrom,
  jacobian,
  missOf,
  solve3,
} from '@/lib/mechanics/spin-backwards';
import { PAIR } from '@/lib/mechanics/pair-motion';
import { TyreMotion } from '@/lib/mechanics/spin';
import { atan2, cos, hypot, sin } from '@/lib/numerics/elementary';
import { CENTRAL_STEPS, Kernel } from './kernel';
import { travelPath } from './travel-path';
import { carriedOn, meanBraking, targetOf, wayBetween } from './spin-travel';

/** Position error, m, that a simulation of the central answer aims at, and how near it must come, m and rad. */
export const ERROR = 1e-7;
const MET = 2e-6;
/** Two separations this near, m/s and rad/s, are one. */
const SAME = 0.02;
const FULL_TURN = 2 * Math.PI;

/** What was found for one vehicle whose travel is simulated. */
export interface SpinFound {
  /** What was to be met, and under what. */
  target: Target;
  /** Separations that meet the rest pose with the turn as written, the least kinetic energy first. */
  separations: Inversion[];
  /** Those that meet it with one full turn more or less. */
  otherTurns: Inversion[];
  /** What came nearest, where none meets it. */
  nearest: Inversion | null;
  /** When the travel begins, s after first touch. */
  elapsed: number;
}

export type SpinsFound = Record<VehicleId, SpinFound | null>;

/** Looks for the separations of the vehicles whose travel is simulated, and fills in where their draws begin. */
export function findSpins(asked: Problem): { problem: Problem; spins: SpinsFound } {
  let carried: Carried = { A: [0, 0, 0], B: [0, 0, 0] };
  let found = searched(asked, carried);
  if (!asked.lasting) return found;
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const next = carriedBy(found.problem);
    if (!next || settled(next, carried)) break;
    carried = next;
    found = searched(asked, carried);
  }
  return found;
}

/** Way and turn of each vehicle from first touch to separation, in the axes of its heading at first touch. */
type Carried = Record<VehicleId, [number, number, number]>;

/** How often a contact that lasts and the travel after it are matched, and how near they must come, m and rad. */
const MOST_ROUNDS = 12;
const MATCHED = 2e-6;

const settled = (a: Carried, b: Carried): boolean =>
  VEHICLE_IDS.every((id) => a[id].every((v, i) => Math.abs(v - b[id][i]) < MATCHED));

/** Where a contact that lasts leaves the vehicles; null where it could not be solved. */
function carriedBy(problem: Problem): Carried | null {
  if (VEHICLE_IDS.some((id) => isLost(problem, id))) return null;
  const kernel = new Kernel(problem, CENTRAL_STEPS);
  kernel.solveCentral();
  const { inputs, lasting } = kernel;
  if (!lasting?.pushed) return null;
  const { y } = lasting.pushed;
  const of = (id: VehicleId): [number, number, number] => {
    const slots = problem.vehicles[id];
    const pose = { x: inputs[slots.x][0], y: inputs[slots.y][0], heading: inputs[slots.heading][0] };
    const at = PAIR[id];
    return wayBetween(pose, { x: y[at], y: y[at + 1], heading: y[at + 2] });
  };
  return { A: of('A'), B: of('B') };
}

/** A vehicle whose travel is simulated and for which no separation was found. */
const isLost = ({ vehicles }: Problem, id: VehicleId): boolean => {
  const { departure } = vehicles[id];
  return departure.kind === 'spin' && departure.start === null;
};

/** The separations for travel that begins where the contact has carried the vehicles. */
function searched(problem: Problem, carried: Carried): { problem: Problem; spins: SpinsFound } {
  const kernel = new Kernel(problem);
  const spins: SpinsFound = { A: null, B: null };
  const vehicles = { ...problem.vehicles };
  for (const id of VEHICLE_IDS) {
    const slots = problem.vehicles[id];
    const spin = slots.departure;
    if (spin.kind !== 'spin' || !spin.rest) continue;
    const body = kernel.loadBody(0, slots, kernel.state[id]);
    const touch = { x: body.x, y: body.y, heading: kernel.inputs[slots.heading][0] };
    const elapsed = problem.lasting ? kernel.inputs[problem.lasting.pulse][0] : 0;
    const departing = { from: carriedOn(touch, carried[id]), elapsed };
    const target = targetOf(kernel.inputs, 0, slots, spin, body, departing, ERROR);
    const found = findSeparations(target, body);
    const best = found.separations[0];
    spins[id] = { ...found, elapsed };
    if (best) {
      const start = { ...startOf(target, best.separation), carried: carried[id] };
      vehicles[id] = { ...slots, departure: { ...spin, start } satisfies SpinSlots };
    }
  }
  return { problem: { ...problem, vehicles }, spins };
}

const energyOf = ({ m, I }: VehicleState, { vx, vy, w }: Separation): number =>
  (m * (vx * vx + vy * vy) + I * w * w) / 2;

function findSeparations(target: Target, body: VehicleState): Omit<SpinFound, 'elapsed'> {
  const all = guesses(target).map((guess) => invertFrom(target, guess, MET));
  const turns = [FULL_TURN, -FULL_TURN].flatMap((turn) => {
    const other = { ...target, to: { ...target.to, heading: target.to.heading + turn } };
    return guesses(other).map((guess) => invertFrom(other, guess, MET));
  });
  const byEnergy = (a: Inversion, b: Inversion): number => energyOf(body, a.separation) - energyOf(body, b.separation);
  const met = (found: Inversion[]): Inversion[] => distinct(found.filter((inversion) => inversion.met).sort(byEnergy));
  const nearest = all.filter(({ miss }) => Number.isFinite(miss)).sort((a, b) => a.miss - b.miss)[0] ?? null;
  return { target, separations: met(all), otherTurns: met(turns), nearest };
}

function distinct(found: Inversion[]): Inversion[] {
  const kept: Inversion[] = [];
  for (const one of found) {
    const near = ({ separation: p }: Inversion): boolean =>
      hypot(p.vx - one.separation.vx, p.vy - one.separation.vy) < SAME && Math.abs(p.w - one.separation.w) < SAME;
    if (!kept.some(near)) kept.push(one);
  }
  return kept;
}

/** Retardations, as shares of friction, and turns off the straight way to rest, rad, that a search begins from. */
const SHARES = [1, 0.5, 0.15];
const TURNS = [0, 0.25, -0.25];

/** Where searches begin: straight lines to the rest under several retardations, turning as far as they must in that time. */
function guesses(target: Target): Separation[] {
  const { from, to, motion } = target;
  const [dx, dy, turn] = [to.x - from.x, to.y - from.y, to.heading - from.heading];
  const distance = Math.max(hypot(dx, dy), 0.02);
  const course = atan2(dy, dx);
  return SHARES.flatMap((share) => {
    const slowing = share * motion.ground.friction * G;
    const speed = Math.sqrt(2 * slowing * distance);
    const time = Math.max((2 * distance) / speed, Math.sqrt(Math.abs(turn) / (motion.ground.friction * G)));
    return TURNS.filter((by) => by === 0 || share === 0.5).map((by) => ({
      vx: speed * cos(course + by),
      vy: speed * sin(course + by),
      w: (2 * turn) / time,
    }));
  });
}

function startOf(target: Target, separation: Separation): Omit<SpinStart, 'carried'> {
  const [c, s] = [cos(target.from.heading), sin(target.from.heading)];
  const { vx, vy, w } = separation;
  const J = jacobian(target, [vx, vy, w]);
  const columns = [0, 1, 2].map(
    (j) =>
      solve3(
        J,
        [0, 1, 2].map((i) => (i === j ? 1 : 0)),
      ) ?? [0, 0, 0],
  );
  const world = [0, 1, 2].map((i) => columns.map((column) => column[i]));
  /** Change of the separation, in local axes, that a unit of relative change asks for. */
  const answerTo = (changed: Target): number[] => {
    const { r } = missOf(changed, [vx, vy, w]);
    const asked = world.map((row) => -(row[0] * r[0] + row[1] * r[1] + row[2] * r[2]) / (LESS - 1));
    return [asked[0] * c + asked[1] * s, asked[1] * c - asked[0] * s, asked[2]];
  };
  return {
    forward: vx * c + vy * s,
    left: vy * c - vx * s,
    w,
    reach: wayBetween(target.from, target.to),
    inverse: intoLocal(world, c, s),
    friction: target.motion.ground.friction,
    braking: meanBraking(target),
    byFriction: answerTo(withLess(target, LESS, 1)),
    byBraking: answerTo(withLess(target, 1, LESS)),
  };
}

/** A relative change that the answers to friction and braking are taken over; downwards, since a wheel brakes at most fully. */
const LESS = 0.96;

/** The same travel with friction and braking times a factor each. */
function withLess(target: Target, friction: number, braking: number): Target {
  const { vehicle, ground, onset } = target.motion;
  const wheels = vehicle.wheels.map((wheel) => ({ ...wheel, braking: wheel.braking * braking }));
  const less = new TyreMotion({ ...vehicle, wheels }, { ...ground, friction: ground.friction * friction }, onset);
  return { ...target, motion: less };
}

/** R' M R with R the turn by the heading. */
function intoLocal(m: readonly (readonly number[])[], c: number, s: number): number[][] {
  const right = m.map(([a, b, z]) => [a * c + b * s, b * c - a * s, z]);
  return [
    right[0].map((a, j) => a * c + right[1][j] * s),
    right[0].map((a, j) => right[1][j] * c - a * s),
    [...right[2]],
  ];
}

/** The central travel of every vehicle whose travel is simulated and was found. */
export function travelsOf(spins: SpinsFound): Travels {
  const travels: Travels = {};
  for (const id of VEHICLE_IDS) {
    const spin = spins[id];
    const best = spin?.separations[0];
    if (!spin || !best) continue;
    const { motion, from, error } = spin.target;
    travels[id] = travelPath(motion, { time: spin.elapsed, from, separation: best.separation }, error);
  }
  return travels;
}
