import { atan2 } from '@/lib/numerics/elementary';
import type { CheckRule } from './check';

/** Sine of the angle between the paths: about 10, 30 and 45 degrees. */
const FAIL = 0.17;
const CAUTION = 0.5;
const NOTE = Math.SQRT1_2;

export const nearlyInLine: CheckRule = {
  id: 'nearlyInLine',
  source:
    'contract of the model (0.17, about 10 deg); 0.5 and 0.71 are screening values: errors grow as 1 / sin of the angle',
  find({ solution }) {
    if (solution.problem.method !== 'directions') return null;
    const { sinBetween, condition } = solution.central.answer;
    const value = Math.abs(sinBetween);
    const level = value < FAIL ? 'fail' : value < CAUTION ? 'caution' : value < NOTE ? 'note' : 'pass';
    const angle = (atan2(value, Math.sqrt(Math.max(0, 1 - value * value))) * 180) / Math.PI;
    const found = `The approach paths cross at ${angle.toFixed(0)}° (condition number ${condition.toFixed(1)})`;
    const grows = `errors of the momenta grow ${(1 / value).toFixed(1)} times`;
    const paths = ['approach.A.direction', 'approach.B.direction'];
    if (level === 'pass') return { level, value, limit: NOTE, says: `${found}.`, paths };
    return {
      level,
      value,
      limit: level === 'fail' ? FAIL : level === 'caution' ? CAUTION : NOTE,
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
