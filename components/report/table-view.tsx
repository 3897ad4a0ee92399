import type { Row, Table } from '@/lib/report/report';
import styles from './table-view.module.css';

/** A table of no more rows is never broken over pages. */
const SHORT = 12;

/** A table for paper: its head is repeated on every page, rows and their group titles stay together. */
export function TableView({ table: { caption, columns, rows, notes } }: { table: Table }) {
  const cell = (row: Extract<Row, { cells: string[] }>) =>
    row.cells.map((text, k) => (
      <td key={k} data-kind={columns[k]?.kind}>
        {text}
      </td>
    ));
  return (
    <>
      <table className={styles.table} data-short={rows.length <= SHORT || undefined}>
        <caption>{caption}</caption>
        <thead>
          <tr>
            {columns.map(({ title, kind }) => (
              <th key={title} scope="col" data-kind={kind}>
                {title}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row, k) =>
            'group' in row ? (
              <tr key={k} className={styles.group}>
                <th scope="rowgroup" colSpan={columns.length}>
                  {row.group}
                </th>
              </tr>
            ) : (
              <tr key={k}>{cell(row)}</tr>
            ),
          )}
        </tbody>
      </table>
      {notes && (
        <div className={styles.notes}>
          {notes.map((note) => (
            <p key={note}>{note}</p>
          ))}
        </div>
      )}
    </>
  );
}
