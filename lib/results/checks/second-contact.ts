import type { VehicleId } from '@/lib/casefile/schema';
import { type Point, outlineOf, overlapDepth } from '@/lib/geometry/polygon';
import { type TimedPath, poseAt } from '@/lib/geometry/timed-path';
import { cos, sin } from '@/lib/numerics/elementary';
import type { CheckContext, CheckRule } from './check';
import { spoken } from './words';

/** Deeper than at separation by this, m. */
const DEEPER = 0.02;

/** The outline of a vehicle at a time, s, of its simulated travel; after its end it stands. */
function outlineAt({ casefile }: CheckContext, id: VehicleId, path: TimedPath, t: number): Point[] {
  const { x, y, heading } = poseAt(path, t);
  const vehicle = casefile.vehicles[id];
  const front = vehicle.frontAxleToMassCentre.value;
  return outlineOf({ ...vehicle, frontAxleToMassCentre: front }, [x, y], [cos(heading), sin(heading)]);
}

/** Both outlines along their simulated travel: where they overlap deeper than at separation, they touched again. */
export const secondContact: CheckRule = {
  id: 'secondContact',
  source: 'screening value: outlines 0.02 m deeper in each other than at separation',
  find(context) {
    const { A, B } = context.solution.central.travels;
    if (!A || !B) return null;
    const depthAt = (t: number): number => overlapDepth(outlineAt(context, 'A', A, t), outlineAt(context, 'B', B, t));
    const times = [...A.poses, ...B.poses].map(({ time }) => time).sort((p, q) => p - q);
    const atFirst = Math.max(0, depthAt(times[0]));
    const depths = times.map((t) => ({ t, deeper: depthAt(t) - atFirst }));
    const { t, deeper } = depths.reduce((most, one) => (one.deeper > most.deeper ? one : most));
    const again = deeper > DEEPER;
    return {
      level: again ? 'caution' : 'pass',
      value: Math.max(0, deeper),
      limit: DEEPER,
      says: again
        ? `Along their simulated travel the outlines meet again ${t.toFixed(2)} s after first touch, ${spoken(context.casefile, deeper, 'length', 2)} deeper than at separation: a second contact.`
        : 'Along their simulated travel the outlines do not meet again.',
      advice: again
        ? 'Look for marks of a second contact; the answer reckons with one contact only. Speed changes of several contacts are added as vectors, never as sizes.'
        : undefined,
      paths: ['departure.A.rest.heading', 'departure.B.rest.heading'],
    };
  },
};
