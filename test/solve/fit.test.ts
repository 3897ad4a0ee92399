import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { type Edit, applyEdit } from '@/lib/casefile/edit';
import { parseCase } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import { readEvidence } from '@/lib/evidence/read-evidence';
import type { CheckContext } from '@/lib/results/checks/check';
import { converged } from '@/lib/results/checks/converged';
import { resultSchema, type Result } from '@/lib/results/result';
import { solveCase } from '@/lib/solve-case';
import { type Lane, runOn } from '@/lib/solve/lanes';
import { runTask } from '@/lib/solve/task';

const q = (value: number, sd?: number) => ({ value, ...(sd ? { spread: { shape: 'normal', sd } } : {}) });
const set = (path: string, to: unknown): Edit => ({ do: 'set', path, to });

function edited(file: string, ...edits: Edit[]): CaseFile {
  const parsed = parseCase(readFileSync(file));
  if (!parsed.ok) throw new Error(`${file} is not valid`);
  const done = applyEdit(parsed.casefile, { do: 'all', edits: [set('analysis.method', 'fit'), ...edits] });
  if (!done.ok) throw new Error(JSON.stringify(done.issues));
  return done.casefile;
}

async function solved(casefile: CaseFile, draws = 600): Promise<Result> {
  const outcome = await solveCase(casefile, { draws });
  if (outcome.kind !== 'solved') throw new Error(JSON.stringify(outcome));
  return outcome.result;
}

const CROSSING = 'test/cases/fit-crossing.case.json';
const JUNCTION = 'public/examples/junction.case.json';
const NUDGE = 'public/examples/nudge.case.json';
const level = (result: Result, id: string) => result.checks.find((check) => check.id === id)?.level;

