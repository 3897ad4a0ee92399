import type { LegsDeparture, VehicleId } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import { legStartSpeedSquared } from '@/lib/mechanics/legs';
import { type CheckContext, type CheckRule } from './check';
import { percent } from './words';

const SHARE = 0.05;
/** Degrees turned on the way to rest. */
const TURNED = 10;
const DEGREES_PER_RADIAN = 180 / Math.PI;

/** Time that the legs take, s: each slows evenly. */
function timeOf({ legs, endSpeed }: LegsDeparture): number {
  let [time, end] = [0, endSpeed.value];
  for (const leg of legs.toReversed()) {
    const { distance, friction, share, grade } = leg;
    const squared = legStartSpeedSquared(end * end, distance.value, friction.value, share.value, grade.value);
    const start = Math.sqrt(Math.max(0, squared));
    if (distance.value > 0 && start + end > 0) time += (2 * distance.value) / (start + end);
    end = start;
  }
  return time;
}

/** Rotation that the impulse predicts for a vehicle whose yaw rate after contact is neither measured nor simulated. */
function rotationOf({ casefile, solution }: CheckContext, id: VehicleId) {
  const departure = casefile.departure[id];
  if (departure?.kind !== 'legs' || departure.yawRate) return [];
  const { m, I, vx, vy } = solution.central.state[id];
  const w = solution.central.answer[id].wPredicted;
  if (!Number.isFinite(w)) return [];
  const [turning, going] = [I * w * w, m * (vx * vx + vy * vy)];
  const share = turning + going > 0 ? turning / (turning + going) : 0;
  const turned = (Math.abs(w) * timeOf(departure) * DEGREES_PER_RADIAN) / 2;
  return [{ id, share, turned, worst: Math.max(share / SHARE, turned / TURNED) }];
}

export const rotation: CheckRule = {
  id: 'rotation',
  source:
    'screening value 5 % of the energy; angular momentum is needed beyond about 10 deg of turn (National Academy of Forensic Engineers Journal, 1995)',
  find(context) {
    const found = VEHICLE_IDS.flatMap((id) => rotationOf(context, id)).sort((p, q) => q.worst - p.worst)[0];
    if (!found) return null;
    const { id, share, turned } = found;
    const bad = share > SHARE || turned > TURNED;
    const byTurn = turned / TURNED > share / SHARE;
    return {
      level: bad ? 'caution' : 'pass',
      value: byTurn ? turned : share,
      limit: byTurn ? TURNED : SHARE,
      says: `The impulse leaves ${percent(share)} of the energy of ${id} after contact in its rotation, and would turn it by about ${turned.toFixed(0)}° on the way to rest; its yaw rate was not measured.`,
      advice: bad
        ? `Enter the yaw rate of ${id} after contact from its marks, or simulate its travel to a measured rest pose.`
        : undefined,
      paths: [`departure.${id}.yawRate`],
    };
  },
};
