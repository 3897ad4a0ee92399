import {
  type Body,
  type Contact,
  type ContactFrame,
  closingEnergyOf,
  cross,
  emptyFrame,
  setFrame,
} from './contact-frame';
import type { Reason } from './reasons';

/** A vehicle before contact: velocity m/s in world axes, yaw rate rad/s. */
export interface MovingBody extends Body {
  vx: number;
  vy: number;
  w: number;
}

export interface ImpactBefore extends Contact {
  A: MovingBody;
  B: MovingBody;
  /** Newton's restitution, 0 to 1. */
  e: number;
  /** Coulomb friction of the contact, >= 0. */
  f: number;
}

interface Motion {
  vx: number;
  vy: number;
  w: number;
}

/** Motion at separation. SI; tangential figures signed along t = perp(n). */
export interface ImpactAfter {
  A: Motion;
  B: Motion;
  frame: ContactFrame;
  /** Impulse on B, N s. */
  Jn: number;
  Jt: number;
  un: number;
  ut: number;
  unAfter: number;
  utAfter: number;
  /** J . (u + u') / 2, which is the loss of kinetic energy; and the most that the contact could take, J. */
  energyLost: number;
  closingEnergy: number;
}

/** A record to be filled in, used again for every draw. */
export const emptyAfter = (): ImpactAfter => ({
  A: { vx: 0, vy: 0, w: 0 },
  B: { vx: 0, vy: 0, w: 0 },
  frame: emptyFrame(),
  Jn: 0,
  Jt: 0,
  un: 0,
  ut: 0,
  unAfter: 0,
  utAfter: 0,
  energyLost: 0,
  closingEnergy: 0,
});

/** Energy may seem to grow by this share of the closing energy, by rounding. */
const TINY = 1e-9;

/**
 * The impact forward, with restitution and contact friction: follows the impulse through the contact, sliding until the
 * slip stops, then sticking or sliding back. Fills `out` and returns why the impact is impossible, or null.
 * Source: Routh, Dynamics of a System of Rigid Bodies (impact with friction); restitution after Newton.
 */
export function solveImpact(s: ImpactBefore, out: ImpactAfter): Reason | null {
  setFrame(s, out.frame);
  setClosing(s, out);
  setImpulse(s.e, s.f, out);
  giveImpulse(s, out);
  const { Knn, Ktt, Knt } = out.frame;
  out.unAfter = out.un - Knn * out.Jn - Knt * out.Jt;
  out.utAfter = out.ut - Knt * out.Jn - Ktt * out.Jt;
  out.energyLost = (out.Jn * (out.un + out.unAfter) + out.Jt * (out.ut + out.utAfter)) / 2;
  out.closingEnergy = closingEnergyOf(out.frame, out.un, out.ut);
  return reasonAgainst(out);
}

function setClosing({ A, B }: ImpactBefore, out: ImpactAfter): void {
  const { nx, ny, dAx, dAy, dBx, dBy } = out.frame;
  const ux = A.vx - A.w * dAy - (B.vx - B.w * dBy);
  const uy = A.vy + A.w * dAx - (B.vy + B.w * dBx);
  out.un = ux * nx + uy * ny;
  out.ut = uy * nx - ux * ny;
}

/** The impulse at the end of the path. */
function setImpulse(e: number, f: number, out: ImpactAfter): void {
  const { Knn, Ktt, Knt } = out.frame;
  const { un, ut } = out;
  const sticks = Math.abs(Knt) <= f * Ktt;
  const way = ut > 0 ? 1 : ut < 0 ? -1 : Knt > 0 ? -1 : 1;
  if (ut === 0 && sticks) {
    setStuckImpulse(e, out);
    return;
  }
  const resistance = Knn + way * f * Knt;
  const throughout = resistance > 0 ? ((1 + e) * un) / resistance : Infinity;
  const slipStops = ut / (Knt + way * f * Ktt);
  if (!(slipStops > 0 && slipStops < throughout)) {
    out.Jn = throughout;
    out.Jt = way * f * throughout;
  } else if (sticks) setStuckImpulse(e, out);
  else {
    const back = Knt > 0 ? -1 : 1;
    out.Jn = ((1 + e) * un - Knt * f * slipStops * (way - back)) / (Knn + back * f * Knt);
    out.Jt = way * f * slipStops + back * f * (out.Jn - slipStops);
  }
}

/** The impulse after which the bodies part at e times the closing speed and do not slide on each other. */
function setStuckImpulse(e: number, out: ImpactAfter): void {
  const { Knn, Ktt, Knt } = out.frame;
  const determinant = Knn * Ktt - Knt * Knt;
  const change = (1 + e) * out.un;
  out.Jn = (Ktt * change - Knt * out.ut) / determinant;
  out.Jt = (Knn * out.ut - Knt * change) / determinant;
}

function giveImpulse({ A, B }: ImpactBefore, out: ImpactAfter): void {
  const { nx, ny, dAx, dAy, dBx, dBy } = out.frame;
  const Jx = out.Jn * nx - out.Jt * ny;
  const Jy = out.Jn * ny + out.Jt * nx;
  out.A.vx = A.vx - Jx / A.m;
  out.A.vy = A.vy - Jy / A.m;
  out.A.w = A.w - cross(dAx, dAy, Jx, Jy) / A.I;
  out.B.vx = B.vx + Jx / B.m;
  out.B.vy = B.vy + Jy / B.m;
  out.B.w = B.w + cross(dBx, dBy, Jx, Jy) / B.I;
}

function reasonAgainst(out: ImpactAfter): Reason | null {
  if (out.un <= 0) return 'notClosing';
  if (out.Jn <= 0) return 'pulling';
  if (out.energyLost < -TINY * out.closingEnergy) return 'energyGain';
  return Number.isFinite(out.Jn + out.Jt + out.energyLost + out.closingEnergy) ? null : 'notFinite';
}
