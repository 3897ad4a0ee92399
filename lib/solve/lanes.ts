import type { Problem } from '@/lib/evidence/problem';
import { type RunTasks, type Task, type TaskDone, runTask } from './task';

/** Something that works on one task at a time: this thread, or a worker at the other end of a port. */
export type Lane = (problem: Problem, task: Task) => Promise<TaskDone>;

/** This thread; left free for one turn of the event loop after each task, so that a cancel or a drag gets in. */
export const here: Lane = async (problem, task) => {
  const done = runTask(problem, task);
  await turn();
  return done;
};

/** Spreads tasks over lanes. Answers come in the order of the tasks, whoever did them. Rejects when the signal aborts. */
export const runOn =
  (lanes: readonly Lane[], signal?: AbortSignal): RunTasks =>
  async (problem, tasks, onDone) => {
    const done: TaskDone[] = new Array(tasks.length);
    let next = 0;
    const work = async (lane: Lane): Promise<void> => {
      while (next < tasks.length) {
        signal?.throwIfAborted();
        const index = next++;
        done[index] = await lane(problem, tasks[index]);
        onDone?.();
      }
    };
    await Promise.all(lanes.map(work));
    return done;
  };

/** One turn of the event loop; a timer would be held back by browsers. */
const turn = (): Promise<void> =>
  new Promise((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.onmessage = () => {
      port1.close();
      resolve();
    };
    port2.postMessage(null);
  });
