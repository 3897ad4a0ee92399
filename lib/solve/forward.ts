import type { Travels } from '@/lib/geometry/timed-path';
import { VEHICLE_IDS, type VehicleId } from '@/lib/casefile/schema';
import type { FitSlots, Problem } from '@/lib/evidence/problem';
import { type ImpactAfter, type ImpactBefore, emptyAfter, solveImpact } from '@/lib/mechanics/impact';
import type { ImpactAnswer, ImpactState, Reason } from '@/lib/mechanics/impact-backwards';
import { type LastingAfter, followContact } from '@/lib/mechanics/lasting-contact';
import { PAIR } from '@/lib/mechanics/pair-motion';
import { type Rest, travelToRest } from '@/lib/mechanics/spin';
import type { Pose } from '@/lib/mechanics/spin-backwards';
import { cos, hypot, sin } from '@/lib/numerics/elementary';
import { roadUnder } from './road';
import { travelPath } from './travel-path';
import { DRAW_ERROR } from './spin-travel';

/** Error of the velocities that a step through a contact may make, m/s. */
const CONTACT_ERROR = 1e-4;

/** The forward model of a fit: approach to impact, instant or lasting, to separation, and where simulated, to rest. */
export class Forward {
  /** Of the draw solved last: rest poses of simulated travel; duration, slide and impulse of a contact that lasts. */
  readonly rest: Record<VehicleId, Rest | null> = { A: null, B: null };
  contact: LastingAfter | null = null;
  private readonly after: ImpactAfter = emptyAfter();
  private readonly before: ImpactBefore = {
    A: { m: 1, I: 1, x: 0, y: 0, vx: 0, vy: 0, w: 0 },
    B: { m: 1, I: 1, x: 0, y: 0, vx: 0, vy: 0, w: 0 },
    px: 0,
    py: 0,
    plane: 0,
    e: 0,
    f: 0,
  };

  constructor(
    private readonly problem: Problem,
    private readonly fit: FitSlots,
  ) {}

  /** Fills `state` with the separation and `answer` with the contact, from bodies and contact that `state` holds. */
  solve(inputs: readonly Float64Array[], k: number, state: ImpactState, answer: ImpactAnswer): Reason | null {
    this.approach(inputs, k, state, answer);
    const reason = this.problem.lasting ? this.lastingContact(inputs, k, state, answer) : this.instant(state, answer);
    if (reason) return reason;
    return this.travel(inputs, k, state) ? null : 'noRest';
  }

  private approach(inputs: readonly Float64Array[], k: number, state: ImpactState, answer: ImpactAnswer): void {
    const { before, fit, problem } = this;
    for (const id of VEHICLE_IDS) {
      const { slot, fromHeading } = fit.direction[id];
      const { heading, approachYawRate } = problem.vehicles[id];
      const course = inputs[slot][k] + (fromHeading ? inputs[heading][k] : 0);
      const speed = inputs[fit.speed[id]][k];
      const w = approachYawRate === null ? 0 : inputs[approachYawRate][k];
      const [vx, vy] = [speed * cos(course), speed * sin(course)];
      const { m, I, x, y } = state[id];
      Object.assign(before[id], { m, I, x, y, vx, vy, w });
      Object.assign(answer[id], { speed, vx, vy, wBefore: w });
    }
    before.px = state.px;
    before.py = state.py;
    before.plane = state.plane;
    before.e = inputs[fit.restitution][k];
    before.f = inputs[fit.friction][k];
  }

  private instant(state: ImpactState, answer: ImpactAnswer): Reason | null {
    const { after } = this;
    const reason = solveImpact(this.before, after);
    const { Jn, Jt, un, ut, unAfter, utAfter, energyLost, closingEnergy } = after;
    Object.assign(answer.frame, after.frame);
    Object.assign(answer, { Jn, Jt, un, ut, unAfter, utAfter, energyLost, closingEnergy });
    answer.e = this.before.e;
    answer.mu = Jt / Jn;
    for (const id of VEHICLE_IDS) leave(state, answer, id, after[id].vx, after[id].vy, after[id].w);
    return reason;
  }

