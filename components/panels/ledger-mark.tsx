import { TriangleAlert } from 'lucide-react';
import styles from './ledger.module.css';

/** What the method or a check says about a value: a sign and words, never colour alone. */
export function LedgerMark({ id, says }: { id?: string; says: string }) {
  return (
    <p id={id} className={styles.marked}>
      <TriangleAlert aria-hidden />
      {says}
    </p>
  );
}
