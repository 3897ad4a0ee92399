import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { parseCaseText } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import { solveCase } from '@/lib/solve-case';
import { engineDraws } from '../support/engine-draws';
import { plainMonteCarlo } from '../support/plain-monte-carlo';

/**
 * Whole cases against the plain reference solver (test/support/plain-monte-carlo.ts) over the same draws: every result, its
 * mean, spread and intervals, and the impossible draws by reason. The two share the random numbers and nothing else.
 */
const DRAWS = 4000;
const SEED = 77;
const COVERAGE = 0.95;

const read = (path: string): CaseFile => {
  const parsed = parseCaseText(readFileSync(path, 'utf8'));
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.issues));
  return parsed.casefile;
};

/** Figures are held to 1e-9 of themselves and of their own spread, or of the unit where both are nothing. */
function expectClose(found: number, expected: number, size: number, what: string): void {
  expect(Math.abs(found - expected), `${what}: ${found} against ${expected}`).toBeLessThan(
    1e-9 * (Math.abs(expected) + size) + 1e-9,
  );
}

function expectBands(result: Result, expected: ReturnType<typeof plainMonteCarlo>): void {
  expect(Object.keys(result.bands).sort()).toEqual(Object.keys(expected.bands).sort());
  for (const [name, band] of Object.entries(expected.bands)) {
    const found = result.bands[name];
    for (const key of ['mean', 'sd', 'median', 'low', 'high'] as const)
      expectClose(found[key], band[key], band.sd, `${name}.${key}`);
    found.shortest.forEach((x, i) => expectClose(x, band.shortest[i], band.sd, `${name}.shortest`));
  }
}

const folders = ['public/examples', 'test/cases'];
const cases = folders.flatMap((folder) =>
  readdirSync(folder)
    .filter((file) => file.endsWith('.case.json'))
    .map((file) => `${folder}/${file}`)
    // The plain reference knows legs and the instant only; the rest has its own laws and constants from outside.
    .filter((path) => !/"spin"|"lasting"/.test(readFileSync(path, 'utf8'))),
);

describe('the engine answers as the plain reference does', () => {
  test.each(cases)('%s', async (path) => {
    const casefile = read(path);
    const { method } = casefile.analysis;
    if (method === 'fit') return;
    const outcome = await solveCase(casefile, { draws: DRAWS, seed: SEED, sensitivity: false });
    const plain = plainMonteCarlo(
      casefile,
      method,
      DRAWS,
      casefile.analysis.coverage ?? COVERAGE,
      engineDraws(casefile, SEED, DRAWS),
    );
    if (outcome.kind !== 'solved') throw new Error(JSON.stringify(outcome));
    const { result } = outcome;
    for (const [name, value] of Object.entries(result.central))
      expectClose(value, plain.central[name], 0, `central ${name}`);
    expect(result.impossible).toEqual(plain.impossible);
    expectBands(result, plain);
  });
});
