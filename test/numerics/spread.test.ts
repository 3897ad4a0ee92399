import { describe, expect, test } from 'vitest';
import { type DrawSpread, type DrawSupport, fillBlock, standardUncertainty } from '@/lib/numerics/spread';
import { normalCumulative } from '@/lib/numerics/normal';
import { meanAndSd } from '@/lib/numerics/quantile';

const ANYWHERE: DrawSupport = { low: -Infinity, high: Infinity, lowOpen: false };
const BLOCK = 1024;

function draws(
  value: number,
  spread: DrawSpread,
  support = ANYWHERE,
  { blocks = 64, seed = 11, stream = 'impact.A.x' } = {},
): Float64Array {
  const all = new Float64Array(blocks * BLOCK);
  const block = new Float64Array(BLOCK);
  for (let b = 0; b < blocks; b++) {
    fillBlock(block, BLOCK, { value, spread, support }, seed, stream, b);
    all.set(block, b * BLOCK);
  }
  return all;
}

/** Greatest distance between the share of the draws below x and a distribution function, times sqrt n (Kolmogorov). */
function kolmogorov(values: Float64Array, share: (x: number) => number): number {
  const sorted = values.slice().sort();
  let most = 0;
  sorted.forEach((x, i) => {
    most = Math.max(most, Math.abs(share(x) - i / sorted.length), Math.abs(share(x) - (i + 1) / sorted.length));
  });
  return most * Math.sqrt(sorted.length);
}

/** The 1e-4 point of Kolmogorov's distribution: 2 exp(-2 k^2) = 1e-4. A right sampler on another seed fails one in 10,000. */
const LIMIT = Math.sqrt(-Math.log(0.5e-4) / 2);

const between = (z: number, low: number, high: number) =>
  (normalCumulative(z) - normalCumulative(low)) / (normalCumulative(high) - normalCumulative(low));

describe('the draws have the stated distribution (Kolmogorov, false alarm 1e-4 each, fixed seed)', () => {
  test('fixed', () => expect(new Set(draws(3, { shape: 'fixed' }))).toEqual(new Set([3])));

  test('rectangular', () =>
    expect(kolmogorov(draws(5, { shape: 'rectangular', low: 4, high: 7 }), (x) => (x - 4) / 3)).toBeLessThan(LIMIT));

  test.each([
    [4, 5, 7],
    [4, 4, 7],
    [4, 7, 7],
  ])('triangular from %d over its mode %d to %d', (low, mode, high) => {
    const share = (x: number): number =>
      x <= mode && mode > low
        ? (x - low) ** 2 / ((high - low) * (mode - low))
        : 1 - (high - x) ** 2 / ((high - low) * (high - mode || 1));
    expect(kolmogorov(draws(mode, { shape: 'triangular', low, high }), share)).toBeLessThan(LIMIT);
  });

  test('normal', () =>
    expect(kolmogorov(draws(5, { shape: 'normal', sd: 2 }), (x) => normalCumulative((x - 5) / 2))).toBeLessThan(LIMIT));

  test.each([
    ['cut on one side', 1, 1, { low: 0, high: Infinity, lowOpen: true }],
    ['cut through the middle', 0, 1, { low: 0, high: Infinity, lowOpen: false }],
    ['cut on both sides', 0.9, 0.3, { low: 0, high: 1, lowOpen: false }],
    ['cut to a sliver', 0.25, 40, { low: 0, high: 1, lowOpen: false }],
    ['flat to the last digit', 0.25, 1e9, { low: 0, high: 1, lowOpen: false }],
  ] as const)('normal %s, as redrawing would give it', (_, value, sd, support) => {
    const found = draws(value, { shape: 'normal', sd }, support);
    const cut = [(support.low - value) / sd, (support.high - value) / sd];
    const share = sd > 1e6 ? (x: number) => x : (x: number) => between((x - value) / sd, cut[0], cut[1]);
    expect(kolmogorov(found, share)).toBeLessThan(LIMIT);
    expect(found.every((x) => x >= support.low && x <= support.high && !(support.lowOpen && x === support.low))).toBe(
      true,
    );
  });

  test('and so has redrawing, drawn by draw (two samples, false alarm 1e-4)', () => {
    const cut = draws(0.5, { shape: 'normal', sd: 1 }, { low: 0, high: Infinity, lowOpen: true });
    const redrawn = draws(0.5, { shape: 'normal', sd: 1 }, ANYWHERE, { blocks: 128, stream: 'another' }).filter(
      (x) => x > 0,
    );
    const sorted = redrawn.sort();
    const below = (x: number): number => {
      let [from, to] = [0, sorted.length];
      while (from < to) {
        const middle = (from + to) >> 1;
        if (sorted[middle] <= x) from = middle + 1;
        else to = middle;
      }
      return from / sorted.length;
    };
    const smaller = Math.sqrt(1 / (1 + cut.length / sorted.length));
    expect(kolmogorov(cut, below) * smaller).toBeLessThan(LIMIT + 0.02);
  });
});

