'use client';
import { useEffect, useState } from 'react';
import type { Issue } from '@/lib/casefile/issue';
import { emptyCase } from '@/lib/casefile/defaults';
import type { CaseFile } from '@/lib/casefile/schema';
import { type Kept, UNREACHABLE, fetchCase, keepFile, keepNewCase } from './case-requests';

export interface CaseFiles {
  /** What was refused last, until it is closed. */
  refused: { what: string; issues: readonly Issue[] } | null;
  close: () => void;
  /** Whether a file is held over the window. */
  over: boolean;
  openFile: (file: File) => Promise<void>;
  create: () => Promise<void>;
  duplicate: (casefile: CaseFile) => Promise<void>;
  /** As duplicate, of the newest revision that the server has. */
  duplicateKept: (id: string) => Promise<void>;
}

/**
 * Makes new cases, from nothing, from a file (also one that is dropped on the window) or from another case, and goes to
 * them. What is refused is said and changes nothing. `before` runs first, to save what is open.
 */
export function useCaseFiles(before: () => Promise<void> = async () => {}): CaseFiles {
  const [refused, setRefused] = useState<CaseFiles['refused']>(null);

  const goTo = async (what: string, keep: () => Promise<Kept>): Promise<void> => {
    setRefused(null);
    const kept = await keep();
    if (!kept.ok) return setRefused({ what, issues: kept.issues });
    await before();
    location.assign(`/cases/${kept.id}`);
  };
  const openFile = (file: File): Promise<void> => goTo(file.name, () => keepFile(file));
  const over = useFileDrop((file) => void openFile(file));

  return {
    refused,
    close: () => setRefused(null),
    over,
    openFile,
    create: () => goTo('A new case', () => keepNewCase(emptyCase())),
    duplicate: (casefile) => goTo('The copy', () => keepCopy(casefile)),
    duplicateKept: (id) =>
      goTo('The copy', async () => {
        const newest = await fetchCase(id);
        return newest ? keepCopy(newest.casefile) : { ok: false, issues: [UNREACHABLE] };
      }),
  };
}

const keepCopy = (casefile: CaseFile): Promise<Kept> => keepNewCase({ ...casefile, title: `${casefile.title} (copy)` });

/** Calls back with a file that is dropped anywhere on the window. Whether one is held over it. */
function useFileDrop(onFile: (file: File) => void): boolean {
  const [over, setOver] = useState(false);
  useEffect(() => {
    const carriesFile = (event: DragEvent): boolean => event.dataTransfer?.types.includes('Files') ?? false;
    const hold = (event: DragEvent): void => {
      if (!carriesFile(event)) return;
      event.preventDefault();
      setOver(true);
    };
    const leave = (event: DragEvent): void => {
      if (event.relatedTarget === null) setOver(false);
    };
    const drop = (event: DragEvent): void => {
      if (!carriesFile(event)) return;
      event.preventDefault();
      setOver(false);
      const file = event.dataTransfer?.files[0];
      if (file) onFile(file);
    };
    addEventListener('dragover', hold);
    addEventListener('dragleave', leave);
    addEventListener('drop', drop);
    return () => {
      removeEventListener('dragover', hold);
      removeEventListener('dragleave', leave);
      removeEventListener('drop', drop);
    };
  });
  return over;
}
