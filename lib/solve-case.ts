import type { Issue } from '@/lib/casefile/issue';
import type { CaseFile, Method } from '@/lib/casefile/schema';
import type { ResultName } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';

/** Which of the case's settings to override, and how to run. */
export interface SolveOptions {
  method?: Method;
  draws?: number;
  seed?: number;
  /** Left out: true. Off while a drag is under way. */
  sensitivity?: boolean;
  /** 0..1, at most some tens of times a second. */
  onProgress?: (done: number) => void;
  signal?: AbortSignal;
}

/** How the draws of one result are distributed: counts in equal bins from low to high. For pictures only. */
export interface Shape {
  low: number;
  high: number;
  counts: number[];
}
export type Shapes = Partial<Record<ResultName, Shape>>;

/** What became of a case. Never throws for a case, whatever stands in it. */
export type Outcome =
  | { kind: 'solved'; result: Result; shapes: Shapes }
  /** The case is invalid, or lacks what its method needs. */
  | { kind: 'invalid'; issues: Issue[] }
  /** Valid, but nothing can be computed: the reason, with the path it hangs on. */
  | { kind: 'unsolved'; reason: Issue }
  | { kind: 'cancelled' };

export async function solveCase(_casefile: CaseFile, _options: SolveOptions = {}): Promise<Outcome> {
  return { kind: 'unsolved', reason: { path: 'analysis.method', says: 'not built yet' } };
}