describe('a draw depends on seed, stream and its own number alone', () => {
  const spread: DrawSpread = { shape: 'normal', sd: 1 };
  const positive: DrawSupport = { low: 0, high: Infinity, lowOpen: true };

  test('blocks in any order, and cut short, give the same draws', () => {
    const whole = draws(0.5, spread, positive, { blocks: 4 });
    for (const b of [3, 1, 0, 2]) {
      const block = new Float64Array(BLOCK);
      fillBlock(block, 100 + b, { value: 0.5, spread, support: positive }, 11, 'impact.A.x', b);
      expect(block.subarray(0, 100 + b)).toEqual(whole.subarray(b * BLOCK, b * BLOCK + 100 + b));
    }
  });

  test('a moved value or a wider spread keeps the order of its draws', () => {
    const ranks = (values: Float64Array) => Array.from(values.keys()).sort((i, j) => values[i] - values[j]);
    const one = ranks(draws(5, spread, ANYWHERE, { blocks: 1 }));
    expect(ranks(draws(6.5, { shape: 'normal', sd: 3 }, ANYWHERE, { blocks: 1 }))).toEqual(one);
    expect(ranks(draws(2, { shape: 'triangular', low: 1, high: 9 }, ANYWHERE, { blocks: 1 }))).toEqual(one);
  });

  test('another seed or stream gives other draws', () => {
    const [first, ...others] = [
      draws(5, spread, ANYWHERE, { blocks: 1 }),
      draws(5, spread, ANYWHERE, { blocks: 1, seed: 12 }),
      draws(5, spread, ANYWHERE, { blocks: 1, stream: 'impact.A.y' }),
    ];
    for (const other of others) expect(other.some((x, k) => x === first[k])).toBe(false);
  });
});

describe('standard uncertainty', () => {
  // JCGM 100:2008, 4.3.7 (rectangular, half width over root 3) and 4.3.9 note 2 (triangular, half width over root 6).
  test('rectangular', () =>
    expect(standardUncertainty(0, { shape: 'rectangular', low: -1, high: 1 })).toBeCloseTo(1 / Math.sqrt(3), 15));
  test('triangular', () =>
    expect(standardUncertainty(0, { shape: 'triangular', low: -1, high: 1 })).toBeCloseTo(1 / Math.sqrt(6), 15));
  test('normal and fixed', () => {
    expect(standardUncertainty(4, { shape: 'normal', sd: 0.3 })).toBe(0.3);
    expect(standardUncertainty(4, { shape: 'fixed' })).toBe(0);
  });
  test('is that of the draws (4 standard errors)', () => {
    const spread: DrawSpread = { shape: 'triangular', low: 1, high: 9 };
    const { sd } = meanAndSd(draws(2, spread));
    expect(Math.abs(sd / standardUncertainty(2, spread) - 1)).toBeLessThan(4 / Math.sqrt(2 * 64 * BLOCK));
  });
});
