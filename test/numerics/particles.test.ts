import { describe, expect, test } from 'vitest';
import { type Likelihood, NothingPossible, temper } from '@/lib/numerics/particles';
import { meanAndSd } from '@/lib/numerics/quantile';

const N = 2000;
const HALF_LOG_TWO_PI = 0.5 * Math.log(2 * Math.PI);
const logNormal = (x: number, mean: number, sd: number): number =>
  -(((x - mean) / sd) ** 2) / 2 - Math.log(sd) - HALF_LOG_TWO_PI;

const of = (dimension: number, logL: (z: Float64Array) => number): Likelihood => ({
  dimension,
  weigh: async (z) =>
    Float64Array.from({ length: z.length / dimension }, (_, k) => logL(z.subarray(k * dimension, (k + 1) * dimension))),
});

const component = (z: Float64Array, d: number, i: number) =>
  meanAndSd(Float64Array.from({ length: z.length / d }, (_, k) => z[k * d + i]));

/** Errors of a mean over particles that are not all independent: a sixth of a standard deviation at worst, with this seed fixed. */
const MEAN = 0.15;

describe('tempered particles against closed forms', () => {
  // Prior N(0, 1) in each unknown, y = a . z observed with sd s: conjugate (any text on linear Gaussian models).
  test('one observation of a sum: mean, spread, correlation and marginal likelihood', async () => {
    const [y, s] = [3, 0.1];
    const cloud = await temper(
      of(2, ([p, q]) => logNormal(y, p + q, s)),
      N,
      1,
      'sum',
    );
    const variance = 2 + s * s;
    const mean = y / variance;
    const sd = Math.sqrt(1 - 1 / variance);
    for (const i of [0, 1]) {
      const found = component(cloud.z, 2, i);
      expect(Math.abs(found.mean - mean)).toBeLessThan(MEAN * sd);
      expect(Math.abs(found.sd / sd - 1)).toBeLessThan(0.1);
    }
    const sums = meanAndSd(Float64Array.from({ length: N }, (_, k) => cloud.z[2 * k] + cloud.z[2 * k + 1]));
    expect(Math.abs(sums.mean - (2 * y) / variance)).toBeLessThan(0.02);
    expect(Math.abs(cloud.logEvidence - logNormal(y, 0, Math.sqrt(variance)))).toBeLessThan(0.3);
  });

  test('twenty unknowns, each observed: marginal likelihood and spreads', async () => {
    const d = 20;
    const data = Array.from({ length: d }, (_, i) => Math.sin(i));
    const cloud = await temper(
      of(d, (z) => data.reduce((sum, y, i) => sum + logNormal(y, z[i], 0.3), 0)),
      N,
      2,
      'many',
    );
    const exact = data.reduce((sum, y) => sum + logNormal(y, 0, Math.sqrt(1.09)), 0);
    expect(Math.abs(cloud.logEvidence - exact)).toBeLessThan(0.5);
    const sd = Math.sqrt(0.09 / 1.09);
    for (let i = 0; i < d; i++) {
      const found = component(cloud.z, d, i);
      expect(Math.abs(found.mean - data[i] / 1.09)).toBeLessThan(MEAN * sd);
      expect(Math.abs(found.sd / sd - 1)).toBeLessThan(0.12);
    }
  });

  // Bayes factor of theta = 0 against theta ~ N(0, 2^2) for x = 1.2, sigma = 1: N(1.2; 0, 1) / N(1.2; 0, sqrt 5) = 0.7956 in
  // the form 1 / ratio as tabled by hand from the two densities.
  test('a point hypothesis against a wide one: the ratio of marginal likelihoods', async () => {
    const wide = await temper(
      of(1, ([z]) => logNormal(1.2, 2 * z, 1)),
      20_000,
      3,
      'wide',
    );
    const point = logNormal(1.2, 0, 1);
    const exact = logNormal(1.2, 0, 1) - logNormal(1.2, 0, Math.sqrt(5));
    expect(Math.abs(Math.exp(point - wide.logEvidence) - Math.exp(exact))).toBeLessThan(0.03);
    expect(Math.exp(-exact)).toBeCloseTo(0.7956, 3);
  });

  test('two modes are both found, with their shares', async () => {
    const both = (z: number): number =>
      Math.log(0.7 * Math.exp(logNormal(z, -1.5, 0.1)) + 0.3 * Math.exp(logNormal(z, 1.5, 0.1)));
    const cloud = await temper(
      of(1, ([z]) => both(z)),
      4000,
      4,
      'modes',
    );
    const left = cloud.z.filter((z) => z < 0).length / 4000;
    // The prior weighs both alike; systematic resampling leaves an error of about 0.01.
    expect(Math.abs(left - 0.7)).toBeLessThan(0.05);
  });

  test('the same seed and stream give the same digits, another stream others', async () => {
    const run = (stream: string) =>
      temper(
        of(2, ([p, q]) => logNormal(1, p * q, 0.2)),
        500,
        5,
        stream,
      );
    const [a, b, c] = [await run('a'), await run('a'), await run('b')];
    expect(b).toEqual(a);
    expect(c.z).not.toEqual(a.z);
  });

  test('where no particle is possible, that is said', async () => {
    await expect(
      temper(
        of(1, () => -Infinity),
        100,
        6,
        'none',
      ),
    ).rejects.toThrow(NothingPossible);
  });
});
