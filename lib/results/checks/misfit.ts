import { labelOf } from '@/lib/casefile/fields';
import type { Quantity, VehicleId } from '@/lib/casefile/schema';
import { standardUncertainty } from '@/lib/numerics/spread';
import type { ResultName } from '../names';
import type { CheckContext, CheckRule } from './check';

/** 95 % quantiles of chi-square for 1 to 4 degrees of freedom (NIST/SEMATECH e-Handbook of Statistical Methods, 1.3.6.7.4). */
const CHI_SQUARE_95 = [3.841, 5.991, 7.815, 9.488];

/** The same for any number, by the cube-root rule (Wilson & Hilferty 1931), within 0.1 from 3 on. */
function chiSquare95(degrees: number): number {
  const spread = 2 / (9 * degrees);
  return CHI_SQUARE_95[degrees - 1] ?? degrees * (1 - spread + 1.644854 * Math.sqrt(spread)) ** 3;
}

interface Held {
  path: string;
  residual: number;
}

/** A stated value that the method does not use, against the result, in standard uncertainties of both. */
function held(
  { central, bands }: CheckContext,
  path: string,
  name: ResultName,
  stated: Quantity | null | undefined,
): Held[] {
  const [value, band] = [central[name], bands[name]];
  if (!stated || value === undefined || !band) return [];
  const own = standardUncertainty(stated.value, stated.spread ?? { shape: 'fixed' });
  const spread = Math.sqrt(own ** 2 + band.sd ** 2);
  const off = stated.value - value;
  const difference = name.endsWith('Direction') ? off - 360 * Math.round(off / 360) : off;
  return spread > 0 ? [{ path, residual: difference / spread }] : [];
}

/** The direction of a vehicle that hardly moves says nothing. */
const STANDING = 0.5;

function heldOf(context: CheckContext, id: VehicleId): Held[] {
  const approach = context.casefile.approach[id];
  const speed = held(context, `approach.${id}.speed`, `${id}.approachSpeed`, approach.speed);
  const moves = (context.central[`${id}.approachSpeed`] ?? 0) > STANDING;
  if (context.solution.problem.method === 'directions' || !moves) return speed;
  return [...speed, ...held(context, `approach.${id}.direction`, `${id}.approachDirection`, approach.direction)];
}

export const misfit: CheckRule = {
  id: 'misfit',
  source: '95 % point of chi-square (NIST/SEMATECH e-Handbook of Statistical Methods, 1.3.6.7.4)',
  find(context) {
    const { fit } = context.solution;
    const all = fit
      ? Object.entries(fit.residuals).map(([path, residual]) => ({ path, residual }))
      : [...heldOf(context, 'A'), ...heldOf(context, 'B')];
    if (all.length === 0) return null;
    const value = all.reduce((sum, { residual }) => sum + residual ** 2, 0);
    const limit = chiSquare95(all.length);
    const bad = value > limit;
    const listed = all
      .map(({ path, residual }) => `${labelOf(context.casefile, path)} by ${Math.abs(residual).toFixed(1)}`)
      .join(', ');
    return {
      level: bad ? 'caution' : 'pass',
      value,
      limit,
      says: `${fit ? 'What was observed differs from what the answer predicts' : 'What is stated and not used differs from the answer'}, in standard uncertainties: ${listed} (chi-square ${value.toFixed(1)} for ${all.length}).`,
      advice: bad
        ? 'The pieces of evidence do not agree with each other: find out which is wrong before relying on any; they are not averaged away.'
        : undefined,
      paths: all.map(({ path }) => path),
    };
  },
};
