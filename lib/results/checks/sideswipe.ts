import type { CheckContext, CheckRule } from './check';
import { spoken } from './words';

const RATIO = 3;
/** m and s. */
const SLIDE = 0.3;
const PULSE = 0.25;
/** Sliding below this share of that before, or of the closing speed, counts as ended. */
const ENDED = 0.05;

/** Whether the vehicles still slide on each other when they part. */
function stillSlides({ solution }: CheckContext): boolean {
  const { ut, utAfter, un } = solution.central.answer;
  return Math.abs(ut) > ENDED * Math.abs(un) && utAfter / ut > ENDED;
}

/** What speaks for a long slide: a number, its limit and words. */
function signs({ casefile, solution }: CheckContext) {
  const { ut, un } = solution.central.answer;
  const slide = casefile.impact.slide?.value ?? 0;
  const pulse = casefile.pulse?.value ?? 0;
  const ratio = Math.abs(ut / un);
  return [
    { value: ratio, limit: RATIO, words: `the sliding is ${ratio.toFixed(1)} times the closing speed` },
    { value: slide, limit: SLIDE, words: `they slid ${spoken(casefile, slide, 'length', 2)} along each other` },
    { value: pulse, limit: PULSE, words: `the contact took ${pulse.toFixed(2)} s` },
  ];
}

export const sideswipe: CheckRule = {
  id: 'sideswipe',
  source:
    'screening value; sideswipes lasted about 1 s (SAE 2004-01-1185) and ended without a common velocity (SAE 2026-01-0532)',
  find(context) {
    const { un, ut, utAfter } = context.solution.central.answer;
    if (context.casefile.analysis.contact === 'lasting' || !(un > 0) || !Number.isFinite(ut + utAfter)) return null;
    const worst = signs(context).sort((p, q) => q.value / q.limit - p.value / p.limit)[0];
    const { value, limit, words } = worst;
    const bad = stillSlides(context) && value > limit;
    const end = stillSlides(context) ? 'still slide on each other' : 'no longer slide on each other';
    return {
      level: bad ? 'fail' : 'pass',
      value,
      limit,
      says: bad
        ? `The vehicles ${end} when they part, and ${words}: this is a sideswipe, which an instant contact does not describe.`
        : `When they part the vehicles ${end}; ${words}.`,
      advice: bad ? 'The lasting contact is needed here, or bounds instead of a speed.' : undefined,
      paths: ['impact.plane', 'impact.slide', 'pulse'],
    };
  },
};
