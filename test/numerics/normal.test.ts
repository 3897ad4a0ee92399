import { expect, test } from 'vitest';
import { normalCumulative, normalQuantiles } from '@/lib/numerics/normal';
import { precise, preciseNormalCumulative, relativeError } from '../support/precise';
import { normalQuantile } from '../support/sample';

/** Against decimal.js at 50 digits (series and continued fraction, test/support/precise.ts). */

test('the twin itself: published points of the standard normal distribution (JCGM 101:2008 table of 95 %, 99 %)', () => {
  expect(preciseNormalCumulative(precise(1.959963984540054)).toNumber()).toBeCloseTo(0.975, 15);
  expect(preciseNormalCumulative(precise(2.5758293035489004)).toNumber()).toBeCloseTo(0.995, 15);
  // Both of its branches meet at 4.
  const below = preciseNormalCumulative(precise(-3.9999999999999996));
  expect(relativeError(below.toNumber(), preciseNormalCumulative(precise(-4)))).toBeLessThan(1e-14);
});

test('cumulative: relative error below 1e-13 from -37 to 8', () => {
  for (let z = -36.97; z < 8; z += 0.137)
    expect(relativeError(normalCumulative(z), preciseNormalCumulative(precise(z))), `z = ${z}`).toBeLessThan(1e-13);
  expect([normalCumulative(-38), normalCumulative(-Infinity), normalCumulative(Infinity), normalCumulative(0)]).toEqual(
    [0, 0, 1, 0.5],
  );
});

test('quantile: the share below it is p, to 1e-14 of z, from 1e-290 to 1 - 1e-15', () => {
  // A relative error d of z shows as a relative error d z density(z) / p in the share.
  for (let exponent = -290; exponent < -0.4; exponent += 1.7) expectQuantile(10 ** exponent);
  for (let p = 0.01; p < 1; p += 0.0093) expectQuantile(p);
  for (let exponent = -15; exponent < -1; exponent += 0.7) expectQuantile(1 - 10 ** exponent);
});

function expectQuantile(p: number): void {
  const z = normalQuantile(p);
  const share = preciseNormalCumulative(precise(z));
  const density = precise(z)
    .pow(2)
    .div(-2)
    .exp()
    .div(Math.sqrt(2 * Math.PI));
  const off = precise(p).minus(share).div(density).abs().toNumber();
  expect(off, `p = ${p}`).toBeLessThan(1e-14 * Math.max(1, Math.abs(z)));
}

test('odd about one half', () => {
  for (const p of [0.03125, 0.0625, 0.25, 0.4375]) expect(normalQuantile(1 - p)).toBe(-normalQuantile(p));
  expect(normalQuantile(0.5)).toBe(0);
});

test('many at once are as one by one, wherever the tails lie among them; more than a block is our mistake', () => {
  const shares = Float64Array.from({ length: 1024 }, (_, i) => ((i * 619) % 1024) / 1024 + 1 / 4096);
  const all = shares.slice();
  normalQuantiles(all, 1000);
  expect(Array.from(all.subarray(0, 1000))).toEqual(Array.from(shares.subarray(0, 1000), normalQuantile));
  expect(all.subarray(1000)).toEqual(shares.subarray(1000));
  expect(() => normalQuantiles(new Float64Array(2000), 1025)).toThrow(RangeError);
});
