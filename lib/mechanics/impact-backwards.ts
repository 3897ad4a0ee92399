import { hypot } from '@/lib/numerics/elementary';
import { type Body, type ContactFrame, closingEnergyOf, cross, emptyFrame, setFrame } from './contact-frame';
import type { Reason } from './reasons';

export { REASONS, type Reason } from './reasons';

/** One vehicle as the impact is worked backwards. SI and radians, world axes. */
export interface VehicleState extends Body {
  /** Velocity at separation, m/s. */
  vx: number;
  vy: number;
  /** Yaw rate before contact, rad/s (directions). */
  wBefore: number;
  /** Yaw rate at separation as measured, rad/s; NaN where it was not (restitution needs it). */
  wMeasured: number;
  /** Unit vector of the approach (directions). */
  hx: number;
  hy: number;
  /** What the road gave the vehicle while the contact lasted: impulse, N s, and change of the yaw rate, rad/s; 0 in an instant. */
  roadX: number;
  roadY: number;
  roadW: number;
}

export interface ImpactState {
  A: VehicleState;
  B: VehicleState;
  /** Contact point, m, and direction angle of the contact plane, rad. */
  px: number;
  py: number;
  plane: number;
  /** Restitution and impulse ratio (restitution). */
  e: number;
  mu: number;
}

/** What is found for one vehicle. */
export interface VehicleAnswer {
  /** Speed of approach, m/s: along the stated direction (directions; below zero is backwards), else the length of the velocity. */
  speed: number;
  vx: number;
  vy: number;
  /** Yaw rate before contact, rad/s. */
  wBefore: number;
  /** Yaw rate at separation that the answer rests on: as measured, or else as predicted. */
  wAfter: number;
  /** Yaw rate at separation that the impulse gives, starting from wBefore. */
  wPredicted: number;
}

/** SI. Velocities are those of the contact point of A relative to that of B; tangential figures are signed along t = perp(n). */
export interface ImpactAnswer {
  A: VehicleAnswer;
  B: VehicleAnswer;
  frame: ContactFrame;
  /** Impulse on B, N s. */
  Jn: number;
  Jt: number;
  un: number;
  ut: number;
  unAfter: number;
  utAfter: number;
  e: number;
  mu: number;
  /** J . (u + u') / 2, and the most that the contact could take, J. */
  energyLost: number;
  closingEnergy: number;
  /** Sine of the angle from the approach of A to that of B, and condition number (2-norm) of [mA hA, mB hB] (directions). */
  sinBetween: number;
  condition: number;
}

const emptyVehicleState = (): VehicleState => ({
  m: 1,
  I: 1,
  x: 0,
  y: 0,
  vx: 0,
  vy: 0,
  wBefore: 0,
  wMeasured: NaN,
  hx: 1,
  hy: 0,
  roadX: 0,
  roadY: 0,
  roadW: 0,
});

/** A state to be filled in, used again for every draw. */
export const emptyState = (): ImpactState => ({
  A: emptyVehicleState(),
  B: emptyVehicleState(),
  px: 0,
  py: 0,
  plane: 0,
  e: NaN,
  mu: NaN,
});

const emptyVehicleAnswer = (): VehicleAnswer => ({ speed: 0, vx: 0, vy: 0, wBefore: 0, wAfter: 0, wPredicted: 0 });

/** An answer to be filled in, used again for every draw. */
export const emptyAnswer = (): ImpactAnswer => ({
  A: emptyVehicleAnswer(),
  B: emptyVehicleAnswer(),
  frame: emptyFrame(),
  Jn: 0,
  Jt: 0,
  un: 0,
  ut: 0,
  unAfter: 0,
  utAfter: 0,
  e: 0,
  mu: 0,
  energyLost: 0,
  closingEnergy: 0,
  sinBetween: NaN,
  condition: NaN,
});

/** Allowed against rounding: of the restitution, and relative to speeds and energies. */
const TINY = 1e-9;

