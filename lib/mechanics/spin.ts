import { cos, exp, log, sin } from '@/lib/numerics/elementary';
import { BogackiShampine } from '@/lib/numerics/ode';
import { G } from './legs';
import { Tyre, type Wheel } from './tyre';
import { brakingWithRolling } from './wheel';

/**
 * Travel from separation to rest: a rigid vehicle in the plane on four wheels. SI and radians;
 * world axes for position and velocity.
 */

export interface SpinVehicle {
  m: number;
  I: number;
  wheels: readonly Wheel[];
}

export interface Ground {
  /** Friction where no surface lies. */
  friction: number;
  /** Friction under a point in the world, where surfaces are drawn; null where there are none. */
  frictionAt: ((x: number, y: number) => number) | null;
  /** Rise over run, and the direction that it rises in, rad. */
  grade: number;
  uphill: number;
}

export interface Rest {
  /** `rest`: it came to rest; `noRest`: it did not within the time allowed. */
  outcome: 'rest' | 'noRest';
  x: number;
  y: number;
  /** Not wrapped: a full turn more is a full turn more. */
  heading: number;
  /** s after separation. */
  time: number;
}

/** Where the mass centre is slower than this (m/s) and the yaw rate smaller (rad/s), a vehicle on level ground is at rest. */
const STILL = 0.01;
/** On a grade: every hub slower than this, m/s, and friction holds it. */
const STILL_ON_GRADE = 0.05;
/** Longest travel, s. */
const LONGEST = 300;
const MOST_STEPS = 200_000;
/** A velocity tolerance looser than this, m/s, never meets the test of rest. */
const LOOSEST = 3e-3;

/** The four wheels of a vehicle, static loads from where the mass centre lies (left = right), N on level ground. */
export function fourWheels(
  car: { m: number; wheelbase: number; track: number; frontAxleToMassCentre: number },
  settings: readonly { braking: number; steer: number }[],
): Wheel[] {
  const { m, wheelbase, track, frontAxleToMassCentre: front } = car;
  const rear = wheelbase - front;
  const frontLoad = (m * G * rear) / wheelbase / 2;
  const rearLoad = (m * G * front) / wheelbase / 2;
  const at: [number, number, number][] = [
    [front, track / 2, frontLoad],
    [front, -track / 2, frontLoad],
    [-rear, track / 2, rearLoad],
    [-rear, -track / 2, rearLoad],
  ];
  return at.map(([x, y, load], i) => ({ x, y, load, ...settings[i] }));
}

/** The equations of motion of one vehicle under its tyres and the grade. A motion is x, y, heading, vx, vy, yaw rate. */
export class TyreMotion {
  private readonly force = { along: 0, across: 0 };
  private readonly cosGrade: number;
  /** Acceleration by the grade, m/s^2. */
  readonly downhillX: number;
  readonly downhillY: number;
  private readonly tyres;

  constructor(
    readonly vehicle: SpinVehicle,
    readonly ground: Ground,
    /** s after separation at which braking sets in. */
    readonly onset: number,
  ) {
    const slope = Math.sqrt(1 + ground.grade * ground.grade);
    this.cosGrade = 1 / slope;
    this.downhillX = (-G * ground.grade * cos(ground.uphill)) / slope;
    this.downhillY = (-G * ground.grade * sin(ground.uphill)) / slope;
    this.tyres = vehicle.wheels.map((wheel) => new Tyre(wheel, wheel.load * this.cosGrade, ground.friction));
  }

  /** dy/dt of the motion y at offset `at` of a longer state, at t s after separation. */
  derivative = (t: number, y: Float64Array, dy: Float64Array, at = 0): void => {
    const { force, ground, tyres } = this;
    const { m, I } = this.vehicle;
    const braked = t >= this.onset;
    const w = y[at + 5];
    const c = cos(y[at + 2]);
    const s = sin(y[at + 2]);
    const forward = y[at + 3] * c + y[at + 4] * s;
    const left = y[at + 4] * c - y[at + 3] * s;
    let fx = 0;
    let fy = 0;
    let moment = 0;
    for (let i = 0; i < tyres.length; i++) {
      const tyre = tyres[i];
      if (ground.frictionAt) tyre.regrip(ground.frictionAt(...tyre.under(y, at, c, s)));
      tyre.force(forward - w * tyre.y, left + w * tyre.x, braked, force);
      fx += force.along;
      fy += force.across;
      moment += tyre.x * force.across - tyre.y * force.along;
    }
    dy[at] = y[at + 3];
    dy[at + 1] = y[at + 4];
    dy[at + 2] = w;
    dy[at + 3] = (fx * c - fy * s) / m + this.downhillX;
    dy[at + 4] = (fx * s + fy * c) / m + this.downhillY;
    dy[at + 5] = moment / I;
  };

