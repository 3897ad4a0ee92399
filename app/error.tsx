'use client';
import { useEffect } from 'react';
import buttons from '@/components/ui/button.module.css';
import styles from './message.module.css';

/** Shown when a page breaks: our mistake. What was drawn is in the store or kept in the browser. */
export default function ErrorPage({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  useEffect(() => {
    console.error(error);
  }, [error]);
  return (
    <main className={styles.message}>
      <h1>This page broke</h1>
      <p>
        That is a mistake in the program, not in your case. What you had entered is saved, or kept in this browser and
        put back when the case is opened again.
      </p>
      {error.digest && <p className={styles.detail}>The server&rsquo;s log has it under {error.digest}.</p>}
      <p className={styles.actions}>
        <button type="button" className={buttons.primary} onClick={reset}>
          Try again
        </button>
        <a className={buttons.button} href="/">
          Cases
        </a>
      </p>
    </main>
  );
}
