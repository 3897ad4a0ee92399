import { describe, expect, test } from 'vitest';
import { q } from '../support/build-case';
import { contextOf, editedCase, findingOf, levelIn, set, withAnswer, withCentral } from '../support/check-context';
import { MORE_ON } from './more-checks-on';

/** The further checks, each on and off in whole cases, and each of their limits from both sides. */

describe('on and off', () => {
  test.each(MORE_ON)('$id: $level', async ({ id, level, name, on, off = [], else: otherwise, traced }) => {
    const tracing = traced ? { traced: ['A.deltaV' as const] } : {};
    const found = findingOf(id, await contextOf(name, on, tracing));
    expect(found?.level).toBe(level);
    expect(found?.says).not.toMatch(/NaN|undefined|Infinity/);
    expect(found?.advice ?? '').not.toBe('');
    expect(levelIn(id, await contextOf(name, off, tracing))).toBe(otherwise);
  });
});

test('nearlyInLine: at the cotangent of half the angle, and at the sine that the model refuses', async () => {
  const context = await contextOf('junction');
  const at = (sinBetween: number) => levelIn('nearlyInLine', withAnswer(context, { sinBetween }));
  // tan of the angle = 2 k / (k^2 - 1) for cot(angle / 2) = k, so its sine is 2 k / (k^2 + 1).
  const sineOf = (k: number) => (2 * k) / (k * k + 1);
  expect([at(sineOf(2.39)), at(sineOf(2.41))]).toEqual(['pass', 'note']);
  expect([at(sineOf(3.69)), at(-sineOf(3.71))]).toEqual(['note', 'caution']);
  expect([at(0.171), at(0.169)]).toEqual(['caution', 'fail']);
});

test('restitutionTests: 0.1 to 0.6, for closing speeds of 0.5 to 6 m/s', async () => {
  const context = await contextOf('queue');
  const at = (restitution: number, closingSpeed = 3) =>
    levelIn('restitutionTests', withCentral(context, { restitution, closingSpeed }));
  expect([at(0.099), at(0.101), at(0.599), at(0.601)]).toEqual(['note', 'pass', 'pass', 'note']);
  expect([at(0.7, 0.49), at(0.7, 0.51), at(0.7, 5.99), at(0.7, 6.01)]).toEqual([undefined, 'note', 'note', undefined]);
});

test('energyShare: at all of the closing energy', async () => {
  const context = await contextOf('queue');
  const at = (energyLost: number) => levelIn('energyShare', withAnswer(context, { energyLost, closingEnergy: 1000 }));
  expect([at(999), at(1001)]).toEqual(['pass', 'caution']);
});

describe('sideswipe', () => {
  const sliding = { un: 1, ut: 2, utAfter: 1 };
  test('by the ratio of sliding to closing', async () => {
    const context = await contextOf('queue');
    const at = (ut: number, utAfter: number) => levelIn('sideswipe', withAnswer(context, { un: 1, ut, utAfter }));
    expect([at(2.99, 1), at(3.01, 1), at(-3.01, -1)]).toEqual(['pass', 'fail', 'fail']);
    expect([at(4, 0.1), at(4, 0.3), at(4, -1)]).toEqual(['pass', 'fail', 'pass']);
  });
  test.each([
    ['impact.slide', 0.3],
    ['pulse', 0.25],
  ])('by %s', async (path, limit) => {
    const at = async (value: number) =>
      levelIn('sideswipe', withAnswer(await contextOf('queue', [set(path, q(value))]), sliding));
    expect([await at(limit - 0.001), await at(limit + 0.001)]).toEqual(['pass', 'fail']);
  });
  test('not where the contact lasts', async () => {
    const context = withAnswer(await contextOf('queue'), { un: 1, ut: 5, utAfter: 4 });
    const casefile = { ...context.casefile, analysis: { ...context.casefile.analysis, contact: 'lasting' as const } };
    expect([levelIn('sideswipe', context), levelIn('sideswipe', { ...context, casefile })]).toEqual([
      'fail',
      undefined,
    ]);
  });
});

