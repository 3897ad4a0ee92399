import type { CaseFile } from '@/lib/casefile/schema';
import { observationsTable, rivalWords, rivalsTable } from '@/lib/report/fit-section';
import type { Table } from '@/lib/report/report';
import type { Result } from '@/lib/results/result';
import styles from './fit-panel.module.css';

/** What a fit weighed: predicted against observed, and the rival accounts beside each other. */
export function FitPanel({ result, of }: { result: Result; of: CaseFile }) {
  if (!result.fit) return null;
  return (
    <section className={styles.panel} aria-label="What the evidence says together">
      <Rows table={observationsTable(of, result.fit)} />
      {result.hypotheses.length > 0 && <Rows table={rivalsTable(of, result)} />}
      {rivalWords(result).map((words) => (
        <p key={words}>{words}</p>
      ))}
    </section>
  );
}

/** The accounts against each other in words; their figures stand in the table. */
export function Rivals({ result }: { result: Result }) {
  // Where the verbal scale comes from stands in the table and in the report.
  const words = rivalWords(result).slice(0, -1);
  if (words.length === 0) return null;
  return (
    <section className={styles.panel} aria-label="Rival accounts">
      {words.map((line) => (
        <p key={line}>{line}</p>
      ))}
    </section>
  );
}

function Rows({ table }: { table: Table }) {
  return (
    <table className={styles.table}>
      <caption>{table.caption}</caption>
      <thead>
        <tr>
          {table.columns.map(({ title }) => (
            <th key={title} scope="col">
              {title}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {table.rows.map((row) => {
          if ('group' in row) return null;
          const [label, ...cells] = row.cells;
          return (
            <tr key={label}>
              <th scope="row">{label}</th>
              {cells.map((cell, k) => (
                <td key={table.columns[k + 1].title}>{cell}</td>
              ))}
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
