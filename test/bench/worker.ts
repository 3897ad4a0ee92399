import { parentPort } from 'node:worker_threads';
import type { CaseFile } from '@/lib/casefile/schema';
import { solveCase } from '@/lib/solve-case';

/** The engine in a thread, as the page has it in a web worker. */
parentPort?.on('message', ({ casefile, draws }: { casefile: CaseFile; draws: number }) => {
  void solveCase(casefile, { draws, sensitivity: false }).then((outcome) => parentPort?.postMessage(outcome));
});
