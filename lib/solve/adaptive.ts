import { summarise } from '@/lib/numerics/quantile';
import type { FigureName } from './columns';
import type { DrawsDone } from './task';

/**
 * Adaptive number of draws, JCGM 101:2008 7.9: batches are added until, for the estimate, its standard uncertainty and
 * both ends of the coverage interval, twice the standard deviation of the average over the batches is below the
 * numerical tolerance that belongs to two significant digits of the standard uncertainty (7.9.2). Batches are added in
 * doubling numbers instead of one by one, so that workers have something to share.
 */

/** A million draws or so; a result that has not settled by then is answered with what there is. */
export const MOST_BATCHES = 64;

/** JCGM 101 7.9.4 b: at least 100 / (1 - p) and at least 10^4 draws, in whole tasks. */
export const batchSize = (coverage: number, perTask: number): number =>
  Math.ceil(Math.max(100 / (1 - coverage), 1e4) / perTask) * perTask;

/** The figures whose printed digits must settle. */
const JUDGED = [
  'A.approachSpeed',
  'B.approachSpeed',
  'A.deltaV',
  'B.deltaV',
  'closingSpeed',
] as const satisfies FigureName[];

export const isSettled = (batches: readonly DrawsDone[], coverage: number): boolean =>
  JUDGED.every((name) => isFigureSettled(batches, name, coverage));

function isFigureSettled(batches: readonly DrawsDone[], name: FigureName, coverage: number): boolean {
  const filled = batches.filter(({ values }) => values[name].length > 1);
  if (filled.length < 2) return true;
  const bands = filled.map(({ values }) => summarise(values[name].slice(), coverage));
  const pooled = Math.sqrt(average(bands.map(({ sd }) => sd * sd)));
  if (pooled === 0) return true;
  const tolerance = toleranceOf(pooled);
  return (['mean', 'sd', 'low', 'high'] as const).every(
    (key) => 2 * errorOfAverage(bands.map((band) => band[key])) <= tolerance,
  );
}

/** Half a unit of the second significant digit of u. */
function toleranceOf(u: number): number {
  const exponent = Number(u.toExponential().split('e')[1]);
  return Number(`0.5e${exponent - 1}`);
}

const average = (values: readonly number[]): number => values.reduce((sum, x) => sum + x, 0) / values.length;

function errorOfAverage(values: readonly number[]): number {
  const mean = average(values);
  const squares = values.reduce((sum, x) => sum + (x - mean) * (x - mean), 0);
  return Math.sqrt(squares / (values.length - 1) / values.length);
}
