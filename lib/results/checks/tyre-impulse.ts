import { ASSUMED_PULSE, tyreShareOf } from '@/lib/evidence/tyre-share';
import { type CheckRule, levelAbove } from './check';
import { percent } from './words';

const NOTE = 0.05;
const CAUTION = 0.1;

export const tyreImpulse: CheckRule = {
  id: 'tyreImpulse',
  source: 'contract of the model: caution above 0.1; note above 0.05 is a screening value',
  find({ solution }) {
    const { problem, central } = solution;
    const value = tyreShareOf(problem, central.figures.impulse);
    if (value === null) return null;
    const level = levelAbove(value, { note: NOTE, caution: CAUTION });
    const over = problem.pulse === null ? ` over an assumed contact of ${ASSUMED_PULSE} s` : '';
    return {
      level,
      value,
      limit: level === 'note' ? NOTE : CAUTION,
      says: `During contact the tyres can have pushed up to ${percent(value)} of the contact impulse${over}; the instant contact leaves that out.`,
      advice:
        level === 'pass'
          ? undefined
          : 'At this speed take the answer as less certain than its interval says, and state it in the report.',
      paths: ['pulse'],
    };
  },
};
