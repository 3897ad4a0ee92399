import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { ImpactAfter, ImpactBefore } from '@/lib/mechanics/impact';
import {
  type ImpactAnswer,
  type ImpactState,
  LEAST_RESTITUTION,
  emptyAnswer,
  solveDirections,
  solveRestitution,
} from '@/lib/mechanics/impact-backwards';
import { byDirections, byRestitution, evidenceOf, sinBetween } from '../support/backward';
import { forward, impacts, kinetic } from '../support/random-impacts';

const RUNS = { seed: 20261201, numRuns: 1000 };

/** About 10 degrees: below it the two speeds are nearly in line and rounding is magnified without limit. */
const CROSSING = 0.17;

const expectOfPossible = (law: (before: ImpactBefore, after: ImpactAfter, state: ImpactState) => void): void =>
  fc.assert(
    fc.property(impacts, (before) => {
      const { after, reason } = forward(before);
      fc.pre(
        reason === null &&
          after.un > 0.01 &&
          Math.hypot(before.A.vx, before.A.vy) > 0 &&
          Math.hypot(before.B.vx, before.B.vy) > 0,
      );
      law(before, after, evidenceOf(before, after));
    }),
    RUNS,
  );

const speedScale = ({ A, B }: ImpactBefore): number =>
  1 + Math.hypot(A.vx, A.vy) + Math.hypot(B.vx, B.vy) + 3 * (Math.abs(A.w) + Math.abs(B.w));

function expectStart(before: ImpactBefore, after: ImpactAfter, answer: ImpactAnswer, tolerance: number): void {
  for (const id of ['A', 'B'] as const) {
    expect(Math.abs(answer[id].vx - before[id].vx)).toBeLessThan(tolerance);
    expect(Math.abs(answer[id].vy - before[id].vy)).toBeLessThan(tolerance);
    expect(Math.abs(answer[id].wBefore - before[id].w)).toBeLessThan(tolerance);
    expect(Math.abs(answer[id].speed - Math.hypot(before[id].vx, before[id].vy))).toBeLessThan(tolerance);
    expect(Math.abs(answer[id].wPredicted - after[id].w)).toBeLessThan(tolerance);
  }
  expect(Math.abs(answer.un - after.un)).toBeLessThan(tolerance);
  expect(Math.abs(answer.utAfter - after.utAfter)).toBeLessThan(tolerance);
}

describe('backward of forward is the start, to 1e-10', () => {
  // Relative to the speeds at hand; times what the geometry magnifies: 1/sin of the angle between the approaches and the
  // mass ratio (directions), 1/e (restitution).
  test.each([
    ['measured', (w: number) => w],
    ['not measured', () => NaN],
  ])('directions, yaw rates after contact %s', (_, seen) =>
    expectOfPossible((before, after, state) => {
      const between = Math.abs(sinBetween(state));
      fc.pre(between > CROSSING);
      state.A.wMeasured = seen(state.A.wMeasured);
      state.B.wMeasured = seen(state.B.wMeasured);
      const { answer, reason } = byDirections(state);
      expect(reason).toBeNull();
      expectStart(before, after, answer, (1e-10 * speedScale(before)) / between);
      expect(Math.abs(answer.e - before.e)).toBeLessThan((1e-10 * speedScale(before)) / between / after.un);
      expect(Math.abs(answer.mu - after.Jt / after.Jn)).toBeLessThan(
        1e-9 * (1 + (before.A.m * speedScale(before)) / after.Jn),
      );
      expect(answer.sinBetween).toBe(sinBetween(state));
    }),
  );

  test('restitution', () =>
    expectOfPossible((before, after, state) => {
      fc.pre(before.e >= LEAST_RESTITUTION && -after.unAfter > 1e-3);
      const { answer, reason } = byRestitution(state);
      expect(reason).toBeNull();
      expectStart(before, after, answer, (1e-10 * speedScale(before)) / before.e);
      expect(Math.abs(answer.Jn / after.Jn - 1)).toBeLessThan((1e-10 * speedScale(before)) / before.e / after.un);
    }));
});

