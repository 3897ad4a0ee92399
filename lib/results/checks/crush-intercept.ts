import { type CheckRule, levelAbove } from './check';
import { damageGiven, meanDepth } from './damage-given';
import { percent, spoken } from './words';

const CAUTION = 0.25;
const UNUSABLE = 0.5;

export const crushIntercept: CheckRule = {
  id: 'crushIntercept',
  source: 'screening value: (A/(A + B C))^2 above 0.25, and above 0.5; stiffness comes from faster tests (from memory)',
  find({ casefile }) {
    const worst = damageGiven(casefile)
      .filter(({ crushed }) => crushed)
      .map(({ id, damage }) => {
        const depth = meanDepth(damage);
        return { id, depth, share: (damage.a.value / (damage.a.value + damage.b.value * depth)) ** 2 };
      })
      .sort((p, q) => q.share - p.share)[0];
    if (!worst) return null;
    const { id, depth, share: value } = worst;
    const level = levelAbove(value, { caution: CAUTION });
    const unusable = value > UNUSABLE;
    return {
      level,
      value,
      limit: unusable ? UNUSABLE : CAUTION,
      says: `With a mean depth of ${spoken(casefile, depth, 'length', 3)} on ${id}, ${percent(value)} of the crush energy comes from the intercept A, that is from below the speeds of the tests behind it.`,
      advice:
        level === 'pass'
          ? undefined
          : unusable
            ? 'Do not use the closing speed from damage: it is mostly the intercept, extrapolated. The headline does not rest on it.'
            : 'Take the closing speed from damage as a rough bound only, and say which tests the stiffness comes from.',
      paths: [`damage.${id}.a`, `damage.${id}.depths`],
    };
  },
};
