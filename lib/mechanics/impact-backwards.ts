import { cos, sin } from '@/lib/numerics/elementary';

/**
 * The planar impact worked backwards (models.md sections 2 and 3; Brach, Mechanical Impact Dynamics, 1991; Brach & Brach,
 * Vehicle Accident Analysis and Reconstruction Methods). SI and radians. Both methods fill a record that the caller
 * owns, so that a million draws allocate nothing.
 */

/** Why an impact is impossible, in the order of precedence. */
export const REASONS = [
  'notClosing',
  'notParting',
  'backwards',
  'pulling',
  'restitution',
  'energyGain',
  'leg',
  'noRest',
  'neverParts',
  'notFinite',
] as const;
export type Reason = (typeof REASONS)[number];

/** What is known of one vehicle. */
export interface VehicleState {
  /** kg, kg m^2 */
  m: number;
  I: number;
  /** Mass centre at contact, m. */
  x: number;
  y: number;
  /** Velocity at separation, m/s. */
  vx: number;
  vy: number;
  /** Yaw rate after contact as measured, rad/s; NaN where it was not. */
  wMeasured: number;
  /** Yaw rate before contact, rad/s (directions). */
  wBefore: number;
  /** Unit vector of the direction of approach (directions). */
  hx: number;
  hy: number;
}

export interface ImpactState {
  A: VehicleState;
  B: VehicleState;
  /** Common contact point, m. */
  px: number;
  py: number;
  /** Direction of the contact plane, rad; a line, so that G and G + pi are the same. */
  plane: number;
  /** Restitution and impulse ratio (restitution). */
  e: number;
  mu: number;
}

/** What was found of one vehicle. */
export interface VehicleAnswer {
  /** Approach velocity, m/s, and its size; signed along the direction of approach for the method directions. */
  vx: number;
  vy: number;
  speed: number;
  /** Yaw rates used before and after contact, and that after contact which the impulse predicts, rad/s. */
  wBefore: number;
  wAfter: number;
  wPredicted: number;
}

export interface ImpactAnswer {
  A: VehicleAnswer;
  B: VehicleAnswer;
  /** Unit normal, from A into B; the tangent is (-ny, nx). */
  nx: number;
  ny: number;
  /** Inverse masses at the contact point, 1/kg. */
  Knn: number;
  Ktt: number;
  Knt: number;
  /** Impulse on B along normal and tangent, N s. */
  Jn: number;
  Jt: number;
  /** Relative velocity of the contact points, A less B, before and after contact, m/s. */
  un: number;
  ut: number;
  unAfter: number;
  utAfter: number;
  e: number;
  mu: number;
  /** J . (u + u') / 2, J. */
  energyLost: number;
  /** The most that the contact could take, u . K^-1 . u / 2, J. */
  closingEnergy: number;
  /** Sine of the angle from the approach direction of A to that of B, and the condition number of [mA hA, mB hB] (directions). */
  sinBetween: number;
  condition: number;
}

const vehicleState = (): VehicleState => ({ m: 0, I: 0, x: 0, y: 0, vx: 0, vy: 0, wMeasured: NaN, wBefore: 0, hx: 1, hy: 0 });
const vehicleAnswer = (): VehicleAnswer => ({ vx: 0, vy: 0, speed: 0, wBefore: 0, wAfter: 0, wPredicted: 0 });

export const emptyState = (): ImpactState => ({ A: vehicleState(), B: vehicleState(), px: 0, py: 0, plane: 0, e: 0, mu: 0 });
export const emptyAnswer = (): ImpactAnswer => ({
  A: vehicleAnswer(),
  B: vehicleAnswer(),
  nx: 0, ny: 0, Knn: 0, Ktt: 0, Knt: 0, Jn: 0, Jt: 0, un: 0, ut: 0, unAfter: 0, utAfter: 0,
  e: 0, mu: 0, energyLost: 0, closingEnergy: 0, sinBetween: 0, condition: 0,
});

/** Slack against rounding, relative. */
const SLACK = 1e-9;

