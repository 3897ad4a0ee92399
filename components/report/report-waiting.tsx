import styles from './report.module.css';

/** While the case is solved and its report set: an empty sheet, so that nothing jumps. */
export function ReportWaiting() {
  return (
    <div className={styles.desk}>
      <main className={styles.report} data-paper="A4">
        <div className={styles.sheet}>
          <p role="status">Working the calculation…</p>
        </div>
      </main>
    </div>
  );
}
