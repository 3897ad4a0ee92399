import { meanAndSd, summarise } from '@/lib/numerics/quantile';
import { normal } from '../support/sample';
import { type Finding, compare } from './measure';

/** The peer: typed sort, then the definitions read off. */
function sortAndScan(values: Float64Array, coverage: number) {
  const moments = meanAndSd(values);
  const y = values.sort();
  const n = y.length;
  const q = Math.floor(coverage * n + 0.5);
  const r = Math.ceil((n - q) / 2) - 1;
  let best = 0;
  for (let i = 1; i + q < n; i++) if (y[i + q] - y[i] < y[best + q] - y[best]) best = i;
  const median = (y[(n - 1) >> 1] + y[n >> 1]) / 2;
  return { ...moments, median, low: y[r], high: y[r + q], shortest: [y[best], y[best + q]] };
}

/** G3: the statistics alone, to exact equality, against sorting. */
export async function statistics(n: number, goal: number): Promise<Finding> {
  const source = normal(n, 9, 'bench', 12, 0.4);
  if (JSON.stringify(summarise(source.slice(), 0.95)) !== JSON.stringify(sortAndScan(source.slice(), 0.95)))
    throw new Error('selection and sort differ');
  const copy = new Float64Array(n);
  const repeats = Math.ceil(2e6 / n);
  const side = (summary: (values: Float64Array, coverage: number) => unknown) => ({
    pieces: n * repeats,
    work: () => {
      for (let i = 0; i < repeats; i++) {
        copy.set(source);
        summary(copy, 0.95);
      }
    },
  });
  const [fast, slow] = await compare(side(summarise), side(sortAndScan));
  return {
    id: 'G3',
    what: `statistics of ${n.toLocaleString('en')} values: ${fast.toFixed(1)} ns each against ${slow.toFixed(1)} by sorting`,
    found: `${(slow / fast).toFixed(1)} times`,
    goal: `${goal} times`,
    met: slow / fast >= goal,
  };
}
