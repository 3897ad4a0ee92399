import { VEHICLE_IDS, type VehicleId } from '@/lib/casefile/schema';
import type { LastingSlots, Problem } from '@/lib/evidence/problem';
import { cross, emptyFrame, setFrame } from '@/lib/mechanics/contact-frame';
import { type Push, type Pushed, pushThrough } from '@/lib/mechanics/half-sine-push';
import {
  type ImpactAnswer,
  type ImpactState,
  type Reason,
  type VehicleState,
  solveDirections,
} from '@/lib/mechanics/impact-backwards';
import { ContactLine, PAIR } from '@/lib/mechanics/pair-motion';
import { type Pose, farthest } from '@/lib/mechanics/spin-backwards';
import { hypot } from '@/lib/numerics/elementary';
import { roadUnder } from './road';
import type { Departing } from './spin-travel';

/** The impulse has settled when it moves by less than this share of itself. */
const SETTLED = 1e-6;
const MOST_ROUNDS = 50;
/** Simulated travel begins within this of where the contact ends, m and rad. */
const MATCHED = 1e-5;

/** Finds the separation of a vehicle anew for a travel that begins elsewhere; false where there is none. */
export type TravelAnew = (id: VehicleId, departing: Departing) => boolean;

/** What a contact of one draw is solved with. */
interface Draw {
  push: Push;
  state: ImpactState;
  answer: ImpactAnswer;
  headings: Record<VehicleId, number>;
}

/**
 * The method directions with a contact that lasts: a fixed point on what the road gives meanwhile. From the momentum less
 * that impulse follow both speeds and J; J is given to both vehicles as a half sine over the contact while their wheels
 * push; that gives the impulse of the road anew, and the poses at separation that simulated travel begins at.
 */
export class LastingDirections {
  /** Of the draw solved last: how the push ended, its duration, s, and how many rounds it took. */
  pushed: Pushed | null = null;
  duration = 0;
  rounds = 0;
  /** Where each simulated travel begins, and how far from the end of the contact. */
  private readonly began: Record<VehicleId, Pose | null> = { A: null, B: null };
  private apart = 0;

  constructor(
    private readonly problem: Problem,
    private readonly slots: LastingSlots,
    /** Steps of a push, at least. */
    private readonly steps: number,
  ) {}

  /** Fills `answer`; `state` holds the separations to begin with, and those at the end. */
  solve(
    inputs: readonly Float64Array[],
    k: number,
    state: ImpactState,
    answer: ImpactAnswer,
    travel: TravelAnew,
  ): Reason | null {
    const draw = this.drawOf(inputs, k, state, answer);
    for (const id of VEHICLE_IDS) {
      clearRoad(state[id]);
      this.began[id] = null;
    }
    let [Jx, Jy] = [Infinity, Infinity];
    for (this.rounds = 0; this.rounds < MOST_ROUNDS; this.rounds++) {
      const reason = solveDirections(state, answer);
      const [x, y] = impulseOf(answer);
      if (!Number.isFinite(x + y)) return 'notFinite';
      if (hypot(x - Jx, y - Jy) <= SETTLED * hypot(x, y) && this.apart < MATCHED) return reason;
      [Jx, Jy] = [x, y];
      this.pushed = pushThrough(draw.push, startOf(draw), Jx, Jy, this.steps);
      takeRoad(draw, this.pushed.y, Jx, Jy);
      if (!this.travelOn(this.pushed.y, travel)) return 'noRest';
    }
    return 'neverParts';
  }

  private drawOf(inputs: readonly Float64Array[], k: number, state: ImpactState, answer: ImpactAnswer): Draw {
    const { vehicles } = this.problem;
    const headings = { A: inputs[vehicles.A.heading][k], B: inputs[vehicles.B.heading][k] };
    const frame = emptyFrame();
    setFrame(state, frame);
    this.duration = inputs[this.slots.pulse][k];
    const at = [...poseOf(state.A, headings.A), 0, 0, 0, ...poseOf(state.B, headings.B), 0, 0, 0];
    const push = {
      A: roadUnder(inputs, k, vehicles.A, state.A, 0),
      B: roadUnder(inputs, k, vehicles.B, state.B, 0),
      line: new ContactLine(state, frame, at, this.slots.lineOn),
      duration: this.duration,
    };
    return { push, state, answer, headings };
  }

  /**
   * Lets simulated travel begin where the push has left the vehicles, or after the first round half way there, since a
   * later beginning makes the vehicle slower and so carries it less far; false where it then meets no rest pose.
   */
  private travelOn(y: Float64Array, travel: TravelAnew): boolean {
    this.apart = 0;
    return VEHICLE_IDS.every((id) => {
      if (this.problem.vehicles[id].departure.kind !== 'spin') return true;
      const left = { x: y[PAIR[id]], y: y[PAIR[id] + 1], heading: y[PAIR[id] + 2] };
      const old = this.began[id] ?? left;
      const from = midway(old, left);
      this.began[id] = from;
      this.apart = Math.max(this.apart, farthest(old, left));
      return travel(id, { from, elapsed: this.duration });
    });
  }
}

const midway = (a: Pose, b: Pose): Pose => ({
  x: (a.x + b.x) / 2,
  y: (a.y + b.y) / 2,
  heading: (a.heading + b.heading) / 2,
});

function clearRoad(vehicle: VehicleState): void {
  vehicle.roadX = 0;
  vehicle.roadY = 0;
  vehicle.roadW = 0;
}

const impulseOf = ({ Jn, Jt, frame: { nx, ny } }: ImpactAnswer): [number, number] => [
  Jn * nx - Jt * ny,
  Jn * ny + Jt * nx,
];

const poseOf = ({ x, y }: VehicleState, heading: number): [number, number, number] => [x, y, heading];

/** Both vehicles at first touch, as they came (PAIR). */
function startOf({ state, answer, headings }: Draw): number[] {
  const of = (id: VehicleId): number[] => {
    const { vx, vy, wBefore } = answer[id];
    return [...poseOf(state[id], headings[id]), vx, vy, wBefore];
  };
  return [...of('A'), ...of('B'), 0, 0, 0, 0];
}

/** What the road gave each vehicle: all its change less what the contact gave. */
function takeRoad({ state, answer }: Draw, y: Float64Array, Jx: number, Jy: number): void {
  for (const id of VEHICLE_IDS) {
    const at = PAIR[id];
    const [vehicle, came] = [state[id], answer[id]];
    const sign = id === 'A' ? -1 : 1;
    const { dAx, dAy, dBx, dBy } = answer.frame;
    const twist = id === 'A' ? cross(dAx, dAy, Jx, Jy) : cross(dBx, dBy, Jx, Jy);
    vehicle.roadX = vehicle.m * (y[at + 3] - came.vx) - sign * Jx;
    vehicle.roadY = vehicle.m * (y[at + 4] - came.vy) - sign * Jy;
    vehicle.roadW = y[at + 5] - came.wBefore - (sign * twist) / vehicle.I;
  }
}
