import { BogackiShampine } from '@/lib/numerics/ode';
import { exp, log } from '@/lib/numerics/elementary';
import { type Contact, emptyFrame, setFrame } from './contact-frame';
import { ContactLine, type ContactPlace, type LineOn, PAIR, closingAt, pushPair, rollPair } from './pair-motion';
import type { TyreMotion } from './spin';

/**
 * A contact of finite duration, forward: a normal force that grows with the depth of the contact point and gives part of its
 * work back, friction against the slip, and the tyres of both vehicles meanwhile. SI and radians, world axes.
 *
 * Loading k x; unloading, and loading again up to the greatest depth, on a line of slope k / e^2 from there; never pulling.
 * A central contact without tyres lasts the stated pulse and has restitution e (closed form of the two half oscillations).
 */
export interface LastingBefore {
  A: TyreMotion;
  B: TyreMotion;
  contact: Contact;
  /** Both vehicles at first touch: x, y, heading, vx, vy, yaw rate of A, then of B. */
  start: ArrayLike<number>;
  e: number;
  friction: number;
  /** Duration of the frictionless contact without tyres, s. */
  pulse: number;
  lineOn: LineOn;
}

export interface LastingAfter {
  outcome: 'parted' | 'notClosing' | 'neverParts';
  /** At separation: both vehicles and what their tyres gave (PAIR). */
  y: Float64Array;
  /** s */
  duration: number;
  /** Closing and sliding speed at first touch, m/s. */
  un: number;
  ut: number;
  /** Impulse on B in the world, N s, and the integrals of the normal and the tangential force. */
  Jx: number;
  Jy: number;
  Jn: number;
  Jt: number;
  /** Work of the contact on both, J. */
  energyLost: number;
  /** Greatest depth; depth at separation; way of the point along the line, m. */
  penetration: number;
  depthLeft: number;
  slide: number;
}

/** Unloading with a restitution below this is as with this. */
const LEAST_UNLOADING = 0.02;
/** Slip at which friction is fully there, m/s. */
const FULL_SLIP = 0.02;
/** Longest contact: this many pulses and this many seconds more. */
const LONGEST = { pulses: 20, more: 0.5 };
const MOST_STEPS = 100_000;

/** Integrals that a contact's state carries beyond PAIR. */
const SUM = { Jx: PAIR.length, Jy: PAIR.length + 1, Jn: PAIR.length + 2, Jt: PAIR.length + 3, work: PAIR.length + 4 };
const LENGTH = PAIR.length + 5;

/** Follows a contact from first touch to separation. `tolerance`: error of the velocities that a step may make, m/s. */
export function followContact(before: LastingBefore, tolerance: number): LastingAfter {
  const contact = new Contacting(before);
  const run = new BogackiShampine(contact.derivative, 0, contact.start);
  const longest = LONGEST.pulses * before.pulse + LONGEST.more;
  if (contact.closing.un <= 0) return contact.result('notClosing', run.y, 0);
  let h = before.pulse / 1000;
  for (let steps = 0; steps < MOST_STEPS && run.t < longest; steps++) {
    h = Math.min(h, contact.untilOnset(run.t));
    run.try(h);
    const off = PUSHED.reduce((most, i) => Math.max(most, Math.abs(run.error[i])), 0);
    if (off <= tolerance) {
      if (contact.hasParted(run.next)) return contact.partWithin(run, h);
      run.accept(h);
      contact.accept(run.y);
      if (contact.isStill(run.y)) break;
    }
    h *= Math.min(2.5, Math.max(0.2, 0.9 * exp(log(tolerance / (off + 1e-300)) / 3)));
  }
  return contact.result('neverParts', run.y, run.t);
}

/** The components whose error is controlled: velocities and yaw rates. */
const PUSHED = [3, 4, 5, 9, 10, 11];

/** The forces of a contact under way, and what it has been through. */
class Contacting {
  readonly start: Float64Array;
  readonly closing = { un: 0, ut: 0 };
  private readonly line: ContactLine;
  private readonly stiffness: number;
  private readonly unloading: number;
  private readonly givenBack: number;
  private readonly place: ContactPlace = { px: 0, py: 0, nx: 0, ny: 0, depth: 0, along: 0 };
  private readonly speed = { un: 0, ut: 0 };
  private deepest = 0;
  private low = 0;
  private high = 0;

