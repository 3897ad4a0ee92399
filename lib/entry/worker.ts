import { solveCase } from '@/lib/solve-case';
import { type Lane, here, runOn } from '@/lib/solve/lanes';
import { type TaskDone, runTask } from '@/lib/solve/task';
import type { Ask, Join, TaskAsk, TaskTell, Tell } from './protocol';

/**
 * The web worker of the pool. One of them leads: it solves cases and hands tasks to the others over ports; the others
 * only do tasks. All run this script.
 */

const running = new Map<number, AbortController>();
let team: Lane[] = [];

const tell = (message: Tell): void => (self as unknown as Worker).postMessage(message);

self.onmessage = ({ data }: MessageEvent<Ask | Join>) => {
  if (data.type === 'join') serve(data.port);
  else if (data.type === 'team') team = data.ports.map(laneOver);
  else if (data.type === 'cancel') running.get(data.id)?.abort();
  else void solve(data);
};

async function solve({ id, casefile, draws, sensitivity }: Extract<Ask, { type: 'solve' }>): Promise<void> {
  const control = new AbortController();
  running.set(id, control);
  try {
    const run = runOn([here, ...team], control.signal);
    const onProgress = (done: number): void => tell({ type: 'progress', id, done });
    tell({ type: 'outcome', id, outcome: await solveCase(casefile, { draws, sensitivity, run, onProgress }) });
  } catch (error) {
    if (control.signal.aborted) tell({ type: 'cancelled', id });
    else tell({ type: 'broken', id, message: error instanceof Error ? error.message : String(error) });
  } finally {
    running.delete(id);
  }
}

/** Does the tasks that come over a port. */
function serve(port: MessagePort): void {
  port.onmessage = ({ data: { id, problem, task } }: MessageEvent<TaskAsk>) =>
    port.postMessage({ id, done: runTask(problem, task) } satisfies TaskTell);
}

/** A worker of the team as a lane. */
function laneOver(port: MessagePort): Lane {
  const waiting = new Map<number, (done: TaskDone) => void>();
  let last = 0;
  port.onmessage = ({ data }: MessageEvent<TaskTell>) => {
    waiting.get(data.id)?.(data.done);
    waiting.delete(data.id);
  };
  return (problem, task) =>
    new Promise((resolve) => {
      const id = ++last;
      waiting.set(id, resolve);
      port.postMessage({ id, problem, task } satisfies TaskAsk);
    });
}
