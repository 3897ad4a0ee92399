'use client';
import { type ReactNode, createContext, useContext, useEffect, useState } from 'react';
import { createWorkerPool } from '@/lib/entry/worker-pool';
import type { Answer } from './answer';
import { NO_ANSWER, startAnswering } from './answer-controller';
import { useSessionStore } from './use-session';

export type { Answer } from './answer';

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