/** Below this restitution the division by it is refused. */
export const LEAST_RESTITUTION = 0.05;

/**
 * Method directions: momentum along both approach directions gives both speeds and the impulse,
 * mA sA hA + mB sB hB = mA vA' + mB vB' - IA - IB, J = mB (vB' - sB hB) - IB, with I what the road gave while the contact
 * lasted; restitution and impulse ratio follow at the contact point.
 * Fills `out` with all that exists and returns why the answer is impossible, or null.
 */
export function solveDirections(s: ImpactState, out: ImpactAnswer): Reason | null {
  const { A, B } = s;
  setFrame(s, out.frame);
  setApproach(s, out);
  const Jx = B.m * (B.vx - out.B.vx) - B.roadX;
  const Jy = B.m * (B.vy - out.B.vy) - B.roadY;
  const { nx, ny, dAx, dAy, dBx, dBy } = out.frame;
  out.Jn = Jx * nx + Jy * ny;
  out.Jt = Jy * nx - Jx * ny;
  out.A.wBefore = A.wBefore;
  out.B.wBefore = B.wBefore;
  out.A.wPredicted = A.wBefore - cross(dAx, dAy, Jx, Jy) / A.I + A.roadW;
  out.B.wPredicted = B.wBefore + cross(dBx, dBy, Jx, Jy) / B.I + B.roadW;
  out.A.wAfter = Number.isNaN(A.wMeasured) ? out.A.wPredicted : A.wMeasured;
  out.B.wAfter = Number.isNaN(B.wMeasured) ? out.B.wPredicted : B.wMeasured;
  setClosing(out);
  setParting(s, out);
  out.e = -out.unAfter / out.un;
  out.mu = out.Jt / out.Jn;
  setEnergy(out);
  return reasonAgainstDirections(s, out);
}

/** Approach speeds and velocities from momentum, with the figures that say how well it fixes them. */
function setApproach({ A, B }: ImpactState, out: ImpactAnswer): void {
  const Px = A.m * A.vx + B.m * B.vx - A.roadX - B.roadX;
  const Py = A.m * A.vy + B.m * B.vy - A.roadY - B.roadY;
  const between = cross(A.hx, A.hy, B.hx, B.hy);
  out.A.speed = cross(Px, Py, B.hx, B.hy) / (A.m * between);
  out.B.speed = cross(A.hx, A.hy, Px, Py) / (B.m * between);
  out.A.vx = out.A.speed * A.hx;
  out.A.vy = out.A.speed * A.hy;
  out.B.vx = out.B.speed * B.hx;
  out.B.vy = out.B.speed * B.hy;
  const squares = A.m * A.m + B.m * B.m;
  const determinant = A.m * B.m * Math.abs(between);
  out.sinBetween = between;
  out.condition =
    (squares + Math.sqrt(Math.max(0, squares * squares - 4 * determinant * determinant))) / (2 * determinant);
}

/** Relative velocity of the contact points before contact. */
function setClosing(out: ImpactAnswer): void {
  const { A, B, frame } = out;
  const ux = A.vx - A.wBefore * frame.dAy - (B.vx - B.wBefore * frame.dBy);
  const uy = A.vy + A.wBefore * frame.dAx - (B.vy + B.wBefore * frame.dBx);
  out.un = ux * frame.nx + uy * frame.ny;
  out.ut = uy * frame.nx - ux * frame.ny;
}

/** Relative velocity of the contact points at separation. */
function setParting({ A, B }: ImpactState, out: ImpactAnswer): void {
  const { frame } = out;
  const ux = A.vx - out.A.wAfter * frame.dAy - (B.vx - out.B.wAfter * frame.dBy);
  const uy = A.vy + out.A.wAfter * frame.dAx - (B.vy + out.B.wAfter * frame.dBx);
  out.unAfter = ux * frame.nx + uy * frame.ny;
  out.utAfter = uy * frame.nx - ux * frame.ny;
}