describe('engagement', () => {
  test('half of the narrower outline: a front 1.8 m wide', async () => {
    // A and B meet in line, the half widths are 0.9 and 0.905 m: half of 1.8 m is common at an offset of 0.805 + 0.1 m.
    const at = async (offset: number) =>
      findingOf('engagement', await contextOf('queue', [set('impact.A.y', q(offset)), set('impact.B.y', q(0))]));
    expect([(await at(0.9))?.value, (await at(0.91))?.value].map((v) => v && v < 0.5)).toEqual([false, true]);
  });
  test('nine tenths of the mass at work: h = k / 3', async () => {
    const context = await contextOf('queue');
    const { state, answer } = context.solution.central;
    const third = Math.sqrt(state.A.I / state.A.m) / 3;
    const at = (h: number) =>
      levelIn('engagement', withAnswer(context, { Jt: 0, frame: { ...answer.frame, nx: 1, ny: 0, dAy: h, dBy: 0 } }));
    expect([at(third * 0.999), at(third * 1.001)]).toEqual(['pass', 'note']);
  });
});

describe('leverArm', () => {
  const rates = (context: Awaited<ReturnType<typeof contextOf>>, change: number) => {
    const { state, answer } = context.solution.central;
    const by = (0.1 * answer.Jn) / state.A.I;
    const vehicle = { ...answer.A, wBefore: 0, wPredicted: change * by };
    return withAnswer(context, { A: vehicle, B: { ...answer.B, wBefore: 0, wPredicted: 1 } });
  };
  test('a shift of 0.10 m that just turns the sense, and one that does not', async () => {
    const context = await contextOf('queue');
    const at = (change: number) => levelIn('leverArm', rates(context, change));
    expect([at(0.99), at(-0.99), at(1.01), at(-1.01)]).toEqual(['caution', 'caution', 'pass', 'pass']);
  });
  test('a seat far from the mass centre', async () => {
    const at = async (y: number) =>
      findingOf('leverArm', rates(await contextOf('queue', [set('vehicles.A.seats', [{ name: 'Far', x: 0, y }])]), 5));
    expect((await at(0.1))?.level).toBe('pass');
    expect((await at(3))?.level).toBe('caution');
    expect((await at(3))?.value).toBeGreaterThan(0.1);
  });
});

test('planeShare: not there without a trace, there with one, and at its limit', async () => {
  expect(levelIn('planeShare', await contextOf('queue'))).toBeUndefined();
  const context = await contextOf('queue', [set('impact.plane', q(90, 30))], { traced: ['A.deltaV'] });
  expect(levelIn('planeShare', context)).toBe('caution');
  const at = (share: number) => {
    const sobol = context.solution.sobol.map((s) => ({ ...s, total: [share] }));
    return levelIn('planeShare', { ...context, solution: { ...context.solution, sobol } });
  };
  expect([at(0.199), at(0.201)]).toEqual(['pass', 'caution']);
});

test('heavyHeading: three times the momentum, one degree', async () => {
  const at = async (massA: number, sd: number) => {
    const directions = ['approach.A.direction', 'departure.A.direction'];
    const known = [set(directions[0], q(0, 0.5)), set(directions[1], q(19.5, sd))];
    const context = await contextOf('junction', known);
    const { state, answer } = context.solution.central;
    // Momentum of B set to 1 kg m/s, that of A to massA.
    const [A, B] = [
      { ...answer.A, speed: massA / state.A.m },
      { ...answer.B, speed: 1 / state.B.m },
    ];
    return levelIn('heavyHeading', withAnswer(context, { A, B }));
  };
  expect([await at(2.99, 1.5), await at(3.01, 1.5)]).toEqual(['pass', 'caution']);
  expect([await at(3.01, 0.99), await at(3.01, 1.01)]).toEqual(['pass', 'caution']);
});

test('correlated: at 0.9, and not with a handful of draws', async () => {
  const context = await contextOf('queue');
  // Two columns of independent unit variance a and b; a and r a + sqrt(1 - r^2) b then have the correlation r exactly.
  const n = 400;
  const a = Float64Array.from({ length: n }, (_, k) => (k % 2 === 0 ? 1 : -1));
  const b = Float64Array.from({ length: n }, (_, k) => (k % 4 < 2 ? 1 : -1));
  const at = (r: number, rows = n) => {
    const mixed = a.map((x, k) => r * x + Math.sqrt(1 - r * r) * b[k]);
    const values = { ...context.solution.values, 'A.approachSpeed': a.slice(0, rows), 'B.approachSpeed': mixed };
    return levelIn('correlated', { ...context, solution: { ...context.solution, values } });
  };
  expect([at(0.899), at(0.901), at(-0.901), at(0.99, 20)]).toEqual(['pass', 'caution', 'caution', undefined]);
});

