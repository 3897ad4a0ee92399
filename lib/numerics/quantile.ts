import { selectEnds } from './select';

/** What is said of the distribution of a result. */
export interface Summary {
  mean: number;
  sd: number;
  median: number;
  /** Ends of the probabilistically symmetric interval. */
  low: number;
  high: number;
  /** Ends of the shortest interval. */
  shortest: [number, number];
}

/**
 * Summary of n >= 1 finite values, which may be reordered. With y(1) <= ... <= y(n) (JCGM 101:2008, 7.6 and 7.7.2):
 * q = n p rounded to the nearest integer; the symmetric interval is y(r) .. y(r + q) with r = (n - q)/2, rounded up
 * where it is not an integer; the shortest is y(r) .. y(r + q) with the least length over r = 1 .. n - q, the first of equals.
 * Where few values leave no such r, the interval runs from the least to the greatest. The median is the middle value, or
 * half way between the middle two. The standard deviation has n - 1 below the line; of one value it is 0.
 */
export function summarise(values: Float64Array, coverage: number): Summary {
  const { mean, sd } = meanAndSd(values);
  const n = values.length;
  const outside = Math.max(1, n - Math.floor(coverage * n + 0.5));
  const { lowest, highest, median } = selectEnds(values, outside);
  const symmetric = Math.ceil(outside / 2) - 1;
  const shortest = narrowest(lowest, highest);
  return {
    mean,
    sd,
    median,
    low: lowest[symmetric],
    high: highest[symmetric],
    shortest: [lowest[shortest], highest[shortest]],
  };
}

/** The first r for which highest[r] - lowest[r] is least. */
function narrowest(lowest: Float64Array, highest: Float64Array): number {
  let best = 0;
  for (let r = 1; r < lowest.length; r++) if (highest[r] - lowest[r] < highest[best] - lowest[best]) best = r;
  return best;
}

/** Mean and standard deviation (n - 1) in two passes, the rounding of the first corrected by the second. */
export function meanAndSd(values: Float64Array): { mean: number; sd: number } {
  const n = values.length;
  let sum = 0;
  for (let i = 0; i < n; i++) sum += values[i];
  const about = sum / n;
  let first = 0;
  let second = 0;
  for (let i = 0; i < n; i++) {
    const off = values[i] - about;
    first += off;
    second += off * off;
  }
  return { mean: about + first / n, sd: n > 1 ? Math.sqrt(Math.max(0, second - (first * first) / n) / (n - 1)) : 0 };
}
