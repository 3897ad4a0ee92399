import type { CaseFile } from '@/lib/casefile/schema';
import type { Problem } from '@/lib/evidence/problem';
import type { Outcome } from '@/lib/solve-case';
import type { Task, TaskDone } from '@/lib/solve/task';

/** What a page asks of the first worker of a pool. */
export type Ask =
  | { type: 'solve'; id: number; casefile: CaseFile; draws?: number; sensitivity: boolean }
  | { type: 'cancel'; id: number }
  /** The other workers of the pool, to hand tasks to. */
  | { type: 'team'; ports: MessagePort[] };

/** What it answers. */
export type Tell =
  | { type: 'progress'; id: number; done: number }
  | { type: 'outcome'; id: number; outcome: Outcome }
  | { type: 'cancelled'; id: number }
  /** Our mistake. */
  | { type: 'broken'; id: number; message: string };

/** Between two workers. */
export interface TaskAsk {
  id: number;
  problem: Problem;
  task: Task;
}
export interface TaskTell {
  id: number;
  done: TaskDone;
}

/** To a worker that is to take tasks from another. */
export interface Join {
  type: 'join';
  port: MessagePort;
}
