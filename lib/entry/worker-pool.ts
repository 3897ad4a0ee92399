import type { CaseFile } from '@/lib/casefile/schema';
import type { Outcome } from '@/lib/solve-case';
import type { Ask, Join, Tell } from './protocol';

/** A solve that was asked of the pool. */
export interface Solve {
  /** Rejects with an AbortError when cancelled, with an Error when a worker broke. */
  outcome: Promise<Outcome>;
  cancel: () => void;
}

export interface WorkerPool {
  solve(
    casefile: CaseFile,
    options: { draws?: number; sensitivity: boolean; onProgress?: (done: number) => void },
  ): Solve;
  close(): void;
}

interface Waiting {
  resolve: (outcome: Outcome) => void;
  reject: (error: Error) => void;
  onProgress?: (done: number) => void;
}

/** Starts `size` workers; the first leads and hands tasks to the others. The digits do not depend on the size. */
export function createWorkerPool(size: number): WorkerPool {
  const [lead, ...others] = Array.from({ length: size }, startWorker);
  const waiting = new Map<number, Waiting>();
  let last = 0;
  const ports = others.map((worker) => {
    const { port1, port2 } = new MessageChannel();
    worker.postMessage({ type: 'join', port: port2 } satisfies Join, [port2]);
    return port1;
  });
  const ask = (message: Ask, transfer: Transferable[] = []): void => lead.postMessage(message, transfer);
  ask({ type: 'team', ports }, ports);

  lead.onmessage = ({ data }: MessageEvent<Tell>) => settle(waiting, data);
  lead.onerror = (event) => {
    for (const { reject } of waiting.values()) reject(new Error(event.message || 'the worker could not start'));
    waiting.clear();
  };

  return {
    solve(casefile, { draws, sensitivity, onProgress }) {
      const id = ++last;
      const outcome = new Promise<Outcome>((resolve, reject) => waiting.set(id, { resolve, reject, onProgress }));
      ask({ type: 'solve', id, casefile, draws, sensitivity });
      return { outcome, cancel: () => ask({ type: 'cancel', id }) };
    },
    close: () => [lead, ...others].forEach((worker) => worker.terminate()),
  };
}

const startWorker = (): Worker => new Worker(new URL('./worker.ts', import.meta.url), { type: 'module' });

function settle(waiting: Map<number, Waiting>, data: Tell): void {
  const asked = waiting.get(data.id);
  if (!asked) return;
  if (data.type === 'progress') return asked.onProgress?.(data.done);
  waiting.delete(data.id);
  if (data.type === 'outcome') asked.resolve(data.outcome);
  else if (data.type === 'cancelled') asked.reject(new DOMException('the solve was cancelled', 'AbortError'));
  else asked.reject(new Error(data.message));
}
