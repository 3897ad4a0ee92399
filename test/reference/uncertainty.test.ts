import { describe, expect, test } from 'vitest';
import { atan2, hypot, log } from '@/lib/numerics/elementary';
import { summarise } from '@/lib/numerics/quantile';
import { standardUncertainty } from '@/lib/numerics/spread';
import { arcsine, inexactRectangular, normal, rectangular, studentT } from '../support/sample';

/**
 * The uncertainty engine (draws and summary) against the examples of the guides. Tolerances: half a unit of the last printed
 * digit, or what exact mathematics gives, plus four standard errors of the Monte Carlo: 4 u/sqrt(M) on a mean,
 * about 4 u/sqrt(2M) on a standard uncertainty, and as stated on the ends of intervals. Seeds are fixed.
 */
const M = 1_000_000;
const SEED = 101;
const MEAN = 4 / Math.sqrt(M);
const SPREAD = 4 / Math.sqrt(2 * M);

const over = (n: number, f: (k: number) => number): Float64Array => Float64Array.from({ length: n }, (_, k) => f(k));
const expectNear = (found: number, expected: number, tolerance: number): void =>
  expect(Math.abs(found - expected)).toBeLessThan(tolerance);

describe('JCGM 101:2008, 9.2: additive model of four inputs', () => {
  const sum = (...inputs: Float64Array[]) => over(M, (k) => inputs.reduce((total, input) => total + input[k], 0));

  test('9.2.2 four normal: u 2.0, 95 % within 3.92', () => {
    const found = summarise(sum(...['a', 'b', 'c', 'd'].map((name) => normal(M, SEED, name, 0, 1))), 0.95);
    expectNear(found.mean, 0, 2 * MEAN);
    expectNear(found.sd, 2, 2 * SPREAD);
    for (const [low, high] of [[found.low, found.high], found.shortest]) {
      expectNear(high - low, 2 * 3.92, 0.03);
      expectNear(low, -3.92, 0.06);
    }
  });

  test('9.2.3 four rectangular: u 2.0, 95 % within 3.88 (exactly 2 sqrt 3 (2 - (3/5)^(1/4)) = 3.87941)', () => {
    const half = Math.sqrt(3);
    const found = summarise(sum(...['a', 'b', 'c', 'd'].map((name) => rectangular(M, SEED, name, -half, half))), 0.95);
    expectNear(found.sd, 2, 2 * SPREAD);
    expectNear(found.high, 2 * half * (2 - (3 / 5) ** 0.25), 0.016);
    expectNear(found.low, -3.87941, 0.016);
    expectNear(found.shortest[1] - found.shortest[0], 2 * 3.88, 0.03);
  });

  test('9.2.4 one of the rectangular inputs ten times as wide: u 10.1, 95 % within 17.0, not 19.9', () => {
    const half = Math.sqrt(3);
    const found = summarise(
      sum(
        ...['a', 'b', 'c'].map((name) => rectangular(M, SEED, name, -half, half)),
        rectangular(M, SEED, 'd', -10 * half, 10 * half),
      ),
      0.95,
    );
    expectNear(found.sd, Math.sqrt(103), 10 * SPREAD);
    expectNear(found.high, 17.02, 0.05);
    expectNear(found.low, -17.02, 0.05);
  });
});

test('JCGM 101:2008, 9.3: calibration of a mass; 1.2341 mg and 0.0754 mg (first order alone gives 0.0539)', () => {
  const reference = normal(M, SEED, 'mR', 100_000, 0.05);
  const added = normal(M, SEED, 'dm', 1.234, 0.02);
  const air = rectangular(M, SEED, 'air', 1.1, 1.3);
  const weight = rectangular(M, SEED, 'W', 7000, 9000);
  const standard = rectangular(M, SEED, 'R', 7950, 8050);
  const found = summarise(
    over(M, (k) => (reference[k] + added[k]) * (1 + (air[k] - 1.2) * (1 / weight[k] - 1 / standard[k])) - 100_000),
    0.95,
  );
  expectNear(found.mean, 1.234, 0.00005 + 0.08 * MEAN);
  expectNear(found.sd, 0.0754, 0.00005 + 0.08 * SPREAD);
  // Recomputed from the same inputs by another program: 1.0848 and 1.3837.
  expectNear(found.low, 1.0848, 0.001);
  expectNear(found.high, 1.3837, 0.001);
});

