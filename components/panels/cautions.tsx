import { STANDING_CAUTIONS } from '@/lib/report/standing-cautions';
import styles from './cautions.module.css';

/** What a reader must know before any number: shown before the first case is opened, and in every report. */
export function Cautions() {
  return (
    <section className={styles.cautions} aria-labelledby="cautions">
      <h2 id="cautions">Before you rely on a number</h2>
      <ol>
        {STANDING_CAUTIONS.map((caution) => (
          <li key={caution}>{caution}</li>
        ))}
      </ol>
    </section>
  );
}
