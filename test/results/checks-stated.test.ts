import { describe, expect, test } from 'vitest';
import type { CheckContext } from '@/lib/results/checks/check';
import { q } from '../support/build-case';
import { contextOf, findingOf, levelIn, set, withCentral } from '../support/check-context';

/** The checks of what is stated beside the answer: recorded delta-V and known speeds, each limit from both sides. */

const KMH = 1 / 3.6;
const band = (sd: number) => ({ mean: 0, sd, median: 0, low: 0, high: 0, shortest: [0, 0] as [number, number] });
const withBand = (context: CheckContext, name: 'A.approachSpeed' | 'A.deltaVForward' | 'A.deltaVLeft', sd: number) => ({
  ...context,
  bands: { [name]: band(sd) },
});

describe('knownSpeed: 0.3 stated and 0.4 answered make 0.5', () => {
  const at = async (stated: number) => {
    const context = await contextOf('junction', [set('approach.A.speed', q(stated, 0.3))]);
    return findingOf('knownSpeed', withBand(withCentral(context, { 'A.approachSpeed': 10 }), 'A.approachSpeed', 0.4));
  };
  test('two and three', async () => {
    expect([(await at(10.99))?.level, (await at(11.01))?.level, (await at(8.99))?.level]).toEqual([
      'pass',
      'caution',
      'caution',
    ]);
    expect((await at(11.49))?.advice).not.toMatch(/contradict/);
    expect((await at(11.51))?.advice).toMatch(/contradict/);
  });
  test('not there where nothing is stated, or nothing has a spread', async () => {
    expect(levelIn('knownSpeed', await contextOf('junction'))).toBeUndefined();
    const exact = await contextOf('junction', [set('approach.A.speed', q(5))]);
    expect(levelIn('knownSpeed', { ...exact, bands: {} })).toBeUndefined();
  });
});

describe('recorded', () => {
  const at = async (key: 'forward' | 'left', quantity: unknown, answer: number) => {
    const context = await contextOf('junction', [set(`recorded.A.${key}`, quantity)]);
    const name = key === 'forward' ? 'A.deltaVForward' : 'A.deltaVLeft';
    return findingOf('recorded', withBand(withCentral(context, { [name]: answer }), name, 0.4));
  };
  test('with the stated spread', async () => {
    expect([(await at('left', q(3, 0.3), 2.01))?.level, (await at('left', q(3, 0.3), 1.99))?.level]).toEqual([
      'pass',
      'caution',
    ]);
    expect((await at('forward', q(3, 0.3), 1.49))?.advice).toMatch(/contradict/);
  });
  test('without one, by the regulation: 6 km/h has 0.45 km/h', async () => {
    const found = await at('forward', { value: -6 * KMH }, -6 * KMH + 1);
    const u = Math.sqrt((0.6 ** 2 + 0.5 ** 2) / 3) * KMH;
    expect(found?.value).toBeCloseTo(1 / Math.sqrt(u ** 2 + 0.16), 9);
  });
  test('not there where nothing is recorded', async () =>
    expect(levelIn('recorded', await contextOf('junction'))).toBeUndefined());
});

test('recorderPulse: 0.15 s, and not without a contact duration', async () => {
  const at = async (pulse: unknown, value = 8 * KMH) =>
    findingOf('recorderPulse', await contextOf('queue', [set('pulse', pulse), set('recorded.B.forward', { value })]));
  expect([(await at(q(0.149)))?.level, (await at(q(0.15)))?.level]).toEqual(['pass', 'caution']);
  expect((await at(q(0.15)))?.says).toMatch(/1\.8 %/);
  expect((await at(q(0.4)))?.says).toMatch(/never start/);
  expect(await at(null)).toBeUndefined();
});

test('recorderResolution: at the uncertainty of the regulation, and a value stated as exact', async () => {
  const u = Math.sqrt((0.6 ** 2 + 0.5 ** 2) / 3) * KMH;
  const at = async (quantity: unknown) =>
    levelIn('recorderResolution', await contextOf('queue', [set('recorded.B.forward', quantity)]));
  expect([await at(q(6 * KMH, u * 0.99)), await at(q(6 * KMH, u * 1.01))]).toEqual(['note', 'pass']);
  expect(await at({ value: 6 * KMH, spread: { shape: 'fixed' } })).toBe('note');
});

test('recorderLateral: a change of the yaw rate of 5 deg/s, only for a recorded lateral value', async () => {
  const context = await contextOf('junction', [set('recorded.A.left', q(1, 0.3))]);
  const at = (degrees: number) => {
    const { central } = context.solution;
    const figures = { ...central.figures, 'A.yawRateChange': (degrees * Math.PI) / 180 };
    return levelIn('recorderLateral', {
      ...context,
      solution: { ...context.solution, central: { ...central, figures } },
    });
  };
  expect([at(4.99), at(5.01), at(-5.01)]).toEqual(['pass', 'note', 'note']);
});

test('restitutionRegression: 1 to 6 m/s, and solved together with the speed of parting where only that is known', async () => {
  const [queue, junction] = [await contextOf('queue'), await contextOf('junction')];
  const at = (closingSpeed: number) => levelIn('restitutionRegression', withCentral(queue, { closingSpeed }));
  expect([at(0.99), at(1.01), at(5.99), at(6.01)]).toEqual([undefined, 'note', 'note', undefined]);
  expect(findingOf('restitutionRegression', queue)?.says).toMatch(/Solved together .* confirm against the paper/);
  expect(findingOf('restitutionRegression', junction)?.says).not.toMatch(/Solved together/);
});
