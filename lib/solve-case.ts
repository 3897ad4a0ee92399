import { DEFAULT_COVERAGE, DEFAULT_DRAWS, DEFAULT_SEED } from '@/lib/casefile/defaults';
import { needsOf } from '@/lib/casefile/needs';
import type { CaseFile } from '@/lib/casefile/schema';
import { readEvidence } from '@/lib/evidence/read-evidence';
import { fitCase } from '@/lib/fit-case';
import { HEADLINES } from '@/lib/results/names';
import type { Outcome, SolveOptions } from '@/lib/results/outcome';
import { summarise } from '@/lib/results/summarise';
import { solveCentral } from '@/lib/solve/central';
import { refusalOf } from '@/lib/solve/refusal';
import { here, runOn } from '@/lib/solve/lanes';
import { restMisses } from '@/lib/solve/rest-miss';
import { solve } from '@/lib/solve/solve';

export type { Shapes } from '@/lib/results/bands';
export type { Outcome } from '@/lib/results/outcome';
export type { RestMiss } from '@/lib/solve/rest-miss';

/** The case with another number of draws, where one is asked for. */
const withDraws = (casefile: CaseFile, draws: number | undefined): CaseFile =>
  draws === undefined ? casefile : { ...casefile, analysis: { ...casefile.analysis, draws } };

/**
 * The whole computation: a valid case to its result. Never throws for a case, whatever stands in it; rejects only when
 * `run` does (cancelled, a worker lost).
 */
export async function solveCase(casefile: CaseFile, options: SolveOptions = {}): Promise<Outcome> {
  const { analysis } = casefile;
  const method = options.method ?? analysis.method;
  const lacking = needsOf(withDraws(casefile, options.draws), method);
  if (lacking.length > 0) return { kind: 'invalid', issues: lacking };

  const asked = readEvidence(casefile, method, options.seed ?? analysis.seed ?? DEFAULT_SEED);
  if (method === 'fit') return fitCase(casefile, asked, options);
  const central = solveCentral(asked);
  const refusal = refusalOf(central);
  if (refusal) return { kind: 'unsolved', reason: refusal, misses: restMisses(central.spins) };

  const settings = {
    draws: options.draws ?? analysis.draws ?? DEFAULT_DRAWS,
    coverage: analysis.coverage ?? DEFAULT_COVERAGE,
    traced: options.sensitivity === false ? [] : [...HEADLINES],
  };
  const solution = await solve(central, settings, options.run ?? runOn([here]), options.onProgress);
  return { kind: 'solved', ...summarise(casefile, solution, settings.coverage), travels: central.travels };
}
