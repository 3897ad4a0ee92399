import type { CaseFile, LegsDeparture, Quantity, VehicleId } from '@/lib/casefile/schema';
import { quantitiesOf, supportOf } from '@/lib/casefile/quantities';
import { plainSummary } from './plain-summary';

/**
 * The plain reference solver: an object per draw, closures, comparator sorts, built-in Math, straight from a case file in its
 * own units. Written from the mathematics and not from the engine, so that it is an oracle; slow, so that it is a peer.
 */

export type Reading = (path: string) => number;

/** Gives the draw k of the quantity at a path: `value`, `spread` and support in the units of the case file. */
export type DrawOf = (path: string, k: number) => number;

export interface PlainBand {
  mean: number;
  sd: number;
  median: number;
  low: number;
  high: number;
  shortest: number[];
}

export interface PlainResult {
  central: Record<string, number>;
  reason: string | null;
  bands: Record<string, PlainBand>;
  impossible: Record<string, number>;
}

interface Vector {
  x: number;
  y: number;
}

const GRAVITY = 9.80665;
const rad = (degrees: number): number => (degrees * Math.PI) / 180;
const deg = (radians: number): number => (radians * 180) / Math.PI;
const unit = (degrees: number): Vector => ({ x: Math.cos(rad(degrees)), y: Math.sin(rad(degrees)) });
const add = (a: Vector, b: Vector): Vector => ({ x: a.x + b.x, y: a.y + b.y });
const scale = (a: Vector, k: number): Vector => ({ x: a.x * k, y: a.y * k });
const subtract = (a: Vector, b: Vector): Vector => add(a, scale(b, -1));
const dot = (a: Vector, b: Vector): number => a.x * b.x + a.y * b.y;
const cross = (a: Vector, b: Vector): number => a.x * b.y - a.y * b.x;
const perp = (a: Vector): Vector => ({ x: -a.y, y: a.x });
const length = (a: Vector): number => Math.hypot(a.x, a.y);
const directionOf = (a: Vector): number | undefined => (length(a) > 1e-9 ? deg(Math.atan2(a.y, a.x)) : undefined);

/** Every quantity of a case with its path; an estimated inertia is a factor about 1. */
export function plainInputs(casefile: CaseFile): { path: string; quantity: Quantity }[] {
  const estimated = (['A', 'B'] as const)
    .filter((id) => casefile.vehicles[id].yawInertia === null)
    .map((id) => ({
      path: `vehicles.${id}.yawInertia`,
      quantity: { value: 1, spread: { shape: 'normal' as const, sd: 0.073 } },
    }));
  return [...quantitiesOf(casefile), ...estimated];
}

export function plainSupport(casefile: CaseFile, path: string) {
  const support = supportOf(path);
  const id = /^vehicles\.([AB])\.frontAxleToMassCentre$/.exec(path)?.[1] as VehicleId | undefined;
  return id ? { ...support, high: casefile.vehicles[id].wheelbase } : support;
}

/** Speed at separation, m/s, by work and energy back from rest; null where a leg cannot have been. */
function separationSpeed(departure: LegsDeparture, at: Reading, prefix: string): number | null {
  let energy = at(`${prefix}.endSpeed`) ** 2 / 2;
  for (const index of departure.legs.map((_, i) => i).toReversed()) {
    const leg = (key: string): number => at(`${prefix}.legs.${index}.${key}`);
    const slope = Math.atan(leg('grade'));
    energy += leg('distance') * GRAVITY * (leg('friction') * leg('share') * Math.cos(slope) + Math.sin(slope));
    if (energy < 0) return null;
  }
  return Math.sqrt(2 * energy);
}

function vehicleOf(casefile: CaseFile, id: VehicleId, at: Reading) {
  const { wheelbase, yawInertia } = casefile.vehicles[id];
  const departure = casefile.departure[id] as LegsDeparture;
  const m = at(`vehicles.${id}.mass`);
  const a = at(`vehicles.${id}.frontAxleToMassCentre`);
  const inertia = at(`vehicles.${id}.yawInertia`);
  const speed = separationSpeed(departure, at, `departure.${id}`);
  const position = { x: at(`impact.${id}.x`), y: at(`impact.${id}.y`) };
  return {
    m,
    I: yawInertia === null ? inertia * 1.091 * m * a * (wheelbase - a) : inertia,
    position,
    arm: subtract({ x: at('impact.point.x'), y: at('impact.point.y') }, position),
    heading: at(`impact.${id}.heading`),
    leaves: speed === null ? null : scale(unit(at(`departure.${id}.direction`)), speed),
    leavesTowards: at(`departure.${id}.direction`),
    measured: departure.yawRate ? rad(at(`departure.${id}.yawRate`)) : null,
  };
}

