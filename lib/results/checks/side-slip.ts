import type { VehicleId } from '@/lib/casefile/schema';
import { type CheckContext, type CheckRule, levelAbove } from './check';
import { combined } from './drawn';

/** Degrees beyond twice the spread that a rolling vehicle's course may differ from its heading. */
const NOTE = 5;
const CAUTION = 10;
/** A vehicle slower than this, m/s, has no course to speak of. */
const STANDING = 0.5;

/** Degrees between course and heading, taken from the tail where the vehicle backs. */
function slipOf({ casefile, central, bands, solution }: CheckContext, id: VehicleId) {
  const course = central[`${id}.approachDirection`];
  const speed = central[`${id}.approachSpeed`];
  if (course === undefined || speed === undefined || speed < STANDING) return null;
  const heading = casefile.impact[id].heading;
  const off = course - heading.value;
  const wrapped = Math.abs(off - 360 * Math.round(off / 360));
  const backing = wrapped > 90;
  const spread =
    solution.problem.method === 'directions'
      ? combined(heading, casefile.approach[id].direction ?? heading)
      : (bands[`${id}.approachDirection`]?.sd ?? 0);
  return { id, slip: backing ? 180 - wrapped : wrapped, backing, allowance: 2 * spread };
}

export const sideSlip: CheckRule = {
  id: 'sideSlip',
  source: 'screening value: 5 and 10 deg beyond twice the stated spread; a rolling vehicle goes where it points',
  find(context) {
    const found = [slipOf(context, 'A'), slipOf(context, 'B')].filter((s) => s !== null);
    if (found.length === 0) return null;
    const worst = found.sort((p, q) => q.slip - q.allowance - (p.slip - p.allowance))[0];
    const { id, slip, backing, allowance } = worst;
    const level = levelAbove(slip, { note: NOTE + allowance, caution: CAUTION + allowance });
    return {
      level,
      value: slip,
      limit: level === 'note' ? NOTE + allowance : CAUTION + allowance,
      says: `Vehicle ${id} approaches ${slip.toFixed(0)}° off ${backing ? 'its tail (it backs)' : 'its heading'}${level === 'pass' ? ', within the stated spread.' : ': it would have been sliding sideways before contact.'}`,
      advice:
        level === 'pass'
          ? undefined
          : 'Compare direction of approach and heading at contact; a sideways slide leaves tyre marks.',
      paths: [`approach.${id}.direction`, `impact.${id}.heading`],
    };
  },
};
