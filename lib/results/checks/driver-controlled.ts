import { type VehicleId, VEHICLE_IDS } from '@/lib/casefile/schema';
import { atan2, hypot } from '@/lib/numerics/elementary';
import type { TimedPose } from '@/lib/geometry/timed-path';
import type { CheckContext, CheckRule } from './check';
import { spoken } from './words';

const RATIO = 1.05;
/** Degrees between the heading at rest and the way there, on a way longer than this, m. */
const ALIGNED = 3;
const LONG = 10;
const DEGREES_PER_RADIAN = 180 / Math.PI;

/** Degrees between the heading at rest and the straight way from contact to rest, either way round. */
function offPath({ casefile }: CheckContext, id: VehicleId): number {
  const departure = casefile.departure[id];
  if (departure?.kind !== 'spin') return Infinity;
  const { rest } = departure;
  const { x, y, heading } = casefile.impact[id];
  const way = atan2((rest.y?.value ?? NaN) - y.value, (rest.x?.value ?? NaN) - x.value) * DEGREES_PER_RADIAN;
  const off = (rest.heading?.value ?? heading.value) - way;
  return Math.abs(off - 180 * Math.round(off / 180));
}

const wayBetween = (from: TimedPose, to: TimedPose): number => hypot(to.x - from.x, to.y - from.y);

function travelOf(context: CheckContext, id: VehicleId) {
  const moments = context.solution.central.travels[id]?.poses ?? [];
  if (moments.length === 0) return [];
  const path = moments.slice(1).reduce((sum, to, i) => sum + wayBetween(moments[i], to), 0);
  const chord = wayBetween(moments[0], moments[moments.length - 1]);
  if (chord === 0) return [];
  const off = offPath(context, id);
  const aligned = path > LONG && off < ALIGNED;
  return [{ id, path, chord, off, aligned, ratio: path / chord, bad: aligned || path / chord > RATIO }];
}

export const driverControlled: CheckRule = {
  id: 'driverControlled',
  source: 'screening value: path over straight way above 1.05, or heading at rest within 3 deg of the way after 10 m',
  find(context) {
    const all = VEHICLE_IDS.flatMap((id) => travelOf(context, id));
    const worst = all.sort((p, q) => Number(q.bad) - Number(p.bad) || q.ratio - p.ratio)[0];
    if (!worst) return null;
    const { id, path, off, aligned, ratio, bad } = worst;
    const byHeading = aligned && ratio <= RATIO;
    return {
      level: bad ? 'caution' : 'pass',
      value: byHeading ? off : ratio,
      limit: byHeading ? ALIGNED : RATIO,
      says: `Vehicle ${id} runs ${spoken(context.casefile, path, 'length', 1)} to its rest pose, ${ratio.toFixed(3)} times the straight way, and comes to stand ${off.toFixed(0)}° off that way.`,
      advice: bad
        ? 'Ask whether the driver steered or braked after contact: the rest pose is then where the driver chose, and only bounds the speed.'
        : undefined,
      paths: [`departure.${id}.rest.x`, `departure.${id}.rest.heading`],
    };
  },
};
