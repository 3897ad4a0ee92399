import { Notice } from '@/components/ui/notice';
import type { Issue } from '@/lib/casefile/issue';
import styles from './refusal.module.css';

/** How many problems are listed before the rest is only counted. */
const LISTED = 12;

export interface Refused {
  /** What was refused: a file's name, or what was tried. */
  what: string;
  issues: readonly Issue[];
}

/** Why a file or a request was refused: each problem with its place, and that nothing was changed. */
export function Refusal({ refused, onClose }: { refused: Refused; onClose: () => void }) {
  const { what, issues } = refused;
  const more = issues.length - LISTED;
  return (
    <Notice tone="refused" onClose={onClose}>
      <p>
        <strong>{what}</strong> was refused; everything here stays as it was.
      </p>
      <ul className={styles.problems}>
        {issues.slice(0, LISTED).map(({ path, says }, i) => (
          <li key={i}>
            <code>{path}</code>: {says}
          </li>
        ))}
      </ul>
      {more > 0 && <p>… and {more} more.</p>}
    </Notice>
  );
}
