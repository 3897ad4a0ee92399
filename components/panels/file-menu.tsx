'use client';
import { useId, useRef } from 'react';
import type { CaseFiles } from '@/components/hooks/use-case-files';
import { useSessionStore } from '@/components/hooks/use-session';
import buttons from '@/components/ui/button.module.css';
import type { CaseFile } from '@/lib/casefile/schema';
import { FileButton } from './file-button';
import styles from './file-menu.module.css';

/** Everything about the case as a file: new, duplicate, open, save. */
export function FileMenu({ files }: { files: CaseFiles }) {
  const session = useSessionStore();
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
      </div>
    </>
  );
}

/** Hands the case to the browser as <title>.case.json. */
export function saveFile(casefile: CaseFile): void {
  const blob = new Blob([`${JSON.stringify(casefile, null, 2)}\n`], { type: 'application/json' });
  const link = document.createElement('a');
  link.href = URL.createObjectURL(blob);
  link.download = `${fileName(casefile.title)}.case.json`;
  link.click();
  URL.revokeObjectURL(link.href);
}

/** A title as a file name on every system: no separators, no control characters, not empty. */
const fileName = (title: string): string =>
  title
    .replace(/[\\/:*?"<>|\p{Cc}]+/gu, ' ')
    .replace(/\s+/g, ' ')
    .trim()
    .replace(/^\.+|\.+$/g, '')
    .slice(0, 80) || 'case';
