import { type CheckRule, levelAbove } from './check';
import { percent } from './words';

const CAUTION = 0.2;

export const planeShare: CheckRule = {
  id: 'planeShare',
  source: "screening value: total Sobol' index of the contact plane above 20 % of the delta-V variance",
  find({ solution: { problem, sobol, traced } }) {
    const plane = sobol.find(({ slot }) => problem.inputs[slot].path === 'impact.plane');
    if (!plane) return null;
    const shares = (['A', 'B'] as const).flatMap((id) => {
      const share = plane.total[traced.indexOf(`${id}.deltaV`)];
      return Number.isFinite(share) ? [{ id, share: Math.max(0, share) }] : [];
    });
    if (shares.length === 0) return null;
    const { id, share: value } = shares.sort((p, q) => q.share - p.share)[0];
    const level = levelAbove(value, { caution: CAUTION });
    return {
      level,
      value,
      limit: CAUTION,
      says: `The direction of the contact plane carries ${percent(value)} of the variance of the delta-V of ${id}.`,
      advice:
        level === 'pass'
          ? undefined
          : 'Find the plane from the damage of both vehicles laid together, and solve again with it 10° to either side.',
      paths: ['impact.plane'],
    };
  },
};
