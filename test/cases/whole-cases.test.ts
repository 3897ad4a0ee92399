import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { parseCase } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import { resultSchema, type Result } from '@/lib/results/result';
import { type Outcome, solveCase } from '@/lib/solve-case';
import { type Lane, runOn } from '@/lib/solve/lanes';
import { runTask } from '@/lib/solve/task';

/**
 * Whole cases, in and out: every *.case.json here is solved and held against the *.expected.json beside it, which an
 * independent implementation of the same published laws made (4 million draws; tolerances from its batches).
 */

const FOLDER = 'test/cases';

interface Figure {
  value: number;
  tol: number;
}
interface Expected {
  case: string;
  central?: Record<string, Figure>;
  bands?: Record<string, Record<string, Figure>>;
  impossibleShare?: Figure;
  reasons?: Record<string, Figure>;
  checks?: Record<string, string[]>;
  logEvidence?: Figure;
  sensitivity?: { tol: number; values: Record<string, Record<string, { first: number; total: number }>> };
}

const read = (file: string): Uint8Array => readFileSync(`${FOLDER}/${file}`);
const expectations = readdirSync(FOLDER)
  .filter((file) => file.endsWith('.expected.json'))
  .map((file) => [file.replace('.expected.json', ''), JSON.parse(read(file).toString()) as Expected] as const);

function caseOf(file: string): CaseFile {
  const parsed = parseCase(read(file));
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.issues));
  return parsed.casefile;
}

const resultOf = (outcome: Outcome): Result => {
  if (outcome.kind !== 'solved') throw new Error(JSON.stringify(outcome));
  return outcome.result;
};

/** Distance, directions round the circle. */
const off = (name: string, a: number, b: number): number => {
  const d = a - b;
  return Math.abs(name.endsWith('Direction') ? d - 360 * Math.round(d / 360) : d);
};

function misses(expected: Expected, result: Result): string[] {
  const found: string[] = [];
  const hold = (what: string, name: string, got: number | undefined, { value, tol }: Figure): void => {
    if (got === undefined || !(off(name, got, value) <= tol)) found.push(`${what}: ${got}, want ${value} ± ${tol}`);
  };
  for (const [name, figure] of Object.entries(expected.central ?? {})) hold(name, name, result.central[name], figure);
  for (const [name, band] of Object.entries(expected.bands ?? {}))
    for (const [key, figure] of Object.entries(band)) {
      const got = result.bands[name];
      const [low, high] = got?.shortest ?? [];
      const value = key === 'shortestLow' ? low : key === 'shortestHigh' ? high : got?.[key as 'mean'];
      hold(`band ${name} ${key}`, key === 'sd' ? '' : name, value, figure);
    }
  const total = Object.values(result.impossible).reduce((sum, n) => sum + n, 0);
  if (expected.impossibleShare) hold('impossible share', '', total / result.draws, expected.impossibleShare);
  for (const [names, figure] of Object.entries(expected.reasons ?? {})) {
    const count = names.split('+').reduce((sum, reason) => sum + (result.impossible[reason] ?? 0), 0);
    hold(`impossible by ${names}`, '', count / result.draws, figure);
  }
  if (expected.logEvidence) hold('log evidence', '', result.fit?.logEvidence, expected.logEvidence);
  for (const [id, levels] of Object.entries(expected.checks ?? {})) {
    const level = result.checks.find((check) => check.id === id)?.level;
    if (!level || !levels.includes(level)) found.push(`check ${id}: ${level}, want ${levels.join(' or ')}`);
  }
  for (const [name, inputs] of Object.entries(expected.sensitivity?.values ?? {}))
    for (const [path, shares] of Object.entries(inputs))
      for (const key of ['first', 'total'] as const)
        hold(`sensitivity of ${name} to ${path}, ${key}`, '', result.sensitivity[name]?.[path]?.[key], {
          value: shares[key],
          tol: expected.sensitivity?.tol ?? 0,
        });
  return found;
}

test('there are whole cases to hold', () => expect(expectations.length).toBeGreaterThanOrEqual(5));

describe.each(expectations)('%s', (_, expected) => {
  test('agrees with the independent implementation, and its result is valid by the schema', async () => {
    const result = resultOf(await solveCase(caseOf(expected.case)));
    expect(misses(expected, result)).toEqual([]);
    expect(resultSchema.safeParse(JSON.parse(JSON.stringify(result))).error).toBeUndefined();
  });
});

describe('the same digits, whoever does the work', () => {
  /** A lane at the other end of a post box: tasks and answers are copied, and some answers come late. */
  const posted = (number: number): Lane => {
    let asked = 0;
    return async (problem, task) => {
      const delay = (number * 7 + ++asked * 3) % 5;
      await new Promise((resolve) => setTimeout(resolve, delay));
      return structuredClone(runTask(structuredClone(problem), structuredClone(task)));
    };
  };

  test.each(['crossing-90', 'offset-yaw'])(
    '%s: one thread, and four workers that finish in another order',
    async (name) => {
      const casefile = caseOf(`${name}.case.json`);
      const alone = resultOf(await solveCase(casefile, { draws: 100_001 }));
      const shared = resultOf(await solveCase(casefile, { draws: 100_001, run: runOn([1, 2, 3, 4].map(posted)) }));
      expect(JSON.stringify(shared)).toBe(JSON.stringify(alone));
    },
  );

  test('another seed gives other draws and the same centre', async () => {
    const casefile = caseOf('crossing-90.case.json');
    const [one, two] = [
      resultOf(await solveCase(casefile, { draws: 5000, seed: 1 })),
      resultOf(await solveCase(casefile, { draws: 5000, seed: 2 })),
    ];
    expect(two.central).toEqual(one.central);
    expect(two.bands).not.toEqual(one.bands);
  });
});

describe("draws 'auto' (JCGM 101:2008, 7.9)", () => {
  test('stops when the digits have settled, the same with any workers', async () => {
    const casefile = caseOf('crossing-90.case.json');
    casefile.analysis.draws = 'auto';
    const result = resultOf(await solveCase(casefile, { sensitivity: false }));
    expect(result.draws).toBeGreaterThanOrEqual(2 * 16_384);
    expect(result.draws).toBeLessThanOrEqual(64 * 16_384);
    // Another, far longer run lies within the numerical tolerance of the printed digits, 95 times in 100.
    const long = resultOf(await solveCase(casefile, { draws: 300_000, seed: 99, sensitivity: false }));
    const [band, other] = [result.bands['A.approachSpeed'], long.bands['A.approachSpeed']];
    expect(Math.abs(band.mean - other.mean)).toBeLessThan(0.005 * 2);
    expect(Math.abs(band.low - other.low)).toBeLessThan(0.005 * 4);
  });
});
