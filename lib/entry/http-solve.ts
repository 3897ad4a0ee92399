import { here, runOn } from '@/lib/solve/lanes';
import { solveCase } from '@/lib/solve-case';
import { answer, problems } from './http-answer';
import { readCaseBody } from './http-body';

/**
 * POST /api/solve: a case in, its result out, in the same bytes as the command prints; 422 with the problems. The work
 * stops when the one who asked goes away.
 */
export async function postSolve(request: Request): Promise<Response> {
  const parsed = await readCaseBody(request);
  if (!parsed.ok) return problems(422, parsed.issues);
  const outcome = await solveCase(parsed.casefile, { run: runOn([here], request.signal) });
  switch (outcome.kind) {
    case 'solved':
      return answer(200, outcome.result);
    case 'invalid':
      return problems(422, outcome.issues);
    case 'unsolved':
      return problems(422, [outcome.reason]);
  }
}
