import type { Shape, Shapes } from './bands';
import type { ResultName } from './names';
import type { Band, Result } from './result';

/** The data behind the pictures of the answer. Values in the units of names.ts; densities per that unit. */

/** A point of a density: value and probability per unit of it. */
export interface DensityPoint {
  x: number;
  y: number;
}

/** One row of the picture of the speeds. */
export interface SpeedRow {
  name: ResultName;
  band: Band;
  /** Empty where the result has no spread. */
  density: DensityPoint[];
}

/** The speeds that share one axis, in reading order. */
export const SPEEDS = ['A.approachSpeed', 'B.approachSpeed', 'A.deltaV', 'B.deltaV', 'closingSpeed'] as const;

/** Passes of the smoothing: enough to take the grain off 60 bins, too few to move a mode. */
const PASSES = 2;

/** How the draws of a result are distributed: area 1 under the trapezia between the points. Empty without a width. */
export function densityOf({ low, high, counts }: Shape): DensityPoint[] {
  const total = counts.reduce((sum, count) => sum + count, 0);
  const width = (high - low) / counts.length;
  if (!(width > 0) || total === 0) return [];
  let heights = counts.map((count) => count / (total * width));
  for (let pass = 0; pass < PASSES; pass++) heights = smoothed(heights);
  const middle = heights.map((y, k) => ({ x: low + (k + 0.5) * width, y }));
  // Out to the ends at the height of the outermost bin: only so is all of its area kept.
  const ends = [
    { x: low, y: heights[0] },
    { x: high, y: heights[heights.length - 1] },
  ];
  return [ends[0], ...middle, ends[1]];
}

/** Binomial weights 1 2 1, mirrored at the ends so that nothing is lost. */
const smoothed = (heights: number[]): number[] =>
  heights.map((y, k) => ((heights[k - 1] ?? y) + 2 * y + (heights[k + 1] ?? y)) / 4);

/** The rows of the picture of the speeds; what the method does not give is left out. */
export const speedRows = (result: Result, shapes: Shapes): SpeedRow[] =>
  SPEEDS.flatMap((name): SpeedRow[] => {
    const band = result.bands[name];
    const shape = shapes[name];
    return band ? [{ name, band, density: shape ? densityOf(shape) : [] }] : [];
  });

/** Ends of an axis that holds 0, every interval and every density. */
export function axisOf(rows: readonly SpeedRow[]): [number, number] {
  const values = rows.flatMap(({ band, density }) => [band.low, band.high, ...density.map(({ x }) => x)]);
  return [Math.min(0, ...values), Math.max(0, ...values)];
}
