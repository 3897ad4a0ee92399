'use client';
import { useEffect, useState } from 'react';
import { useStore } from 'zustand';
import { useSessionStore } from '@/components/hooks/use-session';
import type { Issue } from '@/lib/casefile/issue';
import type { CaseFile } from '@/lib/casefile/schema';
import { Autosave, type SaveState, type SaveWorld } from '@/lib/session/autosave';
import { copyKey, reopenCopies } from '@/lib/session/kept-copies';
import type { Session } from '@/lib/session/session';
import { fetchCase, keepNewCase, restoreCase, sendCase } from './case-requests';

/** A case that was kept apart because it could not go over what stands on the server. */
interface KeptApart {
  id: string;
  title: string;
}

export interface Saving {
  save: SaveState;
  /** Cases made from copies that this browser had kept of an older revision. */
  apart: readonly KeptApart[];
  /** Whether changes kept by this browser were put back when the case was opened. */
  putBack: boolean;
  /** Why a choice of the user could not be followed. */
  trouble: readonly Issue[];
  /** The user has read what became of kept copies, or of a choice. */
  closeNotes: () => void;
  /** Resolves when what can be saved is saved. */
  flush: () => Promise<void>;
  /** Conflict: shows what another tab saved, in place of what stands here. */
  takeTheirs: () => Promise<void>;
  /** Conflict or deleted: keeps what stands here as a new case and goes there. */
  keepMine: () => Promise<void>;
  /** Deleted: restores the case and saves on. */
  restore: () => Promise<void>;
}

/** Keeps the open case on the server, and in this browser until the server has it. */
export function useAutosave(id: string, revision: number): Saving {
  const session = useSessionStore();
  const [key] = useState(() => copyKey(id, newToken()));
  const [autosave] = useState(
    () => new Autosave(worldOf(id, key), { revision, casefile: session.getState().casefile }),
  );
  const save = useStore(autosave.state, (s) => s.save);
  const [apart, setApart] = useState<readonly KeptApart[]>([]);
  const [putBack, setPutBack] = useState(false);
  const [trouble, setTrouble] = useState<readonly Issue[]>([]);

  useEffect(() => {
    const letGo = holdLock(key);
    const stop = session.subscribe(({ gesture, casefile }) => {
      if (!gesture) autosave.changed(casefile);
    });
    const unlisten = listen(id, session, autosave);
    void reopen(id, session, autosave).then(({ restored, kept }) => {
      if (restored) setPutBack(true);
      if (kept.length > 0) setApart(kept);
    });
    return () => {
      stop();
      unlisten();
      letGo();
      void autosave.flush();
    };
  }, [id, key, session, autosave]);

  return {
    save,
    apart,
    putBack,
    trouble,
    closeNotes: () => {
      setTrouble([]);
      setApart([]);
      setPutBack(false);
    },
    flush: () => autosave.flush(),
    takeTheirs: () => showNewest(id, session, autosave),
    keepMine: async () => {
      const { casefile } = session.getState();
      const kept = await keepNewCase({ ...casefile, title: keptTitle(casefile) });
      if (!kept.ok) return setTrouble(kept.issues);
      autosave.abandon();
      location.assign(`/cases/${kept.id}`);
    },
    restore: async () => {
      const issues = await restoreCase(id);
      setTrouble(issues);
      if (issues.length === 0) await autosave.restored();
    },
  };
}

const keptTitle = (casefile: CaseFile): string => `${casefile.title} (kept copy)`;

const newToken = (): string => Array.from(crypto.getRandomValues(new Uint32Array(2)), (n) => n.toString(36)).join('');

const worldOf = (id: string, key: string): SaveWorld => ({
  send: (base, casefile, leaving) => sendCase(id, base, casefile, leaving),
  keep: (copy) => {
    try {
      if (copy) localStorage.setItem(key, JSON.stringify(copy));
      else localStorage.removeItem(key);
    } catch {
      // Storage is full or forbidden: the case is still saved on the server, only a crash is not covered.
    }
  },
  now: Date.now,
  later: (wait, call) => {
    const timer = setTimeout(call, wait);
    return () => clearTimeout(timer);
  },
});

/** Saves when the page goes out of sight, and looks for what other tabs saved when it comes back. */
function listen(id: string, session: Session, autosave: Autosave): () => void {
  const leave = (): void => {
    session.getState().commit();
    void autosave.flush(true);
  };
  const seen = (): void => {
    if (document.visibilityState === 'hidden') leave();
    else if (autosave.isSaved) void showNewest(id, session, autosave);
  };
  const online = (): void => void autosave.flush();
  document.addEventListener('visibilitychange', seen);
  addEventListener('pagehide', leave);
  addEventListener('online', online);
  return () => {
    document.removeEventListener('visibilitychange', seen);
    removeEventListener('pagehide', leave);
    removeEventListener('online', online);
  };
}

/** Shows the newest revision of the server, if this tab is not based on it already; that step can be undone. */
async function showNewest(id: string, session: Session, autosave: Autosave): Promise<void> {
  const before = session.getState().casefile;
  const newest = await fetchCase(id);
  const meanwhile = session.getState().casefile !== before;
  if (!newest || newest.revision === autosave.revision || meanwhile) return;
  autosave.opened(newest.revision, newest.casefile);
  session.getState().replace('what another tab saved', newest.casefile);
}

/** While a tab lives it holds a lock under its key, so that another tab leaves its copy alone. */
function holdLock(key: string): () => void {
  let letGo = (): void => {};
  void navigator.locks?.request(key, () => new Promise<void>((resolve) => (letGo = resolve)));
  return () => letGo();
}

async function liveKeys(): Promise<Set<string | undefined>> {
  const held = (await navigator.locks?.query())?.held ?? [];
  return new Set(held.map((lock) => lock.name));
}

/** Keys of copies that this tab has taken up, so that none is taken up twice. */
const inHand = new Set<string>();

/** Puts back what a closed or crashed tab kept of this case; what no longer fits becomes a case of its own. */
async function reopen(id: string, session: Session, autosave: Autosave) {
  const server = { revision: autosave.revision, casefile: session.getState().casefile };
  const live = await liveKeys();
  const kept: KeptApart[] = [];
  let restored = false;
  for (const { key, copy, kind } of reopenCopies(localStorage, id, server).filter((found) => !live.has(found.key))) {
    if (inHand.has(key)) continue;
    inHand.add(key);
    if (kind === 'newer' && session.getState().casefile === server.casefile) {
      session.getState().replace('what this browser had kept', copy.casefile);
      restored = true;
    } else if (kind !== 'same') {
      const made = await keptApart(copy.casefile);
      if (!made) continue;
      kept.push(made);
    }
    localStorage.removeItem(key);
  }
  return { restored, kept };
}

async function keptApart(casefile: CaseFile): Promise<KeptApart | null> {
  const title = keptTitle(casefile);
  const made = await keepNewCase({ ...casefile, title });
  return made.ok ? { id: made.id, title } : null;
}
