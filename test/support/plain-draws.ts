import type { CaseFile, Quantity } from '@/lib/casefile/schema';
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

/** Draws as one writes them plainly: an object per draw, Box and Muller, the sum of two uniforms, redrawing outside the support. */
export function plainDraws(casefile: CaseFile): DrawOf {
  const inputs = plainInputs(casefile).map(({ path, quantity }) => ({
    path,
    quantity,
    support: plainSupport(casefile, path),
  }));
  let current = -1;
  let sample: Record<string, number> = {};
  return (path, k) => {
    if (k !== current) {
      current = k;
      sample = Object.fromEntries(inputs.map((input) => [input.path, drawWithin(input.quantity, input.support)]));
    }
    return sample[path];
  };
}

function drawWithin(quantity: Quantity, support: { low: number; high: number; lowOpen: boolean }): number {
  for (;;) {
    const x = drawOnce(quantity);
    if (x >= support.low && x <= support.high && !(support.lowOpen && x === support.low)) return x;
  }
}

function drawOnce({ value, spread }: Quantity): number {
  if (!spread || spread.shape === 'fixed') return value;
  if (spread.shape === 'normal')
    return value + spread.sd * Math.sqrt(-2 * Math.log(1 - Math.random())) * Math.cos(2 * Math.PI * Math.random());
  const { low, high } = spread;
  const u = Math.random();
  if (spread.shape === 'rectangular') return low + u * (high - low);
  return u < (value - low) / (high - low)
    ? low + Math.sqrt(u * (high - low) * (value - low))
    : high - Math.sqrt((1 - u) * (high - low) * (high - value));
}
