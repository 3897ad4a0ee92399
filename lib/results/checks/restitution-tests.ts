import type { CheckRule } from './check';
import { spoken } from './words';

const [LOW, HIGH] = [0.1, 0.6];
/** Closing speeds that the comparison is meant for, m/s. */
const [SLOW, FAST] = [0.5, 6];

export const restitutionTests: CheckRule = {
  id: 'restitutionTests',
  source: 'screening value 0.1 to 0.6; staged tests gave about 0.2 to 0.4 at speed changes of 2 to 5 mph (SAE 931842)',
  find({ casefile, central }) {
    const [value, closing] = [central.restitution, central.closingSpeed];
    if (value === undefined || closing === undefined || closing < SLOW || closing > FAST) return null;
    const outside = value < LOW || value > HIGH;
    return {
      level: outside ? 'note' : 'pass',
      value,
      limit: value < LOW ? LOW : HIGH,
      says: `A restitution of ${value.toFixed(2)} at a closing speed of ${spoken(casefile, closing, 'speed', 1)} lies ${outside ? 'outside' : 'within'} what bumper contacts in staged tests suggest (${LOW} to ${HIGH}).`,
      advice: outside
        ? 'Say what makes this contact different from a bumper contact, or look again at what the restitution follows from.'
        : undefined,
      paths: ['impact.restitution'],
    };
  },
};
