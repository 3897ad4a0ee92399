import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { ImpactAfter, ImpactBefore } from '@/lib/mechanics/impact';
import { between, forward, impacts, kinetic, mirrored, moved, swapped } from '../support/random-impacts';

const RUNS = { seed: 20261201, numRuns: 2000 };

/** Checks a law on every random impact that is possible. */
const expectOfPossible = (law: (before: ImpactBefore, after: ImpactAfter) => void): void =>
  fc.assert(
    fc.property(impacts, (before) => {
      const { after, reason } = forward(before);
      fc.pre(reason === null && after.un > 1e-3);
      law(before, after);
    }),
    RUNS,
  );

const speedScale = ({ A, B }: ImpactBefore): number =>
  Math.hypot(A.vx, A.vy) + Math.hypot(B.vx, B.vy) + Math.abs(A.w) + Math.abs(B.w) + 1;

/** Impact after with every number that a scene's turning leaves alone. */
const invariants = ({ Jn, Jt, un, ut, unAfter, utAfter, energyLost, closingEnergy }: ImpactAfter) => ({
  Jn,
  Jt,
  un,
  ut,
  unAfter,
  utAfter,
  energyLost,
  closingEnergy,
});

function expectSame(
  found: Record<string, number>,
  expected: Record<string, number>,
  scales: { [key: string]: number },
): void {
  for (const [key, value] of Object.entries(expected))
    expect(Math.abs(found[key] - value), key).toBeLessThan(1e-9 * (scales[key] ?? scales.other));
}

const scalesOf = (before: ImpactBefore, after: ImpactAfter) => {
  const impulse = Math.abs(after.Jn) + Math.abs(after.Jt) + (before.A.m + before.B.m) * 0.01;
  const speed = speedScale(before);
  return {
    Jn: impulse,
    Jt: impulse,
    energyLost: after.closingEnergy + impulse,
    closingEnergy: after.closingEnergy + impulse,
    other: speed,
  };
};

describe('laws of every possible impact', () => {
  test('momentum is kept', () =>
    expectOfPossible(({ A, B }, after) => {
      const scale = (A.m + B.m) * 50;
      expect(Math.abs(A.m * (after.A.vx - A.vx) + B.m * (after.B.vx - B.vx))).toBeLessThan(1e-12 * scale);
      expect(Math.abs(A.m * (after.A.vy - A.vy) + B.m * (after.B.vy - B.vy))).toBeLessThan(1e-12 * scale);
    }));

  test('angular momentum is kept about any point', () => {
    const about = fc.tuple(between(-100, 100), between(-100, 100));
    fc.assert(
      fc.property(impacts, about, (before, [qx, qy]) => {
        const { after, reason } = forward(before);
        fc.pre(reason === null && after.un > 1e-3);
        const gained = (['A', 'B'] as const).reduce((sum, id) => {
          const b = before[id];
          const [dvx, dvy] = [after[id].vx - b.vx, after[id].vy - b.vy];
          return sum + b.I * (after[id].w - b.w) + b.m * ((b.x - qx) * dvy - (b.y - qy) * dvx);
        }, 0);
        expect(Math.abs(gained)).toBeLessThan(1e-11 * 4000 * 50 * 100);
      }),
      RUNS,
    );
  });

  test("kinetic energy never grows, and its loss is J . (u + u')/2", () =>
    expectOfPossible(({ A, B }, after) => {
      const before = kinetic(A.m, A.I, A) + kinetic(B.m, B.I, B);
      const lost = before - kinetic(A.m, A.I, after.A) - kinetic(B.m, B.I, after.B);
      expect(Math.abs(lost - after.energyLost)).toBeLessThan(1e-11 * before);
      expect(after.energyLost).toBeGreaterThanOrEqual(-1e-9 * after.closingEnergy);
      expect(after.energyLost).toBeLessThanOrEqual(after.closingEnergy * (1 + 1e-9));
    }));

  test('the bodies part at e times the closing speed, and friction stays within its cone', () =>
    expectOfPossible((before, after) => {
      expect(Math.abs(after.unAfter + before.e * after.un)).toBeLessThan(1e-9 * speedScale(before));
      expect(Math.abs(after.Jt)).toBeLessThanOrEqual(before.f * after.Jn * (1 + 1e-9) + 1e-9);
    }));

  test('the velocities at the contact point change as the inverse masses say', () =>
    expectOfPossible(({ A, B, px, py, plane }, after) => {
      const at = (b: { x: number; y: number }, v: { vx: number; vy: number; w: number }) => [
        v.vx - v.w * (py - b.y),
        v.vy + v.w * (px - b.x),
      ];
      const [a, b] = [at(A, after.A), at(B, after.B)];
      const flip = Math.sin(plane) * (B.x - A.x) - Math.cos(plane) * (B.y - A.y) < 0 ? -1 : 1;
      const [nx, ny] = [flip * Math.sin(plane), -flip * Math.cos(plane)];
      expect((a[0] - b[0]) * nx + (a[1] - b[1]) * ny).toBeCloseTo(after.unAfter, 8);
      expect((a[1] - b[1]) * nx - (a[0] - b[0]) * ny).toBeCloseTo(after.utAfter, 8);
    }));
});

