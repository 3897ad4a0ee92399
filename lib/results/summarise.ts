import { hashOf } from '@/lib/casefile/canonical';
import type { CaseFile } from '@/lib/casefile/schema';
import { bandsOf, centralResults } from './bands';
import type { Shapes } from './bands';
import { checksOf } from './checks/all';
import { moreOf } from './more';
import type { Result } from './result';
import { fitResult } from './fit';
import { seatResults } from './seats';
import { sensitivityOf } from './sensitivity';
import type { Solution } from '@/lib/solve/solution';

/** The version of the engine: it changes whenever a digit of any result may change. */
export const ENGINE = 'retrodict 0.1.0';

/** Puts a solution into the result file. `coverage` is that of the intervals. */
export function summarise(
  casefile: CaseFile,
  solution: Solution,
  coverage: number,
): { result: Result; shapes: Shapes } {
  const central = centralResults(solution);
  const { bands, shapes } = bandsOf(solution, coverage);
  const result: Result = {
    format: 'retrodict-result',
    version: 1,
    case: hashOf(casefile),
    engine: ENGINE,
    method: solution.problem.method,
    seed: solution.problem.seed,
    draws: solution.draws,
    coverage,
    central,
    bands,
    impossible: solution.impossible,
    checks: checksOf({ casefile, solution, central, bands, coverage }),
    sensitivity: sensitivityOf(solution),
    fit: fitResult(solution),
    hypotheses: [],
    seats: { A: seatResults(solution, 'A', coverage), B: seatResults(solution, 'B', coverage) },
    more: moreOf(solution),
  };
  return { result, shapes };
}
