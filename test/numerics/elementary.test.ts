import type { Decimal } from 'decimal.js';
import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { atan, atan2, cos, exp, hypot, log, sin, tan } from '@/lib/numerics/elementary';
import { Precise, precise, ulpsFrom } from '../support/precise';

/** Each function against decimal.js at 50 digits. The limits in units in the last place are what the comments promise. */

const SEED = 20261201;
const RUNS = 1500;

/** Numbers of every size up to 10^high, both signs. */
const ofAnySize = (low: number, high: number) =>
  fc
    .tuple(fc.double({ min: low, max: high, noNaN: true }), fc.boolean())
    .map(([power, negative]) => (negative ? -1 : 1) * 10 ** power);

function worst(numbers: fc.Arbitrary<number>, found: (x: number) => number, truth: (x: Decimal) => Decimal): number {
  let most = 0;
  for (const x of fc.sample(numbers, { seed: SEED, numRuns: RUNS }))
    most = Math.max(most, ulpsFrom(found(x), truth(precise(x))));
  return most;
}

describe('against decimal.js at 50 digits', () => {
  test('sin and cos within 1 unit in the last place up to 8e5 rad', () => {
    const angles = ofAnySize(-8, 5.9);
    expect(worst(angles, sin, (x) => x.sin())).toBeLessThan(1);
    expect(worst(angles, cos, (x) => x.cos())).toBeLessThan(1);
  });

  test('sin and cos where the reduction is hardest: next to multiples of a quarter turn', () => {
    const nearMultiples = fc
      .tuple(fc.integer({ min: -500_000, max: 500_000 }), fc.integer({ min: -3, max: 3 }))
      .map(([n, off]) => {
        const near = n * (Math.PI / 2);
        return near + off * Math.abs(near) * Number.EPSILON;
      });
    expect(worst(nearMultiples, sin, (x) => x.sin())).toBeLessThan(1);
    expect(worst(nearMultiples, cos, (x) => x.cos())).toBeLessThan(1);
  });

  test('tan within 2', () => expect(worst(ofAnySize(-8, 5.9), tan, (x) => x.tan())).toBeLessThan(2));
  test('atan within 1', () => expect(worst(ofAnySize(-10, 20), atan, (x) => x.atan())).toBeLessThan(1));
  test('log within 1', () => {
    expect(worst(ofAnySize(-300, 300).map(Math.abs), log, (x) => x.ln())).toBeLessThan(1);
    expect(worst(fc.double({ min: 0.5, max: 2, noNaN: true }), log, (x) => x.ln())).toBeLessThan(1);
  });
  test('exp within 1', () =>
    expect(worst(fc.double({ min: -700, max: 709, noNaN: true }), exp, (x) => x.exp())).toBeLessThan(1));

  test('atan2 within 2, in all four quadrants', () => {
    const pairs = fc.sample(fc.tuple(ofAnySize(-6, 6), ofAnySize(-6, 6)), { seed: SEED, numRuns: RUNS });
    for (const [y, x] of pairs) expect(ulpsFrom(atan2(y, x), Precise.atan2(precise(y), precise(x)))).toBeLessThan(2);
  });

  test('hypot within 2', () => {
    const pairs = fc.sample(fc.tuple(ofAnySize(-6, 6), ofAnySize(-6, 6)), { seed: SEED, numRuns: RUNS });
    for (const [x, y] of pairs)
      expect(ulpsFrom(hypot(x, y), precise(x).pow(2).plus(precise(y).pow(2)).sqrt())).toBeLessThan(2);
  });
});

describe('special values are those of the language', () => {
  const special = [0, -0, 1, -1, Infinity, -Infinity, NaN, 5e-324, -5e-324, 1e308, 0.4375, 0.6875, 1.1875, 2.4375];

  test.each([
    ['atan', atan, Math.atan],
    ['exp', exp, Math.exp],
    ['log', log, Math.log],
  ])('%s', (_, found, builtIn) => {
    for (const x of special) expect(relative(found(x), builtIn(x)), `at ${x}`).toBeLessThan(4e-16);
  });

  test('sin and cos', () => {
    for (const x of [0, 1, -1, 5e-324]) expect(relative(sin(x), Math.sin(x))).toBeLessThan(4e-16);
    expect(sin(-0)).toBe(-0);
    for (const x of [Infinity, -Infinity, NaN]) expect([sin(x), cos(x)]).toEqual([NaN, NaN]);
  });

  test('atan2', () => {
    for (const y of special)
      for (const x of special) expect(relative(atan2(y, x), Math.atan2(y, x)), `(${y}, ${x})`).toBeLessThan(4e-16);
  });

  test('subnormal results of exp', () => {
    for (const x of [-744.9, -720, -708.5])
      expect(Math.abs(exp(x) - Math.exp(x))).toBeLessThanOrEqual(5e-324 + Math.exp(x) * 4e-16);
  });
});

/** 0 where both are the same number, the same infinity, the same zero with its sign, or both NaN. */
function relative(found: number, expected: number): number {
  if (Object.is(found, expected)) return 0;
  return expected === 0 || !Number.isFinite(expected) ? Infinity : Math.abs(found / expected - 1);
}

test('the bits are pinned: a change of any result here is a change of the engine', () => {
  const xs = Array.from({ length: 2000 }, (_, i) => (i - 1000) * 0.37 + 1 / (i + 3));
  const bits = xs.flatMap((x) => [sin(x), cos(x), atan(x), atan2(x, 3 - x), exp(x / 4), log(Math.abs(x))]);
  const bytes = new Uint32Array(new Float64Array(bits).buffer);
  expect(bytes.reduce((hash, word) => Math.imul(hash ^ word, 16777619) >>> 0, 2166136261)).toBe(2022055803);
});