describe('where the scene lies, and which vehicle is called A, does not matter', () => {
  const turn = fc.record({
    angle: between(-6, 6),
    dx: between(-50, 50),
    dy: between(-50, 50),
  });

  test('turned and moved', () => {
    fc.assert(
      fc.property(impacts, turn, (before, { angle, dx, dy }) => {
        const { after, reason } = forward(before);
        fc.pre(reason === null && after.un > 1e-3);
        const there = forward(moved(before, angle, dx, dy));
        fc.pre(there.reason === null || after.energyLost > 1e-6 * after.closingEnergy);
        expect(there.reason).toBeNull();
        expectSame(invariants(there.after), invariants(after), scalesOf(before, after));
        const [c, s] = [Math.cos(angle), Math.sin(angle)];
        expect(Math.abs(there.after.A.vx - (c * after.A.vx - s * after.A.vy))).toBeLessThan(1e-8 * speedScale(before));
        expect(Math.abs(there.after.B.vy - (s * after.B.vx + c * after.B.vy))).toBeLessThan(1e-8 * speedScale(before));
        expect(Math.abs(there.after.A.w - after.A.w)).toBeLessThan(1e-8 * speedScale(before));
      }),
      RUNS,
    );
  });

  test('mirrored: everything along the plane changes its sign, and so do the yaw rates', () =>
    expectOfPossible((before, after) => {
      const there = forward(mirrored(before)).after;
      const expected = { ...invariants(after), Jt: -after.Jt, ut: -after.ut, utAfter: -after.utAfter };
      expectSame(invariants(there), expected, scalesOf(before, after));
      expect(Math.abs(there.A.w + after.A.w)).toBeLessThan(1e-8 * speedScale(before));
      expect(Math.abs(there.B.vy + after.B.vy)).toBeLessThan(1e-8 * speedScale(before));
    }));

  test('A and B swapped', () =>
    expectOfPossible((before, after) => {
      const there = forward(swapped(before)).after;
      expectSame(invariants(there), invariants(after), scalesOf(before, after));
      expect(Math.abs(there.A.vx - after.B.vx)).toBeLessThan(1e-8 * speedScale(before));
      expect(Math.abs(there.B.w - after.A.w)).toBeLessThan(1e-8 * speedScale(before));
    }));

  test('the plane is a line: half a turn more is the same plane', () =>
    expectOfPossible((before, after) => {
      const there = forward({ ...before, plane: before.plane + Math.PI }).after;
      expectSame(invariants(there), invariants(after), scalesOf(before, after));
    }));
});

/** The path of the impulse followed in small steps instead of by formula: explicit, and knows nothing of the closed form. */
function stepped({ e, f }: ImpactBefore, { un, ut, frame: { Knn, Ktt, Knt } }: ImpactAfter, steps: number) {
  const dJ = ((1 + e) * un) / Knn / steps;
  let [Jn, Jt, n, t] = [0, 0, un, ut];
  while (n > -e * un && Jn < 100 * steps * dJ) {
    const needed = -Knt / Ktt + t / (Ktt * dJ); // the tangential share that would end this step without slip
    const share = Math.max(-f, Math.min(f, needed));
    Jn += dJ;
    Jt += share * dJ;
    n -= Knn * dJ + Knt * share * dJ;
    t -= Knt * dJ + Ktt * share * dJ;
  }
  return { Jn, Jt };
}

