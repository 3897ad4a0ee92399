import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { type Edit, applyEdit } from '@/lib/casefile/edit';
import { parseCase } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import { CHECKS } from '@/lib/results/checks/all';
import type { Check } from '@/lib/results/result';
import { solveCase } from '@/lib/solve-case';
import { q } from '../support/build-case';
import { MORE_ON } from './more-checks-on';

/** Every check, off and on, in whole cases: the junction and the queue, with one thing changed. */

function example(name: 'junction' | 'queue'): CaseFile {
  const parsed = parseCase(readFileSync(`public/examples/${name}.case.json`));
  if (!parsed.ok) throw new Error('the example is not valid');
  return parsed.casefile;
}

const set = (path: string, to: unknown): Edit => ({ do: 'set', path, to });

async function checksAfter(name: 'junction' | 'queue', ...edits: Edit[]): Promise<Map<string, Check>> {
  const edited = applyEdit(example(name), { do: 'all', edits });
  if (!edited.ok) throw new Error(JSON.stringify(edited.issues));
  const outcome = await solveCase(edited.casefile, { draws: 2000, sensitivity: false });
  if (outcome.kind !== 'solved') throw new Error(JSON.stringify(outcome));
  return new Map(outcome.result.checks.map((check) => [check.id, check]));
}

const levelOf = async (id: string, name: 'junction' | 'queue', ...edits: Edit[]): Promise<string | undefined> =>
  (await checksAfter(name, ...edits)).get(id)?.level;

describe('off in the examples where nothing is wrong', () => {
  test.each([
    'energyGain',
    'restitutionRange',
    'friction',
    'slidingReversal',
    'closing',
    'contactPoint',
    'overlap',
    'nearlyInLine',
    'sideSlip',
    'yawMismatch',
    'speedRange',
    'wide',
  ])('%s passes at the junction', async (id) => expect(await levelOf(id, 'junction')).toBe('pass'));
  test.each(['amplification', 'misfit', 'impossibleShare'])('%s passes in the queue', async (id) =>
    expect(await levelOf(id, 'queue')).toBe('pass'),
  );
  test('checks that do not apply are not there', async () => {
    const [junction, queue] = [await checksAfter('junction'), await checksAfter('queue')];
    expect(junction.has('amplification')).toBe(false);
    expect(junction.has('misfit')).toBe(false);
    expect(queue.has('nearlyInLine')).toBe(false);
  });
});

type Case = [id: string, level: string, name: 'junction' | 'queue', edits: Edit[]];

/** What turns each check on. */
const ON: Case[] = [
  [
    'energyGain',
    'fail',
    'queue',
    [
      set('impact.restitution', q(1)),
      set('impact.impulseRatio', q(0.6)),
      set('impact.A.y', q(0.75)),
      set('departure.A.yawRate', q(-90)),
      set('departure.B.yawRate', q(-90)),
    ],
  ],
  ['restitutionRange', 'fail', 'junction', [set('departure.B.direction', q(40))]],
  ['friction', 'caution', 'junction', [set('impact.plane', q(110))]],
  ['friction', 'fail', 'junction', [set('impact.plane', q(122))]],
  [
    'slidingReversal',
    'caution',
    'queue',
    [set('impact.impulseRatio', q(-0.4)), set('departure.B.direction', q(-20)), set('departure.A.direction', q(30))],
  ],
  ['closing', 'fail', 'junction', [set('impact.plane', q(150))]],
  ['contactPoint', 'caution', 'junction', [set('impact.point.y', q(3))]],
  ['overlap', 'caution', 'queue', [set('impact.A.x', q(-3.4))]],
  ['overlap', 'caution', 'queue', [set('impact.A.x', q(-1.2))]],
  ['nearlyInLine', 'note', 'junction', [set('approach.B.direction', q(40)), set('impact.B.heading', q(40))]],
  ['nearlyInLine', 'caution', 'junction', [set('approach.B.direction', q(24)), set('impact.B.heading', q(24))]],
  ['nearlyInLine', 'fail', 'junction', [set('approach.B.direction', q(8)), set('impact.B.heading', q(8))]],
  ['amplification', 'caution', 'queue', [set('impact.restitution', q(0.15))]],
  ['sideSlip', 'note', 'junction', [set('impact.A.heading', q(9, 0.5)), set('approach.A.direction', q(0, 0.5))]],
  ['sideSlip', 'caution', 'junction', [set('impact.A.heading', q(25))]],
  ['yawMismatch', 'caution', 'junction', [set('departure.A.yawRate', q(200, 4))]],
  ['yawMismatch', 'caution', 'queue', [set('departure.A.yawRate', q(120, 1))]],
  ['tyreImpulse', 'caution', 'queue', []],
  ['tyreImpulse', 'pass', 'queue', [set('pulse', q(0.005))]],
  [
    'speedRange',
    'caution',
    'junction',
    [set('departure.A.legs.0.distance', q(60)), set('departure.B.legs.0.distance', q(90))],
  ],
  ['misfit', 'caution', 'queue', [set('approach.A.speed', q(12, 0.5))]],
  ['impossibleShare', 'caution', 'junction', [set('departure.B.direction', q(29, 6))]],
  [
    'wide',
    'caution',
    'queue',
    [set('impact.restitution', { value: 0.3, spread: { shape: 'rectangular', low: 0.06, high: 0.6 } })],
  ],
];

