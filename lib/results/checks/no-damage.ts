import type { CheckRule } from './check';
import { damageGiven, idsOf, mostWithoutDepth } from './damage-given';
import { spoken } from './words';

export const noDamage: CheckRule = {
  id: 'noDamage',
  source:
    'contract of the model: no depth is an upper limit; bumper ratings are no damage threshold (SAE 2016-01-1473)',
  find({ casefile }) {
    const given = damageGiven(casefile);
    if (given.length === 0) return null;
    const spared = given.filter(({ crushed }) => !crushed);
    const depths = (list: typeof given): string[] => list.map(({ id }) => `damage.${id}.depths`);
    if (spared.length === 0)
      return {
        level: 'pass',
        value: 0,
        limit: 0,
        says: `Residual depth is given for ${idsOf(given)}.`,
        paths: depths(given),
      };
    const most = spared.reduce((sum, { damage }) => sum + mostWithoutDepth(damage), 0);
    return {
      level: 'caution',
      value: spared.length,
      limit: 0,
      says: `No depth remained on ${idsOf(spared)}: that bounds the energy from above (at most ${spoken(casefile, most, 'energy', 1)}) and gives no estimate.`,
      advice: 'Do not read a speed out of missing damage; look behind the bumper cover, and say how it was looked at.',
      paths: depths(spared),
    };
  },
};
