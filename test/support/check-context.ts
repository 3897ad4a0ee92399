import { readFileSync } from 'node:fs';
import { type Edit, applyEdit } from '@/lib/casefile/edit';
import { parseCase } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import { readEvidence } from '@/lib/evidence/read-evidence';
import { bandsOf, centralResults } from '@/lib/results/bands';
import { CHECKS } from '@/lib/results/checks/all';
import type { CheckContext, Finding } from '@/lib/results/checks/check';
import { solveCentral } from '@/lib/solve/central';
import { here, runOn } from '@/lib/solve/lanes';
import { solve } from '@/lib/solve/solve';

/** What a check looks at, from a case with some edits: a test may then set single figures to a limit exactly. */

const PLACES = { junction: 'public/examples', queue: 'public/examples', 'spin-straight': 'test/cases' } as const;
export type CaseName = keyof typeof PLACES;

export const set = (path: string, to: unknown): Edit => ({ do: 'set', path, to });

export function editedCase(name: CaseName, edits: Edit[]): CaseFile {
  const parsed = parseCase(readFileSync(`${PLACES[name]}/${name}.case.json`));
  if (!parsed.ok) throw new Error('the case is not valid');
  const edited = applyEdit(parsed.casefile, { do: 'all', edits });
  if (!edited.ok) throw new Error(JSON.stringify(edited.issues));
  return edited.casefile;
}

/** A context over a few draws; `traced` says whose spread is traced back. */
export async function contextOf(
  name: CaseName,
  edits: Edit[] = [],
  { draws = 400, traced = [] as 'A.deltaV'[] } = {},
): Promise<CheckContext> {
  const casefile = editedCase(name, edits);
  const { method } = casefile.analysis;
  if (method === 'fit') throw new Error('no case of the method fit is solved here');
  const central = solveCentral(readEvidence(casefile, method, 1));
  const solution = await solve(central, { draws, coverage: 0.95, traced }, runOn([here]));
  return {
    casefile,
    solution,
    central: centralResults(solution),
    bands: bandsOf(solution, 0.95).bands,
    coverage: 0.95,
  };
}

/** What the check of this id finds; undefined where it does not apply. */
export function findingOf(id: string, context: CheckContext): Finding | undefined {
  const rule = CHECKS.find((check) => check.id === id);
  if (!rule) throw new Error(`no check is called ${id}`);
  return rule.find(context) ?? undefined;
}

export const levelIn = (id: string, context: CheckContext): string | undefined => findingOf(id, context)?.level;

/** The context with figures of the central answer set: of the impact, of a vehicle, of the results. */
export function withAnswer(context: CheckContext, answer: Partial<CheckContext['solution']['central']['answer']>) {
  const { solution } = context;
  const central = { ...solution.central, answer: { ...solution.central.answer, ...answer } };
  return { ...context, solution: { ...solution, central } };
}

export const withCentral = (context: CheckContext, central: CheckContext['central']): CheckContext => ({
  ...context,
  central: { ...context.central, ...central },
});
