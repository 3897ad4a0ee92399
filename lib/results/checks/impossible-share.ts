import { type CheckRule, levelAbove } from './check';
import { percent } from './words';

const NOTE = 0.001;
const CAUTION = 0.05;
const FAIL = 0.5;

export const impossibleShare: CheckRule = {
  id: 'impossibleShare',
  source: 'screening value: note above 0.1 %, caution above 5 %, fail above 50 % of the draws',
  find({ solution }) {
    const count = Object.values(solution.impossible).reduce((sum, n) => sum + n, 0);
    const value = count / solution.draws;
    const level = levelAbove(value, { note: NOTE, caution: CAUTION, fail: FAIL });
    return {
      level,
      value,
      limit: level === 'fail' ? FAIL : level === 'caution' ? CAUTION : NOTE,
      says:
        count === 0
          ? `None of the ${solution.draws} draws was physically impossible.`
          : `${count} of ${solution.draws} draws (${percent(value)}) were physically impossible and are left out of the bands.`,
      advice:
        level === 'caution' || level === 'fail'
          ? 'The inputs as stated contradict each other over much of their spread: narrow or correct them.'
          : undefined,
    };
  },
};
