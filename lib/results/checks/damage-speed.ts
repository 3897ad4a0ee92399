import { closingSpeedFromWork } from '@/lib/mechanics/crush';
import type { CheckContext, CheckRule, Finding } from './check';
import { type DamageGiven, damageGiven, mostWithoutDepth } from './damage-given';
import { figure, spoken } from './words';

const LIMIT = 2;

/** Whether the damage estimates the speed, or bounds it from below, from above, or both. */
interface Bounds {
  /** m/s, with its standard uncertainty: from the vehicles with depths; null where there are none. */
  low: { speed: number; sd: number } | null;
  /** m/s, from the vehicles without; null where one vehicle's damage is not given. */
  high: number | null;
}

function boundsOf({ central, bands, solution }: CheckContext, given: DamageGiven[]): Bounds {
  const [speed, band] = [central.damageClosingSpeed, bands.damageClosingSpeed];
  const low = speed === undefined ? null : { speed, sd: band?.sd ?? 0 };
  const spared = given.filter(({ crushed }) => !crushed);
  if (given.length < 2 || spared.length === 0) return { low, high: null };
  const { frame, e, mu } = solution.central.answer;
  const factor = closingSpeedFromWork(1, frame.Knn, frame.Knt, e, mu);
  const more = spared.reduce((sum, { damage }) => sum + mostWithoutDepth(damage), 0);
  const work = ((low?.speed ?? 0) / factor) ** 2;
  const high = factor * Math.sqrt(work + more);
  return { low, high: Number.isFinite(high) ? high : null };
}

/** How far the closing speed lies off the damage, in standard uncertainties of both: 0 where a bound holds. */
function offOf({ low, high }: Bounds, closing: number, sd: number, estimate: boolean): number {
  const under = low ? (closing - low.speed) / Math.sqrt(low.sd ** 2 + sd ** 2) : Infinity;
  if (estimate) return under;
  if (low && under < 0) return under;
  return high !== null && closing > high ? (closing - high) / Math.sqrt((low?.sd ?? 0) ** 2 + sd ** 2) : 0;
}

/** «The closing speed from damage is 12 km/h», or what bounds there are. */
function wordsOf({ casefile }: CheckContext, { low, high }: Bounds, estimate: boolean): string {
  const speed = (v: number): string => spoken(casefile, v, 'speed', 1);
  const width = low ? ` ± ${speed(low.sd)}` : '';
  if (estimate && low) return `Damage of both vehicles stands for a closing speed of ${speed(low.speed)}${width}`;
  const limits = [low ? `at least ${speed(low.speed)}${width}` : '', high === null ? '' : `at most ${speed(high)}`];
  return `The damage that is given stands for a closing speed of ${limits.filter((limit) => limit !== '').join(' and ')}`;
}

function finding(context: CheckContext, bounds: Bounds, closing: number, sd: number, estimate: boolean): Finding {
  const zeta = offOf(bounds, closing, sd, estimate);
  const value = Math.abs(zeta);
  const weighed = Number.isFinite(zeta);
  const bad = value > LIMIT;
  const answer = `${spoken(context.casefile, closing, 'speed', 1)} ± ${spoken(context.casefile, sd, 'speed', 1)}`;
  const found = weighed ? `${figure(zeta, 1)} standard uncertainties off` : 'and neither has a spread to weigh them by';
  return {
    level: !weighed ? 'note' : bad ? 'caution' : 'pass',
    value,
    limit: LIMIT,
    says: `${wordsOf(context, bounds, estimate)}; the answer is ${answer}, ${found}. The two are compared and never averaged.`,
    advice: bad ? 'Find out which of the two is wrong, damage or travel, before relying on either.' : undefined,
  };
}

export const damageSpeed: CheckRule = {
  id: 'damageSpeed',
  source: 'screening value: twice the combined standard uncertainty (JCGM 100:2008, 5.1.2)',
  find(context) {
    const given = damageGiven(context.casefile);
    const closing = context.central.closingSpeed;
    const estimate = given.filter(({ crushed }) => crushed).length === 2;
    const bounds = boundsOf(context, given);
    if (closing === undefined || (bounds.low === null && bounds.high === null)) return null;
    const found = finding(context, bounds, closing, context.bands.closingSpeed?.sd ?? 0, estimate);
    return { ...found, paths: given.map(({ id }) => `damage.${id}.depths`) };
  },
};