/** Checks of travel that is simulated to a rest pose. */
const SIMULATED = ['restPose', 'otherTurns', 'secondContact'];
/** Checks of the method fit: turned on and off in test/solve/fit.test.ts. */
const OF_A_FIT = ['converged', 'priorDriven'];

describe('simulated travel', () => {
  const simulated = async (...edits: Edit[]) => {
    const parsed = parseCase(readFileSync('test/cases/spin-straight.case.json'));
    if (!parsed.ok) throw new Error('the case is not valid');
    const edited = applyEdit(parsed.casefile, { do: 'all', edits });
    if (!edited.ok) throw new Error(JSON.stringify(edited.issues));
    return solveCase(edited.casefile, { draws: 20, sensitivity: false });
  };
  test('restPose says how well the pose is met, otherTurns names what else leads there', async () => {
    const outcome = await simulated();
    if (outcome.kind !== 'solved') throw new Error('not solved');
    const level = (id: string) => outcome.result.checks.find((check) => check.id === id)?.level;
    expect([level('restPose'), level('otherTurns')]).toEqual(['pass', 'note']);
    expect(outcome.result.more['A.separations']?.[0]?.speed).toBeCloseTo(7.4466, 3);
    expect(outcome.result.more['A.separations']?.length).toBeGreaterThan(1);
  });
  test('neither is there with legs', async () => {
    const checks = await checksAfter('junction');
    expect(SIMULATED.some((id) => checks.has(id))).toBe(false);
  });
  test('a vehicle that rolls away downhill is refused in words', async () => {
    const slope = { grade: q(0.3), uphill: q(180) };
    const outcome = await simulated(set('departure.A.slope', slope), set('departure.A.friction', q(0.1)));
    expect(outcome.kind === 'unsolved' && outcome.reason.says).toMatch(/does not come to rest/);
  });
});

describe('on', () => {
  test.each(ON)('%s: %s', async (id, level, name, edits) => expect(await levelOf(id, name, ...edits)).toBe(level));

  test('every check is turned on here, with simulated travel, or among the further checks', () =>
    expect(new Set([...ON.map(([id]) => id), ...SIMULATED, ...OF_A_FIT, ...MORE_ON.map(({ id }) => id)])).toEqual(
      new Set(CHECKS.map(({ id }) => id)),
    ));
});

test('every check says what it found, what to do where it speaks up, and where its limit comes from', async () => {
  for (const [, , name, edits] of ON)
    for (const check of (await checksAfter(name, ...edits)).values()) {
      expect(check.says).not.toMatch(/NaN|undefined|Infinity/);
      expect(check.source.length).toBeGreaterThan(10);
      if (check.level === 'caution' || check.level === 'fail') expect(check.advice ?? '').not.toBe('');
    }
});
