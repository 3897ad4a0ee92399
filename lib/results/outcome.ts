import type { Issue } from '@/lib/casefile/issue';
import type { Method } from '@/lib/casefile/schema';
import type { Travels } from '@/lib/geometry/timed-path';
import type { RestMiss } from '@/lib/solve/rest-miss';
import type { RunTasks } from '@/lib/solve/task';
import type { Shapes } from './bands';
import type { Result } from './result';

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
