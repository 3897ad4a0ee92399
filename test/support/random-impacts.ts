import * as fc from 'fast-check';
import { type ImpactAfter, type ImpactBefore, type MovingBody, emptyAfter, solveImpact } from '@/lib/mechanics/impact';
import type { Reason } from '@/lib/mechanics/reasons';

/** Impacts of every kind that two road vehicles can have, and some that they cannot. */

/** Multiples of a ten-thousandth, for the laws have to do with vehicles and not with the smallest numbers that there are. */
export const between = (min: number, max: number): fc.Arbitrary<number> =>
  fc.integer({ min: Math.round(min * 1e4), max: Math.round(max * 1e4) }).map((n) => n / 1e4);

/** A body near the origin; its radius of gyration runs from that of a small car to that of a long van. */
const body: fc.Arbitrary<MovingBody> = fc
  .record({
    m: between(400, 4000),
    gyration: between(0.9, 1.9),
    x: between(-3, 3),
    y: between(-3, 3),
    vx: between(-25, 25),
    vy: between(-25, 25),
    w: between(-3, 3),
  })
  .map(({ m, gyration, ...motion }) => ({ m, I: m * gyration * gyration, ...motion }));

export const impacts: fc.Arbitrary<ImpactBefore> = fc
  .record({
    A: body,
    B: body,
    px: between(-2, 2),
    py: between(-2, 2),
    plane: between(-3.1, 3.1),
    e: fc.oneof(between(0, 1), fc.constantFrom(0, 1)),
    f: fc.oneof(between(0, 1), fc.constantFrom(0, 0.3, 5)),
  })
  .filter(hasSides);

/** Whether the centres lie on two sides of the plane; if not, no side of it is A's. */
function hasSides({ A, B, plane }: ImpactBefore): boolean {
  return Math.abs(Math.sin(plane) * (B.x - A.x) - Math.cos(plane) * (B.y - A.y)) > 1e-3;
}

export function forward(before: ImpactBefore): { after: ImpactAfter; reason: Reason | null } {
  const after = emptyAfter();
  const reason = solveImpact(before, after);
  return { after, reason };
}

/** The same scene turned by an angle about the origin and then moved. */
export function moved<T extends ImpactBefore>(s: T, angle: number, dx: number, dy: number): T {
  const [c, n] = [Math.cos(angle), Math.sin(angle)];
  const at = (b: MovingBody): MovingBody => ({
    ...b,
    x: c * b.x - n * b.y + dx,
    y: n * b.x + c * b.y + dy,
    vx: c * b.vx - n * b.vy,
    vy: n * b.vx + c * b.vy,
  });
  return {
    ...s,
    A: at(s.A),
    B: at(s.B),
    px: c * s.px - n * s.py + dx,
    py: n * s.px + c * s.py + dy,
    plane: s.plane + angle,
  };
}

/** The same scene in a mirror along the x axis. */
export function mirrored<T extends ImpactBefore>(s: T): T {
  const at = (b: MovingBody): MovingBody => ({ ...b, y: -b.y, vy: -b.vy, w: -b.w });
  return { ...s, A: at(s.A), B: at(s.B), py: -s.py, plane: -s.plane };
}

export const swapped = <T extends ImpactBefore>(s: T): T => ({ ...s, A: s.B, B: s.A });

/** Kinetic energy, J. */
export const kinetic = (m: number, I: number, { vx, vy, w }: { vx: number; vy: number; w: number }): number =>
  (m * (vx * vx + vy * vy) + I * w * w) / 2;
