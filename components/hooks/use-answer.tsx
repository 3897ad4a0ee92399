'use client';
import { type ReactNode, createContext, useContext, useEffect, useState } from 'react';
import type { Issue } from '@/lib/casefile/issue';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Shapes } from '@/lib/solve-case';
import type { Result } from '@/lib/results/result';
import { createWorkerPool } from '@/lib/entry/worker-pool';
import { NO_ANSWER, startAnswering } from './answer-controller';
import { useSessionStore } from './use-session';

/**
 * The answer to the case as it stands now.
 * settled: all draws, current. live: coarse draws while a drag is under way. working: a full solve is running; what is
 * shown is older than the inputs (or nothing yet). refused: the case lacks what its method needs. unsolved: nothing can
 * be computed. failed: our mistake, or the worker could not start. cancelled: the user stopped it.
 */
export interface Answer {
  status: 'settled' | 'live' | 'working' | 'refused' | 'unsolved' | 'failed' | 'cancelled';
  /** The newest result, which may be older than the inputs. */
  result: Result | null;
  shapes: Shapes;
  /** The case that the result is of. */
  of: CaseFile | null;
  /** Whether the result is older than the inputs. */
  stale: boolean;
  /** Why there is no result (refused, unsolved, failed). */
  issues: readonly Issue[];
  /** 0..1 while working for more than half a second, else null. */
  progress: number | null;
  cancel: () => void;
  /** Solves again, after a cancel or a failure. */
  again: () => void;
}

const AnswerContext = createContext<Answer>(NO_ANSWER);

export const useAnswer = (): Answer => useContext(AnswerContext);

/** At most this many workers; `?workers=N` in the address asks for another number. */
const MOST_WORKERS = 4;

function workersWanted(): number {
  const asked = Number(new URLSearchParams(window.location.search).get('workers'));
  if (Number.isInteger(asked) && asked >= 1 && asked <= 16) return asked;
  return Math.max(1, Math.min(MOST_WORKERS, (navigator.hardwareConcurrency || 2) - 1));
}

/** Solves the session's case in workers and hands the answer to everything below. */
export function AnswerProvider({ children }: { children: ReactNode }) {
  const session = useSessionStore();
  const [answer, setAnswer] = useState<Answer>(NO_ANSWER);
  useEffect(() => startAnswering(session, createWorkerPool(workersWanted()), setAnswer), [session]);
  return <AnswerContext value={answer}>{children}</AnswerContext>;
}
