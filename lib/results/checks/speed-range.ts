import type { CheckRule } from './check';
import { spoken } from './words';

const LOW = 0.5;
const HIGH = 10;

export const speedRange: CheckRule = {
  id: 'speedRange',
  source:
    'screening value: normal closing speed 0.5 to 10 m/s, the range that the restitution and contact-time figures come from',
  find({ casefile, central }) {
    const value = central.closingSpeed;
    if (value === undefined || value <= 0) return null;
    const inside = value >= LOW && value <= HIGH;
    const range = `${spoken(casefile, LOW, 'speed', 0)} to ${spoken(casefile, HIGH, 'speed', 0)}`;
    return {
      level: inside ? 'pass' : 'caution',
      value,
      limit: value < LOW ? LOW : HIGH,
      says: `The closing speed along the normal, ${spoken(casefile, value, 'speed', 1)}, is ${inside ? 'inside' : 'outside'} the range the model is meant for (${range}).`,
      advice: inside
        ? undefined
        : 'Outside it the usual ranges of restitution, contact time and friction are unsupported: support yours from elsewhere.',
    };
  },
};
