import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { emptyFrame, setFrame } from '@/lib/mechanics/contact-frame';
import { type LastingBefore, followContact } from '@/lib/mechanics/lasting-contact';
import type { ImpactBefore } from '@/lib/mechanics/impact';
import { G } from '@/lib/mechanics/legs';
import { TyreMotion, fourWheels } from '@/lib/mechanics/spin';
import { energeticImpulse } from '../support/energetic-impact';
import { between, forward, impacts } from '../support/random-impacts';

const SEED = { seed: 20261201, numRuns: 60 };
const level = (friction: number) => ({ friction, frictionAt: null, grade: 0, uphill: 0 });

/** A body without wheels: nothing but the contact pushes it. */
const free = ({ m, I }: { m: number; I: number }) => new TyreMotion({ m, I, wheels: [] }, level(0.7), 0);

/** The random impact as a contact that lasts, without tyres. */
function lasting(s: ImpactBefore, pulse: number, change: Partial<LastingBefore> = {}): LastingBefore {
  const of = ({ x, y, vx, vy, w }: ImpactBefore['A']): number[] => [x, y, 0, vx, vy, w];
  const start = [...of(s.A), ...of(s.B)];
  return { A: free(s.A), B: free(s.B), contact: s, start, e: s.e, friction: s.f, pulse, lineOn: 'B', ...change };
}

/** Impacts that close at some speed and whose lever arms are those of vehicles. */
const closing = impacts.filter((s) => forward(s).after.un > 1 && s.e >= 0.05 && s.f <= 1);

const frameOf = (s: ImpactBefore) => {
  const frame = emptyFrame();
  setFrame(s, frame);
  return frame;
};

describe('a contact that lasts, without tyres', () => {
  test('with e = 1 and no friction the energy is kept to 1e-9', () => {
    fc.assert(
      fc.property(closing, (s) => {
        const before = lasting({ ...s, e: 1, f: 0 }, 0.002, { e: 1, friction: 0 });
        const after = followContact(before, 1e-10);
        fc.pre(after.outcome === 'parted');
        const energy = (y: ArrayLike<number>): number =>
          [s.A, s.B].reduce((sum, { m, I }, i) => {
            const at = 6 * i;
            return sum + (m * (y[at + 3] ** 2 + y[at + 4] ** 2) + I * y[at + 5] ** 2) / 2;
          }, 0);
        expect(Math.abs(energy(after.y) / energy(before.start) - 1)).toBeLessThan(1e-9);
      }),
      { ...SEED, numRuns: 12 },
    );
  });

  test.each([0.05, 0.3, 0.8, 1])('a central contact lasts the stated pulse and has restitution %f', (e) => {
    const body = { m: 1200, I: 1800 };
    const before: LastingBefore = {
      A: free(body),
      B: free({ m: 900, I: 1300 }),
      contact: { A: { ...body, x: -2, y: 0 }, B: { m: 900, I: 1300, x: 2, y: 0 }, px: 0, py: 0, plane: Math.PI / 2 },
      start: [-2, 0, 0, 3, 0, 0, 2, 0, 0, 0.5, 0, 0],
      e,
      friction: 0.5,
      pulse: 0.12,
      lineOn: 'A',
    };
    const after = followContact(before, 1e-9);
    expect(after.outcome).toBe('parted');
    expect(after.duration).toBeCloseTo(0.12, 6);
    expect((after.y[9] - after.y[3]) / 2.5).toBeCloseTo(e, 5);
    expect(after.depthLeft / after.penetration).toBeCloseTo(1 - e * e, 5);
  });

  test('the work of the contact is the energy lost, and its impulse the change of momentum', () => {
    fc.assert(
      fc.property(closing, fc.constantFrom('A' as const, 'B' as const), (s, lineOn) => {
        const before = lasting(s, 0.05, { lineOn });
        const after = followContact(before, 1e-8);
        fc.pre(after.outcome === 'parted');
        const { start } = before;
        const energy = (y: ArrayLike<number>): number =>
          [s.A, s.B].reduce(
            (sum, { m, I }, i) => sum + (m * (y[6 * i + 3] ** 2 + y[6 * i + 4] ** 2) + I * y[6 * i + 5] ** 2) / 2,
            0,
          );
        const lost = energy(start) - energy(after.y);
        expect(Math.abs(after.energyLost - lost)).toBeLessThan(1e-5 * energy(start));
        expect(Math.abs(s.B.m * (after.y[9] - start[9]) - after.Jx)).toBeLessThan(
          1e-5 * Math.hypot(after.Jx, after.Jy),
        );
        expect(Math.abs(s.A.m * (after.y[4] - start[4]) + after.Jy)).toBeLessThan(
          1e-5 * Math.hypot(after.Jx, after.Jy),
        );
      }),
      SEED,
    );
  });

  test('as the pulse goes to 0 it converges, with order 1, to the Coulomb path that ends by normal work', () => {
    let judged = 0;
    fc.assert(
      fc.property(closing, (s) => {
        const limit = energeticImpulse(frameOf(s), forward(s).after, s.e, s.f);
        const off = [4e-4, 1e-4].map((pulse) => {
          const { Jn, Jt, outcome } = followContact(lasting(s, pulse), 1e-8);
          return outcome === 'parted' ? Math.hypot(Jn - limit.Jn, Jt - limit.Jt) / Math.hypot(limit.Jn, limit.Jt) : NaN;
        });
        fc.pre(off.every(Number.isFinite));
        expect(off[1]).toBeLessThan(0.02);
        if (off[0] > 1e-4) {
          judged++;
          expect(off[0] / off[1]).toBeGreaterThan(2);
        }
      }),
      { ...SEED, numRuns: 25 },
    );
    expect(judged).toBeGreaterThan(5);
  });

  test('where the slip keeps its sense that is the instant impact', () => {
    let judged = 0;
    fc.assert(
      fc.property(closing, (s) => {
        const { after, reason } = forward(s);
        const limit = energeticImpulse(frameOf(s), after, s.e, s.f);
        fc.pre(reason === null && limit.keepsSense);
        judged++;
        expect(Math.abs(limit.Jn - after.Jn)).toBeLessThan(1e-9 * after.Jn);
        const { Jn, Jt, outcome } = followContact(lasting(s, 2e-5), 1e-8);
        expect(outcome).toBe('parted');
        expect(Math.hypot(Jn - after.Jn, Jt - after.Jt) / after.Jn).toBeLessThan(0.01);
      }),
      { ...SEED, numRuns: 25 },
    );
    expect(judged).toBeGreaterThan(5);
  });
});

