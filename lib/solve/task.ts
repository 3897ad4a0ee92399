import type { Problem } from '@/lib/evidence/problem';
import { REASONS } from '@/lib/mechanics/impact-backwards';
import { type FigureName, columnOf, figuresOf } from './columns';
import { BLOCK, Kernel } from './kernel';
import { type SobolIndices, sobolIndices } from './sobol';

/**
 * A piece of work that any worker can do, and its answer: plain data both ways. What a task answers depends on the
 * problem and the task alone, so any number of workers gives the same digits.
 */
export type Task =
  /** The draws first .. first + draws - 1. */
  | { kind: 'draws'; first: number; draws: number }
  /** The Sobol' indices of the figures for some inputs, over `rows` draws of each set. */
  | { kind: 'sobol'; slots: number[]; rows: number; figures: FigureName[] };

export interface DrawsDone {
  kind: 'draws';
  /** All draws, impossible ones included. */
  draws: number;
  /** Per figure, the values of the possible draws, in order. */
  values: Record<FigureName, Float64Array>;
  /** Per reason, how many draws were impossible. */
  impossible: Record<string, number>;
}

export interface SobolDone {
  kind: 'sobol';
  indices: SobolIndices[];
}

export type TaskDone = DrawsDone | SobolDone;

/** How tasks are run: one after another here, or spread over workers. Answers come in the order of the tasks. */
export type RunTasks = (problem: Problem, tasks: readonly Task[], onDone?: () => void) => Promise<TaskDone[]>;

export function runTask(problem: Problem, task: Task): TaskDone {
  if (task.kind === 'draws') return runDraws(new Kernel(problem), task);
  return { kind: 'sobol', indices: sobolIndices(problem, task.slots, task.rows, task.figures) };
}

function runDraws(kernel: Kernel, { first, draws }: Extract<Task, { kind: 'draws' }>): DrawsDone {
  const names = figuresOf(kernel.problem);
  const sources = names.map((name) => columnOf(kernel.columns, name));
  const kept = names.map(() => new Float64Array(draws));
  const impossible: Record<string, number> = {};
  let n = 0;
  for (let at = first; at < first + draws;) {
    const block = Math.floor(at / BLOCK);
    const from = at - block * BLOCK;
    const to = Math.min(BLOCK, first + draws - block * BLOCK);
    kernel.draw(block, to);
    kernel.solve(to, from);
    at = block * BLOCK + to;
    for (let k = from; k < to; k++) {
      const reason = kernel.reasons[k];
      if (reason !== 0) impossible[REASONS[reason - 1]] = (impossible[REASONS[reason - 1]] ?? 0) + 1;
      else {
        for (let i = 0; i < sources.length; i++) kept[i][n] = sources[i][k];
        n++;
      }
    }
  }
  const values = Object.fromEntries(names.map((name, i) => [name, kept[i].slice(0, n)])) as DrawsDone['values'];
  return { kind: 'draws', draws, values, impossible };
}