describe('laws of the answer', () => {
  const solveBoth = (state: ImpactState) => [byDirections(state), byRestitution(state)];

  test('momentum is kept; angular momentum with the predicted yaw rates', () =>
    expectOfPossible((_, __, state) => {
      fc.pre(Math.abs(sinBetween(state)) > CROSSING && state.e >= LEAST_RESTITUTION);
      // Wrong evidence on purpose: the laws must hold for whatever is answered.
      state.A.vx *= 1.2;
      state.B.vy += 0.7;
      for (const { answer, reason } of solveBoth(state)) {
        if (reason === 'notParting') continue;
        const [A, B] = [state.A, state.B];
        const scale =
          A.m * (Math.hypot(answer.A.vx, answer.A.vy) + 1) + B.m * (Math.hypot(answer.B.vx, answer.B.vy) + 1);
        expect(Math.abs(A.m * (A.vx - answer.A.vx) + B.m * (B.vx - answer.B.vx))).toBeLessThan(1e-11 * scale);
        expect(Math.abs(A.m * (A.vy - answer.A.vy) + B.m * (B.vy - answer.B.vy))).toBeLessThan(1e-11 * scale);
        const gained = (['A', 'B'] as const).reduce((sum, id) => {
          const [b, found] = [state[id], answer[id]];
          return (
            sum + b.I * (found.wPredicted - found.wBefore) + b.m * (b.x * (b.vy - found.vy) - b.y * (b.vx - found.vx))
          );
        }, 0);
        expect(Math.abs(gained)).toBeLessThan(1e-10 * scale * 10);
      }
    }));

  test('the energy lost is that of motion, where the yaw rates are those that the impulse predicts', () =>
    expectOfPossible((_, __, state) => {
      fc.pre(Math.abs(sinBetween(state)) > CROSSING && state.e >= LEAST_RESTITUTION);
      const predicted = { ...state, A: { ...state.A, wMeasured: NaN }, B: { ...state.B, wMeasured: NaN } };
      for (const { answer, reason } of [byDirections(predicted), byRestitution(state)]) {
        if (reason === 'notParting') continue;
        const lost = (['A', 'B'] as const).reduce((sum, id) => {
          const [{ m, I, vx, vy }, found] = [state[id], answer[id]];
          return sum + kinetic(m, I, { ...found, w: found.wBefore }) - kinetic(m, I, { vx, vy, w: found.wAfter });
        }, 0);
        const size = (['A', 'B'] as const).reduce(
          (sum, id) => sum + kinetic(state[id].m, state[id].I, { ...answer[id], w: answer[id].wBefore }),
          1,
        );
        expect(Math.abs(lost - answer.energyLost)).toBeLessThan(1e-10 * size);
      }
    }));
});

