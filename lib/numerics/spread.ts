import { normalCumulative, normalQuantiles } from './normal';
import { fillUniforms, seededState } from './random';

/** How an input varies (JCGM 101:2008 clause 6.4), in the units of its value. A triangular spread has its mode at the value. */
export type DrawSpread =
  | { shape: 'fixed' }
  | { shape: 'normal'; sd: number }
  | { shape: 'rectangular'; low: number; high: number }
  | { shape: 'triangular'; low: number; high: number };

/** Where physics allows the input to lie; the value does. */
export interface DrawSupport {
  low: number;
  high: number;
  /** Whether `low` itself is excluded. */
  lowOpen: boolean;
}

interface Drawn {
  value: number;
  spread: DrawSpread;
  support: DrawSupport;
}

/**
 * Fills out[0 .. count - 1] with the draws of one block of an input. Draw k depends on (seed, stream, block, k) alone: one
 * uniform number is used for each, put through the inverse distribution, so a changed spread moves the draws without
 * shuffling them. A normal spread is cut to its support exactly, as redrawing would.
 */
export function fillBlock(
  out: Float64Array,
  count: number,
  drawn: Drawn,
  seed: number,
  stream: string,
  block: number,
): void {
  if (drawn.spread.shape === 'fixed') {
    out.fill(drawn.value, 0, count);
    return;
  }
  fillUniforms(seededState(seed, stream, block), out, count);
  spreadUniforms(out, count, drawn);
}

/** Puts uniform numbers of (0, 1) in out[0 .. count - 1] through the inverse distribution of an input, in place. */
export function spreadUniforms(out: Float64Array, count: number, { value, spread, support }: Drawn): void {
  if (spread.shape === 'fixed') out.fill(value, 0, count);
  else if (spread.shape === 'normal') toNormal(out, count, value, spread.sd, support);
  else if (spread.shape === 'rectangular') toRectangular(out, count, spread.low, spread.high);
  else toTriangular(out, count, value, spread.low, spread.high);
}

/** A support narrower than this many standard deviations about the value sees a flat density, to 1e-12. */
const FLAT = 1e-6;

function toNormal(
  out: Float64Array,
  count: number,
  value: number,
  sd: number,
  { low, high, lowOpen }: DrawSupport,
): void {
  if (high - low < FLAT * sd) {
    toRectangular(out, count, low, high);
    return;
  }
  const below = normalCumulative((low - value) / sd);
  const share = normalCumulative((high - value) / sd) - below;
  const least = lowOpen ? low + Number.MIN_VALUE : low; // rounding may reach the edge itself
  for (let k = 0; k < count; k++) out[k] = below + share * out[k];
  normalQuantiles(out, count);
  for (let k = 0; k < count; k++) out[k] = Math.min(high, Math.max(least, value + sd * out[k]));
}

function toRectangular(out: Float64Array, count: number, low: number, high: number): void {
  for (let k = 0; k < count; k++) out[k] = low + (high - low) * out[k];
}

function toTriangular(out: Float64Array, count: number, mode: number, low: number, high: number): void {
  const width = high - low;
  const rising = (mode - low) / width;
  for (let k = 0; k < count; k++) {
    const u = out[k];
    out[k] = u < rising ? low + Math.sqrt(u * width * (mode - low)) : high - Math.sqrt((1 - u) * width * (high - mode));
  }
}

/** Standard uncertainty of a spread about its value, before any cut to the support (JCGM 100:2008, 4.3.7 and 4.3.9). */
export function standardUncertainty(value: number, spread: DrawSpread): number {
  if (spread.shape === 'fixed') return 0;
  if (spread.shape === 'normal') return spread.sd;
  const { low, high } = spread;
  if (spread.shape === 'rectangular') return (high - low) / Math.sqrt(12);
  return Math.sqrt((low * low + high * high + value * value - low * high - low * value - high * value) / 18);
}

/** Mean of a spread about its value, before any cut to the support. */
export function meanOf(value: number, spread: DrawSpread): number {
  if (spread.shape === 'rectangular') return (spread.low + spread.high) / 2;
  if (spread.shape === 'triangular') return (spread.low + spread.high + value) / 3;
  return value;
}
