import type { VehicleId } from '@/lib/casefile/schema';
import type { DamageSlots, LegsSlots, Problem, VehicleSlots } from '@/lib/evidence/problem';
import { atan2, cos, hypot, sin } from '@/lib/numerics/elementary';
import { fillBlock } from '@/lib/numerics/spread';
import {
  type ImpactAnswer,
  type ImpactState,
  REASONS,
  type Reason,
  type VehicleAnswer,
  type VehicleState,
  emptyAnswer,
  emptyState,
  solveDirections,
  solveRestitution,
} from '@/lib/mechanics/impact-backwards';
import { closingSpeedFromWork, obliqueFactor, stripWork } from '@/lib/mechanics/crush';
import { estimatedYawInertia } from '@/lib/mechanics/inertia';
import { meanAcceleration } from '@/lib/mechanics/pulse';
import { legStartSpeedSquared } from '@/lib/mechanics/legs';
import type { Travels } from '@/lib/geometry/timed-path';
import { Forward } from './forward';
import { LastingDirections } from './lasting-directions';
import {
  type Departing,
  DRAW_ERROR,
  type Met,
  carriedOn,
  isNear,
  separateDraw,
  shifted,
  targetOf,
} from './spin-travel';
import { type VehicleColumns, type Columns, makeColumns } from './columns';

/** Draws are made and solved in blocks of this many; draw k of an input depends on (seed, path, k) alone. */
export const BLOCK = 1024;

/** Steps through a contact that lasts: of a draw, and of the central answer. */
const DRAW_STEPS = 12;
export const CENTRAL_STEPS = 400;

/** A speed below this has no direction, m/s. */
const STANDING = 1e-9;

const LEG = 1 + REASONS.indexOf('leg');
const NO_REST = 1 + REASONS.indexOf('noRest');

/** Separation velocities and yaw rates of a block, SI; `lost` as in Kernel.reasons. */
interface Travelled {
  vx: Float64Array;
  vy: Float64Array;
  w: Float64Array;
  lost: Uint8Array;
}
const freshTravel = (): Travelled => ({
  vx: new Float64Array(BLOCK),
  vy: new Float64Array(BLOCK),
  w: new Float64Array(BLOCK),
  lost: new Uint8Array(BLOCK),
});

/**
 * The one kernel: solves a block of draws, structure of arrays, nothing allocated per draw. The central answer is a
 * block of one. Columns are SI and radians; a value that does not exist is NaN there and is left out of the result.
 */
export class Kernel {
  readonly columns: Columns;
  /** Of the last solved block: 0, or 1 + index into REASONS. */
  readonly reasons = new Uint8Array(BLOCK);
  /** The records of the draw solved last: of the central one, for the worked figures. */
  readonly state: ImpactState = emptyState();
  readonly answer: ImpactAnswer = emptyAnswer();
  readonly inputs: Float64Array[];
  private readonly own: Record<VehicleId, Travelled> = { A: freshTravel(), B: freshTravel() };
  private travelled = { ...this.own };
  /** The separation of simulated travel that was found last. */
  private met: Record<VehicleId, Met | null> = { A: null, B: null };
  private kept: Record<VehicleId, boolean> = { A: false, B: false };

  /** The contact that lasts, where the problem has one: the records of the draw solved last. */
  readonly lasting: LastingDirections | null;

  /** The forward model, where the problem is a fit. */
  readonly forward: Forward | null;

  /** `steps`: of a contact that lasts, at least. */
  constructor(
    readonly problem: Problem,
    steps = DRAW_STEPS,
  ) {
    this.forward = problem.fit && new Forward(problem, problem.fit);
    this.lasting = problem.lasting && !problem.fit ? new LastingDirections(problem, problem.lasting, steps) : null;
    this.inputs = problem.inputs.map((input) => new Float64Array(BLOCK).fill(input.value));
    this.columns = makeColumns(BLOCK);
  }

