import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { meanAndSd, summarise } from '@/lib/numerics/quantile';
import { fillUniforms, seededState } from '@/lib/numerics/random';
import { plainSummary } from '../support/plain-summary';
import { normalQuantile } from '../support/sample';

const uniforms = (n: number, stream: string): Float64Array => {
  const out = new Float64Array(n);
  fillUniforms(seededState(3, stream, 0), out, n);
  return out;
};

/** Everything that is picked out of the values must be equal to the last bit; mean and sd, which are summed, to rounding. */
function expectTwin(values: ArrayLike<number>, coverage: number): void {
  const expected = plainSummary(Array.from(values), coverage);
  const found = summarise(Float64Array.from(values), coverage);
  const picked = ({ median, low, high, shortest }: { median: number; low: number; high: number; shortest: number[] }) =>
    [median, low, high, ...shortest].map((x) => x + 0);
  expect(picked(found)).toEqual(picked(expected));
  const scale = Math.max(Math.abs(expected.mean), expected.sd, 1e-300);
  expect(Math.abs(found.mean - expected.mean)).toBeLessThanOrEqual(1e-12 * scale);
  expect(Math.abs(found.sd - expected.sd)).toBeLessThanOrEqual(1e-11 * scale);
}

const COVERAGES = [0.01, 0.5, 0.68, 0.75, 0.95, 0.99, 0.999, 1 - 1e-9];

describe('equal to sorting and reading the definitions', () => {
  test('one to twelve values', () => {
    for (let n = 1; n <= 12; n++) for (const p of COVERAGES) expectTwin(uniforms(n, `tiny ${n}`), p);
  });

  const shapes: Record<string, (u: number, i: number) => number> = {
    uniform: (u) => u,
    normal: (u) => 12 + 0.3 * normalQuantile(u),
    'heavy tails': (u) => Math.tan(Math.PI * (u - 0.5)),
    'heavier tails': (u) => Math.exp(300 * (u - 0.5)),
    'very skewed': (u) => u ** 20,
    constant: () => 7.25,
    'two values': (u) => (u < 0.3 ? -1 : 1),
    'few values, many ties': (u) => Math.floor(u * 5),
    'ties and one far away': (u, i) => (i === 17 ? 1e9 : Math.floor(u * 20)),
    'already sorted': (_, i) => i,
    'sorted backwards': (_, i) => -i,
    'zeros of both signs': (u) => (u < 0.5 ? -0 : 0),
    'around zero': (u) => (u - 0.5) * 1e-300,
    subnormal: (u) => Math.floor(u * 1000) * 5e-324,
    'nearly equal': (u) => 1 + Math.floor(u * 8) * Number.EPSILON,
    'width beyond the largest number': (u) => (u - 0.5) * 3.5e308,
    'two clusters': (u, i) => (i % 2) * 1e6 + u,
  };
  test.each(Object.entries(shapes))('%s', (name, shape) => {
    for (const n of [255, 256, 257, 1000, 5001])
      for (const p of COVERAGES) {
        const values = uniforms(n, name).map(shape);
        if (name === 'width beyond the largest number') expectPicked(values, p);
        else expectTwin(values, p);
      }
  });

  test('any values at all', () => {
    fc.assert(
      fc.property(
        fc.array(fc.oneof(fc.double({ noNaN: true, min: -1e100, max: 1e100 }), fc.integer({ min: -3, max: 3 })), {
          minLength: 1,
          maxLength: 900,
        }),
        fc.double({ min: 0.001, max: 0.999, noNaN: true }),
        (values, p) => expectPicked(Float64Array.from(values), p),
      ),
      { seed: 20261201, numRuns: 300 },
    );
  });

  test('100,000 values, by buckets', () => {
    const values = uniforms(100_000, 'many').map((u) => normalQuantile(u));
    for (const p of COVERAGES) expectTwin(values, p);
  });
});

/** Where sums may overflow or cancel: the picked figures alone. */
function expectPicked(values: Float64Array, coverage: number): void {
  const expected = plainSummary(Array.from(values), coverage);
  const found = summarise(values.slice(), coverage);
  expect([found.median + 0, found.low + 0, found.high + 0]).toEqual([
    expected.median + 0,
    expected.low + 0,
    expected.high + 0,
  ]);
  expect(found.shortest.map((x) => x + 0)).toEqual(expected.shortest.map((x) => x + 0));
}

describe('worked by hand', () => {
  test('JCGM 101:2008, 7.7.2 with M = 10 and p = 0.8: q = 8, r = 1 of {1, 2}', () => {
    const found = summarise(Float64Array.of(10, 2, 3, 4, 5, 6, 7, 8, 9, 1), 0.8);
    expect(found).toMatchObject({ median: 5.5, low: 1, high: 9, shortest: [1, 9], mean: 5.5 });
    expect(summarise(Float64Array.of(0, 2, 3, 4, 5, 6, 7, 8, 9, 9.5), 0.8).shortest).toEqual([2, 9.5]);
  });

  test('one value', () => {
    expect(summarise(Float64Array.of(3.5), 0.95)).toEqual({
      mean: 3.5,
      sd: 0,
      median: 3.5,
      low: 3.5,
      high: 3.5,
      shortest: [3.5, 3.5],
    });
  });
});

test('NIST StRD NumAcc4: mean 10000000.2, standard deviation 0.1, to 1e-8', () => {
  // Certified values and data: NIST Statistical Reference Datasets, univariate summary statistics, NumAcc4 (1001 values).
  const values = Float64Array.from({ length: 1001 }, (_, i) =>
    i === 0 ? 10000000.2 : i % 2 === 1 ? 10000000.1 : 10000000.3,
  );
  const { mean, sd } = meanAndSd(values);
  expect(Math.abs(mean / 10000000.2 - 1)).toBeLessThan(1e-15);
  expect(Math.abs(sd - 0.1) / 0.1).toBeLessThan(1e-8);
});
