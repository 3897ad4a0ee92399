import type { Problem } from '@/lib/evidence/problem';
import { type FigureName, columnOf, figuresOf } from './columns';
import { BLOCK, Kernel } from './kernel';
import { placeParticles, unknownsOf, weighParticles } from './likelihood';
import { type SobolIndices, sobolIndices } from './sobol';

/**
 * A piece of work that any worker can do, and its answer: plain data both ways. What a task answers depends on the
 * problem and the task alone, so any number of workers gives the same digits.
 */
export type Task =
  /** The draws first .. first + draws - 1. */
  | { kind: 'draws'; first: number; draws: number }
  /** The Sobol' indices of the figures for some inputs, over `rows` draws of each set. */
  | { kind: 'sobol'; slots: number[]; rows: number; figures: FigureName[] }
  /** The log likelihood of some particles of a fit, which lie one after another in z. */
  | { kind: 'weigh'; z: Float64Array }
  /** The figures of some particles. */
  | { kind: 'figures'; z: Float64Array };

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

export interface Weighed {
  kind: 'weighed';
  logLikelihood: Float64Array;
}

export type TaskDone = DrawsDone | SobolDone | Weighed;

/** How tasks are run: one after another here, or spread over workers. Answers come in the order of the tasks. */
export type RunTasks = (problem: Problem, tasks: readonly Task[], onDone?: () => void) => Promise<TaskDone[]>;

export function runTask(problem: Problem, task: Task): TaskDone {
  if (task.kind === 'draws') return runDraws(new Kernel(problem), task);
  if (task.kind === 'weigh') return { kind: 'weighed', logLikelihood: weighParticles(problem, task.z) };
  if (task.kind === 'figures') return runParticles(new Kernel(problem), task.z);
  return { kind: 'sobol', indices: sobolIndices(problem, task.slots, task.rows, task.figures) };
}

function runDraws(kernel: Kernel, { first, draws }: Extract<Task, { kind: 'draws' }>): DrawsDone {
  const kept = new Kept(kernel, draws);
  for (let at = first; at < first + draws;) {
    const block = Math.floor(at / BLOCK);
    const from = at - block * BLOCK;
    const to = Math.min(BLOCK, first + draws - block * BLOCK);
    kernel.draw(block, to);
    kernel.solve(to, from);
    kept.take(from, to);
    at = block * BLOCK + to;
  }
  return kept.done();
}

function runParticles(kernel: Kernel, z: Float64Array): DrawsDone {
  const n = z.length / unknownsOf(kernel.problem).length;
  const kept = new Kept(kernel, n);
  for (let first = 0; first < n; first += BLOCK) {
    const count = Math.min(BLOCK, n - first);
    placeParticles(kernel, z, first, count);
    kernel.solve(count);
    kept.take(0, count);
  }
  return kept.done();
}

/** The figures of possible draws, block by block, and the count of the impossible ones. */
class Kept {
  private readonly names: FigureName[];
  private readonly columns: Float64Array[];
  private readonly impossible: Record<string, number> = {};
  private n = 0;

  constructor(
    private readonly kernel: Kernel,
    private readonly draws: number,
  ) {
    this.names = figuresOf(kernel.problem);
    this.columns = this.names.map(() => new Float64Array(draws));
  }

  take(from: number, to: number): void {
    const { kernel, names, columns, impossible } = this;
    const sources = names.map((name) => columnOf(kernel.columns, name));
    for (let k = from; k < to; k++) {
      const reason = kernel.reasonOf(k);
      if (reason !== null) impossible[reason] = (impossible[reason] ?? 0) + 1;
      else {
        for (let i = 0; i < sources.length; i++) columns[i][this.n] = sources[i][k];
        this.n++;
      }
    }
  }

  done(): DrawsDone {
    const { names, columns, n, draws, impossible } = this;
    const values = Object.fromEntries(names.map((name, i) => [name, columns[i].slice(0, n)])) as DrawsDone['values'];
    return { kind: 'draws', draws, values, impossible };
  }
}
