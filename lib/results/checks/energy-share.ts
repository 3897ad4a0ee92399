import { type CheckRule, levelAbove } from './check';
import { percent } from './words';

const CAUTION = 1;

export const energyShare: CheckRule = {
  id: 'energyShare',
  source: 'conservation of energy: a contact can take no more than the closing energy (contract of the model)',
  find({ solution }) {
    const { energyLost, closingEnergy } = solution.central.answer;
    const value = energyLost / closingEnergy;
    if (!Number.isFinite(value) || closingEnergy <= 0) return null;
    const level = levelAbove(value, { caution: CAUTION });
    return {
      level,
      value,
      limit: CAUTION,
      says: `The energy lost is ${percent(value)} of what the contact could take at most${level === 'pass' ? '.' : '; more than all of it cannot be lost.'}`,
      advice:
        level === 'pass'
          ? undefined
          : 'The yaw rates after contact do not belong to this impulse: look again at them and at the contact point.',
      paths: ['departure.A.yawRate', 'departure.B.yawRate', 'impact.point.x', 'impact.point.y'],
    };
  },
};
