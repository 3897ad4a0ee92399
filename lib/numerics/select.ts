/** The ends and the middle of sorted values. */
export interface Ends {
  /** The k least and the k greatest, each in rising order. */
  lowest: Float64Array;
  highest: Float64Array;
  /** The middle value, or half way between the middle two. */
  median: number;
}

/** Fewer values than this are sorted at once. */
const FEW = 256;

/** Ends of n >= 1 finite values, which may be reordered; 1 <= k <= n. Equal to sorting to the last bit. */
export function selectEnds(values: Float64Array, k: number): Ends {
  const n = values.length;
  const selected = n < FEW || 4 * k > n ? null : selectByBuckets(values, k);
  if (selected) return selected;
  values.sort();
  return { lowest: values.subarray(0, k), highest: values.subarray(n - k), median: medianOf(values, 0, n) };
}

/** Median of n values of which sorted[0] has rank `before`. */
const medianOf = (sorted: Float64Array, before: number, n: number): number =>
  (sorted[((n - 1) >> 1) - before] + sorted[(n >> 1) - before]) / 2;

/**
 * A quarter as many equal buckets as values. A value's bucket never falls as the value rises, so only the buckets at the ends and in
 * the middle need be sorted inside. null where buckets do not help: all equal, too wide, or nearly all in few buckets.
 */
function selectByBuckets(values: Float64Array, k: number): Ends | null {
  const n = values.length;
  const { low, high } = rangeOf(values);
  const buckets = n >> 2;
  const scale = (buckets - 1) / (high - low);
  if (!(scale > 0 && scale < Infinity)) return null;
  const counts = new Uint32Array(buckets);
  for (let i = 0; i < n; i++) counts[((values[i] - low) * scale) | 0]++;
  const bounds = boundsOf(counts, n, k);
  if (bounds === null || isCrowded(counts, n, bounds)) return null;
  const kept = new Float64Array(placesFromCounts(counts, bounds));
  collect(values, low, scale, bounds, counts, kept);
  sortNearly(kept);
  return {
    lowest: kept.subarray(0, k),
    highest: kept.subarray(kept.length - k),
    median: medianOf(kept, bounds.skipped, n),
  };
}

function rangeOf(values: Float64Array): { low: number; high: number } {
  let low = values[0];
  let high = low;
  for (let i = 1; i < values.length; i++) {
    const x = values[i];
    if (x < low) low = x;
    else if (x > high) high = x;
  }
  return { low, high };
}

/** The buckets to keep: 0 .. bottom - 1, from .. to - 1 about the median, top .. end. */
interface Bounds {
  bottom: number;
  from: number;
  to: number;
  top: number;
  /** How many values lie between the bottom buckets and the middle ones. */
  skipped: number;
}

/** The buckets of the k least, of the median and of the k greatest; null where they overlap. */
function boundsOf(counts: Uint32Array, n: number, k: number): Bounds | null {
  let bottom = 0;
  let lowest = 0;
  while (lowest < k) lowest += counts[bottom++];
  let top = counts.length;
  let highest = 0;
  while (highest < k) highest += counts[--top];
  let from = bottom;
  let before = lowest;
  while (from < top && before + counts[from] <= (n - 1) >> 1) before += counts[from++];
  let to = from;
  let through = before;
  while (to < top && through <= n >> 1) through += counts[to++];
  const inside = bottom <= from && from < to && before <= (n - 1) >> 1 && through > n >> 1;
  return inside ? { bottom, from, to, top, skipped: before - lowest } : null;
}

/** Putting a bucket in order takes about the square of its values; beyond this many per value in all, sorting is quicker. */
const CROWDED = 8;

function isCrowded(counts: Uint32Array, n: number, { bottom, from, to, top }: Bounds): boolean {
  let squares = 0;
  for (let bucket = 0; bucket < counts.length; bucket++)
    if (bucket < bottom || bucket >= top || (bucket >= from && bucket < to)) squares += counts[bucket] * counts[bucket];
  return squares > CROWDED * n;
}

/** Turns the counts of the kept buckets into the places where their values begin; returns how many values there are. */
function placesFromCounts(counts: Uint32Array, { bottom, from, to, top }: Bounds): number {
  let place = 0;
  for (let bucket = 0; bucket < counts.length; bucket++) {
    if (bucket === bottom) bucket = from;
    if (bucket === to) bucket = top;
    const count = counts[bucket];
    counts[bucket] = place;
    place += count;
  }
  return place;
}

/** Puts the values of the kept buckets in their places, bucket after bucket. */
function collect(
  values: Float64Array,
  low: number,
  scale: number,
  { bottom, from, to, top }: Bounds,
  places: Uint32Array,
  kept: Float64Array,
): void {
  for (let i = 0; i < values.length; i++) {
    const x = values[i];
    const bucket = ((x - low) * scale) | 0;
    if (bucket < bottom || bucket >= top || (bucket >= from && bucket < to)) kept[places[bucket]++] = x;
  }
}

/** Insertion sort: quick where every value is near its place. */
function sortNearly(values: Float64Array): void {
  for (let i = 1; i < values.length; i++) {
    const x = values[i];
    let j = i - 1;
    while (j >= 0 && values[j] > x) {
      values[j + 1] = values[j];
      j--;
    }
    values[j + 1] = x;
  }
}