function setEnergy(out: ImpactAnswer): void {
  out.energyLost = (out.Jn * (out.un + out.unAfter) + out.Jt * (out.ut + out.utAfter)) / 2;
  out.closingEnergy = closingEnergyOf(out.frame, out.un, out.ut);
}

function reasonAgainstDirections({ A, B }: ImpactState, out: ImpactAnswer): Reason | null {
  if (!areFinite(out)) return 'notFinite';
  const standing = -TINY * (hypot(A.vx, A.vy) + hypot(B.vx, B.vy));
  if (out.un <= 0) return 'notClosing';
  if (out.A.speed < standing || out.B.speed < standing) return 'backwards';
  if (out.Jn <= 0) return 'pulling';
  if (out.e < -TINY || out.e > 1 + TINY) return 'restitution';
  return gainsEnergy(out) ? 'energyGain' : null;
}

const gainsEnergy = (out: ImpactAnswer): boolean => out.energyLost < -TINY * out.closingEnergy;

const areFinite = (out: ImpactAnswer): boolean =>
  Number.isFinite(out.un + out.ut + out.Jn + out.Jt + out.energyLost + out.closingEnergy + out.A.speed + out.B.speed);

/**
 * Method restitution: with restitution e and impulse ratio mu known, un = -un'/e and Jn = (un - un')/(Knn + mu Knt); both
 * approach velocities and yaw rates follow from the impulse. Fills `out` with all that exists (NaN else) and returns why
 * the answer is impossible, or null. Below e = 0.05 the reason is `restitution`.
 */
export function solveRestitution(s: ImpactState, out: ImpactAnswer): Reason | null {
  const { A, B, e, mu } = s;
  const { frame } = out;
  setFrame(s, frame);
  out.A.wAfter = A.wMeasured;
  out.B.wAfter = B.wMeasured;
  setParting(s, out);
  const parts = out.unAfter < 0;
  const un = parts && e > 0 ? -out.unAfter / e : NaN;
  out.e = e;
  out.mu = mu;
  out.sinBetween = NaN;
  out.condition = NaN;
  out.Jn = (un - out.unAfter) / (frame.Knn + mu * frame.Knt);
  out.Jt = mu * out.Jn;
  takeBack(s, out);
  setClosing(out);
  setEnergy(out);
  return out.unAfter >= 0 ? 'notParting' : reasonAgainstRestitution(e, out);
}

/** Takes the impulse back from both vehicles. */
function takeBack({ A, B }: ImpactState, out: ImpactAnswer): void {
  const { nx, ny, dAx, dAy, dBx, dBy } = out.frame;
  const Jx = out.Jn * nx - out.Jt * ny;
  const Jy = out.Jn * ny + out.Jt * nx;
  out.A.vx = A.vx + Jx / A.m;
  out.A.vy = A.vy + Jy / A.m;
  out.B.vx = B.vx - Jx / B.m;
  out.B.vy = B.vy - Jy / B.m;
  out.A.wBefore = out.A.wAfter + cross(dAx, dAy, Jx, Jy) / A.I;
  out.B.wBefore = out.B.wAfter - cross(dBx, dBy, Jx, Jy) / B.I;
  out.A.wPredicted = out.A.wAfter;
  out.B.wPredicted = out.B.wAfter;
  out.A.speed = hypot(out.A.vx, out.A.vy);
  out.B.speed = hypot(out.B.vx, out.B.vy);
}

function reasonAgainstRestitution(e: number, out: ImpactAnswer): Reason | null {
  if (out.un <= 0) return 'notClosing';
  if (out.Jn <= 0) return 'pulling';
  if (e < LEAST_RESTITUTION - 1e-12 || e > 1 + TINY) return 'restitution';
  if (gainsEnergy(out)) return 'energyGain';
  return areFinite(out) ? null : 'notFinite';
}
