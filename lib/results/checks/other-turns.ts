import { type VehicleId, VEHICLE_IDS } from '@/lib/casefile/schema';
import { hypot } from '@/lib/numerics/elementary';
import type { CheckContext, CheckRule } from './check';
import { figure, spoken } from './words';

const DEGREES_PER_RADIAN = 180 / Math.PI;

/** Separations of a vehicle that lead to the same rest pose and are not the one answered, in words. */
function othersOf({ casefile, solution }: CheckContext, id: VehicleId): string[] {
  const found = solution.central.spins[id];
  if (!found) return [];
  return [...found.separations.slice(1), ...found.otherTurns].map(({ separation: { vx, vy, w } }) => {
    const speed = spoken(casefile, hypot(vx, vy), 'speed', 1);
    return `${id} at ${speed} turning at ${figure(w * DEGREES_PER_RADIAN, 0)}°/s`;
  });
}

export const otherTurns: CheckRule = {
  id: 'otherTurns',
  source: 'contract of the model: every separation found that reproduces the rest pose is named',
  find(context) {
    const simulated = VEHICLE_IDS.filter((id) => context.solution.central.spins[id]);
    if (simulated.length === 0) return null;
    const others = simulated.flatMap((id) => othersOf(context, id));
    const paths = simulated.map((id) => `departure.${id}.rest.heading`);
    if (others.length === 0)
      return {
        level: 'pass',
        value: 0,
        limit: 0,
        says: 'No other separation was found that leads to the same rest pose, nor with a full turn more or less.',
        paths,
      };
    return {
      level: 'note',
      value: others.length,
      limit: 0,
      says: `The same rest pose also follows from ${others.join('; ')}. The answer takes the turn as written, and of several the one with the least kinetic energy.`,
      advice:
        'Say from tyre marks or witnesses which way and how far the vehicle turned; a full turn more is written as 360° more.',
      paths,
    };
  },
};
