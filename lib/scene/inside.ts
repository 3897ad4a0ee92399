import { holds } from '@/lib/geometry/polygon';
import { distanceToSegment } from '@/lib/geometry/segment';
import { type Vec, add, scale } from '@/lib/geometry/vector';
import { boundsOf } from './view';

/** Places looked at along each side of the box around an outline. */
const PLACES = 16;

/** A place well inside an outline of any shape: of the middle and a lattice of places, the one farthest from every edge. */
export function insideOf(outline: readonly Vec[]): Vec {
  const middle = scale(outline.reduce(add), 1 / outline.length);
  const { left, right, bottom, top } = boundsOf(outline);
  const shares = Array.from({ length: PLACES }, (_, k) => (k + 0.5) / PLACES);
  const lattice = shares.flatMap((u) =>
    shares.map((v): Vec => [left + u * (right - left), bottom + v * (top - bottom)]),
  );
  const rated = [middle, ...lattice]
    .filter((at) => holds(outline, at))
    .map((at) => ({ at, clear: clearOfEdges(outline, at) }));
  return rated.reduce((best, next) => (next.clear > best.clear * SURELY ? next : best), { at: middle, clear: 0 }).at;
}

/** By how much farther a place must be to be taken instead: the middle is kept where it is nearly as good. */
const SURELY = 1.25;

const clearOfEdges = (outline: readonly Vec[], at: Vec): number =>
  Math.min(...outline.map((from, k) => distanceToSegment(at, from, outline[(k + 1) % outline.length])));
