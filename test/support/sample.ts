import { normalQuantiles } from '@/lib/numerics/normal';
import { type DrawSpread, type DrawSupport, fillBlock } from '@/lib/numerics/spread';
import { fillUniforms, seededState } from '@/lib/numerics/random';

/** Samples for tests of the uncertainty engine: its own spreads, and the ones that it does not have, built from its uniforms. */

/** One quantile of the standard normal distribution. */
export function normalQuantile(p: number): number {
  const one = Float64Array.of(p);
  normalQuantiles(one, 1);
  return one[0];
}

const BLOCK = 1024;
const ANYWHERE: DrawSupport = { low: -Infinity, high: Infinity, lowOpen: false };

/** n draws of an input of the engine, block by block, as the kernel makes them. */
export function drawn(n: number, seed: number, name: string, value: number, spread: DrawSpread): Float64Array {
  const all = new Float64Array(Math.ceil(n / BLOCK) * BLOCK);
  for (let at = 0; at < n; at += BLOCK)
    fillBlock(all.subarray(at, at + BLOCK), BLOCK, { value, spread, support: ANYWHERE }, seed, name, at / BLOCK);
  return all.subarray(0, n);
}

export const normal = (n: number, seed: number, name: string, value: number, sd: number): Float64Array =>
  drawn(n, seed, name, value, { shape: 'normal', sd });

export const rectangular = (n: number, seed: number, name: string, low: number, high: number): Float64Array =>
  drawn(n, seed, name, (low + high) / 2, { shape: 'rectangular', low, high });

const uniform = (n: number, seed: number, name: string): Float64Array => {
  const out = new Float64Array(n);
  fillUniforms(seededState(seed, name, 0), out, n);
  return out;
};

/** Scaled and shifted t-distribution (JCGM 101:2008, 6.4.9): a normal over the root of a chi-square by its degrees. Not a spread of the engine. */
export function studentT(
  n: number,
  seed: number,
  name: string,
  degrees: number,
  value: number,
  scale: number,
): Float64Array {
  const squares = new Float64Array(n);
  for (let i = 0; i < degrees; i++) {
    const z = normal(n, seed, `${name} ${i}`, 0, 1);
    for (let k = 0; k < n; k++) squares[k] += z[k] * z[k];
  }
  return normal(n, seed, name, 0, 1).map((z, k) => value + (scale * z) / Math.sqrt(squares[k] / degrees));
}

/** Arc sine (U-shaped) distribution (JCGM 101:2008, 6.4.6). Not a spread of the engine. */
export const arcsine = (n: number, seed: number, name: string, low: number, high: number): Float64Array =>
  uniform(n, seed, name).map((u) => (low + high) / 2 + ((high - low) / 2) * Math.sin(2 * Math.PI * u));

/** Rectangular distribution with inexact limits (curvilinear trapezoid, JCGM 101:2008, 6.4.3). Not a spread of the engine. */
export function inexactRectangular(
  n: number,
  seed: number,
  name: string,
  a: number,
  b: number,
  d: number,
): Float64Array {
  const within = uniform(n, seed, `${name} within`);
  return uniform(n, seed, `${name} limit`).map((u, k) => {
    const low = a - d + 2 * d * u;
    return low + (a + b - 2 * low) * within[k];
  });
}