  /** Draws a block of every uncertain input. `tag` names another, independent set of streams. */
  draw(block: number, count: number, tag = ''): void {
    this.problem.inputs.forEach((_, slot) => this.drawInput(slot, block, count, tag));
  }

  /** Draws a block of one input. */
  drawInput(slot: number, block: number, count: number, tag = ''): void {
    const input = this.problem.inputs[slot];
    if (input.spread.shape === 'fixed') return;
    fillBlock(this.inputs[slot], count, input, this.problem.seed, input.path + tag, block);
  }

  /** Solves every input at its value; returns why it is impossible, or null. The figures are in row 0 and in the records. */
  solveCentral(): Reason | null {
    this.problem.inputs.forEach((input, slot) => (this.inputs[slot][0] = input.value));
    this.solve(1);
    return this.reasonOf(0);
  }

  /** Takes the separation velocities of a vehicle from another kernel's last block, instead of finding them anew. */
  keepTravel(id: VehicleId, from: Kernel): void {
    this.travelled[id] = from.travelled[id];
    this.kept[id] = true;
  }

  /** Finds the separation velocities of both vehicles anew again. */
  forgetTravel(): void {
    this.travelled = { ...this.own };
    this.kept = { A: false, B: false };
  }

  /** Solves the draws from .. to - 1 of the block. */
  solve(to: number, from = 0): void {
    for (let k = from; k < to; k++) this.solveDraw(k);
  }

  reasonOf(k: number): Reason | null {
    return this.reasons[k] === 0 ? null : REASONS[this.reasons[k] - 1];
  }

  /** The simulated travels of the draw solved last, by the forward model. */
  forwardTravels(): Travels {
    return this.forward?.travels(this.inputs, this.state) ?? {};
  }

  private solveDraw(k: number): void {
    const { problem, state } = this;
    const { A, B } = problem.vehicles;
    const lost = this.loadVehicle(k, 'A', A, state.A) || this.loadVehicle(k, 'B', B, state.B);
    if (lost !== 0) {
      this.reasons[k] = lost;
      return;
    }
    state.px = this.inputs[problem.pointX][k];
    state.py = this.inputs[problem.pointY][k];
    state.plane = this.inputs[problem.plane][k];
    const reason = this.solveContact(k);
    this.reasons[k] = reason === null ? 0 : 1 + REASONS.indexOf(reason);
    this.write(k);
  }

  private solveContact(k: number): Reason | null {
    const { problem, state, answer, inputs } = this;
    if (this.forward) return this.forward.solve(inputs, k, state, answer);
    if (problem.restitution !== null && problem.impulseRatio !== null) {
      state.e = inputs[problem.restitution][k];
      state.mu = inputs[problem.impulseRatio][k];
      return solveRestitution(state, answer);
    }
    if (!this.lasting) return solveDirections(state, answer);
    return this.lasting.solve(inputs, k, state, answer, (id, departing) => this.separateAgain(k, id, departing));
  }

  /** Finds the separation of a vehicle whose travel is simulated. */
  private separate(k: number, id: VehicleId, departing: Departing): boolean {
    const slots = this.problem.vehicles[id];
    if (slots.departure.kind !== 'spin') return true;
    const body = this.state[id];
    const target = targetOf(this.inputs, k, slots, slots.departure, body, departing, DRAW_ERROR);
    const met = separateDraw(target, slots.departure, body);
    this.met[id] = { target, vx: body.vx, vy: body.vy, w: body.wMeasured };
    return met;
  }

  /** The same for travel that begins elsewhere: shifted from the one found last while it is near, else found anew. */
  private separateAgain(k: number, id: VehicleId, departing: Departing): boolean {
    const { departure } = this.problem.vehicles[id];
    const found = this.met[id];
    if (!found || departure.kind !== 'spin' || !departure.start) return false;
    if (!isNear(found.target.from, departing.from)) return this.separate(k, id, departing);
    const body = this.state[id];
    [body.vx, body.vy, body.wMeasured] = shifted(found, departing.from, departure.start);
    return true;
  }

