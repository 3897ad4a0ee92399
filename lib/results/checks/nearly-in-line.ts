import { atan2 } from '@/lib/numerics/elementary';
import type { CheckRule } from './check';

/** Sine of the angle between the paths, about 10 degrees. */
const FAIL = 0.17;
/** Cotangent of half the acute angle between the paths: about 30 and 45 degrees. */
const CAUTION = 3.7;
const NOTE = 2.4;

/** Cotangent of half the acute angle that has this sine. */
const halfCotangent = (sine: number): number => (1 + Math.sqrt(Math.max(0, 1 - sine * sine))) / sine;

export const nearlyInLine: CheckRule = {
  id: 'nearlyInLine',
  source:
    'contract of the model (sine of the angle 0.17, about 10 deg); cot(angle / 2) of 2.4 and 3.7 are screening values',
  find({ solution }) {
    if (solution.problem.method !== 'directions') return null;
    const { sinBetween, condition } = solution.central.answer;
    const sine = Math.abs(sinBetween);
    const value = halfCotangent(sine);
    const level = sine < FAIL ? 'fail' : value > CAUTION ? 'caution' : value > NOTE ? 'note' : 'pass';
    const angle = (atan2(sine, Math.sqrt(Math.max(0, 1 - sine * sine))) * 180) / Math.PI;
    const found = `The approach paths cross at ${angle.toFixed(0)}° (cot of half the angle ${value.toFixed(1)}, condition number ${condition.toFixed(1)})`;
    const grows = `errors of the momenta grow ${(1 / sine).toFixed(1)} times`;
    const paths = ['approach.A.direction', 'approach.B.direction'];
    if (level === 'pass') return { level, value, limit: NOTE, says: `${found}.`, paths };
    return {
      level,
      value,
      limit: level === 'fail' ? halfCotangent(FAIL) : level === 'caution' ? CAUTION : NOTE,
      says:
        level === 'fail'
          ? `${found}: nearly in line, so momentum alone does not part the two speeds.`
          : `${found}; ${grows}.`,
      advice:
        level === 'fail'
          ? 'Use the method restitution, with a restitution and an impulse ratio, instead.'
          : 'Measure the directions of approach again before anything else, or compare with the method restitution.',
      paths,
    };
  },
};
