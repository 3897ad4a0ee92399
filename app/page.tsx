import { CaseList } from '@/components/panels/case-list';
import { Cautions } from '@/components/panels/cautions';
import { keptCases } from '@/lib/entry/kept-cases';
import styles from './page.module.css';

export const dynamic = 'force-dynamic';

export default async function CasesPage() {
  const cases = await keptCases();
  return (
    <div className={styles.page}>
      <header className={styles.header}>
        <h1>Retrodict</h1>
        <p>
          From where two vehicles came to rest, back to the speeds at which they met: drawn to scale, with honest
          ranges, and a report that can be checked line by line.
        </p>
      </header>
      <main className={styles.main}>
        <CaseList cases={cases} />
        <Cautions />
      </main>
    </div>
  );
}