type PlainVehicle = ReturnType<typeof vehicleOf> & { leaves: Vector };

/** Velocity of the contact point of one vehicle relative to that of the other. */
const relative = (A: Vector, wA: number, armA: Vector, B: Vector, wB: number, armB: Vector): Vector =>
  subtract(add(A, scale(perp(armA), wA)), add(B, scale(perp(armB), wB)));

/** How the relative velocity answers to an impulse: the matrix K over the axes n and t. */
function inverseMasses(vehicles: PlainVehicle[], n: Vector, t: Vector): number[][] {
  const entry = (p: Vector, q: Vector): number =>
    vehicles.reduce((sum, { m, I, arm }) => sum + dot(p, q) / m + (cross(arm, p) * cross(arm, q)) / I, 0);
  return [
    [entry(n, n), entry(n, t)],
    [entry(t, n), entry(t, t)],
  ];
}

interface Worked {
  before: { v: Vector; w: number; speed: number }[];
  after: { v: Vector; w: number }[];
  J: Vector;
}

function workDirections(casefile: CaseFile, at: Reading, vehicles: PlainVehicle[]): Worked {
  const [A, B] = vehicles;
  const momentum = add(scale(A.leaves, A.m), scale(B.leaves, B.m));
  const [hA, hB] = (['A', 'B'] as const).map((id) => unit(at(`approach.${id}.direction`)));
  const sA = cross(momentum, hB) / cross(scale(hA, A.m), hB);
  const sB = cross(hA, momentum) / cross(hA, scale(hB, B.m));
  const J = scale(subtract(B.leaves, scale(hB, sB)), B.m);
  const w = (['A', 'B'] as const).map((id) => rad(at(`approach.${id}.yawRate`)));
  const predicted = [w[0] - cross(A.arm, J) / A.I, w[1] + cross(B.arm, J) / B.I];
  return {
    J,
    before: [
      { v: scale(hA, sA), w: w[0], speed: sA },
      { v: scale(hB, sB), w: w[1], speed: sB },
    ],
    after: vehicles.map(({ leaves, measured }, i) => ({ v: leaves, w: measured ?? predicted[i] })),
  };
}

function workRestitution(at: Reading, vehicles: PlainVehicle[], n: Vector, t: Vector, K: number[][]): Worked | null {
  const [A, B] = vehicles;
  const [wA, wB] = [A.measured ?? NaN, B.measured ?? NaN];
  const parting = dot(relative(A.leaves, wA, A.arm, B.leaves, wB, B.arm), n);
  if (parting >= 0) return null;
  const [e, mu] = [at('impact.restitution'), at('impact.impulseRatio')];
  const Jn = (-parting / e - parting) / (K[0][0] + mu * K[0][1]);
  const J = add(scale(n, Jn), scale(t, mu * Jn));
  const [vA, vB] = [add(A.leaves, scale(J, 1 / A.m)), subtract(B.leaves, scale(J, 1 / B.m))];
  return {
    J,
    before: [
      { v: vA, w: wA + cross(A.arm, J) / A.I, speed: length(vA) },
      { v: vB, w: wB - cross(B.arm, J) / B.I, speed: length(vB) },
    ],
    after: [
      { v: A.leaves, w: wA },
      { v: B.leaves, w: wB },
    ],
  };
}

interface PlainAnswer {
  reason: string | null;
  figures: Record<string, number>;
}

