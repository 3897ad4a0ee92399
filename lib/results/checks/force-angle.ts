import { atan2 } from '@/lib/numerics/elementary';
import type { CheckRule } from './check';
import { damageGiven } from './damage-given';

/** Degrees. */
const LIMIT = 15;
const DEGREES_PER_RADIAN = 180 / Math.PI;

export const forceAngle: CheckRule = {
  id: 'forceAngle',
  source: 'screening value: directions of force from damage and from the impulse within 15 deg',
  find({ casefile, central }) {
    if (central.impulseRatio === undefined) return null;
    const impulse = atan2(Math.abs(central.impulseRatio), 1) * DEGREES_PER_RADIAN;
    const worst = damageGiven(casefile)
      .map(({ id, damage }) => ({ id, angle: Math.abs(damage.forceAngle.value) }))
      .sort((p, q) => Math.abs(q.angle - impulse) - Math.abs(p.angle - impulse))[0];
    if (!worst) return null;
    const { id, angle } = worst;
    const value = Math.abs(angle - impulse);
    const bad = value > LIMIT;
    return {
      level: bad ? 'caution' : 'pass',
      value,
      limit: LIMIT,
      says: `The force on the damage of ${id} is put at ${angle.toFixed(0)}° off the normal, the impulse lies ${impulse.toFixed(0)}° off the normal of the contact.`,
      advice: bad
        ? 'Force and counterforce lie on one line: look again at the contact plane and at the direction of crush.'
        : undefined,
      paths: [`damage.${id}.forceAngle`, 'impact.plane'],
    };
  },
};