describe('the method fit', () => {
  test('one, two and three lanes give the same digits', async () => {
    const lane: Lane = async (problem, task) =>
      structuredClone(runTask(structuredClone(problem), structuredClone(task)));
    const results = await Promise.all(
      [1, 2, 3].map((n) =>
        solveCase(edited(CROSSING), { draws: 300, run: runOn(Array.from({ length: n }, () => lane)) }),
      ),
    );
    expect(results[1]).toEqual(results[0]);
    expect(results[2]).toEqual(results[0]);
  });

  test('its result is valid by the schema and says how it went', async () => {
    const result = await solved(edited(CROSSING));
    expect(resultSchema.safeParse(result).success).toBe(true);
    expect(result.fit?.degreesOfFreedom).toBe(6);
    expect(Object.keys(result.fit?.residuals ?? {})).toContain('departure.A.legs');
    expect(level(result, 'converged')).toBe('pass');
    expect(level(result, 'misfit')).toBe('pass');
  });

  test('evidence that contradicts itself is said to, with its residuals', async () => {
    const result = await solved(edited(CROSSING, set('recorded.A', { forward: q(-1, 0.3) })));
    expect(level(result, 'misfit')).toBe('caution');
    expect(Math.abs(result.fit?.residuals['recorded.A.forward'] ?? 0)).toBeGreaterThan(2);
  });

  test('a vehicle may have no evidence at all, and what is then set by the prior is named', async () => {
    const result = await solved(edited(CROSSING, set('departure.B', null), set('departure.A.yawRate', null)));
    expect(result.fit?.degreesOfFreedom).toBe(2);
    const sure = await solved(edited(CROSSING));
    expect(result.bands['B.approachSpeed'].sd).toBeGreaterThan(2 * sure.bands['B.approachSpeed'].sd);
    const recordedOnly = await solved(
      edited(CROSSING, set('departure.A', null), set('departure.B', null), set('recorded.B', { left: q(-9, 3) })),
    );
    expect(level(recordedOnly, 'priorDriven')).toBe('caution');
    expect(level(sure, 'priorDriven')).toBe('pass');
  });

  test('rival accounts stand beside each other with their marginal likelihoods; a standing vehicle is speed 0 exactly', async () => {
    const result = await solved(
      edited(
        CROSSING,
        set('hypotheses', [
          { name: 'B stood', set: { 'approach.B.speed': q(0) } },
          {
            name: 'B came slowly',
            set: { 'approach.B.speed': { value: 9, spread: { shape: 'rectangular', low: 5, high: 12 } } },
          },
        ]),
      ),
    );
    const [stood, slow] = result.hypotheses;
    expect(stood.name).toBe('B stood');
    expect(stood.central['B.approachSpeed']).toBe(0);
    // A pushed standing B cannot be driven 11 m/s across: the account is far behind.
    expect((slow.logEvidence ?? 0) - (stood.logEvidence ?? 0)).toBeGreaterThan(10);
    // A prior narrowed from 45 to 7 m/s about what the evidence says gains log(45/7), less what it cuts off.
    expect((slow.logEvidence ?? 0) - (result.fit?.logEvidence ?? 0)).toBeCloseTo(Math.log(45 / 7), 0);
  });

  test('an instant and a lasting contact agree with the same working backwards', async () => {
    const backwards = async (contact: string) => {
      const outcome = await solveCase(edited(JUNCTION, set('analysis.contact', contact)), {
        method: 'directions',
        draws: 300,
        sensitivity: false,
      });
      if (outcome.kind !== 'solved') throw new Error('not solved');
      return outcome.result;
    };
    for (const contact of ['instant', 'lasting']) {
      const [fit, back] = [
        await solved(edited(JUNCTION, set('analysis.contact', contact)), 500),
        await backwards(contact),
      ];
      for (const name of ['A.approachSpeed', 'B.approachSpeed', 'A.deltaV'])
        expect(Math.abs(fit.bands[name].median - back.bands[name].median)).toBeLessThan(back.bands[name].sd);
    }
  }, 120_000);

  test('simulated travel is run forward and its rest poses observed, each where stated', async () => {
    const casefile = edited(NUDGE, set('departure.B.rest.heading', null));
    const result = await solved(casefile, 300);
    expect(Object.keys(result.fit?.residuals ?? {}).filter((path) => path.includes('rest'))).toHaveLength(5);
    const whole = await solved(edited(NUDGE), 300);
    expect(Math.abs(whole.bands['A.approachSpeed'].median - 5.5)).toBeLessThan(0.5);
  }, 120_000);

  test('no residual depth on either vehicle bounds the energy from above', async () => {
    const none = {
      depths: [q(0), q(0)],
      width: q(1.4, 0.1),
      forceAngle: q(0),
      a: q(40_000, 4000),
      b: q(600_000, 60_000),
    };
    const casefile = edited(CROSSING, set('damage', { A: none, B: none }));
    const observation = readEvidence(casefile, 'fit', 1).fit?.observations.find(({ path }) => path === 'damage');
    expect(observation?.of).toBe('energyBelow');
    // G = A^2/(2B) over 1.4 m, both vehicles: 40 000^2 / (2 x 600 000) x 2.8, widened by the spreads of A and B.
    expect(observation?.value).toBeGreaterThan(3733);
    expect(observation?.value).toBeLessThan(4000);
    const [bounded, free] = [await solved(casefile), await solved(edited(CROSSING))];
    expect(bounded.bands.energyLost.median).toBeLessThan(free.bands.energyLost.median);
  });

  test('two runs that disagree fail the check and withhold the answer', () => {
    const check = (disagreement: number, logEvidence: number) =>
      converged.find({
        solution: { fit: { logEvidence: 0, secondRun: { disagreement, logEvidence } } },
      } as CheckContext)?.level;
    expect([check(0.29, 0.9), check(0.31, 0), check(0, -1.1)]).toEqual(['pass', 'fail', 'fail']);
  });

  test('more particles than can be held are refused with the path', async () => {
    const outcome = await solveCase(edited(CROSSING, set('analysis.draws', 200_001)));
    expect(outcome).toMatchObject({ kind: 'invalid', issues: [{ path: 'analysis.draws' }] });
  });

  test('an observation without a spread is refused with its path', async () => {
    const outcome = await solveCase(edited(CROSSING, set('departure.A.direction', q(19))));
    expect(outcome).toMatchObject({ kind: 'invalid', issues: [{ path: 'departure.A.direction' }] });
  });
});
