'use client';
import { Redo2, Undo2 } from 'lucide-react';
import { useEffect } from 'react';
import { type Saving, useAutosave } from '@/components/hooks/use-autosave';
import { useCaseFiles } from '@/components/hooks/use-case-files';
import { useSession } from '@/components/hooks/use-session';
import buttons from '@/components/ui/button.module.css';
import { Notice } from '@/components/ui/notice';
import { FileMenu } from './file-menu';
import { Refusal } from './refusal';
import { SaveChoice, SaveStatus } from './save-status';
import { SavedLink } from './saved-link';
import { TextInPlace } from './text-in-place';
import styles from './title-bar.module.css';
import { useTitleCommands } from './use-title-commands';

/** What the open case is called, how it stands on the server, and what can be done with it as a whole. */
export function TitleBar({ id, revision }: { id: string; revision: number }) {
  const saving = useAutosave(id, revision);
  const files = useCaseFiles(saving.flush);
  const title = useSession((s) => s.casefile.title);
  const reference = useSession((s) => s.casefile.reference ?? '');
  const edit = useSession((s) => s.edit);
  useTitleCommands(id, saving, files);
  useEffect(() => {
    document.title = `${title} · Retrodict`;
  }, [title]);

  return (
    <>
      <div className={styles.bar}>
        <SavedLink className={buttons.quiet} href="/" save={saving.flush}>
          Cases
        </SavedLink>
        <h1 className="visually-hidden">{title}</h1>
        <TextInPlace
          label="Title"
          className={styles.name}
          value={title}
          onChange={(to) => edit('title', { do: 'set', path: 'title', to })}
          needed
        />
        <TextInPlace
          label="Reference"
          className={styles.reference}
          value={reference}
          onChange={(to) => edit('reference', { do: 'set', path: 'reference', to })}
        />
        <SaveStatus save={saving.save} />
        <History />
        <FileMenu files={files} />
        <SavedLink className={buttons.button} href={`/cases/${id}/report`} save={saving.flush}>
          Report
        </SavedLink>
      </div>
      <SaveChoice saving={saving} />
      <Notices saving={saving} files={files} />
    </>
  );
}

function History() {
  const undone = useSession((s) => s.past.at(-1)?.label);
  const redone = useSession((s) => s.future[0]?.label);
  const undo = useSession((s) => s.undo);
  const redo = useSession((s) => s.redo);
  const says = (verb: string, label: string | undefined): string =>
    label === undefined ? `${verb}: nothing` : `${verb}: ${label}`;
  return (
    <>
      <button
        type="button"
        className={buttons.quiet}
        disabled={undone === undefined}
        aria-label={says('Undo', undone)}
        title={says('Undo', undone)}
        onClick={undo}
      >
        <Undo2 size={16} aria-hidden />
      </button>
      <button
        type="button"
        className={buttons.quiet}
        disabled={redone === undefined}
        aria-label={says('Redo', redone)}
        title={says('Redo', redone)}
        onClick={redo}
      >
        <Redo2 size={16} aria-hidden />
      </button>
    </>
  );
}

function Notices({ saving, files }: { saving: Saving; files: ReturnType<typeof useCaseFiles> }) {
  return (
    <div className={styles.notices}>
      {files.over && <Notice tone="plain">Drop a case file to open it as a case of its own.</Notice>}
      {saving.trouble.length > 0 && (
        <Refusal refused={{ what: 'What you chose', issues: saving.trouble }} onClose={saving.closeNotes} />
      )}
      {files.refused && <Refusal refused={files.refused} onClose={files.close} />}
      {saving.save.kind === 'refused' && (
        <Notice tone="refused">
          The server did not take the last change:{' '}
          {saving.save.issues.map(({ path, says }) => `${path} ${says}`).join('; ')}. It is kept in this browser.
        </Notice>
      )}
      {saving.putBack && (
        <Notice tone="plain" onClose={saving.closeNotes}>
          Changes that this browser had kept were put back and saved. Undo takes them away again.
        </Notice>
      )}
      {saving.apart.length > 0 && (
        <Notice tone="plain" onClose={saving.closeNotes}>
          This browser had kept changes to an older revision. They were kept as{' '}
          {saving.apart.map((kept) => (
            <a key={kept.id} href={`/cases/${kept.id}`}>
              {kept.title}
            </a>
          ))}
          .
        </Notice>
      )}
    </div>
  );
}
