import { type CheckRule, levelAbove } from './check';

const CAUTION = 5;

export const amplification: CheckRule = {
  id: 'amplification',
  source: 'contract of the model: caution above 5, refused above 20 (restitution below 0.05)',
  find({ solution }) {
    if (solution.problem.method !== 'restitution') return null;
    const value = 1 / solution.central.state.e;
    const level = levelAbove(value, { caution: CAUTION });
    return {
      level,
      value,
      limit: CAUTION,
      says: `The speed of parting is multiplied by 1/e = ${value.toFixed(1)} to find the closing speed${level === 'pass' ? '.' : '; so are its errors.'}`,
      advice:
        level === 'pass'
          ? undefined
          : 'Do not rest the closing speed on this restitution alone: seek another source for it.',
      paths: ['impact.restitution'],
    };
  },
};
