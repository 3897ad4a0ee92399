import * as fc from 'fast-check';
import { expect, test } from 'vitest';
import { seatDeltaV } from '@/lib/mechanics/seat';
import { between } from '../support/random-impacts';

test('rigid-body motion: the velocity of the seat after less before, taken in the world and turned into vehicle axes', () => {
  const motion = fc.record({ vx: between(-20, 20), vy: between(-20, 20), w: between(-4, 4) });
  fc.assert(
    fc.property(motion, motion, between(-6, 6), between(-2, 2), between(-1, 1), (before, after, heading, x, y) => {
      const [c, s] = [Math.cos(heading), Math.sin(heading)];
      const [armX, armY] = [c * x - s * y, s * x + c * y];
      const at = (v: typeof before) => [v.vx - v.w * armY, v.vy + v.w * armX];
      const [dx, dy] = [at(after)[0] - at(before)[0], at(after)[1] - at(before)[1]];
      const [cx, cy] = [after.vx - before.vx, after.vy - before.vy];
      const found = seatDeltaV(c * cx + s * cy, c * cy - s * cx, after.w - before.w, { x, y });
      expect(found.forward).toBeCloseTo(c * dx + s * dy, 11);
      expect(found.left).toBeCloseTo(c * dy - s * dx, 11);
    }),
    { seed: 20261201, numRuns: 500 },
  );
});

test('by hand: a gain of yaw rate to the left slows what sits on the left and moves what sits in front to the left', () => {
  expect(seatDeltaV(1, 0, 2, { x: 0, y: 0.25 })).toEqual({ forward: 0.5, left: 0 });
  expect(seatDeltaV(1, 0, 2, { x: 1.5, y: 0 })).toEqual({ forward: 1, left: 3 });
});
