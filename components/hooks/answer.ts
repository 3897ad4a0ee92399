import type { Issue } from '@/lib/casefile/issue';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import type { Travels } from '@/lib/geometry/timed-path';
import type { RestMiss, Shapes } from '@/lib/solve-case';

/**
 * The answer to the case as it stands now.
 * settled: all draws, current. live: coarse draws while a drag is under way. working: a full solve is running; what is
 * shown is older than the inputs (or nothing yet). refused: the case lacks what its method needs. unsolved: nothing can
 * be computed. failed: our mistake, or the worker could not start. cancelled: the user stopped it.
 */
export interface Answer {
  status: 'settled' | 'live' | 'working' | 'refused' | 'unsolved' | 'failed' | 'cancelled';
  /** The newest result, which may be older than the inputs. */
  result: Result | null;
  shapes: Shapes;
  /** The simulated travel of the newest result. */
  travels: Travels;
  /** Rest poses that no simulated travel met, where there is no result for that. */
  misses: readonly RestMiss[];
  /** The case that the result is of. */
  of: CaseFile | null;
  /** Whether the result is older than the inputs. */
  stale: boolean;
  /** Why there is no result (refused, unsolved, failed). */
  issues: readonly Issue[];
  /** 0..1 while working for more than half a second, else null. */
  progress: number | null;
  cancel: () => void;
  /** Solves again, after a cancel or a failure. */
  again: () => void;
}