  /** How far the motion is above rest: at most 1 is at rest; Infinity where friction cannot hold the vehicle. */
  unrest(y: Float64Array): number {
    const speed = Math.sqrt(y[3] * y[3] + y[4] * y[4]);
    if (this.ground.grade === 0) return Math.max(speed, Math.abs(y[5])) / STILL;
    return this.holds(y) ? this.fastestHub(y) / STILL_ON_GRADE : Infinity;
  }

  /** Whether friction along the fall line holds the vehicle: sum of b f Fz at least m g sin. */
  private holds(y: Float64Array): boolean {
    const pull = this.vehicle.m * Math.sqrt(this.downhillX * this.downhillX + this.downhillY * this.downhillY);
    const [c, s] = [cos(y[2]), sin(y[2])];
    const held = this.tyres.reduce((sum, tyre) => {
      const friction = this.ground.frictionAt?.(...tyre.under(y, 0, c, s)) ?? this.ground.friction;
      return sum + brakingWithRolling(tyre.braking, friction) * friction * tyre.load;
    }, 0);
    return held >= pull;
  }

  private fastestHub(y: Float64Array): number {
    const [c, s] = [cos(y[2]), sin(y[2])];
    const forward = y[3] * c + y[4] * s;
    const left = y[4] * c - y[3] * s;
    return Math.max(
      ...this.tyres.map(({ x, y: yw }) => Math.sqrt((forward - y[5] * yw) ** 2 + (left + y[5] * x) ** 2)),
    );
  }
}

/**
 * Follows a vehicle from `start` to rest. `error` is the position error, m, that the step control aims at (1e-6 for a
 * central answer, 5e-5 for draws). `watch` sees every accepted state.
 */
export function travelToRest(
  motion: TyreMotion,
  start: ArrayLike<number>,
  error: number,
  watch?: (t: number, y: Float64Array) => void,
): Rest {
  const run = new BogackiShampine(motion.derivative, 0, start);
  const slowing = (motion.ground.friction * G) / 2;
  let h = 1e-3;
  watch?.(0, run.y);
  if (motion.unrest(run.y) <= 1) return restAt('rest', run.y, 0);
  for (let steps = 0; steps < MOST_STEPS && run.t < LONGEST; steps++) {
    const left = (Math.sqrt(run.y[3] ** 2 + run.y[4] ** 2) + Math.abs(run.y[5])) / slowing;
    const tolerance = Math.min(LOOSEST, error / left);
    if (run.t < motion.onset) h = Math.min(h, motion.onset - run.t);
    run.try(h);
    const off = Math.max(Math.abs(run.error[3]), Math.abs(run.error[4]), Math.abs(run.error[5]));
    if (off <= tolerance) {
      if (motion.unrest(run.next) <= 1) return locateRest(motion, run, h, watch);
      run.accept(h);
      watch?.(run.t, run.y);
    }
    h *= Math.min(2.5, Math.max(0.2, 0.9 * exp(log(tolerance / (off + 1e-300)) / 3)));
  }
  return restAt('noRest', run.y, run.t);
}

/** The moment of rest within the last trial step, by bisection on its interpolant. */
function locateRest(
  motion: TyreMotion,
  run: BogackiShampine,
  h: number,
  watch?: (t: number, y: Float64Array) => void,
): Rest {
  const y = new Float64Array(run.y.length);
  let [early, late] = [0, 1];
  for (let i = 0; i < 40; i++) {
    const middle = (early + late) / 2;
    run.within(h, middle, y);
    if (motion.unrest(y) <= 1) late = middle;
    else early = middle;
  }
  run.within(h, late, y);
  watch?.(run.t + late * h, y);
  return restAt('rest', y, run.t + late * h);
}

const restAt = (outcome: Rest['outcome'], y: Float64Array, time: number): Rest => ({
  outcome,
  x: y[0],
  y: y[1],
  heading: y[2],
  time,
});