describe('where the scene lies, and which vehicle is called A, does not matter', () => {
  const both = [
    ['directions', byDirections],
    ['restitution', byRestitution],
  ] as const;
  const figures = (a: ImpactAnswer): Record<string, number> => ({
    un: a.un,
    ut: a.ut,
    unAfter: a.unAfter,
    utAfter: a.utAfter,
    e: a.e,
    mu: a.mu,
    speedA: a.A.speed,
    speedB: a.B.speed,
    wA: a.A.wBefore,
    wB: a.B.wPredicted,
    share: a.energyLost / a.closingEnergy,
  });

  function expectFigures(found: Record<string, number>, expected: Record<string, number>, tolerance: number): void {
    for (const [key, value] of Object.entries(expected))
      expect(Math.abs(found[key] - value), key).toBeLessThan(tolerance * (1 + Math.abs(value)));
  }

  const changed = (
    state: ImpactState,
    change: (v: ImpactState['A']) => ImpactState['A'],
    rest: Partial<ImpactState>,
  ): ImpactState => ({
    ...state,
    A: change(state.A),
    B: change(state.B),
    ...rest,
  });

  test.each(both)('%s: turned and moved', (_, solve) =>
    expectOfPossible((before, after, state) => {
      fc.pre(Math.abs(sinBetween(state)) > CROSSING && before.e >= LEAST_RESTITUTION && after.un > 0.5);
      const angle = before.plane * 1.7 + 0.3;
      const [c, s] = [Math.cos(angle), Math.sin(angle)];
      const turn = (x: number, y: number) => [c * x - s * y, s * x + c * y];
      const there = changed(
        state,
        (v) => {
          const [[x, y], [vx, vy], [hx, hy]] = [turn(v.x, v.y), turn(v.vx, v.vy), turn(v.hx, v.hy)];
          return { ...v, x: x + 7, y: y - 3, vx, vy, hx, hy };
        },
        { px: turn(state.px, state.py)[0] + 7, py: turn(state.px, state.py)[1] - 3, plane: state.plane + angle },
      );
      expectFigures(figures(solve(there).answer), figures(solve(state).answer), 1e-8);
      expect(Math.abs(solve(there).answer.condition / solve(state).answer.condition - 1) || 0).toBeLessThan(1e-8);
    }),
  );

  test.each(both)('%s: mirrored', (_, solve) =>
    expectOfPossible((before, after, state) => {
      fc.pre(Math.abs(sinBetween(state)) > CROSSING && before.e >= LEAST_RESTITUTION && after.un > 0.5);
      const there = changed(
        state,
        (v) => ({ ...v, y: -v.y, vy: -v.vy, hy: -v.hy, wBefore: -v.wBefore, wMeasured: -v.wMeasured }),
        { py: -state.py, plane: -state.plane, mu: -state.mu },
      );
      const expected = figures(solve(state).answer);
      for (const key of ['ut', 'utAfter', 'mu', 'wA', 'wB']) expected[key] = -expected[key];
      expectFigures(figures(solve(there).answer), expected, 1e-8);
    }),
  );

  test.each(both)('%s: A and B swapped', (_, solve) =>
    expectOfPossible((before, after, state) => {
      fc.pre(Math.abs(sinBetween(state)) > CROSSING && before.e >= LEAST_RESTITUTION && after.un > 0.5);
      const [here, there] = [solve(state).answer, solve({ ...state, A: state.B, B: state.A }).answer];
      expectFigures(figures({ ...there, A: there.B, B: there.A }), figures(here), 1e-8);
    }),
  );
});

/** An instant: the road gives nothing meanwhile. */
const NO_ROAD = { roadX: 0, roadY: 0, roadW: 0 };

