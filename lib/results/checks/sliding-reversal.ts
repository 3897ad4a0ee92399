import type { CheckRule } from './check';
import { spoken } from './words';

/** A slip below this share of the slip before contact counts as stopped, not reversed. */
const STOPPED = 0.05;

export const slidingReversal: CheckRule = {
  id: 'slidingReversal',
  source: 'Coulomb friction opposes the slip and cannot turn it round (Brach, critical impulse ratio)',
  find({ casefile, solution }) {
    const { ut, utAfter, un, mu } = solution.central.answer;
    if (![ut, utAfter, un, mu].every(Number.isFinite)) return null;
    const negligible = Math.abs(ut) < STOPPED * Math.abs(un);
    const reversed = !negligible && ut * utAfter < 0 && Math.abs(utAfter) > STOPPED * Math.abs(ut);
    const driven = !negligible && mu * ut < 0 && Math.abs(mu) > 0.02;
    const before = spoken(casefile, Math.abs(ut), 'speed', 1);
    const after = spoken(casefile, Math.abs(utAfter), 'speed', 1);
    const value = negligible ? 0 : utAfter / ut;
    if (!reversed && !driven)
      return {
        level: 'pass',
        value,
        limit: 0,
        says: `The sliding along the plane goes from ${before} to ${after} and keeps its sense or stops.`,
      };
    return {
      level: 'caution',
      value,
      limit: 0,
      says: driven
        ? `The tangential impulse pushes with the sliding (${before} before, ${after} after contact), where friction would brake it.`
        : `The tangential impulse turns the sliding round: ${before} before contact, ${after} the other way after it.`,
      advice:
        'Turn the contact plane, move the contact point, or lower the impulse ratio; a hooked part would be needed for this.',
      paths: ['impact.plane', 'impact.impulseRatio', 'impact.point.x', 'impact.point.y'],
    };
  },
};
