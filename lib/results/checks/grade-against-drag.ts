import { type CheckRule, levelAbove } from './check';
import { stretchesOf } from './travel-drag';
import { figure, percent } from './words';

const CAUTION = 0.2;

export const gradeAgainstDrag: CheckRule = {
  id: 'gradeAgainstDrag',
  source:
    'screening value: grade above 20 % of the drag; at a rolling drag of 0.015 a grade of 1 % is two thirds of it',
  find({ casefile }) {
    const worst = stretchesOf(casefile)
      .filter(({ drag }) => drag > 0)
      .map((stretch) => ({ ...stretch, share: Math.abs(stretch.grade) / stretch.drag }))
      .sort((p, q) => q.share - p.share)[0];
    if (!worst) return null;
    const { name, path, grade, drag, share: value } = worst;
    const level = levelAbove(value, { caution: CAUTION });
    return {
      level,
      value,
      limit: CAUTION,
      says: `On ${name} the grade of ${figure(100 * grade, 1)} % is ${percent(value)} of the drag (${drag.toFixed(3)}).`,
      advice:
        level === 'pass'
          ? undefined
          : 'Measure the grade along the path of each vehicle, and give it its spread: it weighs as much as the friction.',
      paths: [path],
    };
  },
};