/** Normal, tangent and the inverse masses at the contact point. */
function contactFrame(s: ImpactState, out: ImpactAnswer): void {
  const { A, B } = s;
  let nx = sin(s.plane);
  let ny = -cos(s.plane);
  if (nx * (B.x - A.x) + ny * (B.y - A.y) < 0) {
    nx = -nx;
    ny = -ny;
  }
  const ax = s.px - A.x;
  const ay = s.py - A.y;
  const bx = s.px - B.x;
  const by = s.py - B.y;
  // a_i = cross(d_i, n), b_i = cross(d_i, t) with t = (-ny, nx)
  const aA = ax * ny - ay * nx;
  const bA = ax * nx + ay * ny;
  const aB = bx * ny - by * nx;
  const bB = bx * nx + by * ny;
  const inverse = 1 / A.m + 1 / B.m;
  out.nx = nx;
  out.ny = ny;
  out.Knn = inverse + (aA * aA) / A.I + (aB * aB) / B.I;
  out.Ktt = inverse + (bA * bA) / A.I + (bB * bB) / B.I;
  out.Knt = (aA * bA) / A.I + (aB * bB) / B.I;
}

/** Relative velocity of the contact points, A less B, along the normal: before contact. */
const relativeX = (s: ImpactState, avx: number, aw: number, bvx: number, bw: number): number =>
  avx - aw * (s.py - s.A.y) - (bvx - bw * (s.py - s.B.y));
const relativeY = (s: ImpactState, avy: number, aw: number, bvy: number, bw: number): number =>
  avy + aw * (s.px - s.A.x) - (bvy + bw * (s.px - s.B.x));

function setBefore(s: ImpactState, out: ImpactAnswer): void {
  const { A, B, nx, ny } = out;
  const ux = relativeX(s, A.vx, A.wBefore, B.vx, B.wBefore);
  const uy = relativeY(s, A.vy, A.wBefore, B.vy, B.wBefore);
  out.un = ux * nx + uy * ny;
  out.ut = -ux * ny + uy * nx;
}

function setAfter(s: ImpactState, out: ImpactAnswer): void {
  const { A, B, nx, ny } = out;
  const ux = relativeX(s, s.A.vx, A.wAfter, s.B.vx, B.wAfter);
  const uy = relativeY(s, s.A.vy, A.wAfter, s.B.vy, B.wAfter);
  out.unAfter = ux * nx + uy * ny;
  out.utAfter = -ux * ny + uy * nx;
}

/** Energy lost and the most that could be; both from the relative velocities and the impulse. */
function setEnergy(out: ImpactAnswer): void {
  const { Knn, Ktt, Knt, un, ut } = out;
  out.energyLost = (out.Jn * (un + out.unAfter) + out.Jt * (ut + out.utAfter)) / 2;
  out.closingEnergy = (Ktt * un * un - 2 * Knt * un * ut + Knn * ut * ut) / (2 * (Knn * Ktt - Knt * Knt));
}

/** Yaw-rate change, rad/s, that the impulse gives a body: cross(d, J) / I. */
const yawChange = (s: ImpactState, v: VehicleState, jx: number, jy: number): number =>
  ((s.px - v.x) * jy - (s.py - v.y) * jx) / v.I;

const isFiniteAnswer = (out: ImpactAnswer): boolean =>
  Number.isFinite(out.Jn + out.Jt + out.energyLost + out.closingEnergy + out.A.speed + out.B.speed + out.A.wAfter + out.B.wAfter);

/**
 * Method `directions`: both approach directions known, crossing paths. Translation alone fixes the approach speeds and
 * the impulse (mA sA hA + mB sB hB = mA vA' + mB vB'); measured yaw rates enter restitution and energy only.
 * Returns why the impact is impossible, or null; the figures are filled in where they exist either way.
 */
