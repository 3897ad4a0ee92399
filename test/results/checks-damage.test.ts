import { describe, expect, test } from 'vitest';
import type { Damage } from '@/lib/casefile/schema';
import { meanDepth } from '@/lib/results/checks/damage-given';
import { q } from '../support/build-case';
import { contextOf, findingOf, levelIn, set, withCentral } from '../support/check-context';
import { damage } from './more-checks-on';

/** The checks of damage, each limit from both sides. Damage and stiffness are invented. */

const given = (a: unknown, b: unknown) => contextOf('queue', [set('damage', { A: a, B: b })]);

describe('damageEnergy', () => {
  test('both estimates: from half to twice', async () => {
    const context = await given(damage(0.03), damage(0.03));
    const at = (energyLost: number) =>
      levelIn('damageEnergy', withCentral(context, { energyLost, 'A.damageEnergy': 400, 'B.damageEnergy': 600 }));
    expect([at(499), at(501), at(1999), at(2001)]).toEqual(['caution', 'pass', 'pass', 'caution']);
  });
  test('one estimate is a lower limit, with or without a vehicle that kept no depth', async () => {
    for (const other of [null, damage(0)]) {
      const context = await given(damage(0.03), other);
      const at = (energyLost: number) =>
        findingOf('damageEnergy', withCentral(context, { energyLost, 'A.damageEnergy': 400 }));
      expect([at(399)?.level, at(401)?.level, at(9999)?.level]).toEqual(['caution', 'pass', 'pass']);
      expect(at(9999)?.says).toMatch(/lower limit/);
    }
  });
});

describe('damageSpeed', () => {
  const speeds = (context: Awaited<ReturnType<typeof given>>, closing: number, fromDamage: number) => {
    const band = (sd: number) => ({ mean: 0, sd, median: 0, low: 0, high: 0, shortest: [0, 0] as [number, number] });
    const bands = { ...context.bands, closingSpeed: band(0.3), damageClosingSpeed: band(0.4) };
    return findingOf('damageSpeed', {
      ...withCentral(context, { closingSpeed: closing, damageClosingSpeed: fromDamage }),
      bands,
    })?.level;
  };
  test('both estimates: two combined standard uncertainties, 0.3 and 0.4 make 0.5', async () => {
    const context = await given(damage(0.03), damage(0.03));
    const at = (closing: number) => speeds(context, closing, 4);
    expect([at(2.99), at(3.01), at(4.99), at(5.01)]).toEqual(['caution', 'pass', 'pass', 'caution']);
  });
  test('one vehicle bounds from below only', async () => {
    const context = await given(null, damage(0.03));
    const at = (closing: number) => speeds(context, closing, 4);
    expect([at(2.99), at(3.01), at(40)]).toEqual(['caution', 'pass', 'pass']);
  });
  test('no depth on either bounds from above only, at the energy of A^2 / 2B over both widths', async () => {
    const context = await given(damage(0), damage(0));
    const { e, mu, frame } = context.solution.central.answer;
    // In plain words: 2 vehicles x 40 000^2 / (2 x 600 000) J/m x 1.2 m.
    const work = (2 * 1.2 * 40_000 ** 2) / (2 * 600_000);
    const most = Math.sqrt((2 * work * (frame.Knn + mu * frame.Knt)) / (1 - e * e));
    const band = { mean: 0, sd: 0.3, median: 0, low: 0, high: 0, shortest: [0, 0] as [number, number] };
    const at = (closingSpeed: number) =>
      levelIn('damageSpeed', { ...withCentral(context, { closingSpeed }), bands: { closingSpeed: band } });
    expect([at(0.5), at(most + 0.59), at(most + 0.61)]).toEqual(['pass', 'pass', 'caution']);
  });
  test('without any spread the two are shown and not weighed', async () => {
    const context = { ...(await given(damage(0.03), damage(0.03))), bands: {} };
    const found = findingOf('damageSpeed', context);
    expect([found?.level, found?.says.includes('neither has a spread')]).toEqual(['note', true]);
  });
  test('not there without damage, nor with one vehicle that kept no depth', async () => {
    expect(levelIn('damageSpeed', await contextOf('queue'))).toBeUndefined();
    expect(levelIn('damageSpeed', await given(damage(0), null))).toBeUndefined();
  });
});

test('forceAngle: 15 degrees, to either side', async () => {
  const at = async (forceAngle: number) =>
    levelIn('forceAngle', withCentral(await given(damage(0.03, forceAngle), null), { impulseRatio: -1 }));
  expect([await at(29.9), await at(30.1), await at(-59.9), await at(60.1)]).toEqual([
    'caution',
    'pass',
    'pass',
    'caution',
  ]);
});

describe('crushIntercept', () => {
  // Shares of the intercept at A = 40 kN/m, B = 600 kN/m^2: 2 cm 0.59, 7 cm 0.24, 20 cm 0.06 (computed apart from this program).
  test.each([
    [0.02, 0.59],
    [0.07, 0.24],
    [0.2, 0.06],
  ])('%f m', async (depth, share) =>
    expect(findingOf('crushIntercept', await given(damage(depth), null))?.value).toBeCloseTo(share, 2),
  );
  test('at a quarter (C = A/B) and at a half', async () => {
    const at = async (depth: number) => findingOf('crushIntercept', await given(damage(depth), null));
    const quarter = 40_000 / 600_000;
    const half = quarter * (Math.SQRT2 - 1);
    expect((await at(quarter * 1.001))?.level).toBe('pass');
    expect((await at(quarter * 0.999))?.level).toBe('caution');
    expect((await at(half * 1.001))?.advice).not.toMatch(/Do not use/);
    expect((await at(half * 0.999))?.advice).toMatch(/Do not use/);
  });
  test('the mean depth follows the stations', () => {
    const uneven: Damage = { ...damage(0), depths: [q(0), q(0.1), q(0.1)], stations: [0, 0.3, 1.2] };
    expect(meanDepth(uneven)).toBeCloseTo((0.3 * 0.05 + 0.9 * 0.1) / 1.2, 12);
    expect(meanDepth({ ...uneven, stations: null })).toBeCloseTo(0.075, 12);
  });
});

test('checks of damage are not there without damage', async () => {
  const context = await contextOf('queue');
  for (const id of ['damageEnergy', 'damageSpeed', 'forceAngle', 'crushIntercept', 'noDamage', 'oneVehicle'])
    expect(levelIn(id, context)).toBeUndefined();
});
