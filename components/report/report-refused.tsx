import Link from 'next/link';
import type { Issue } from '@/lib/casefile/issue';
import styles from './report-refused.module.css';

/** Instead of a report: what the case still lacks, or why it has no answer. */
export function ReportRefused({
  id,
  title,
  issues,
  labels,
}: {
  id: string;
  title: string;
  issues: Issue[];
  labels: string[];
}) {
  return (
    <main className={styles.refused}>
      <h1>{title}</h1>
      <p>A report needs a solved case. What stands in the way:</p>
      <ul>
        {issues.map(({ path, says }, k) => (
          <li key={path + says}>
            <strong>{labels[k]}</strong>: {says}
          </li>
        ))}
      </ul>
      <p>
        <Link href={`/cases/${id}`}>Back to the board</Link>
      </p>
    </main>
  );
}
