import { overlapDepth } from '@/lib/geometry/polygon';
import type { CheckRule } from './check';
import { combined, outlineAtContact } from './drawn';
import { spoken } from './words';

/** Beyond the crush of both, m. */
const DEEPEST = 0.1;
const WIDEST_GAP = 0.05;

export const overlap: CheckRule = {
  id: 'overlap',
  source:
    'screening value: overlap up to the crush of both plus 0.10 m, gap up to 0.05 m, plus twice the stated spread',
  find(context) {
    const { casefile } = context;
    const { A, B } = casefile.impact;
    const depth = overlapDepth(outlineAtContact(context, 'A'), outlineAtContact(context, 'B'));
    const spread = 2 * combined(A.x, A.y, B.x, B.y);
    const crush = (['A', 'B'] as const).reduce(
      (sum, id) => sum + Math.max(0, ...(casefile.damage?.[id]?.depths.map((d) => d.value) ?? [])),
      0,
    );
    const deepest = crush + DEEPEST + spread;
    const gap = WIDEST_GAP + spread;
    const figure = spoken(casefile, Math.abs(depth), 'length', 2);
    const paths = ['impact.A.x', 'impact.A.y', 'impact.B.x', 'impact.B.y'];
    if (depth > deepest)
      return {
        level: 'caution',
        value: depth,
        limit: deepest,
        paths,
        says: `The outlines overlap by ${figure} at contact.`,
        advice: 'Move the vehicles apart to where they first touched.',
      };
    if (-depth > gap)
      return {
        level: 'caution',
        value: depth,
        limit: -gap,
        paths,
        says: `The outlines are ${figure} apart at contact.`,
        advice: 'Move the vehicles together until they touch.',
      };
    return {
      level: 'pass',
      value: depth,
      limit: depth < 0 ? -gap : deepest,
      paths,
      says:
        depth < 0
          ? `The outlines are ${figure} apart, within the stated spread.`
          : `The outlines overlap by ${figure}, within crush and stated spread.`,
    };
  },
};
