import type { CheckContext, CheckRule, Finding } from './check';
import { damageGiven, idsOf } from './damage-given';
import { spoken } from './words';

const [LOW, HIGH] = [0.5, 2];

/** Both energies are estimates: the energy lost over their sum. */
function ofBoth({ casefile }: CheckContext, lost: number, crush: number, paths: string[]): Finding {
  const value = lost / crush;
  const outside = value < LOW || value > HIGH;
  return {
    level: outside ? 'caution' : 'pass',
    value,
    limit: value < LOW ? LOW : HIGH,
    says: `The contact lost ${spoken(casefile, lost, 'energy', 1)}, ${value.toFixed(2)} times the crush energy of both vehicles (${spoken(casefile, crush, 'energy', 1)}).`,
    advice: outside
      ? 'Impact and damage tell different stories: look again at depths, stiffness, restitution and the travel after contact.'
      : undefined,
    paths,
  };
}

/** One vehicle's damage alone is a lower limit of the energy lost. */
function ofOne({ casefile }: CheckContext, lost: number, crush: number, id: string, paths: string[]): Finding {
  const value = lost / crush;
  const below = value < 1;
  return {
    level: below ? 'caution' : 'pass',
    value,
    limit: 1,
    says: `The crush energy of ${id} alone, ${spoken(casefile, crush, 'energy', 1)}, is a lower limit; the contact lost ${spoken(casefile, lost, 'energy', 1)}${below ? ', which is less.' : '.'}`,
    advice: below
      ? 'The damage took more than the contact gave: look again at depths, stiffness and the impact.'
      : undefined,
    paths,
  };
}

export const damageEnergy: CheckRule = {
  id: 'damageEnergy',
  source: 'screening value: energy lost 0.5 to 2 times the crush energy of both; of one vehicle a lower limit',
  find(context) {
    const { central, casefile } = context;
    const lost = central.energyLost;
    const crushed = damageGiven(casefile).filter((d) => d.crushed);
    const energies = crushed.map(({ id }) => central[`${id}.damageEnergy`] ?? NaN);
    const crush = energies.reduce((sum, energy) => sum + energy, 0);
    if (lost === undefined || !(crush > 0)) return null;
    const paths = crushed.map(({ id }) => `damage.${id}.depths`);
    return crushed.length === 2
      ? ofBoth(context, lost, crush, paths)
      : ofOne(context, lost, crush, idsOf(crushed), paths);
  },
};
