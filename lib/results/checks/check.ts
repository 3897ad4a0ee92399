import type { CaseFile } from '@/lib/casefile/schema';
import type { Solution } from '@/lib/solve/solution';
import type { ResultName } from '../names';
import type { Band, Check, Level } from '../result';

/** What a check may look at. */
export interface CheckContext {
  casefile: CaseFile;
  solution: Solution;
  central: Partial<Record<ResultName, number>>;
  bands: Partial<Record<ResultName, Band>>;
  coverage: number;
}

/** What a check found; its id and the source of its limit are added by the rule. */
export type Finding = Omit<Check, 'id' | 'source' | 'paths'> & { paths?: string[] };

/**
 * One check: an id, where its limit comes from, and the test itself, which returns null where it
 * does not apply to the case.
 */
export interface CheckRule {
  id: string;
  /** Source and mark of the limit: a publication, 'contract of the model', or 'screening value'. */
  source: string;
  find: (context: CheckContext) => Finding | null;
}

/** The level of a value held against rising limits. */
export function levelAbove(value: number, limits: { note?: number; caution?: number; fail?: number }): Level {
  if (limits.fail !== undefined && value > limits.fail) return 'fail';
  if (limits.caution !== undefined && value > limits.caution) return 'caution';
  if (limits.note !== undefined && value > limits.note) return 'note';
  return 'pass';
}
