import type { Issue } from '@/lib/casefile/issue';
import type { Paper, Report } from '@/lib/report/report';
import { writeReport } from '@/lib/report/write-report';
import { solveCase } from '@/lib/solve-case';
import type { Revision } from '@/lib/store/revisions';

export type ReportOutcome =
  | { kind: 'written'; report: Report }
  /** The case lacks what its method needs, or has no answer: why, in words. */
  | { kind: 'refused'; issues: Issue[] };

/** Solves a kept case and writes its report. `paper` is what an address asked for; anything unknown is that of the case. */
export async function reportOn(kept: Revision, paper: unknown): Promise<ReportOutcome> {
  const outcome = await solveCase(kept.case);
  if (outcome.kind === 'invalid') return { kind: 'refused', issues: outcome.issues };
  if (outcome.kind === 'unsolved') return { kind: 'refused', issues: [outcome.reason] };
  const chosen: Paper | undefined = paper === 'A4' || paper === 'Letter' ? paper : undefined;
  const issue = { revision: kept.revision, saved: kept.created, paper: chosen };
  return { kind: 'written', report: writeReport(kept.case, outcome.result, outcome.shapes, issue, outcome.travels) };
}