  /** Where and when the simulated travel of a draw begins: at first touch, or where a contact that lasts is thought to end. */
  private departing(k: number, { x, y, heading, departure }: VehicleSlots): Departing {
    const { inputs } = this;
    const pose = { x: inputs[x][k], y: inputs[y][k], heading: inputs[heading][k] };
    const carried = departure.kind === 'spin' ? departure.start?.carried : undefined;
    const { lasting } = this.problem;
    if (!lasting || !carried) return { from: pose, elapsed: 0 };
    return { from: carriedOn(pose, carried), elapsed: inputs[lasting.pulse][k] };
  }

  /** All that is known of one vehicle. Answers why its travel cannot have been, as in `reasons`, or 0. */
  private loadVehicle(k: number, id: VehicleId, slots: VehicleSlots, vehicle: VehicleState): number {
    const { inputs } = this;
    this.loadBody(k, slots, vehicle);
    if (slots.approachDirection !== null) {
      const direction = inputs[slots.approachDirection][k];
      vehicle.hx = cos(direction);
      vehicle.hy = sin(direction);
    }
    vehicle.wBefore = slots.approachYawRate === null ? 0 : inputs[slots.approachYawRate][k];
    if (this.forward) return 0;
    const travelled = this.travelled[id];
    if (!this.kept[id]) this.findTravel(k, id, vehicle, travelled);
    vehicle.vx = travelled.vx[k];
    vehicle.vy = travelled.vy[k];
    vehicle.wMeasured = travelled.w[k];
    return travelled.lost[k];
  }

  private findTravel(k: number, id: VehicleId, vehicle: VehicleState, to: Travelled): void {
    const slots = this.problem.vehicles[id];
    if (slots.departure.kind === 'legs') to.lost[k] = this.loadLegs(k, slots.departure, vehicle);
    else if (slots.departure.kind === 'spin') {
      const departing = this.departing(k, slots);
      to.lost[k] = this.separate(k, id, departing) ? 0 : NO_REST;
    }
    to.vx[k] = vehicle.vx;
    to.vy[k] = vehicle.vy;
    to.w[k] = vehicle.wMeasured;
  }

  /** Mass, yaw inertia and place of one vehicle. */
  loadBody(k: number, slots: VehicleSlots, vehicle: VehicleState): VehicleState {
    const { inputs } = this;
    const front = inputs[slots.frontAxleToMassCentre][k];
    const inertia = inputs[slots.yawInertia][k];
    vehicle.m = inputs[slots.mass][k];
    vehicle.I = slots.inertiaEstimated
      ? inertia * estimatedYawInertia(vehicle.m, front, slots.wheelbase - front)
      : inertia;
    vehicle.x = inputs[slots.x][k];
    vehicle.y = inputs[slots.y][k];
    return vehicle;
  }

  /** Separation velocity from legs. Not 0 where one has no real speed at its start. */
  private loadLegs(k: number, { legs, endSpeed, direction, yawRate }: LegsSlots, vehicle: VehicleState): number {
    const { inputs } = this;
    vehicle.wMeasured = yawRate === null ? NaN : inputs[yawRate][k];
    let squared = inputs[endSpeed][k] * inputs[endSpeed][k];
    for (let i = legs.length - 1; i >= 0; i--) {
      const leg = legs[i];
      squared = legStartSpeedSquared(
        squared,
        inputs[leg.distance][k],
        inputs[leg.friction][k],
        inputs[leg.share][k],
        inputs[leg.grade][k],
      );
      if (!(squared >= 0)) return LEG;
    }
    const speed = Math.sqrt(squared);
    vehicle.vx = speed * cos(inputs[direction][k]);
    vehicle.vy = speed * sin(inputs[direction][k]);
    return 0;
  }

