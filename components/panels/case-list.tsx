'use client';
import { useEffect, useRef, useState } from 'react';
import { type CaseFiles, useCaseFiles } from '@/components/hooks/use-case-files';
import { deleteCase, restoreCase } from '@/components/hooks/case-requests';
import buttons from '@/components/ui/button.module.css';
import { Notice } from '@/components/ui/notice';
import type { Issue } from '@/lib/casefile/issue';
import { CaseRow, type CaseRowData } from './case-row';
import { FileButton } from './file-button';
import { Refusal } from './refusal';
import styles from './case-list.module.css';

/** All cases, last changed first, and the ways to begin another. */
export function CaseList({ cases }: { cases: readonly CaseRowData[] }) {
  const files = useCaseFiles();
  const { deleted, failed, remove, undo, close } = useDeletion();
  const shown = cases.filter(({ id }) => !deleted.some((gone) => gone.id === id));

  return (
    <section aria-labelledby="cases">
      <Heading files={files} />
      {files.over && <Notice tone="plain">Drop a case file anywhere to open it.</Notice>}
      {files.refused && <Refusal refused={files.refused} onClose={files.close} />}
      {failed && <Refusal refused={failed} onClose={close} />}
      {deleted.map((row, i) => (
        <Deleted key={row.id} row={row} focus={i === deleted.length - 1} onUndo={() => void undo(row)} />
      ))}
      {shown.length === 0 ? (
        <Empty />
      ) : (
        <table className={styles.table}>
          <thead>
            <tr>
              <th scope="col">Title</th>
              <th scope="col">Reference</th>
              <th scope="col">Changed</th>
              <th scope="col" className={styles.number}>
                Revision
              </th>
              <th scope="col">
                <span className="visually-hidden">Actions</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {shown.map((row) => (
              <CaseRow
                key={row.id}
                row={row}
                onDuplicate={() => void files.duplicateKept(row.id)}
                onDelete={() => void remove(row)}
              />
            ))}
          </tbody>
        </table>
      )}
    </section>
  );
}

function Heading({ files }: { files: CaseFiles }) {
  return (
    <div className={styles.heading}>
      <h2 id="cases">Cases</h2>
      <FileButton className={buttons.button} onFile={(file) => void files.openFile(file)}>
        Open a case file…
      </FileButton>
      <button type="button" className={buttons.primary} onClick={() => void files.create()}>
        New case
      </button>
    </div>
  );
}

function Deleted({ row, focus, onUndo }: { row: CaseRowData; focus: boolean; onUndo: () => void }) {
  const button = useRef<HTMLButtonElement>(null);
  useEffect(() => {
    if (focus) button.current?.focus();
  }, [focus]);
  return (
    <Notice tone="plain">
      <div className={styles.deleted}>
        <span>
          <strong>{row.title}</strong> was deleted.
        </span>
        <button ref={button} type="button" className={buttons.button} onClick={onUndo}>
          Undo delete
        </button>
      </div>
    </Notice>
  );
}

const Empty = () => (
  <p className={styles.empty}>
    No cases yet. Begin with <strong>New case</strong>: two vehicles on an empty board. Or open a case file, or drop one
    anywhere on this page.
  </p>
);

/** Deleting without a question, since it can be undone. */
function useDeletion() {
  const [deleted, setDeleted] = useState<readonly CaseRowData[]>([]);
  const [failed, setFailed] = useState<{ what: string; issues: readonly Issue[] } | null>(null);

  const attempt = async (what: string, issues: Promise<readonly Issue[]>, done: () => void): Promise<void> => {
    const found = await issues;
    if (found.length === 0) done();
    else setFailed({ what, issues: found });
  };
  return {
    deleted,
    failed,
    close: () => setFailed(null),
    remove: (row: CaseRowData) =>
      attempt(`Deleting ${row.title}`, deleteCase(row.id), () => setDeleted((rows) => [...rows, row])),
    undo: (row: CaseRowData) =>
      attempt(`Restoring ${row.title}`, restoreCase(row.id), () => {
        setDeleted((rows) => rows.filter(({ id }) => id !== row.id));
        requestAnimationFrame(() => document.getElementById(`case-${row.id}`)?.focus());
      }),
  };
}
