import type { CaseFile } from '@/lib/casefile/schema';
import { fillBlock } from '@/lib/numerics/spread';
import { type DrawOf, plainInputs, plainSupport } from './plain-monte-carlo';

const BLOCK = 1024;

/** The engine's own draws in the units of the case file, so that engine and plain reference can be held together figure by figure. */
export function engineDraws(casefile: CaseFile, seed: number, draws: number): DrawOf {
  const columns = new Map(
    plainInputs(casefile).map(({ path, quantity }) => {
      const column = new Float64Array(Math.ceil(draws / BLOCK) * BLOCK);
      const input = {
        value: quantity.value,
        spread: quantity.spread ?? { shape: 'fixed' as const },
        support: plainSupport(casefile, path),
      };
      for (let at = 0; at < draws; at += BLOCK)
        fillBlock(column.subarray(at, at + BLOCK), BLOCK, input, seed, path, at / BLOCK);
      return [path, column] as const;
    }),
  );
  return (path, k) => (columns.get(path) as Float64Array)[k];
}
