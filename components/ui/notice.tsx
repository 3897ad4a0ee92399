import type { ReactNode } from 'react';
import buttons from './button.module.css';
import styles from './notice.module.css';

/** Something that happened, said without stopping the work. A refusal is read out at once. */
export function Notice({
  tone,
  onClose,
  children,
}: {
  tone: 'plain' | 'refused';
  onClose?: () => void;
  children: ReactNode;
}) {
  return (
    <div className={tone === 'refused' ? styles.refused : styles.plain} role={tone === 'refused' ? 'alert' : 'status'}>
      <div className={styles.says}>{children}</div>
      {onClose && (
        <button type="button" className={buttons.quiet} onClick={onClose}>
          Close
        </button>
      )}
    </div>
  );
}
