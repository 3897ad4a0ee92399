import type { CheckRule } from './check';
import { spoken } from './words';

export const closing: CheckRule = {
  id: 'closing',
  source: 'an impact needs the contact point to close (contract of the model)',
  find({ casefile, central }) {
    const speed = central.closingSpeed;
    if (speed === undefined) return null;
    const figure = spoken(casefile, Math.abs(speed), 'speed', 1);
    if (speed > 0)
      return { level: 'pass', value: speed, limit: 0, says: `The vehicles close at ${figure} along the normal.` };
    return {
      level: 'fail',
      value: speed,
      limit: 0,
      says: `The vehicles would be moving apart at ${figure} along the normal when they touch.`,
      advice:
        'Look again at the directions of approach and the contact plane, and whether A and B are on the right sides.',
      paths: ['impact.plane', 'approach.A.direction', 'approach.B.direction'],
    };
  },
};
