import { type VehicleId, VEHICLE_IDS } from '@/lib/casefile/schema';
import { seatDeltaV } from '@/lib/mechanics/seat';
import { hypot } from '@/lib/numerics/elementary';
import type { CheckContext, CheckRule } from './check';
import { figure, percent } from './words';

const DEGREES_PER_RADIAN = 180 / Math.PI;
/** How far the contact point is moved along the plane, m. */
const MOVED = 0.1;
const SEAT = 0.1;

/** The impulse stays; only its lever arm moves, so the yaw rate changes by Jn times the shift over the inertia. */
function movedBy({ solution: { central } }: CheckContext, id: VehicleId) {
  const found = central.answer[id];
  return { change: found.wPredicted - found.wBefore, by: Math.abs((central.answer.Jn * MOVED) / central.state[id].I) };
}

/** The largest share by which delta-V at a seat of the vehicle moves. */
function seatShare({ solution: { central, problem } }: CheckContext, id: VehicleId, by: number): number {
  const forward = central.figures[`${id}.deltaVForward`];
  const left = central.figures[`${id}.deltaVLeft`];
  const turn = central.figures[`${id}.yawRateChange`];
  const size = (change: number, seat: { x: number; y: number }): number => {
    const at = seatDeltaV(forward, left, change, seat);
    return hypot(at.forward, at.left);
  };
  const shares = problem.seats[id].flatMap((seat) => {
    const now = size(turn, seat);
    return [turn + by, turn - by].map((change) => Math.abs(size(change, seat) - now) / now);
  });
  return Math.max(0, ...shares.filter(Number.isFinite));
}

function leverOf(context: CheckContext, id: VehicleId) {
  const { change, by } = movedBy(context, id);
  return { id, change, by, turns: Math.abs(change) < by * (1 - 1e-9), seats: seatShare(context, id, by) };
}

export const leverArm: CheckRule = {
  id: 'leverArm',
  source: 'screening value: contact point moved 0.10 m along the plane; seat delta-V moved by more than 10 %',
  find(context) {
    if (!Number.isFinite(context.solution.central.answer.Jn)) return null;
    const both = VEHICLE_IDS.map((id) => leverOf(context, id));
    const seats = both.toSorted((p, q) => q.seats - p.seats)[0];
    const turning = both.filter(({ turns }) => turns);
    const bad = turning.length > 0 || seats.seats > SEAT;
    const least = both.toSorted((p, q) => Math.abs(p.change) / p.by - Math.abs(q.change) / q.by)[0];
    const rate = (w: number): string => `${figure(w * DEGREES_PER_RADIAN, 0)}°/s`;
    const turn =
      turning.length > 0
        ? `which way the impulse turns ${turning.map(({ id }) => id).join(' and ')} is open`
        : 'the sense of both turns stays';
    const seat = seats.seats > 0 ? `, and delta-V at a seat of ${seats.id} moves by up to ${percent(seats.seats)}` : '';
    return {
      level: bad ? 'caution' : 'pass',
      value: turning.length > 0 ? Math.abs(least.change) / least.by : seats.seats,
      limit: turning.length > 0 ? 1 : SEAT,
      says: `With the contact point moved by 0.10 m along the plane ${turn} (the impulse changes the yaw rate of ${least.id} by ${rate(least.change)}, the shift by ${rate(least.by)})${seat}.`,
      advice: bad
        ? 'The centre of the contact is a convenience, not a measured point: give it the spread it deserves, or measure the yaw rates after contact.'
        : undefined,
      paths: ['impact.point.x', 'impact.point.y'],
    };
  },
};