test('rotation: 5 % of the energy, 10 degrees on the way, only where the yaw rate is not measured', async () => {
  const context = await contextOf('junction', [set('departure.B.yawRate', null)]);
  const { B } = context.solution.central.state;
  const speed = Math.hypot(B.vx, B.vy);
  // Half of I w^2 over the whole: w = v sqrt(m share / (I (1 - share))).
  const at = (w: number) =>
    levelIn('rotation', withAnswer(context, { B: { ...context.solution.central.answer.B, wPredicted: w } }));
  const byShare = speed * Math.sqrt((B.m * 0.05) / (B.I * 0.95));
  expect(at(byShare * 1.01)).toBe('caution');
  // Legs of 7.11 m from speed v under an even retardation take 2 d / v; the turn is w t / 2.
  const byTurn = (10 * Math.PI) / 180 / (7.11 / speed);
  expect([at(byTurn * 0.98), at(byTurn * 1.02)]).toEqual(['pass', 'caution']);
});

test('seatDeltaV: 10 % or 1 km/h, whichever is less', async () => {
  const at = async (deltaV: number, off: number) => {
    const context = await contextOf('queue', [
      set('vehicles.A.seats', [{ name: 'Seat', x: 0, y: -1 }]),
      set('vehicles.B.seats', []),
    ]);
    const { central } = context.solution;
    // A seat 1 m to the right: the yaw rate adds its size to the forward component.
    const figures = {
      ...central.figures,
      'A.deltaV': deltaV,
      'A.deltaVForward': deltaV,
      'A.deltaVLeft': 0,
      'A.yawRateChange': off,
    };
    return levelIn('seatDeltaV', { ...context, solution: { ...context.solution, central: { ...central, figures } } });
  };
  expect([await at(2, 0.199), await at(2, 0.201)]).toEqual(['pass', 'note']);
  expect([await at(5, 0.277), await at(5, 0.278)]).toEqual(['pass', 'note']);
});

describe('travel', () => {
  const leg = (distance: number, drag: number, grade = 0) => ({
    distance: q(distance),
    friction: q(0.5),
    share: q(drag / 0.5),
    grade: q(grade),
  });
  const legsOfB = (...legs: unknown[]) => contextOf('queue', [set('departure.B.legs', legs)], { draws: 1 });
  test('coasting: 3 m at a drag below 0.05, over all such legs', async () => {
    const at = async (...legs: unknown[]) => levelIn('coasting', await legsOfB(...legs));
    expect([await at(leg(2.99, 0.02)), await at(leg(3.01, 0.02))]).toEqual(['pass', 'caution']);
    expect([await at(leg(1.6, 0.02), leg(1.6, 0.03)), await at(leg(9, 0.051))]).toEqual(['caution', undefined]);
  });
  test('gradeAgainstDrag: a fifth of the drag, up or down', async () => {
    const at = async (grade: number) => levelIn('gradeAgainstDrag', await legsOfB(leg(3, 0.1, grade)));
    expect([await at(0.0199), await at(0.0201), await at(-0.0201)]).toEqual(['pass', 'caution', 'caution']);
  });
  test('both look at simulated travel too, where rolling resistance is the least drag', async () => {
    const rolling = [
      set('departure.A.wheels', { all: { braking: q(0) } }),
      set('departure.A.slope', { grade: q(0.0021), uphill: q(0) }),
    ];
    const context = await contextOf('spin-straight', [], { draws: 1 });
    const casefile = editedCase('spin-straight', rolling);
    expect(findingOf('gradeAgainstDrag', { ...context, casefile })?.value).toBeCloseTo(0.21, 9);
    expect(levelIn('coasting', { ...context, casefile })).toBe('caution');
  });
  test('driverControlled: not where nothing is simulated', async () =>
    expect(levelIn('driverControlled', await contextOf('queue'))).toBeUndefined());
  test('driverControlled: within 3 degrees of the way, only after 10 m', async () => {
    const at = async (x: number, heading: number) =>
      levelIn(
        'driverControlled',
        await contextOf(
          'spin-straight',
          [set('departure.A.rest.x', q(x)), set('departure.A.rest.heading', q(heading))],
          { draws: 1 },
        ),
      );
    expect([await at(7.5, 0), await at(8.1, 0)]).toEqual(['pass', 'caution']);
    expect([await at(9, 2.9), await at(9, 3.1)]).toEqual(['caution', 'pass']);
  });
});
