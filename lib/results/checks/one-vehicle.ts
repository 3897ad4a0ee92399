import type { CheckRule } from './check';
import { damageGiven } from './damage-given';

export const oneVehicle: CheckRule = {
  id: 'oneVehicle',
  source:
    'screening value: damage of both vehicles wanted; a closing speed from one needs the balance of forces with the other',
  find({ casefile }) {
    const given = damageGiven(casefile);
    if (given.length === 0) return null;
    const value = given.length;
    if (value === 2) return { level: 'pass', value, limit: 2, says: 'The damage of both vehicles is given.' };
    const [{ id }] = given;
    const other = id === 'A' ? 'B' : 'A';
    return {
      level: 'caution',
      value,
      limit: 2,
      says: `Only the damage of ${id} is given: energy and closing speed from damage are lower limits.`,
      advice: `Measure the damage of ${other} too, even where it is slight.`,
      paths: [`damage.${other}`],
    };
  },
};