test('following the contact in 20,000 steps ends at the same impulse', () => {
  fc.assert(
    fc.property(impacts, (before) => {
      const { after, reason } = forward(before);
      fc.pre(reason === null && after.un > 0.1);
      const { Jn, Jt } = stepped(before, after, 20_000);
      const size = Math.hypot(after.Jn, after.Jt);
      fc.pre(Jn < (50 * ((1 + before.e) * after.un)) / after.frame.Knn);
      expect(Math.hypot(Jn - after.Jn, Jt - after.Jt)).toBeLessThan(2e-3 * size);
    }),
    { seed: 20261201, numRuns: 300 },
  );
});

describe('edges of the path', () => {
  /** Two equal bodies in line: A comes down upon B. The plane lies along x, so that its sine and cosine are exact. */
  const pair = (change: Partial<ImpactBefore>): ImpactBefore => ({
    A: { m: 1000, I: 1000, x: 0, y: 1, vx: 0, vy: -5, w: 0 },
    B: { m: 1000, I: 1000, x: 0, y: -1, vx: 0, vy: 0, w: 0 },
    px: 0,
    py: 0,
    plane: 0,
    e: 0.25,
    f: 0.5,
    ...change,
  });
  const standing = { m: 9e9, I: 9e9, x: 0, y: -1, vx: 0, vy: 0, w: 0 };

  test('no slip and nothing to start one: friction does nothing', () => {
    const { after, reason } = forward(pair({}));
    expect([reason, after.Jt + 0, after.utAfter + 0]).toEqual([null, 0, 0]);
    expect(after.A.vy).toBeCloseTo(-1.875, 12);
    expect(after.B.vy).toBeCloseTo(-3.125, 12);
  });

  test('no slip at first, held by friction: it sticks', () => {
    const { after } = forward(pair({ px: 0.5, f: 5, B: standing }));
    expect(after.ut).toBe(0);
    expect(after.Jt).not.toBe(0);
    expect(Math.abs(after.utAfter)).toBeLessThan(1e-12);
  });

  test('no slip at first, friction too weak to hold: it slides, against the slip that begins', () => {
    const { after } = forward(pair({ B: standing, px: 0.9, f: 0.01 }));
    expect(after.ut).toBe(0);
    expect(after.Jt).toBeCloseTo(-Math.sign(after.frame.Knt) * 0.01 * after.Jn, 9);
    expect(after.utAfter * after.Jt).toBeGreaterThan(0);
  });

  test('friction that wedges (no sliding impulse would end it): slip stops first and the answer is finite', () => {
    const before = pair({ A: { m: 1000, I: 30, x: 0, y: 1, vx: -0.3, vy: -5, w: 0 }, B: standing, px: -1, f: 3 });
    const { after } = forward(before);
    const { Knn, Knt } = after.frame;
    expect(Knn + Math.sign(after.ut) * before.f * Knt).toBeLessThan(0);
    expect(Number.isFinite(after.Jn)).toBe(true);
    expect(Math.abs(after.utAfter)).toBeLessThan(1e-9);
  });

  test('reasons', () => {
    expect(forward(pair({ A: { ...pair({}).A, vy: 1 } })).reason).toBe('notClosing');
    expect(forward(pair({ A: { ...pair({}).A, vy: 0 } })).reason).toBe('notClosing');
    expect(forward(pair({ A: { ...pair({}).A, m: NaN } })).reason).toBe('notFinite');
    expect(forward(pair({ A: { ...pair({}).A, vy: -1e300 } })).reason).toBe('notFinite');
  });

  test("Newton's restitution near 1 with friction can seem to gain energy, and then says so", () => {
    const found = new Set<string | null>();
    for (const before of fc.sample(impacts, { seed: 7, numRuns: 4000 })) {
      const { after, reason } = forward({ ...before, e: 1, f: 0.6 });
      if (reason === 'energyGain') expect(after.energyLost).toBeLessThan(0);
      if (reason === 'pulling') expect(after.Jn).toBeLessThanOrEqual(0);
      found.add(reason);
    }
    expect(found).toContain('energyGain');
  });
});
