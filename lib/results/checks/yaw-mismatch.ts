import type { VehicleId } from '@/lib/casefile/schema';
import { meanAndSd } from '@/lib/numerics/quantile';
import type { CheckContext, CheckRule } from './check';
import { figure } from './words';

const DEGREES_PER_RADIAN = 180 / Math.PI;
/** Allowed in any case, deg/s. */
const LEAST = 5;

/** Yaw rate that the impulse wants against the one stated, deg/s: after contact (directions) or before it (restitution). */
function mismatchOf({ casefile, solution }: CheckContext, id: VehicleId) {
  const { problem, central, values } = solution;
  const directions = problem.method === 'directions';
  const { departure } = problem.vehicles[id];
  if (directions && departure.kind === 'legs' && departure.yawRate === null) return null;
  const stated = directions ? `${id}.departureYawRate` : `${id}.approachYawRate`;
  const size = stated as `A.departureYawRate`;
  const toRate = DEGREES_PER_RADIAN;
  const before = casefile.approach[id].yawRate.value;
  const wanted = directions ? central.figures[`${id}.predictedYawRate`] * toRate : central.figures[size] * toRate;
  const given = directions ? central.figures[size] * toRate : before;
  const draws = directions ? difference(values[size], values[`${id}.predictedYawRate`]) : values[size];
  const spread = draws.length > 1 ? meanAndSd(draws).sd * toRate : 0;
  return { id, wanted, given, off: Math.abs(wanted - given), limit: LEAST + 2 * spread, directions };
}

function difference(a: Float64Array, b: Float64Array): Float64Array {
  const found = new Float64Array(a.length);
  for (let k = 0; k < a.length; k++) found[k] = a[k] - b[k];
  return found;
}

export const yawMismatch: CheckRule = {
  id: 'yawMismatch',
  source: 'screening value: 5 deg/s plus twice the spread of the difference over the draws',
  find(context) {
    const found = [mismatchOf(context, 'A'), mismatchOf(context, 'B')].filter((m) => m !== null);
    if (found.length === 0) return null;
    const { id, wanted, given, off, limit, directions } = found.sort((p, q) => q.off / q.limit - p.off / p.limit)[0];
    const bad = off > limit;
    const when = directions ? 'after contact' : 'before contact';
    const paths = directions
      ? [`departure.${id}.yawRate`, 'impact.point.x', 'impact.point.y']
      : [`approach.${id}.yawRate`, `departure.${id}.yawRate`];
    return {
      level: bad ? 'caution' : 'pass',
      value: off,
      limit,
      says: `The impulse wants vehicle ${id} to turn at ${figure(wanted, 0)}°/s ${when}; ${figure(given, 0)}°/s ${directions ? 'was measured' : 'is stated'}${bad ? ', further off than the spreads explain.' : ', within the spreads.'}`,
      advice: bad ? 'Look again at the contact point (the lever arm), the yaw rate and the yaw inertia.' : undefined,
      paths,
    };
  },
};
