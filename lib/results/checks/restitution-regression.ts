import { REGRESSIONS, consistentRestitution } from '@/lib/mechanics/restitution-regression';
import type { CheckContext, CheckRule } from './check';
import { spoken } from './words';

/** What the regressions give where only the speed of parting is known and the closing speed is that over e. */
function solvedTogether({ casefile, solution }: CheckContext): string {
  if (solution.problem.method !== 'restitution') return '';
  const parting = -solution.central.answer.unAfter;
  const found = REGRESSIONS.flatMap((regression) => {
    const both = consistentRestitution(regression, (e) => parting / e);
    return both ? [`${both.e.toFixed(2)} at ${spoken(casefile, both.closingSpeed, 'speed', 1)}`] : [];
  });
  return found.length === 0 ? '' : ` Solved together with the speed of parting they give ${found.join(' and ')}.`;
}

export const restitutionRegression: CheckRule = {
  id: 'restitutionRegression',
  source: 'regressions of SAE 980552 and SAE 2002-01-0540, from memory, cross-checked with each other; 1 to 6 m/s',
  find(context) {
    const { casefile, central } = context;
    const [e, closing] = [central.restitution, central.closingSpeed];
    if (e === undefined || closing === undefined) return null;
    const given = REGRESSIONS.flatMap(({ name, at }) => {
      const value = at(closing);
      return value === null ? [] : [`${value.toFixed(2)} (${name})`];
    });
    if (given.length === 0) return null;
    return {
      level: 'note',
      value: e,
      says: `For a closing speed of ${spoken(casefile, closing, 'speed', 1)} regressions of bumper contacts give a restitution of ${given.join(' and ')}; the answer has ${e.toFixed(2)}.${solvedTogether(context)} Regression recalled, confirm against the paper.`,
      advice: 'Read it as an order of size: it is not used in the answer.',
      paths: ['impact.restitution'],
    };
  },
};