  private write(k: number): void {
    const { answer, columns, problem, state, inputs } = this;
    const stated = problem.pulse === null ? NaN : inputs[problem.pulse][k];
    const pulse = this.forward?.contact?.duration ?? stated;
    const { A, B } = problem.vehicles;
    this.writeVehicle(k, columns.A, A, state.A, answer.A, pulse);
    this.writeVehicle(k, columns.B, B, state.B, answer.B, pulse);
    columns.closingSpeed[k] = answer.un;
    columns.slidingSpeed[k] = answer.ut;
    columns.restitution[k] = answer.e;
    columns.impulseRatio[k] = answer.mu;
    columns.impulse[k] = this.forward ? this.forward.impulse(answer) : hypot(answer.Jn, answer.Jt);
    columns.energyLost[k] = answer.energyLost;
    if (A.damage !== null || B.damage !== null) this.writeDamage(k);
  }

  /** Crush energies, and the closing speed that the normal work of what is stated stands for. */
  private writeDamage(k: number): void {
    const { columns, answer, inputs } = this;
    const { A, B } = this.problem.vehicles;
    let work = 0;
    for (const [slots, to] of [
      [A.damage, columns.A],
      [B.damage, columns.B],
    ] as const) {
      if (slots === null) continue;
      const normal = this.normalWork(k, slots);
      to.damageEnergy[k] = normal * obliqueFactor(cos(inputs[slots.forceAngle][k]));
      work += normal;
    }
    const { Knn, Knt } = answer.frame;
    columns.damageClosingSpeed[k] = closingSpeedFromWork(work, Knn, Knt, answer.e, answer.mu);
  }

  private normalWork(k: number, { depths, strips, width, a, b }: DamageSlots): number {
    const { inputs } = this;
    let work = 0;
    for (let i = 0; i < strips.length; i++)
      work += stripWork(
        strips[i] * inputs[width][k],
        inputs[depths[i]][k],
        inputs[depths[i + 1]][k],
        inputs[a][k],
        inputs[b][k],
      );
    return work;
  }

  private writeVehicle(
    k: number,
    to: VehicleColumns,
    slots: VehicleSlots,
    vehicle: VehicleState,
    found: VehicleAnswer,
    pulse: number,
  ): void {
    const { inputs } = this;
    const heading = inputs[slots.heading][k];
    const [cosH, sinH] = [cos(heading), sin(heading)];
    const dx = vehicle.vx - found.vx;
    const dy = vehicle.vy - found.vy;
    const forward = dx * cosH + dy * sinH;
    const left = dy * cosH - dx * sinH;
    const deltaV = hypot(dx, dy);
    const after = hypot(vehicle.vx, vehicle.vy);
    to.approachSpeed[k] = found.speed;
    to.approachDirection[k] =
      slots.approachDirection === null
        ? directionOf(found.vx, found.vy, found.speed)
        : inputs[slots.approachDirection][k];
    to.approachYawRate[k] = found.wBefore;
    to.departureSpeed[k] = after;
    to.departureDirection[k] =
      slots.departure.kind === 'legs' && after > STANDING
        ? inputs[slots.departure.direction][k]
        : directionOf(vehicle.vx, vehicle.vy, after);
    to.departureYawRate[k] = found.wAfter;
    to.deltaV[k] = deltaV;
    to.deltaVForward[k] = forward;
    to.deltaVLeft[k] = left;
    to.deltaVDirection[k] = directionOf(forward, left, deltaV);
    to.meanAcceleration[k] = meanAcceleration(deltaV, pulse);
    to.predictedYawRate[k] = found.wPredicted;
    to.yawRateChange[k] = found.wAfter - found.wBefore;
  }
}

const directionOf = (x: number, y: number, size: number): number => (size > STANDING ? atan2(y, x) : NaN);
