import { holds } from '@/lib/geometry/polygon';
import { distanceToSegment } from '@/lib/geometry/segment';
import { type Vec, add, distance, scale } from '@/lib/geometry/vector';
import { boundsOf } from './view';

/** Places looked at along each side of the box around an outline. */
const PLACES = 16;

/** Where something may stand within an outline. */
interface Place {
  at: Vec;
  /** From the nearest edge, m. */
  clear: number;
}

function placesIn(outline: readonly Vec[]): Place[] {
  const middle = scale(outline.reduce(add), 1 / outline.length);
  const { left, right, bottom, top } = boundsOf(outline);
  const shares = Array.from({ length: PLACES }, (_, k) => (k + 0.5) / PLACES);
  const lattice = shares.flatMap((u) =>
    shares.map((v): Vec => [left + u * (right - left), bottom + v * (top - bottom)]),
  );
  return [middle, ...lattice]
    .filter((at) => holds(outline, at))
    .map((at) => ({ at, clear: clearOfEdges(outline, at) }));
}

const clearOfEdges = (outline: readonly Vec[], at: Vec): number =>
  Math.min(...outline.map((from, k) => distanceToSegment(at, from, outline[(k + 1) % outline.length])));

/** By how much farther from the edges a place must be to be taken instead: the middle is kept where it is nearly as good. */
const SURELY = 1.25;
/** Farther than this from an edge is far enough, m; where there is less room, half of what there is. */
const ENOUGH = 0.6;

/** A place well inside an outline of any shape, and of those that are free the one nearest to the middle, where any is. */
export function insideOf(outline: readonly Vec[], isFree: (at: Vec) => boolean): Vec {
  const places = placesIn(outline);
  const none: Place = { at: outline[0], clear: 0 };
  const best = places.reduce((found, next) => (next.clear > found.clear * SURELY ? next : found), places[0] ?? none);
  const least = Math.min(ENOUGH, best.clear / 2);
  const free = places.filter(({ at, clear }) => clear >= least && isFree(at));
  const off = ({ at }: Place): number => distance(at, best.at);
  return (
    free.reduce<Place | null>((found, next) => (found && off(found) <= off(next) ? found : next), null)?.at ?? best.at
  );
}
