'use client';
import dynamic from 'next/dynamic';
import { type KeyboardEvent, useState } from 'react';
import { AnswerProvider } from '@/components/hooks/use-answer';
import { CommandsProvider } from '@/components/hooks/use-commands';
import { SessionProvider } from '@/components/hooks/use-session';
import { ShowProvider, useShow } from '@/components/hooks/use-show';
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
        <ShowProvider>
          <CommandsProvider>
            <Sheet id={id} revision={revision} />
          </CommandsProvider>
        </ShowProvider>
      </AnswerProvider>
    </SessionProvider>
  );
}

function Sheet({ id, revision }: { id: string; revision: number }) {
  return (
    <div className={styles.sheet}>
      <nav className={styles.skip} aria-label="Skip">
        <a href="#board">To the board</a>
        <a href="#answer">To the answer</a>
        <a href="#ledger">To the ledger</a>
      </nav>
      <header className={styles.title}>
        <TitleBar id={id} revision={revision} />
      </header>
      <main className={styles.board} id="board" aria-label="Board" tabIndex={-1}>
        <Board />
      </main>
      <section className={styles.answer} id="answer" aria-label="Answer" tabIndex={-1}>
        <AnswerPanel />
      </section>
      <LedgerDrawer />
    </div>
  );
}

/** The ledger: beside the board, and over its right side where there is no room beside. */
function LedgerDrawer() {
  const { isLedgerOpen, openLedger } = useShow();
  const close = (event: KeyboardEvent): void => {
    if (event.key !== 'Escape' || event.defaultPrevented || !isLedgerOpen) return;
    openLedger(false);
    document.getElementById('ledger-tab')?.focus();
  };
  return (
    <>
      <button
        type="button"
        id="ledger-tab"
        className={styles.tab}
        aria-expanded={isLedgerOpen}
        aria-controls="ledger"
        onClick={() => openLedger(!isLedgerOpen)}
        onKeyDown={close}
      >
        Ledger
      </button>
      {/* Escape steps back from whatever has the focus in it. */}
      {/* oxlint-disable-next-line jsx-a11y/no-noninteractive-element-interactions */}
      <aside
        className={styles.ledger}
        id="ledger"
        aria-label="Ledger"
        tabIndex={-1}
        data-open={isLedgerOpen}
        onKeyDown={close}
      >
        <Ledger />
      </aside>
    </>
  );
}
