import type { VehicleId } from '@/lib/casefile/schema';
import { distanceOutside } from '@/lib/geometry/polygon';
import type { CheckContext, CheckRule } from './check';
import { combined, outlineAtContact } from './drawn';
import { spoken } from './words';

/** Allowed without any stated spread, m: what bodywork bends and bulges. */
const LEAST = 0.05;

function outside(context: CheckContext, id: VehicleId) {
  const { impact } = context.casefile;
  const { point } = impact;
  const distance = distanceOutside([point.x.value, point.y.value], outlineAtContact(context, id));
  const limit = LEAST + 2 * combined(point.x, point.y, impact[id].x, impact[id].y);
  return { id, distance, limit };
}

export const contactPoint: CheckRule = {
  id: 'contactPoint',
  source: 'screening value: 0.05 m plus twice the stated spread of the positions',
  find(context) {
    const worst = [outside(context, 'A'), outside(context, 'B')].sort(
      (p, q) => q.distance - q.limit - (p.distance - p.limit),
    )[0];
    const { id, distance, limit } = worst;
    const bad = distance > limit;
    const figure = spoken(context.casefile, Math.max(0, distance), 'length', 2);
    return {
      level: bad ? 'caution' : 'pass',
      value: distance,
      limit,
      says: bad
        ? `The contact point lies ${figure} outside the outline of vehicle ${id}, more than the stated spread allows.`
        : 'The contact point lies on or inside both outlines, within the stated spread.',
      advice: bad ? `Move the contact point onto the damage of both vehicles, or move vehicle ${id}.` : undefined,
      paths: ['impact.point.x', 'impact.point.y', `impact.${id}.x`, `impact.${id}.y`],
    };
  },
};
