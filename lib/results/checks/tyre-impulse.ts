import { ASSUMED_PULSE, tyreShareOf } from '@/lib/evidence/tyre-share';
import { PAIR } from '@/lib/mechanics/pair-motion';
import { hypot } from '@/lib/numerics/elementary';
import { type CheckContext, type CheckRule, type Finding, levelAbove } from './check';
import { percent } from './words';

const NOTE = 0.05;
const CAUTION = 0.1;

export const tyreImpulse: CheckRule = {
  id: 'tyreImpulse',
  source: 'contract of the model: caution above 0.1; note above 0.05 is a screening value',
  find: (context) => (context.solution.problem.lasting ? included(context) : leftOut(context)),
};

/** An instant contact leaves the tyres out: the most that they can have pushed, over the contact impulse. */
function leftOut({ solution: { problem, central } }: CheckContext): Finding | null {
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
        : problem.method !== 'restitution'
          ? 'Let the contact last (with its duration stated), so that the tyres are reckoned in; else take the answer as less certain than its interval says, and state it in the report.'
          : 'At this speed take the answer as less certain than its interval says, and state it in the report.',
    paths: ['pulse'],
  };
}

/** A contact that lasts has them in: what they gave is said, not held against the answer. */
function included({ solution: { central } }: CheckContext): Finding | null {
  const { contact, figures } = central;
  if (!contact) return null;
  const { y } = contact;
  const share = (at: number): number => hypot(y[at], y[at + 1]) / figures.impulse;
  const [A, B] = [share(PAIR.tyresA), share(PAIR.tyresB)];
  return {
    level: 'pass',
    value: Math.max(A, B),
    limit: CAUTION,
    says: `While the contact lasted the tyres of A gave ${percent(A)} of the contact impulse and those of B ${percent(B)}; the answer includes both.`,
    paths: ['pulse', 'analysis.contact'],
  };
}