  constructor(private readonly before: LastingBefore) {
    const { contact, e, pulse, lineOn } = before;
    const frame = emptyFrame();
    setFrame(contact, frame);
    this.start = new Float64Array(LENGTH);
    this.start.set(Array.from(before.start));
    this.line = new ContactLine(contact, frame, this.start, lineOn);
    this.stiffness = (((Math.PI / 2) * (1 + e)) / pulse) ** 2 / frame.Knn;
    const back = Math.max(e, LEAST_UNLOADING);
    this.givenBack = 1 - back * back;
    this.unloading = this.stiffness / (back * back);
    this.line.place(this.start, this.place);
    closingAt(this.start, this.place, this.closing);
  }

  derivative = (t: number, y: Float64Array, dy: Float64Array): void => {
    const { before, place, speed } = this;
    rollPair(before.A, before.B, t, y, dy);
    this.line.place(y, place);
    closingAt(y, place, speed);
    const Fn = this.normalForce(place.depth);
    const Ft = before.friction * Fn * Math.max(-1, Math.min(1, speed.ut / FULL_SLIP));
    const [fx, fy] = [Fn * place.nx - Ft * place.ny, Fn * place.ny + Ft * place.nx];
    pushPair(before.A, before.B, y, dy, place, fx, fy);
    dy[SUM.Jx] = fx;
    dy[SUM.Jy] = fy;
    dy[SUM.Jn] = Fn;
    dy[SUM.Jt] = Ft;
    dy[SUM.work] = Fn * speed.un + Ft * speed.ut;
  };

  private normalForce(depth: number): number {
    if (depth >= this.deepest) return this.stiffness * depth;
    return Math.max(0, this.stiffness * this.deepest - this.unloading * (this.deepest - depth));
  }

  /** Time until braking sets in at a vehicle, s: no step goes over it, since the force jumps there. */
  untilOnset(t: number): number {
    const next = [this.before.A.onset, this.before.B.onset].filter((onset) => onset > t + 1e-12);
    return Math.min(...next) - t;
  }

  accept(y: Float64Array): void {
    this.line.place(y, this.place);
    this.deepest = Math.max(this.deepest, this.place.depth);
    this.low = Math.min(this.low, this.place.along);
    this.high = Math.max(this.high, this.place.along);
  }

  /** After loading, the depth at which the force is zero. */
  hasParted(y: Float64Array): boolean {
    this.line.place(y, this.place);
    return this.deepest > 0 && this.place.depth <= this.givenBack * this.deepest && this.isOpening(y);
  }

  private isOpening(y: Float64Array): boolean {
    closingAt(y, this.place, this.speed);
    return this.speed.un < 0;
  }

  /** Both vehicles stand while they still touch. */
  isStill(y: Float64Array): boolean {
    return [PAIR.A, PAIR.B].every(
      (at, i) => (i === 0 ? this.before.A : this.before.B).unrest(y.subarray(at, at + 6)) <= 1,
    );
  }

  /** The moment of separation within the last trial step, by bisection on its interpolant. */
  partWithin(run: BogackiShampine, h: number): LastingAfter {
    const y = new Float64Array(LENGTH);
    let [early, late] = [0, 1];
    for (let i = 0; i < 50; i++) {
      const middle = (early + late) / 2;
      run.within(h, middle, y);
      if (this.hasParted(y)) late = middle;
      else early = middle;
    }
    run.within(h, late, y);
    return this.result('parted', y, run.t + late * h);
  }

  result(outcome: LastingAfter['outcome'], y: Float64Array, duration: number): LastingAfter {
    if (duration > 0) this.accept(y);
    const { un, ut } = this.closing;
    return {
      outcome,
      y: y.slice(0, PAIR.length),
      duration,
      un,
      ut,
      Jx: y[SUM.Jx],
      Jy: y[SUM.Jy],
      Jn: y[SUM.Jn],
      Jt: y[SUM.Jt],
      energyLost: y[SUM.work],
      penetration: this.deepest,
      depthLeft: this.place.depth,
      slide: this.high - this.low,
    };
  }
}
