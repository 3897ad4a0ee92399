import { summarise } from '@/lib/numerics/quantile';
import type { FigureName } from '@/lib/solve/columns';
import type { Solution } from '@/lib/solve/solution';
import { RESULT_NAMES, type ResultName, isDirection, resultDimension } from './names';
import type { Band } from './result';

const DEGREES_PER_RADIAN = 180 / Math.PI;

/** How the draws of one result are distributed: counts in equal bins from low to high. For pictures only. */
export interface Shape {
  low: number;
  high: number;
  counts: number[];
}
export type Shapes = Partial<Record<ResultName, Shape>>;

const BINS = 60;

/** The results that a solution has a figure for. */
const namesOf = (solution: Solution): ResultName[] => RESULT_NAMES.filter((name) => name in solution.values);

const unitFactor = (name: ResultName): number => {
  const dimension = resultDimension(name);
  return dimension === 'angle' || dimension === 'yawRate' ? DEGREES_PER_RADIAN : 1;
};

/** The central results in the units of the contract; what does not exist is left out. */
export function centralResults(solution: Solution): Partial<Record<ResultName, number>> {
  const { figures, reason } = solution.central;
  const found: Partial<Record<ResultName, number>> = {};
  for (const name of namesOf(solution)) {
    const value = figures[name as FigureName] * unitFactor(name);
    const isSpeedBackwards = reason === 'backwards' && name.endsWith('approachSpeed') && value < 0;
    if (Number.isFinite(value) && !isSpeedBackwards) found[name] = isDirection(name) ? wrapped(value) : value;
  }
  return found;
}

/** Into (-180, 180]. */
const wrapped = (degrees: number): number => {
  const turned = degrees - 360 * Math.round(degrees / 360);
  return turned === -180 ? 180 : turned;
};

/** The values of a result over the possible draws in the units of the contract, directions unwrapped about the centre. */
function valuesOf(solution: Solution, name: ResultName): Float64Array {
  const drawn = solution.values[name as FigureName];
  const factor = unitFactor(name);
  const values = new Float64Array(drawn.length);
  let n = 0;
  for (let k = 0; k < drawn.length; k++) if (!Number.isNaN(drawn[k])) values[n++] = drawn[k] * factor;
  const existing = n === drawn.length ? values : values.slice(0, n);
  if (isDirection(name) && n > 0) {
    const centre = solution.central.figures[name as FigureName] * factor;
    unwrap(existing, Number.isFinite(centre) ? wrapped(centre) : existing[0]);
  }
  return existing;
}

/** Turns every direction, deg, by whole circles until it lies within half a circle of another. */
function unwrap(directions: Float64Array, about: number): void {
  for (let k = 0; k < directions.length; k++) directions[k] -= 360 * Math.round((directions[k] - about) / 360);
}

/** Mean, spread and intervals of every result (JCGM 101:2008 clause 7), and the shapes of their distributions. */
export function bandsOf(
  solution: Solution,
  coverage: number,
): { bands: Partial<Record<ResultName, Band>>; shapes: Shapes } {
  const bands: Partial<Record<ResultName, Band>> = {};
  const shapes: Shapes = {};
  for (const name of namesOf(solution)) {
    const values = valuesOf(solution, name);
    if (values.length === 0) continue;
    const band = summarise(values, coverage);
    if (!Object.values(band).flat().every(Number.isFinite)) continue;
    bands[name] = band;
    shapes[name] = shapeOf(values, band);
  }
  return { bands, shapes };
}

/** A histogram over the middle of the distribution: at most one interval's width beyond each end. */
function shapeOf(values: Float64Array, { low, high }: Band): Shape {
  const width = high - low;
  let [min, max] = [Infinity, -Infinity];
  for (let k = 0; k < values.length; k++) {
    min = Math.min(min, values[k]);
    max = Math.max(max, values[k]);
  }
  const from = Math.max(min, low - width);
  const to = Math.min(max, high + width);
  const counts = new Uint32Array(BINS);
  const perUnit = BINS / (to - from || 1);
  for (let k = 0; k < values.length; k++)
    if (values[k] >= from && values[k] <= to) counts[Math.min(BINS - 1, Math.floor((values[k] - from) * perUnit))]++;
  return { low: from, high: to, counts: [...counts] };
}
