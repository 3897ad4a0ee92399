import type { Problem } from '@/lib/evidence/problem';
import type { FigureName } from './columns';
import type { Central } from './central';
import { BLOCK } from './kernel';
import { MOST_BATCHES, batchSize, isSettled } from './adaptive';
import { type Solution, counted, joined } from './solution';
import type { DrawsDone, RunTasks, Task, TaskDone } from './task';

/** Draws per task: what one worker does between two looks at the clock. */
const DRAWS_PER_TASK = 16 * BLOCK;
/** The same where every draw is a search through simulations. */
const SIMULATED_PER_TASK = 128;
/** Draws of each of the two sets that the sensitivity rests on, and how many inputs one task takes. */
const SOBOL = { rows: 8 * BLOCK, slots: 4 };
/** The same where every draw is a search through simulations; the indices are then good to about 0.06. */
const SOBOL_SIMULATED = { rows: 256, slots: 6 };

export interface Settings {
  /** A number, or as many as settle the digits that are printed (adaptive.ts). */
  draws: number | 'auto';
  coverage: number;
  /** Figures whose spread is traced back to the inputs; none leaves the sensitivity out. */
  traced: FigureName[];
}

/** Solves a problem over its draws and, where asked, traces the spread of its figures back to the inputs. */
export async function solve(
  central: Central,
  settings: Settings,
  run: RunTasks,
  onProgress?: (done: number) => void,
): Promise<Solution> {
  const { problem } = central;
  const perTask = isSimulated(problem) ? SIMULATED_PER_TASK : DRAWS_PER_TASK;
  const sobolShare = settings.traced.length > 0 ? 0.5 : 0;
  const parts =
    settings.draws === 'auto'
      ? await drawUntilSettled(problem, settings.coverage, run)
      : await runCounted(problem, drawTasks(0, settings.draws, perTask), run, (done) =>
          onProgress?.((1 - sobolShare) * done),
        );
  const traced = await runCounted(problem, sobolTasks(problem, settings.traced), run, (done) =>
    onProgress?.(1 - sobolShare + sobolShare * done),
  );
  const draws = parts.filter((d) => d.kind === 'draws');
  return {
    problem,
    central,
    draws: draws.reduce((n, part) => n + part.draws, 0),
    values: joined(draws),
    impossible: counted(draws),
    traced: settings.traced,
    sobol: traced.filter((d) => d.kind === 'sobol').flatMap((d) => d.indices),
    fit: null,
  };
}

/** Runs tasks and says after each what share of them is done. */
function runCounted(
  problem: Problem,
  tasks: Task[],
  run: RunTasks,
  onShare: (done: number) => void,
): Promise<TaskDone[]> {
  let finished = 0;
  return run(problem, tasks, () => onShare(++finished / tasks.length));
}

/** Batches until the printed digits have settled; the digits do not depend on how the tasks are spread. */
async function drawUntilSettled(problem: Problem, coverage: number, run: RunTasks): Promise<TaskDone[]> {
  const size = batchSize(coverage, DRAWS_PER_TASK);
  const batches: DrawsDone[] = [];
  for (let wanted = 2; wanted <= MOST_BATCHES; wanted *= 2) {
    const more = drawTasks(batches.length * size, (wanted - batches.length) * size, size);
    batches.push(...(await run(problem, more)).filter((d) => d.kind === 'draws'));
    if (isSettled(batches, coverage)) break;
  }
  return batches;
}

/** Tasks for `draws` draws from the draw `from` on. */
function drawTasks(from: number, draws: number, perTask = DRAWS_PER_TASK): Task[] {
  const tasks: Task[] = [];
  for (let first = 0; first < draws; first += perTask)
    tasks.push({ kind: 'draws', first: from + first, draws: Math.min(perTask, draws - first) });
  return tasks;
}

/** Whether a draw takes simulations: of the travel, or of a contact that lasts. */
export const isSimulated = ({ lasting, vehicles: { A, B } }: Problem): boolean =>
  lasting !== null || A.departure.kind === 'spin' || B.departure.kind === 'spin';

function sobolTasks(problem: Problem, figures: FigureName[]): Task[] {
  if (figures.length === 0) return [];
  const uncertain = problem.inputs.flatMap((input, slot) => (input.spread.shape === 'fixed' ? [] : [slot]));
  const { rows, slots } = isSimulated(problem) ? SOBOL_SIMULATED : SOBOL;
  const tasks: Task[] = [];
  for (let i = 0; i < uncertain.length; i += slots)
    tasks.push({ kind: 'sobol', slots: uncertain.slice(i, i + slots), rows, figures });
  return tasks;
}
