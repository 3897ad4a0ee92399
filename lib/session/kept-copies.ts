import { hashOf } from '@/lib/casefile/canonical';
import { checkCase } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';

/** Changes that a tab kept in its browser until the server had them. */
export interface KeptCopy {
  /** The revision that they change. */
  base: number;
  casefile: CaseFile;
  /** When it was kept, ms since 1970. */
  at: number;
  /** SHA-256 of what was on its way to the server as base + 1 when this was kept. */
  sent?: string;
}

/** The part of Web Storage that is used. */
export type CopyStorage = Pick<Storage, 'getItem' | 'setItem' | 'removeItem' | 'key' | 'length'>;

const prefixOf = (id: string): string => `retrodict.copy.${id}.`;

/** Each tab keeps under a key of its own, so that no tab drops what another still needs. */
export const copyKey = (id: string, tab: string): string => `${prefixOf(id)}${tab}`;

/** What of the kept copies of a case became of it, oldest first. */
export interface Reopened {
  key: string;
  copy: KeptCopy;
  /** same: the server has it. newer: changes its newest revision. apart: the case moved on otherwise. */
  kind: 'same' | 'newer' | 'apart';
}

/** The kept copies of a case, held against what the server has. At most one is newer; a second one stands apart. */
export function reopenCopies(
  storage: CopyStorage,
  id: string,
  server: { revision: number; casefile: CaseFile },
): Reopened[] {
  const sha256 = hashOf(server.casefile);
  let taken = false;
  return readCopies(storage, id).map(({ key, copy }): Reopened => {
    if (hashOf(copy.casefile) === sha256) return { key, copy, kind: 'same' };
    const follows = copy.base === server.revision || (copy.base + 1 === server.revision && copy.sent === sha256);
    if (!follows || taken) return { key, copy, kind: 'apart' };
    taken = true;
    return { key, copy, kind: 'newer' };
  });
}

function readCopies(storage: CopyStorage, id: string): { key: string; copy: KeptCopy }[] {
  const keys = Array.from({ length: storage.length }, (_, i) => storage.key(i) ?? '').filter((key) =>
    key.startsWith(prefixOf(id)),
  );
  const found = keys.flatMap((key) => {
    const copy = readCopy(storage.getItem(key));
    return copy ? [{ key, copy }] : [];
  });
  return found.sort((a, b) => a.copy.at - b.copy.at);
}

/** A copy that cannot be read is left where it is and not used. */
function readCopy(text: string | null): KeptCopy | null {
  try {
    const { base, casefile, at, sent } = JSON.parse(text ?? '') as Record<string, unknown>;
    const checked = checkCase(casefile);
    if (!checked.ok || typeof base !== 'number' || typeof at !== 'number') return null;
    return { base, casefile: checked.casefile, at, ...(typeof sent === 'string' ? { sent } : {}) };
  } catch {
    return null;
  }
}
