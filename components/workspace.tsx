'use client';
import dynamic from 'next/dynamic';
import { useState } from 'react';
import { AnswerProvider } from '@/components/hooks/use-answer';
import { SessionProvider } from '@/components/hooks/use-session';
import { Ledger } from '@/components/panels/ledger';
import { TitleBar } from '@/components/panels/title-bar';
import { AnswerPanel } from '@/components/results/answer-panel';
import type { CaseFile } from '@/lib/casefile/schema';
import { createSession } from '@/lib/session/session';
import styles from './workspace.module.css';

const Board = dynamic(() => import('@/components/canvas/board').then((m) => m.Board), {
  ssr: false,
  loading: () => <p className={styles.loading}>Unrolling the sheet…</p>,
});

/** One open case: the board with its answer beneath and the ledger beside. */
export function Workspace({ id, revision, casefile }: { id: string; revision: number; casefile: CaseFile }) {
  const [session] = useState(() => createSession(casefile));
  return (
    <SessionProvider session={session}>
      <AnswerProvider>
        <div className={styles.sheet}>
          <header className={styles.title}>
            <TitleBar id={id} revision={revision} />
          </header>
          <main className={styles.board} aria-label="Board">
            <Board />
          </main>
          <section className={styles.answer} aria-label="Answer">
            <AnswerPanel />
          </section>
          <aside className={styles.ledger} aria-label="Ledger">
            <Ledger />
          </aside>
        </div>
      </AnswerProvider>
    </SessionProvider>
  );
}