/** Two cars in line, 9 km/h, the struck one braked: masses kg, m/s. */
const wheels = (m: number, braking: number) =>
  fourWheels(
    { m, wheelbase: 2.6, track: 1.5, frontAxleToMassCentre: 1.2 },
    [0, 1, 2, 3].map(() => ({ braking, steer: 0 })),
  );
const car = (m: number, braking: number) =>
  new TyreMotion({ m, I: 1.2 * m, wheels: wheels(m, braking) }, level(0.7), 0);

function rearEnd(braking: number, pulse = 0.12): LastingBefore {
  const [mA, mB] = [1400, 1100];
  return {
    A: car(mA, 0),
    B: car(mB, braking),
    contact: {
      A: { m: mA, I: 1.2 * mA, x: -4.2, y: 0 },
      B: { m: mB, I: 1.2 * mB, x: 0, y: 0 },
      px: -2,
      py: 0,
      plane: Math.PI / 2,
    },
    start: [-4.2, 0, 0, 2.5, 0, 0, 0, 0, 0, 0, 0, 0],
    e: 0.3,
    friction: 0.4,
    pulse,
    lineOn: 'B',
  };
}

describe('a contact that lasts, with tyres', () => {
  test('the momentum of the pair changes by the impulse of the tyres and nothing else', () => {
    fc.assert(
      fc.property(closing, between(0, 1), between(-0.5, 0.5), (s, braking, turn) => {
        const motion = ({ m, I }: ImpactBefore['A']) =>
          new TyreMotion({ m, I, wheels: wheels(m, braking) }, level(0.7), 0.02);
        const before = lasting(s, 0.1, { A: motion(s.A), B: motion(s.B) });
        const start = Array.from(before.start);
        start[2] = turn;
        const after = followContact({ ...before, start }, 1e-8);
        fc.pre(after.outcome === 'parted');
        for (const axis of [0, 1]) {
          const change = s.A.m * (after.y[3 + axis] - start[3 + axis]) + s.B.m * (after.y[9 + axis] - start[9 + axis]);
          const tyres = after.y[12 + axis] + after.y[14 + axis];
          expect(Math.abs(change - tyres)).toBeLessThan(1e-4 * Math.hypot(after.Jx, after.Jy));
        }
      }),
      { ...SEED, numRuns: 25 },
    );
  });

  test('rear end at 9 km/h, struck car braked: the closing speed with and without the tyres differ by the share that the check states', () => {
    const after = followContact(rearEnd(1), 1e-9);
    expect(after.outcome).toBe('parted');
    const [mA, mB] = [1400, 1100];
    const [tyresA, tyresB, J] = [after.y[12], after.y[14], after.Jx];
    // From the same separation, B known to stand before: momentum alone, and momentum with what the tyres gave.
    const without = (mA * after.y[3] + mB * after.y[9]) / mA;
    expect(without).toBeLessThan(2);
    expect(without - (tyresA + tyresB) / mA).toBeCloseTo(2.5, 6);
    const share = Math.abs(tyresB) / J;
    expect(share).toBeGreaterThan(0.3);
    expect((mA * (2.5 - without) + tyresA) / J).toBeCloseTo(share, 6);
    // The upper bound of an instant contact, f m g dt / J over what brakes, is above it and of its size.
    const bound = (0.7 * mB * G * after.duration) / J;
    expect(share).toBeLessThan(bound);
    expect(share).toBeGreaterThan(0.8 * bound);
  });

  test('two cars that come to stand while they touch never part, and that is said', () => {
    const before = { ...rearEnd(1, 0.3), e: 0 };
    const stopped = { ...before, A: car(1400, 1), start: [-4.2, 0, 0, 0.5, 0, 0, 0, 0, 0, 0, 0, 0] };
    expect(followContact(stopped, 1e-7).outcome).toBe('neverParts');
  });

  test('vehicles that draw apart have no contact', () => {
    const before = rearEnd(0);
    expect(followContact({ ...before, start: [-4.2, 0, 0, -1, 0, 0, 0, 0, 0, 0, 0, 0] }, 1e-7).outcome).toBe(
      'notClosing',
    );
  });
});
