import { VEHICLE_IDS } from '@/lib/casefile/schema';
import type { CheckRule } from './check';

/** Beyond this the simulated travel would not reproduce the rest pose, m (a turn at one metre per radian). */
const LIMIT = 0.01;

/** Says how well the rest pose is met. A pose that no separation leads to is refused before any check is asked. */
export const restPose: CheckRule = {
  id: 'restPose',
  source: 'screening value: 0.01 m, well below what a survey of a rest position can tell',
  find({ solution }) {
    const { spins } = solution.central;
    const misses = VEHICLE_IDS.flatMap((id) => {
      const best = spins[id]?.separations[0];
      return best ? [{ id, miss: best.miss }] : [];
    });
    if (misses.length === 0) return null;
    const value = Math.max(...misses.map(({ miss }) => miss));
    return {
      level: value > LIMIT ? 'fail' : 'pass',
      value,
      limit: LIMIT,
      says: `The simulated travel meets the measured rest pose of ${misses.map((m) => m.id).join(' and ')} to within ${(1000 * value).toFixed(2)} mm.`,
      paths: misses.map((m) => `departure.${m.id}.rest.heading`),
    };
  },
};
