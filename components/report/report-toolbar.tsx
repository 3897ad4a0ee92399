'use client';
import Link from 'next/link';
import type { Paper } from '@/lib/report/report';
import styles from './report-toolbar.module.css';

const PAPERS: Paper[] = ['A4', 'Letter'];

/** Above the sheets, on the screen only. */
export function ReportToolbar({ id, paper }: { id: string; paper: Paper }) {
  return (
    <nav className={styles.toolbar} aria-label="Report">
      <Link href={`/cases/${id}`}>Back to the board</Link>
      <span className={styles.papers} role="group" aria-label="Paper">
        {PAPERS.map((name) => (
          <Link
            key={name}
            href={`/cases/${id}/report?paper=${name}`}
            replace
            aria-current={name === paper ? 'true' : undefined}
          >
            {name}
          </Link>
        ))}
      </span>
      <button type="button" onClick={() => window.print()}>
        Print
      </button>
    </nav>
  );
}