describe('reasons', () => {
  /** A comes down on B from the north while B comes from the west; both stop each other's motion in part. */
  const state = (change: Partial<ImpactState> = {}): ImpactState => ({
    A: { m: 1000, I: 1500, x: 0, y: 1, vx: 1, vy: -3, wBefore: 0, wMeasured: NaN, hx: 0, hy: -1, ...NO_ROAD },
    B: { m: 1000, I: 1500, x: 0, y: -1, vx: 4, vy: -4, wBefore: 0, wMeasured: NaN, hx: 1, hy: 0, ...NO_ROAD },
    px: 0,
    py: 0,
    plane: 0,
    e: 0.25,
    mu: 0.1,
    ...change,
  });
  const withA = (change: Partial<ImpactState['A']>, s = state()): ImpactState => ({ ...s, A: { ...s.A, ...change } });
  const measured = (s: ImpactState): ImpactState => ({
    ...s,
    A: { ...s.A, wMeasured: 0 },
    B: { ...s.B, wMeasured: 0 },
  });

  test('the case itself is possible', () => {
    const { answer, reason } = byDirections(state());
    expect(reason).toBeNull();
    expect([answer.A.speed, answer.B.speed]).toEqual([7, 5]);
    expect(answer.e).toBeCloseTo(1 / 7, 12);
    expect(answer.condition).toBe(1);
    expect(byRestitution(measured(state())).reason).toBeNull();
  });

  test.each([
    [
      'notClosing: A goes away from B',
      'notClosing',
      withA({ hy: 1, vy: 8 }, withA({}, state({ B: { ...state().B, vy: -1 } }))),
    ],
    ['backwards: momentum along x is negative', 'backwards', withA({ vx: -6 })],
    [
      'restitution above 1: parts faster than it closed',
      'restitution',
      withA({ vy: 6, vx: 1 }, state({ B: { ...state().B, vy: -13 } })),
    ],
    ['restitution below 0: still closing', 'restitution', withA({ vy: -6 })],
    ['notFinite', 'notFinite', withA({ m: NaN })],
    ['notFinite: parallel approaches', 'notFinite', withA({ hx: 1, hy: 0 })],
  ])('directions, %s', (_, reason, s) => expect(byDirections(s).reason).toBe(reason));

  test('energyGain: the bodies slide apart faster than they met, along the impulse of friction', () => {
    const { answer, reason } = byDirections(withA({ vx: -3 }, state({ B: { ...state().B, vx: 8 } })));
    expect(answer.energyLost).toBeLessThan(0);
    expect(reason).toBe('energyGain');
  });

  test('restitution of 1 to a rounding is allowed, more is not', () => {
    // A hands its whole speed of 7 m/s over; bouncing back itself makes it more than 1.
    const bounces = (speed: number) => byDirections(withA({ vy: speed }, state({ B: { ...state().B, vy: -7 } })));
    expect(bounces(0)).toMatchObject({ reason: null, answer: { e: 1 } });
    expect(bounces(1e-11).answer.e).toBeGreaterThan(1);
    expect(bounces(1e-11).reason).toBeNull();
    expect(bounces(1e-6).reason).toBe('restitution');
  });

  test.each([
    ['notParting', 'notParting', measured(withA({ vy: -5 }))],
    ['notParting: at the same speed', 'notParting', measured(withA({ vy: -4 }))],
    ['restitution below 0.05', 'restitution', measured(state({ e: 0.0499 }))],
    ['restitution of 0', 'restitution', measured(state({ e: 0 }))],
    ['restitution above 1', 'restitution', measured(state({ e: 1.01 }))],
    [
      'pulling: friction that would draw the bodies together',
      'pulling',
      measured(state({ px: 1.5, mu: 5, B: { ...state().B, I: 9e5 } })),
    ],
    ['notFinite: a yaw rate after contact is missing', 'notFinite', state()],
  ])('restitution, %s', (_, reason, s) => expect(byRestitution(s).reason).toBe(reason));

  test('0.05 itself is allowed, and so is a last digit below it', () => {
    expect(byRestitution(measured(state({ e: 0.05 }))).reason).toBeNull();
    expect(byRestitution(measured(state({ e: 0.05 - 1e-14 }))).reason).toBeNull();
  });

  test('figures that exist are there beside a reason; those that do not are NaN', () => {
    const { answer } = byDirections(withA({ vx: -6 }));
    expect([answer.A.speed, answer.B.speed]).toEqual([7, -2]);
    const none = byRestitution(measured(withA({ vy: -5 }))).answer;
    expect(none.unAfter).toBe(1);
    expect([none.un, none.Jn, none.A.speed, none.energyLost]).toEqual([NaN, NaN, NaN, NaN]);
    const refused = byRestitution(measured(state({ e: 0.01 }))).answer;
    expect(refused.un).toBeCloseTo(100, 9);
  });

  test('a standing vehicle may come out a rounding below zero', () => {
    // B stood: its speed is found from 4.0 - 4.0.
    const s = withA({ vx: 0.1 + 0.2 }, state({ B: { ...state().B, vx: -0.3 } }));
    const { answer, reason } = byDirections(s);
    expect(Math.abs(answer.B.speed)).toBeLessThan(1e-15);
    expect(reason).not.toBe('backwards');
  });

  test('a record used again holds nothing of the draw before', () => {
    const used = emptyAnswer();
    for (const [solve, s] of [
      [solveDirections, withA({ hx: 1, hy: 0 })],
      [solveRestitution, measured(withA({ vy: -5 }))],
      [solveDirections, state({ px: 1, plane: 0.3 })],
      [solveRestitution, measured(state({ px: -1 }))],
    ] as const) {
      const fresh = emptyAnswer();
      expect(solve(s, used)).toBe(solve(s, fresh));
      expect(used).toEqual(fresh);
    }
  });
});