  private lastingContact(
    inputs: readonly Float64Array[],
    k: number,
    state: ImpactState,
    answer: ImpactAnswer,
  ): Reason | null {
    const { before, problem } = this;
    const { lasting, vehicles } = problem;
    if (!lasting) return null;
    solveImpact(before, this.after);
    const of = (id: VehicleId): number[] => {
      const { x, y, vx, vy, w } = before[id];
      return [x, y, inputs[vehicles[id].heading][k], vx, vy, w];
    };
    const contact = followContact(
      {
        A: roadUnder(inputs, k, vehicles.A, state.A, 0),
        B: roadUnder(inputs, k, vehicles.B, state.B, 0),
        contact: before,
        start: [...of('A'), ...of('B')],
        e: before.e,
        friction: before.f,
        pulse: inputs[lasting.pulse][k],
        lineOn: lasting.lineOn,
      },
      CONTACT_ERROR,
    );
    this.contact = contact;
    if (contact.outcome !== 'parted') return contact.outcome;
    const { y, Jn, Jt, un, ut, energyLost } = contact;
    Object.assign(answer.frame, this.after.frame);
    Object.assign(answer, { Jn, Jt, un, ut, energyLost, closingEnergy: this.after.closingEnergy });
    answer.e = before.e;
    answer.mu = Jt / Jn;
    for (const id of VEHICLE_IDS) leave(state, answer, id, y[PAIR[id] + 3], y[PAIR[id] + 4], y[PAIR[id] + 5]);
    return null;
  }

  /** Simulated travel of the vehicles that have it; false where one does not come to rest. */
  private travel(inputs: readonly Float64Array[], k: number, state: ImpactState): boolean {
    return VEHICLE_IDS.every((id) => {
      const slots = this.problem.vehicles[id];
      if (slots.departure.kind !== 'spin') return true;
      const { x, y, heading } = this.leaving(inputs, k, state, id);
      const body = state[id];
      const road = roadUnder(inputs, k, slots, body, this.contact?.duration ?? 0);
      const rest = travelToRest(road, [x, y, heading, body.vx, body.vy, body.wMeasured], DRAW_ERROR);
      this.rest[id] = rest;
      return rest.outcome === 'rest';
    });
  }

  /** The simulated travels of the central values (row 0), which were solved last, for pictures and checks. */
  travels(inputs: readonly Float64Array[], state: ImpactState): Travels {
    const travels: Travels = {};
    const time = this.contact?.duration ?? 0;
    for (const id of VEHICLE_IDS) {
      const slots = this.problem.vehicles[id];
      if (slots.departure.kind !== 'spin' || this.rest[id]?.outcome !== 'rest') continue;
      const { vx, vy, wMeasured: w } = state[id];
      const from = this.leaving(inputs, 0, state, id);
      const road = roadUnder(inputs, 0, slots, state[id], time);
      travels[id] = travelPath(road, { time, from, separation: { vx, vy, w } }, DRAW_ERROR);
    }
    return travels;
  }

  /** Where a travel begins: at contact, or where a contact that lasts has left the vehicle. */
  private leaving(inputs: readonly Float64Array[], k: number, state: ImpactState, id: VehicleId): Pose {
    const at = PAIR[id];
    const y = this.contact?.y;
    if (y) return { x: y[at], y: y[at + 1], heading: y[at + 2] };
    return { x: state[id].x, y: state[id].y, heading: inputs[this.problem.vehicles[id].heading][k] };
  }

  /** Size of the contact impulse, N s. */
  impulse = (answer: ImpactAnswer): number =>
    this.contact ? hypot(this.contact.Jx, this.contact.Jy) : hypot(answer.Jn, answer.Jt);
}

function leave(state: ImpactState, answer: ImpactAnswer, id: VehicleId, vx: number, vy: number, w: number): void {
  Object.assign(state[id], { vx, vy, wMeasured: w });
  Object.assign(answer[id], { wAfter: w, wPredicted: w });
}
