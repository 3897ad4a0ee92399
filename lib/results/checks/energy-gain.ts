import type { CheckRule } from './check';
import { spoken } from './words';

export const energyGain: CheckRule = {
  id: 'energyGain',
  source: 'conservation of energy: a contact cannot give kinetic energy',
  find({ casefile, central, solution }) {
    const lost = central.energyLost;
    if (lost === undefined) return null;
    const gained = lost < -1e-9 * Math.abs(solution.central.answer.closingEnergy);
    const figure = spoken(casefile, Math.abs(lost), 'energy', 1);
    return {
      level: gained ? 'fail' : 'pass',
      value: lost,
      limit: 0,
      says: gained
        ? `The contact would have given ${figure} of kinetic energy; that cannot be.`
        : `The contact lost ${figure} of kinetic energy.`,
      advice: gained ? 'Look again at the travel after contact, the masses and the restitution.' : undefined,
    };
  },
};
