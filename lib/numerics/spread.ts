import { normalCdf, normalQuantile } from './normal';
import { Random, streamOf } from './random';

/** The four distributions of an input (JCGM 101:2008, 6.4), in the unit of its value. A triangular mode is the value. */
export type DrawSpread =
  | { shape: 'fixed' }
  | { shape: 'normal'; sd: number }
  | { shape: 'rectangular'; low: number; high: number }
  | { shape: 'triangular'; low: number; high: number };

/** Where a drawn value must lie. */
export interface DrawSupport {
  low: number;
  high: number;
  /** Whether the lower bound itself is excluded. */
  lowOpen: boolean;
}

export interface DrawQuantity {
  value: number;
  spread: DrawSpread;
  support: DrawSupport;
}

/**
 * Fills the first `count` places of `out` with draws of block number `block`. Draw k of a stream depends on (seed,
 * stream, block, place) alone. Normal spreads are truncated to the support by inverting within it.
 */
export function fillBlock(
  out: Float64Array,
  count: number,
  { value, spread, support }: DrawQuantity,
  seed: number,
  stream: string,
  block: number,
): void {
  const random = new Random(seed, streamOf(stream), block);
  if (spread.shape === 'fixed') out.fill(value, 0, count);
  else if (spread.shape === 'rectangular') {
    const width = spread.high - spread.low;
    for (let k = 0; k < count; k++) out[k] = spread.low + width * random.uniform();
  } else if (spread.shape === 'triangular') fillTriangular(out, count, value, spread.low, spread.high, random);
  else fillNormal(out, count, value, spread.sd, support, random);
}

function fillTriangular(out: Float64Array, count: number, mode: number, low: number, high: number, random: Random): void {
  const width = high - low;
  const split = (mode - low) / width;
  for (let k = 0; k < count; k++) {
    const p = random.uniform();
    out[k] =
      p < split ? low + Math.sqrt(p * width * (mode - low)) : high - Math.sqrt((1 - p) * width * (high - mode));
  }
}

/** Further than this from a bound, in standard uncertainties, no draw of 53 bits reaches it. */
const FAR = 9;

function fillNormal(out: Float64Array, count: number, mean: number, sd: number, support: DrawSupport, random: Random): void {
  const from = (support.low - mean) / sd;
  const to = (support.high - mean) / sd;
  if (from < -FAR && to > FAR) {
    for (let k = 0; k < count; k++) out[k] = mean + sd * normalQuantile(random.uniform());
    return;
  }
  // Inverting within the bounds is what redrawing until inside would give. From above 0 the upper tail keeps its digits.
  const mirrored = from > 0;
  const [a, b] = mirrored ? [-to, -from] : [from, to];
  const [lowest, highest] = [normalCdf(a), normalCdf(b)];
  for (let k = 0; k < count; k++) {
    const z = normalQuantile(lowest + (highest - lowest) * random.uniform());
    const x = mean + sd * (mirrored ? -z : z);
    out[k] = Math.min(support.high, Math.max(x, support.lowOpen ? Math.max(support.low, Number.MIN_VALUE) : support.low));
  }
}

/** Standard uncertainty that a spread states (JCGM 100, 4.3), before any truncation. */
export function standardUncertainty(value: number, spread: DrawSpread): number {
  if (spread.shape === 'fixed') return 0;
  if (spread.shape === 'normal') return spread.sd;
  const { low, high } = spread;
  if (spread.shape === 'rectangular') return (high - low) / Math.sqrt(12);
  return Math.sqrt((low * low + high * high + value * value - low * high - low * value - high * value) / 18);
}
