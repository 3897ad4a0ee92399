import { DEFAULT_COVERAGE, DEFAULT_DRAWS, DEFAULT_SEED } from '@/lib/casefile/defaults';
import type { Issue } from '@/lib/casefile/issue';
import { needsOf } from '@/lib/casefile/needs';
import type { CaseFile, Method } from '@/lib/casefile/schema';
import { readEvidence } from '@/lib/evidence/read-evidence';
import { fitCase } from '@/lib/fit-case';
import type { Shapes } from '@/lib/results/bands';
import { HEADLINES } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import { summarise } from '@/lib/results/summarise';
import { solveCentral } from '@/lib/solve/central';
import { refusalOf } from '@/lib/solve/refusal';
import { here, runOn } from '@/lib/solve/lanes';
import { type RestMiss, restMisses } from '@/lib/solve/rest-miss';
import { solve } from '@/lib/solve/solve';
import type { RunTasks } from '@/lib/solve/task';
import type { Travels } from '@/lib/geometry/timed-path';

export type { Shapes } from '@/lib/results/bands';
export type { RestMiss } from '@/lib/solve/rest-miss';

/** Which of the case's settings to override, and how to run. */
export interface SolveOptions {
  method?: Method;
  draws?: number;
  seed?: number;
  /** Left out: true. Off while a drag is under way. */
  sensitivity?: boolean;
  /** How tasks are run; left out: one after another, here. */
  run?: RunTasks;
  /** 0..1, once a finished task. */
  onProgress?: (done: number) => void;
}

/** What became of a case. */
export type Outcome =
  /** `travels`: the motions that were simulated, with every input at its value; like the shapes, only for pictures. */
  | { kind: 'solved'; result: Result; shapes: Shapes; travels: Travels }
  /** The case lacks what its method needs, or is invalid. */
  | { kind: 'invalid'; issues: Issue[] }
  /** Valid, but nothing can be computed: the reason, with the path it hangs on, and the rest poses that were missed. */
  | { kind: 'unsolved'; reason: Issue; misses: RestMiss[] };

/**
 * The whole computation: a valid case to its result. Never throws for a case, whatever stands in it; rejects only when
 * `run` does (cancelled, a worker lost).
 */
export async function solveCase(casefile: CaseFile, options: SolveOptions = {}): Promise<Outcome> {
  const { analysis } = casefile;
  const method = options.method ?? analysis.method;
  const lacking = needsOf(casefile, method);
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