describe('JCGM 101:2008, 9.4: comparison loss in microwave power meter calibration', () => {
  // Mean x1^2 + 2 u^2 and variance 4 u^2 x1^2 + 4 u^4 (1 + r^2) are exact; shortest 95 % intervals in 1e-6 as recomputed by
  // another program (published to three digits). First order gives u 0 at x1 = 0.
  const U = 0.005;
  const loss = (x1: number, r: number) => {
    const [a, b] = [normal(M, SEED, 'X1', 0, U), normal(M, SEED, 'X2', 0, U)];
    const along = Math.sqrt(1 - r * r);
    return summarise(
      over(M, (k) => (x1 + a[k]) ** 2 + (r * a[k] + along * b[k]) ** 2),
      0.95,
    );
  };
  // The shortest interval of a flat-topped histogram is found to about M^(-1/3): 2 % of u, and 3 % where it has two free ends.
  test.each([
    [0, 0, 50, 50, [0, 150]],
    [0.01, 0, 150, 112, [0, 366]],
    [0.05, 0, 2550, 502, [1592, 3547]],
    [0, 0.9, 50, 67, [0, 185]],
    [0.01, 0.9, 150, 121, [13, 398]],
    [0.05, 0.9, 2550, 504, [1622, 3552]],
  ])('x1 = %d, correlation %d', (x1, r, mean, sd, shortest) => {
    const found = loss(x1, r);
    const exact = Math.sqrt(4 * U * U * x1 * x1 + 4 * U ** 4 * (1 + r * r));
    expectNear(found.mean, x1 * x1 + 2 * U * U, exact * MEAN);
    expectNear(exact * 1e6, sd, 0.55);
    expectNear(found.mean * 1e6, mean, 0.5 + 500 * MEAN);
    expectNear(found.sd, exact, 3 * exact * SPREAD); // its kurtosis is up to 15
    expectNear((found.shortest[1] - found.shortest[0]) * 1e6, shortest[1] - shortest[0], 0.5 + 0.01 * sd);
    expectNear(found.shortest[0] * 1e6, shortest[0], 0.5 + 0.08 * sd);
  });
});

describe('gauge block', () => {
  test('JCGM 101:2008, 9.5: 838 nm, u 36 nm, 99 % from 745 to 932 nm', () => {
    // t, arc sine and inexact rectangular inputs are built by the test: the engine has no such spreads. What is held to the
    // standard here is its normal and rectangular draws and its summary.
    const n = 400_000;
    const length = studentT(n, SEED, 'Ls', 18, 50_000_623, 25);
    const difference = studentT(n, SEED, 'D', 24, 215, 6);
    const [random, systematic] = [studentT(n, SEED, 'd1', 5, 0, 4), studentT(n, SEED, 'd2', 8, 0, 7)];
    const expansion = rectangular(n, SEED, 'as', 9.5e-6, 13.5e-6);
    const [mean, cycle] = [normal(n, SEED, 'theta0', -0.1, 0.2), arcsine(n, SEED, 'Delta', -0.5, 0.5)];
    const unlike = inexactRectangular(n, SEED, 'da', -1e-6, 1e-6, 0.1e-6);
    const warmer = inexactRectangular(n, SEED, 'dt', -0.05, 0.05, 0.025);
    const found = summarise(
      over(
        n,
        (k) =>
          length[k] +
          difference[k] +
          random[k] +
          systematic[k] -
          length[k] * (unlike[k] * (mean[k] + cycle[k]) + expansion[k] * warmer[k]) -
          50_000_000,
      ),
      0.99,
    );
    expectNear(found.mean, 838, 0.5 + 36 * (4 / Math.sqrt(n)));
    expectNear(found.sd, 35.81, 0.1 + 36 * (4 / Math.sqrt(2 * n)));
    expectNear(found.sd, 36, 0.5);
    expectNear(found.low, 744, 1.5); // printed 745; 744 recomputed: an end of 99 % stands on 0.5 % of the draws
    expectNear(found.high, 932, 1.5);
  });

  test('JCGM 100:2008 (GUM), H.1: 50 000 838 nm; u 32 nm to first order, 34 nm to second', () => {
    const budget = [
      25,
      50_000_623 * 11.5e-6 * standardUncertainty(0, { shape: 'rectangular', low: -0.05, high: 0.05 }),
      6.7,
      5.8,
      3.9,
      50_000_623 * 0.1 * standardUncertainty(0, { shape: 'rectangular', low: -1e-6, high: 1e-6 }),
    ];
    expectNear(budget[1], 16.599, 6e-4);
    expectNear(budget[5], 2.88679, 6e-6);
    expectNear(Math.sqrt(budget.reduce((sum, u) => sum + u * u, 0)), 31.66, 6e-3);

    const inputs = [normal(M, SEED, 'ls', 50_000_623, 25), normal(M, SEED, 'd', 215, 9.7)];
    const expansion = rectangular(M, SEED, 'as', 9.5e-6, 13.5e-6);
    const unlike = rectangular(M, SEED, 'da', -1e-6, 1e-6);
    const warmer = rectangular(M, SEED, 'dt', -0.05, 0.05);
    const temperature = normal(M, SEED, 'theta', -0.1, 0.41);
    const found = summarise(
      over(
        M,
        (k) => inputs[0][k] + inputs[1][k] - inputs[0][k] * (unlike[k] * temperature[k] + expansion[k] * warmer[k]),
      ),
      0.95,
    );
    expectNear(found.mean, 50_000_838, 0.5);
    expectNear(found.sd, 33.81, 0.05 + 34 * SPREAD);
  });
});

