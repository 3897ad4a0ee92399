'use client';
import { useSyncExternalStore } from 'react';
import buttons from '@/components/ui/button.module.css';
import styles from './case-list.module.css';

export interface CaseRowData {
  id: string;
  title: string;
  reference: string;
  revision: number;
  /** ms since 1970-01-01 UTC */
  changed: number;
  example: boolean;
}

interface Props {
  row: CaseRowData;
  onDuplicate: () => void;
  onDelete: () => void;
}

export function CaseRow({ row, onDuplicate, onDelete }: Props) {
  const address = `/cases/${encodeURIComponent(row.id)}`;
  return (
    <tr>
      <th scope="row">
        <a id={`case-${row.id}`} href={address}>
          {row.title}
        </a>
        {row.example && <span className={styles.example}>example</span>}
      </th>
      <td>{row.reference}</td>
      <td>
        <Changed at={row.changed} />
      </td>
      <td className={styles.number}>{row.revision}</td>
      <td className={styles.actions}>
        <a className={buttons.quiet} href={`${address}/report`} aria-label={`Report of ${row.title}`}>
          Report
        </a>
        <button type="button" className={buttons.quiet} aria-label={`Duplicate ${row.title}`} onClick={onDuplicate}>
          Duplicate
        </button>
        <button type="button" className={buttons.quiet} aria-label={`Delete ${row.title}`} onClick={onDelete}>
          Delete
        </button>
      </td>
    </tr>
  );
}

const never = (): (() => void) => () => {};

/** In the reader's own time zone and language, which only the browser knows; the day by UTC until then. */
function Changed({ at }: { at: number }) {
  const inBrowser = useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
  const iso = new Date(at).toISOString();
  const local = (): string =>
    new Intl.DateTimeFormat(undefined, { dateStyle: 'medium', timeStyle: 'short' }).format(at);
  return <time dateTime={iso}>{inBrowser ? local() : iso.slice(0, 10)}</time>;
}
