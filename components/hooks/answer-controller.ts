import type { CaseFile } from '@/lib/casefile/schema';
import type { Solve, WorkerPool } from '@/lib/entry/worker-pool';
import type { Outcome } from '@/lib/solve-case';
import type { Session } from '@/lib/session/session';
import type { Answer } from './answer';

/** Draws while a gesture is under way: coarse, and said to be. */
const LIVE_DRAWS = 2048;
/** The same where every draw is a search, or a particle that is moved many times. */
const LIVE_SLOW = 64;
const isSlow = ({ analysis, departure: { A, B } }: CaseFile): boolean =>
  A?.kind === 'spin' || B?.kind === 'spin' || analysis.method === 'fit' || analysis.contact === 'lasting';
/** Rest after the last edit before all draws are made, ms. */
const REST = 80;
/** A solve that takes longer shows its progress, ms. */
const PATIENCE = 500;

export const NO_ANSWER: Answer = {
  status: 'working',
  result: null,
  shapes: {},
  travels: {},
  misses: [],
  of: null,
  stale: true,
  issues: [],
  progress: null,
  cancel: () => {},
  again: () => {},
};

/**
 * Keeps the answer abreast of the session: coarse draws while a gesture moves (the newest state wins, one at a time),
 * all draws at rest. Framework-free; `show` gets every new state of the answer.
 */
export function startAnswering(session: Session, pool: WorkerPool, show: (answer: Answer) => void): () => void {
  let answer: Answer = NO_ANSWER;
  let full: Solve | null = null;
  let liveRunning = false;
  let liveWanted: CaseFile | null = null;
  let restTimer: ReturnType<typeof setTimeout> | undefined;
  let closed = false;

  const update = (change: Partial<Answer>): void => {
    if (closed) return;
    answer = { ...answer, ...change, cancel, again };
    show(answer);
  };
  const current = (): CaseFile => session.getState().casefile;

  function settle(outcome: Outcome, of: CaseFile, status: 'live' | 'settled'): void {
    if (outcome.kind === 'solved')
      update({
        status,
        result: outcome.result,
        shapes: outcome.shapes,
        travels: outcome.travels,
        misses: [],
        of,
        stale: of !== current(),
        issues: [],
        progress: null,
      });
    else {
      const issues = outcome.kind === 'invalid' ? outcome.issues : [outcome.reason];
      const misses = outcome.kind === 'unsolved' ? outcome.misses : [];
      const nothing = { result: null, shapes: {}, travels: {}, of: null, stale: false, progress: null };
      update({ ...nothing, misses, status: outcome.kind === 'invalid' ? 'refused' : 'unsolved', issues });
    }
  }

  async function solveLive(casefile: CaseFile): Promise<void> {
    liveWanted = casefile;
    if (liveRunning) return;
    liveRunning = true;
    try {
      while (liveWanted) {
        const of: CaseFile = liveWanted;
        liveWanted = null;
        settle(
          await pool.solve(of, { draws: isSlow(of) ? LIVE_SLOW : LIVE_DRAWS, sensitivity: false }).outcome,
          of,
          'live',
        );
      }
    } catch (error) {
      fail(error);
    } finally {
      liveRunning = false;
    }
  }

  async function solveFully(): Promise<void> {
    const of = current();
    const started = performance.now();
    full?.cancel();
    const solving = pool.solve(of, {
      sensitivity: true,
      onProgress: (done) => {
        if (full === solving && performance.now() - started > PATIENCE) update({ progress: done });
      },
    });
    full = solving;
    update({ status: 'working', stale: answer.of !== of, progress: null });
    try {
      const outcome = await solving.outcome;
      if (full === solving) settle(outcome, of, 'settled');
    } catch (error) {
      if (full === solving) fail(error);
    } finally {
      if (full === solving) full = null;
    }
  }

  function fail(error: unknown): void {
    if (error instanceof DOMException && error.name === 'AbortError') update({ status: 'cancelled', progress: null });
    else
      update({
        status: 'failed',
        progress: null,
        issues: [{ path: 'analysis', says: error instanceof Error ? error.message : 'the solver failed' }],
      });
  }

  const cancel = (): void => full?.cancel();
  const again = (): void => void solveFully();

  const onChange = (): void => {
    clearTimeout(restTimer);
    full?.cancel();
    full = null;
    if (session.getState().gesture) void solveLive(current());
    else {
      liveWanted = null;
      update({ stale: answer.of !== current() });
      restTimer = setTimeout(() => void solveFully(), REST);
    }
  };

  const stop = session.subscribe((state, before) => {
    const ended = before.gesture !== null && state.gesture === null;
    if (state.casefile !== before.casefile || ended) onChange();
  });
  void solveFully();
  return () => {
    closed = true;
    stop();
    clearTimeout(restTimer);
    pool.close();
  };
}
