'use client';
import { useId, useRef } from 'react';
import type { CaseFiles } from '@/components/hooks/use-case-files';
import { useAnswer } from '@/components/hooks/use-answer';
import { useSessionStore } from '@/components/hooks/use-session';
import buttons from '@/components/ui/button.module.css';
import { FileButton } from './file-button';
import { saveFile, saveResult } from './save-file';
import styles from './file-menu.module.css';

/** Everything about the case as a file: new, duplicate, open, save, and its result. */
export function FileMenu({ files }: { files: CaseFiles }) {
  const session = useSessionStore();
  const { result, stale } = useAnswer();
  const id = useId();
  const menu = useRef<HTMLDivElement>(null);
  const then = (act: () => void) => (): void => {
    menu.current?.hidePopover();
    act();
  };
  return (
    <>
      <button type="button" className={buttons.quiet} popoverTarget={id}>
        File
      </button>
      <div ref={menu} id={id} popover="auto" className={styles.menu} aria-label="File" role="group">
        <button type="button" className={buttons.quiet} onClick={then(() => void files.create())}>
          New case
        </button>
        <button
          type="button"
          className={buttons.quiet}
          onClick={then(() => void files.duplicate(session.getState().casefile))}
        >
          Duplicate
        </button>
        <FileButton className={buttons.quiet} onFile={(file) => then(() => void files.openFile(file))()}>
          Open file…
        </FileButton>
        <button type="button" className={buttons.quiet} onClick={then(() => saveFile(session.getState().casefile))}>
          Save file…
        </button>
        <button
          type="button"
          className={buttons.quiet}
          disabled={result === null || stale}
          onClick={then(() => result && saveResult(session.getState().casefile, result))}
        >
          Save result…
        </button>
      </div>
    </>
  );
}
