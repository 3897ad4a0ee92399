/** Mean, standard deviation, median and coverage intervals of a sample (JCGM 101:2008, 7.6 and 7.7). */
export interface Summary {
  mean: number;
  /** With n - 1; 0 for a sample of one. */
  sd: number;
  median: number;
  /** Ends of the probabilistically symmetric coverage interval. */
  low: number;
  high: number;
  /** Ends of the shortest coverage interval. */
  shortest: [number, number];
}

/** Mean and standard deviation (n - 1) in two passes, shifted by the first value. */
export function meanAndSd(values: Float64Array): { mean: number; sd: number } {
  const n = values.length;
  const shift = values[0];
  let sum = 0;
  for (let i = 0; i < n; i++) sum += values[i] - shift;
  const offset = sum / n;
  let squares = 0;
  for (let i = 0; i < n; i++) {
    const d = values[i] - shift - offset;
    squares += d * d;
  }
  return { mean: shift + offset, sd: n > 1 ? Math.sqrt(squares / (n - 1)) : 0 };
}

/** Summary of a sample of at least one; reorders it. */
export function summarise(values: Float64Array, coverage: number): Summary {
  const { mean, sd } = meanAndSd(values);
  values.sort();
  const tail = (1 - coverage) / 2;
  return {
    mean,
    sd,
    median: quantile(values, 0.5),
    low: quantile(values, tail),
    high: quantile(values, 1 - tail),
    shortest: shortestInterval(values, coverage),
  };
}

/** Quantile of a sorted sample, linear between the order statistics k = 1..n taken at (k - 1/2)/n (JCGM 101, D.2 c). */
function quantile(sorted: Float64Array, p: number): number {
  const n = sorted.length;
  const at = Math.min(n - 1, Math.max(0, p * n - 0.5));
  const k = Math.floor(at);
  return k + 1 < n ? sorted[k] + (at - k) * (sorted[k + 1] - sorted[k]) : sorted[k];
}

/** The shortest of the intervals that hold the coverage (JCGM 101, 7.7.4): q = integer part of p n + 1/2 steps apart. */
function shortestInterval(sorted: Float64Array, coverage: number): [number, number] {
  const n = sorted.length;
  const steps = Math.min(n - 1, Math.floor(coverage * n + 0.5));
  let best = 0;
  for (let i = 1; i + steps < n; i++)
    if (sorted[i + steps] - sorted[i] < sorted[best + steps] - sorted[best]) best = i;
  return [sorted[best], sorted[best + steps]];
}
