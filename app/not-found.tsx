import buttons from '@/components/ui/button.module.css';
import styles from './message.module.css';

export default function NotFound() {
  return (
    <main className={styles.message}>
      <h1>Nothing is kept here</h1>
      <p>There is no such page, or the case was deleted.</p>
      <p className={styles.actions}>
        <a className={buttons.primary} href="/">
          Cases
        </a>
      </p>
    </main>
  );
}