/** One draw, or the central values. */
export function plainAnswer(casefile: CaseFile, method: 'directions' | 'restitution', at: Reading): PlainAnswer {
  const found = (['A', 'B'] as const).map((id) => vehicleOf(casefile, id, at));
  if (found.some(({ leaves }) => leaves === null)) return { reason: 'leg', figures: {} };
  const vehicles = found as PlainVehicle[];
  const [A, B] = vehicles;
  const along = unit(at('impact.plane'));
  const across = { x: along.y, y: -along.x };
  const n = dot(across, subtract(B.position, A.position)) < 0 ? scale(across, -1) : across;
  const t = perp(n);
  const K = inverseMasses(vehicles, n, t);
  const worked =
    method === 'directions' ? workDirections(casefile, at, vehicles) : workRestitution(at, vehicles, n, t, K);
  if (worked === null) return { reason: 'notParting', figures: {} };
  const { before, after, J } = worked;
  const u = relative(before[0].v, before[0].w, A.arm, before[1].v, before[1].w, B.arm);
  const uAfter = relative(after[0].v, after[0].w, A.arm, after[1].v, after[1].w, B.arm);
  const pair = {
    closingSpeed: dot(u, n),
    slidingSpeed: dot(u, t),
    restitution: method === 'directions' ? -dot(uAfter, n) / dot(u, n) : at('impact.restitution'),
    impulseRatio: dot(J, t) / dot(J, n),
    impulse: length(J),
    energyLost: dot(J, add(u, uAfter)) / 2,
  };
  const figures: Record<string, number> = { ...pair };
  (['A', 'B'] as const).forEach((id, i) => {
    const figure = vehicleFigures(casefile, at, id, vehicles[i], before[i], after[i], method);
    for (const [key, value] of Object.entries(figure)) if (value !== undefined) figures[`${id}.${key}`] = value;
  });
  const determinant = K[0][0] * K[1][1] - K[0][1] * K[1][0];
  const [un, ut] = [pair.closingSpeed, pair.slidingSpeed];
  const most = (K[1][1] * un * un - 2 * K[0][1] * un * ut + K[0][0] * ut * ut) / (2 * determinant);
  const slowest = Math.min(before[0].speed, before[1].speed);
  const reason = plainReason(method, {
    ...pair,
    Jn: dot(J, n),
    most,
    slowest,
    out: length(A.leaves) + length(B.leaves),
  });
  return { reason, figures };
}

function plainReason(
  method: string,
  p: {
    closingSpeed: number;
    restitution: number;
    energyLost: number;
    Jn: number;
    most: number;
    slowest: number;
    out: number;
  },
): string | null {
  const least = method === 'restitution' ? 0.05 - 1e-12 : -1e-9;
  if (p.closingSpeed <= 0) return 'notClosing';
  if (p.slowest < -1e-9 * p.out) return 'backwards';
  if (p.Jn <= 0) return 'pulling';
  if (p.restitution < least || p.restitution > 1 + 1e-9) return 'restitution';
  if (p.energyLost < -1e-9 * p.most) return 'energyGain';
  return Number.isFinite(p.energyLost) ? null : 'notFinite';
}

function vehicleFigures(
  casefile: CaseFile,
  at: Reading,
  id: VehicleId,
  vehicle: PlainVehicle,
  before: Worked['before'][number],
  after: Worked['after'][number],
  method: string,
): Record<string, number | undefined> {
  const change = subtract(after.v, before.v);
  const ahead = unit(vehicle.heading);
  const own = { x: dot(change, ahead), y: dot(change, perp(ahead)) };
  return {
    approachSpeed: before.speed,
    approachDirection: method === 'directions' ? at(`approach.${id}.direction`) : directionOf(before.v),
    approachYawRate: deg(before.w),
    departureSpeed: length(after.v),
    departureDirection: length(after.v) > 1e-9 ? vehicle.leavesTowards : undefined,
    departureYawRate: deg(after.w),
    deltaV: length(change),
    deltaVForward: own.x,
    deltaVLeft: own.y,
    deltaVDirection: directionOf(own),
    meanAcceleration: casefile.pulse ? length(change) / at('pulse') : undefined,
  };
}

const near = (angle: number, about: number): number => angle - 360 * Math.round((angle - about) / 360);
const wrapped = (angle: number): number => {
  const found = near(angle, 0);
  return found === -180 ? 180 : found;
};

/** Mean, spread and intervals of every figure over `draws` draws. */
export function plainMonteCarlo(
  casefile: CaseFile,
  method: 'directions' | 'restitution',
  draws: number,
  coverage: number,
  drawOf: DrawOf,
): PlainResult {
  const values = new Map(plainInputs(casefile).map(({ path, quantity }) => [path, quantity.value]));
  const { figures, reason } = plainAnswer(casefile, method, (path) => values.get(path) as number);
  const central = Object.fromEntries(
    Object.entries(figures).map(([name, x]) => [name, name.endsWith('Direction') ? wrapped(x) : x]),
  );
  const answers = Array.from({ length: draws }, (_, k) => plainAnswer(casefile, method, (path) => drawOf(path, k)));
  const impossible: Record<string, number> = {};
  for (const answer of answers) if (answer.reason) impossible[answer.reason] = (impossible[answer.reason] ?? 0) + 1;
  const possible = answers.filter((answer) => answer.reason === null);
  const names = new Set(possible.flatMap((answer) => Object.keys(answer.figures)));
  const bands: PlainResult['bands'] = {};
  for (const name of names) {
    const found = possible.map((answer) => answer.figures[name]).filter((x) => x !== undefined);
    const about = central[name] ?? found[0];
    bands[name] = plainSummary(name.endsWith('Direction') ? found.map((x) => near(x, about)) : found, coverage);
  }
  return { central, reason, bands, impossible };
}
