import { sin } from '@/lib/numerics/elementary';
import { RungeKutta } from '@/lib/numerics/ode';
import { type ContactLine, type ContactPlace, PAIR, pushPair, rollPair } from './pair-motion';
import type { TyreMotion } from './spin';

/**
 * A known contact impulse given to two vehicles over a known time as a half sine, while their wheels push:
 * F(t) = J sin(pi t / T) pi / (2 T) at the contact point, fixed in its body, in the direction of J.
 */
export interface Push {
  A: TyreMotion;
  B: TyreMotion;
  line: ContactLine;
  /** Duration of the contact, s. */
  duration: number;
}

/** What a vehicle was pushed to: the pair's state at the end, and what the contact point did on the way, m. */
export interface Pushed {
  y: Float64Array;
  /** The greatest depth of the point beyond the line, and the way it slid along it. */
  penetration: number;
  slide: number;
}

/** Follows both from `start` (PAIR) under the impulse (Jx, Jy) on B, N s, in at least `steps` steps a piece. */
export function pushThrough(push: Push, start: ArrayLike<number>, Jx: number, Jy: number, steps: number): Pushed {
  const { A, B, line, duration } = push;
  const y = Float64Array.from(start);
  const place: ContactPlace = { px: 0, py: 0, nx: 0, ny: 0, depth: 0, along: 0 };
  let latest = 0;
  const run = new RungeKutta((t, now, dy) => {
    const rate = (sin((Math.PI * t) / duration) * Math.PI) / (2 * duration);
    rollPair(A, B, Math.min(t, latest), now, dy);
    line.place(now, place);
    pushPair(A, B, now, dy, place, rate * Jx, rate * Jy);
  }, PAIR.length);
  let [penetration, low, high] = [0, 0, 0];
  for (const [from, to] of pieces(push)) {
    latest = to * (1 - Number.EPSILON);
    const n = Math.max(steps, Math.ceil((to - from) / LONGEST_STEP));
    for (let i = 0; i < n; i++) {
      run.step(from + ((to - from) * i) / n, (to - from) / n, y);
      line.place(y, place);
      penetration = Math.max(penetration, place.depth);
      low = Math.min(low, place.along);
      high = Math.max(high, place.along);
    }
  }
  return { y, penetration, slide: high - low };
}

/** A wheel about to stand still settles within this, s. */
const LONGEST_STEP = 0.005;

/** The contact, cut where braking sets in: there the force jumps. The braking of a piece is that of its inside. */
function pieces({ A, B, duration }: Push): [number, number][] {
  const cuts = [A.onset, B.onset].filter((t) => t > 0 && t < duration).sort((p, q) => p - q);
  const ends = [0, ...cuts, duration];
  return ends
    .slice(1)
    .map((to, i) => [ends[i], to] as [number, number])
    .filter(([from, to]) => to > from);
}
