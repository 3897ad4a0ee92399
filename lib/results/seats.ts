import type { VehicleId } from '@/lib/casefile/schema';
import { seatDeltaV } from '@/lib/mechanics/seat';
import { summarise } from '@/lib/numerics/quantile';
import { hypot } from '@/lib/numerics/elementary';
import type { Solution } from '@/lib/solve/solution';
import type { SeatResult } from './result';

/** Delta-V at each seat of a vehicle: rigid-vehicle kinematics, m/s in vehicle axes; not the motion of an occupant. */
export function seatResults(solution: Solution, id: VehicleId, coverage: number): SeatResult[] {
  return solution.problem.seats[id].map((seat) => {
    const { figures } = solution.central;
    const central = seatDeltaV(
      figures[`${id}.deltaVForward`],
      figures[`${id}.deltaVLeft`],
      figures[`${id}.yawRateChange`],
      seat,
    );
    return {
      name: seat.name,
      central: Number.isFinite(central.forward) ? named(central.forward, central.left) : {},
      bands: seatBands(solution, id, seat, coverage),
    };
  });
}

const named = (forward: number, left: number) => ({
  deltaV: hypot(forward, left),
  deltaVForward: forward,
  deltaVLeft: left,
});

function seatBands(
  solution: Solution,
  id: VehicleId,
  seat: { x: number; y: number },
  coverage: number,
): SeatResult['bands'] {
  const { values } = solution;
  const n = values[`${id}.deltaVForward`].length;
  if (n === 0) return {};
  const [size, forward, left] = [new Float64Array(n), new Float64Array(n), new Float64Array(n)];
  for (let k = 0; k < n; k++) {
    const at = seatDeltaV(
      values[`${id}.deltaVForward`][k],
      values[`${id}.deltaVLeft`][k],
      values[`${id}.yawRateChange`][k],
      seat,
    );
    forward[k] = at.forward;
    left[k] = at.left;
    size[k] = hypot(at.forward, at.left);
  }
  return {
    deltaV: summarise(size, coverage),
    deltaVForward: summarise(forward, coverage),
    deltaVLeft: summarise(left, coverage),
  };
}
