import type { Solution } from '@/lib/solve/solution';
import type { Result } from './result';

/** First-order and total Sobol' indices per traced result and input path. A result without spread has none. */
export function sensitivityOf({ problem, traced, sobol }: Solution): Result['sensitivity'] {
  const sensitivity: Result['sensitivity'] = {};
  traced.forEach((name, f) => {
    const shares: Result['sensitivity'][string] = {};
    for (const { slot, first, total } of sobol)
      if (Number.isFinite(first[f]) && Number.isFinite(total[f]))
        shares[problem.inputs[slot].path] = { first: first[f], total: total[f] };
    if (Object.keys(shares).length > 0) sensitivity[name] = shares;
  });
  return sensitivity;
}
