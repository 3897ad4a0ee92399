import { type CheckRule, levelAbove } from './check';

/** Above this an impulse ratio needs a snag, not friction; above the second no contact of bodywork is known to reach. */
const CAUTION = 1;
const FAIL = 1.5;

export const friction: CheckRule = {
  id: 'friction',
  source: 'screening value; friction of painted panels and plastics 0.3 to 0.6 (from memory), snags above',
  find({ central }) {
    const ratio = central.impulseRatio;
    if (ratio === undefined) return null;
    const value = Math.abs(ratio);
    const level = levelAbove(value, { caution: CAUTION, fail: FAIL });
    return {
      level,
      value,
      limit: level === 'fail' ? FAIL : CAUTION,
      says: `The tangential impulse is ${value.toFixed(2)} times the normal one${level === 'pass' ? '.' : `; sliding bodywork gives at most about ${CAUTION}.`}`,
      advice:
        level === 'pass'
          ? undefined
          : 'Turn the contact plane to the damage, or look for parts that hooked into each other.',
      paths: ['impact.plane', 'impact.impulseRatio'],
    };
  },
};
