import type { CheckRule } from './check';
import { figure } from './words';

export const restitutionRange: CheckRule = {
  id: 'restitutionRange',
  source: "Newton's restitution lies between 0 and 1 (contract of the model)",
  find({ central, solution }) {
    const e = central.restitution;
    if (e === undefined) return null;
    const outside = e < -1e-9 || e > 1 + 1e-9;
    const found = `The restitution at the contact point is ${figure(e, 2)}`;
    if (!outside) return { level: 'pass', value: e, limit: 1, says: `${found}, inside 0 to 1.` };
    const directions = solution.problem.method === 'directions';
    return {
      level: 'fail',
      value: e,
      limit: e < 0 ? 0 : 1,
      says: `${found}; it must lie between 0 and 1. ${e < 0 ? 'The vehicles would still press into each other after contact.' : 'They would part faster than they closed.'}`,
      advice: directions
        ? 'Look again at the contact plane, the contact point and the directions before and after contact.'
        : 'Enter a restitution between 0 and 1.',
      paths: ['impact.plane', 'impact.point.x', 'impact.point.y'],
    };
  },
};
