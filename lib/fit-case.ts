import { DEFAULT_COVERAGE, DEFAULT_PARTICLES, DEFAULT_SEED } from '@/lib/casefile/defaults';
import { applyEdit } from '@/lib/casefile/edit';
import { needsOf } from '@/lib/casefile/needs';
import type { CaseFile } from '@/lib/casefile/schema';
import { readEvidence } from '@/lib/evidence/read-evidence';
import type { Problem } from '@/lib/evidence/problem';
import type { HypothesisResult } from '@/lib/results/result';
import { summarise } from '@/lib/results/summarise';
import { solveFit } from '@/lib/solve/fit';
import { here, runOn } from '@/lib/solve/lanes';
import type { Outcome, SolveOptions } from '@/lib/results/outcome';

type Hypothesis = NonNullable<CaseFile['hypotheses']>[number];

/** A case of the method fit to its result: the case itself, and each rival account that it states. */
export async function fitCase(casefile: CaseFile, problem: Problem, options: SolveOptions): Promise<Outcome> {
  const { analysis } = casefile;
  const coverage = analysis.coverage ?? DEFAULT_COVERAGE;
  const draws = options.draws ?? analysis.draws ?? DEFAULT_PARTICLES;
  const run = options.run ?? runOn([here]);
  const rivals = casefile.hypotheses ?? [];
  const share = 1 / (1 + rivals.length);
  const fitted = await solveFit(problem, draws, run, (done) => options.onProgress?.(share * done));
  if (fitted.kind === 'refused') return { kind: 'unsolved', reason: fitted.reason, misses: [] };
  const { result, shapes } = summarise(casefile, fitted.solution, coverage);
  const hypotheses: HypothesisResult[] = [];
  for (const rival of rivals) {
    hypotheses.push(await rivalResult(casefile, rival, options, draws, coverage));
    options.onProgress?.(share * (1 + hypotheses.length));
  }
  return { kind: 'solved', result: { ...result, hypotheses }, shapes, travels: fitted.solution.central.travels };
}

/** The case with the changes of a rival account, fitted; where it cannot be, why. */
async function rivalResult(
  casefile: CaseFile,
  { name, set }: Hypothesis,
  options: SolveOptions,
  draws: number | 'auto',
  coverage: number,
): Promise<HypothesisResult> {
  const none = (says: string): HypothesisResult => ({ name, central: {}, bands: {}, says });
  const edits = Object.entries(set).map(([path, to]) => ({ do: 'set' as const, path, to }));
  const edited = applyEdit(casefile, { do: 'all', edits });
  const issues = edited.ok ? needsOf(edited.casefile, 'fit') : edited.issues;
  if (!edited.ok || issues.length > 0) return none(issues.map(({ path, says }) => `${path}: ${says}`).join('; '));
  const seed = options.seed ?? casefile.analysis.seed ?? DEFAULT_SEED;
  const fitted = await solveFit(readEvidence(edited.casefile, 'fit', seed), draws, options.run ?? runOn([here]));
  if (fitted.kind === 'refused') return none(fitted.reason.says);
  const { result } = summarise(edited.casefile, fitted.solution, coverage);
  return { name, central: result.central, bands: result.bands, logEvidence: fitted.solution.fit?.logEvidence };
}
