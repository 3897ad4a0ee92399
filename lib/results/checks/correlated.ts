import { type CheckRule, levelAbove } from './check';
import { figure } from './words';

const CAUTION = 0.9;
/** Fewer draws than this say nothing about a correlation. */
const FEWEST = 30;

/** Correlation coefficient of two columns over the rows where both exist; NaN where one does not vary. */
function correlation(a: Float64Array, b: Float64Array): number {
  const rows = [...a.keys()].filter((k) => Number.isFinite(a[k]) && Number.isFinite(b[k]));
  if (rows.length < FEWEST) return NaN;
  const mean = (column: Float64Array): number => rows.reduce((sum, k) => sum + column[k], 0) / rows.length;
  const [meanA, meanB] = [mean(a), mean(b)];
  let [ab, aa, bb] = [0, 0, 0];
  for (const k of rows) {
    ab += (a[k] - meanA) * (b[k] - meanB);
    aa += (a[k] - meanA) ** 2;
    bb += (b[k] - meanB) ** 2;
  }
  return aa > 0 && bb > 0 ? ab / Math.sqrt(aa * bb) : NaN;
}

export const correlated: CheckRule = {
  id: 'correlated',
  source: 'screening value: correlation of the approach speeds over the draws beyond 0.9',
  find({ solution }) {
    const rho = correlation(solution.values['A.approachSpeed'], solution.values['B.approachSpeed']);
    if (!Number.isFinite(rho)) return null;
    const value = Math.abs(rho);
    const level = levelAbove(value, { caution: CAUTION });
    return {
      level,
      value,
      limit: CAUTION,
      says: `Over the draws the two approach speeds have a correlation of ${figure(rho, 2)}${level === 'pass' ? '.' : `: only their ${rho > 0 ? 'difference' : 'sum'} is fixed well, not each by itself.`}`,
      advice:
        level === 'pass'
          ? undefined
          : 'Never combine the low end of one speed with the high end of the other freely; find one of the two speeds from another source.',
      paths: ['approach.A.direction', 'approach.B.direction'],
    };
  },
};