export function solveDirections(s: ImpactState, out: ImpactAnswer): Reason | null {
  const { A, B } = s;
  contactFrame(s, out);
  const sine = A.hx * B.hy - A.hy * B.hx;
  const qx = A.m * A.vx + B.m * B.vx;
  const qy = A.m * A.vy + B.m * B.vy;
  const sA = (qx * B.hy - qy * B.hx) / (A.m * sine);
  const sB = (A.hx * qy - A.hy * qx) / (B.m * sine);
  out.sinBetween = sine;
  out.condition = conditionOf(A.m, B.m, sine);
  setApproach(out.A, sA, A.hx, A.hy, A.wBefore);
  setApproach(out.B, sB, B.hx, B.hy, B.wBefore);
  const jx = B.m * (B.vx - out.B.vx);
  const jy = B.m * (B.vy - out.B.vy);
  out.Jn = jx * out.nx + jy * out.ny;
  out.Jt = -jx * out.ny + jy * out.nx;
  out.mu = out.Jt / out.Jn;
  out.A.wPredicted = A.wBefore - yawChange(s, A, jx, jy);
  out.B.wPredicted = B.wBefore + yawChange(s, B, jx, jy);
  out.A.wAfter = Number.isNaN(A.wMeasured) ? out.A.wPredicted : A.wMeasured;
  out.B.wAfter = Number.isNaN(B.wMeasured) ? out.B.wPredicted : B.wMeasured;
  setBefore(s, out);
  setAfter(s, out);
  out.e = -out.unAfter / out.un;
  setEnergy(out);
  return directionsReason(s, out);
}

function directionsReason(s: ImpactState, out: ImpactAnswer): Reason | null {
  if (!isFiniteAnswer(out)) return 'notFinite';
  const scale = SLACK * (Math.abs(s.A.vx) + Math.abs(s.A.vy) + Math.abs(s.B.vx) + Math.abs(s.B.vy));
  if (out.un <= 0) return 'notClosing';
  if (out.A.speed < -scale || out.B.speed < -scale) return 'backwards';
  if (out.Jn <= 0) return 'pulling';
  if (out.e < -SLACK || out.e > 1 + SLACK) return 'restitution';
  return out.energyLost < -SLACK * out.closingEnergy ? 'energyGain' : null;
}

function setApproach(to: VehicleAnswer, speed: number, hx: number, hy: number, w: number): void {
  to.speed = speed;
  to.vx = speed * hx;
  to.vy = speed * hy;
  to.wBefore = w;
}

/** 2-norm condition number of [mA hA, mB hB]: the larger singular value squared over the determinant. */
function conditionOf(mA: number, mB: number, sine: number): number {
  const trace = mA * mA + mB * mB;
  const determinant = mA * mB * Math.abs(sine);
  const root = Math.sqrt(Math.max(0, trace * trace - 4 * determinant * determinant));
  return (trace + root) / (2 * determinant);
}

/** Below this 1/e would multiply the speed of parting more than 20 times. */
export const LEAST_RESTITUTION = 0.05;

/**
 * Method `restitution`: restitution and impulse ratio known, yaw rates after contact measured; directions, speeds and
 * yaw rates before contact are results. Needs parting at the contact point. Returns as solveDirections does.
 */
export function solveRestitution(s: ImpactState, out: ImpactAnswer): Reason | null {
  const { A, B, e, mu } = s;
  contactFrame(s, out);
  const { nx, ny } = out;
  out.A.wAfter = A.wMeasured;
  out.B.wAfter = B.wMeasured;
  setAfter(s, out);
  out.Jn = (-out.unAfter / e - out.unAfter) / (out.Knn + mu * out.Knt);
  out.Jt = mu * out.Jn;
  const jx = out.Jn * nx - out.Jt * ny;
  const jy = out.Jn * ny + out.Jt * nx;
  setVelocity(out.A, A.vx + jx / A.m, A.vy + jy / A.m, A.wMeasured + yawChange(s, A, jx, jy));
  setVelocity(out.B, B.vx - jx / B.m, B.vy - jy / B.m, B.wMeasured - yawChange(s, B, jx, jy));
  out.A.wPredicted = A.wMeasured;
  out.B.wPredicted = B.wMeasured;
  setBefore(s, out);
  out.e = e;
  out.mu = mu;
  setEnergy(out);
  if (!isFiniteAnswer(out)) return 'notFinite';
  if (out.unAfter >= 0) return 'notParting';
  if (out.Jn <= 0) return 'pulling';
  if (e < LEAST_RESTITUTION - 1e-12) return 'restitution';
  return out.energyLost < -SLACK * out.closingEnergy ? 'energyGain' : null;
}

function setVelocity(to: VehicleAnswer, vx: number, vy: number, w: number): void {
  to.vx = vx;
  to.vy = vy;
  to.speed = Math.sqrt(vx * vx + vy * vy);
  to.wBefore = w;
}