describe('GUM-5:2026 (JCGM, DOI 10.59161/YNLY8209)', () => {
  test('example 3, molar mass of glucose: 180.1557, u 0.0038', () => {
    const [H, C, O] = [
      normal(M, SEED, 'H', 1.00798, 0.00008),
      normal(M, SEED, 'C', 12.0106, 0.00058),
      normal(M, SEED, 'O', 15.9994, 0.00021),
    ];
    const found = summarise(
      over(M, (k) => 12 * H[k] + 6 * C[k] + 6 * O[k]),
      0.95,
    );
    expectNear(found.mean, 180.1557, 0.00005 + 0.004 * MEAN + 0.0001);
    expectNear(found.sd, 0.0038, 0.00005 + 0.004 * SPREAD);
  });

  test('example 14, decay: 10.810, u 0.054', () => {
    const [start, halfLife] = [normal(M, SEED, 'A', 11.45, 0.05), normal(M, SEED, 'T', 32.9, 1.4)];
    const found = summarise(
      over(M, (k) => start[k] * Math.exp((-2.73 * Math.LN2) / halfLife[k])),
      0.95,
    );
    expectNear(found.median, 10.81, 0.001);
    expectNear(found.sd, 0.054, 0.0006);
  });
});

describe('skewed and awkward', () => {
  test('NIST TN 1900, example E3, a ratio like those of speeds: mean 5.82, u 1.11, 95 % from 4.05 to 8.39', () => {
    const [top, rate, below] = [
      normal(M, SEED, 'a', 4.63, 0.0463),
      normal(M, SEED, 'b', 61, 6.1),
      normal(M, SEED, 'c', 36.6, 5.49),
    ];
    const found = summarise(
      over(M, (k) => (top[k] * rate[k] * (2217 - 1180)) / (below[k] * (2217 - 810))),
      0.95,
    );
    expectNear(found.mean, 5.82, 0.006);
    expectNear(found.sd, 1.11, 0.011);
    expectNear(found.low, 4.05, 0.01);
    expectNear(found.high, 8.39, 0.02);
  });

  test('NIST TN 1900, example E13: 1.7266e-5, u 1.76e-6', () => {
    const [hot, cold, rise] = [
      normal(M, SEED, 'hot', 1.5021, 1e-4),
      normal(M, SEED, 'cold', 1.4999, 2e-4),
      normal(M, SEED, 'rise', 84.95, 0.05),
    ];
    const found = summarise(
      over(M, (k) => (hot[k] - cold[k]) / (cold[k] * rise[k])),
      0.95,
    );
    expectNear(found.mean, 1.7266e-5, 1.8e-6 * MEAN + 1e-9);
    expectNear(found.sd, 1.76e-6, 0.006e-6);
  });

  test('y = ln x, x rectangular on 0.1 to 1.1: mean -0.665 (exactly -0.664900), u 0.606, shortest 95 % from ln 0.15 to ln 1.1', () => {
    // suncal, test_NPLlog; the exact mean and interval follow from the density e^y. First order gives -0.511 and 0.481.
    const found = summarise(rectangular(M, SEED, 'x', 0.1, 1.1).map(log), 0.95);
    expectNear(found.mean, -0.6649, 0.61 * MEAN);
    expectNear(found.sd, 0.606, 0.0005 + 0.61 * SPREAD);
    expectNear(found.shortest[0], Math.log(0.15), 0.012);
    expectNear(found.shortest[1], Math.log(1.1), 1e-4);
  });

  test('JCGM 102, polar form of a short vector, like the direction of a small momentum: size 0.013, u 0.007; phase u 1.744', () => {
    // suncal, GUM supplement 2 example: 0.001 + 0i with u 0.010 each. First order gives 0.010 and 10.0 rad.
    const [re, im] = [normal(M, SEED, 're', 0.001, 0.01), normal(M, SEED, 'im', 0, 0.01)];
    const size = summarise(
      over(M, (k) => hypot(re[k], im[k])),
      0.95,
    );
    expectNear(size.mean, 0.013, 0.0005);
    expectNear(size.sd, 0.007, 0.0005);
    expectNear(
      summarise(
        over(M, (k) => atan2(im[k], re[k])),
        0.95,
      ).sd,
      1.744,
      0.0005 + 1.8 * SPREAD,
    );
  });
});
