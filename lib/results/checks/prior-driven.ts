import { VEHICLE_IDS } from '@/lib/casefile/schema';
import type { CheckRule } from './check';
import { percent } from './words';

/** At least this share of its prior variance is to be taken from an approach speed by the evidence. */
const CONTRACTION = 0.5;

/** An approach speed that the evidence hardly narrowed is set mainly by what was put in beforehand. */
export const priorDriven: CheckRule = {
  id: 'priorDriven',
  source: 'screening value: contraction 1 - var(posterior) / var(prior) of an approach speed below one half',
  find({ solution: { fit } }) {
    if (!fit) return null;
    const speeds = VEHICLE_IDS.flatMap((id) => {
      const contraction = fit.contraction[`approach.${id}.speed`];
      return contraction === undefined ? [] : [{ id, contraction }];
    });
    if (speeds.length === 0) return null;
    const least = speeds.reduce((a, b) => (b.contraction < a.contraction ? b : a));
    const bad = least.contraction < CONTRACTION;
    return {
      level: bad ? 'caution' : 'pass',
      value: least.contraction,
      limit: CONTRACTION,
      says: `The evidence takes ${percent(Math.max(0, least.contraction))} of the prior variance of the approach speed of ${least.id}${bad ? ': it is set mainly by the prior.' : '.'}`,
      advice: bad ? 'State more evidence, or report this speed as what was assumed.' : undefined,
      paths: [`approach.${least.id}.speed`],
    };
  },
};
