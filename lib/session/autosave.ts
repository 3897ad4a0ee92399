import { createStore } from 'zustand/vanilla';
import { hashOf } from '@/lib/casefile/canonical';
import type { Issue } from '@/lib/casefile/issue';
import type { CaseFile } from '@/lib/casefile/schema';
import type { KeptCopy } from './kept-copies';

/** How long edits are gathered before they are sent, ms. */
export const GATHER = 400;
/** Waits between tries while the server cannot be reached, ms; the last one repeats. */
const RETRY = [1_000, 2_000, 5_000, 15_000];

/** What a server says to a save. */
export type Sent =
  | { kind: 'saved'; revision: number }
  /** The case moved on: its newest revision and the hash of that. */
  | { kind: 'conflict'; revision: number; sha256: string }
  | { kind: 'deleted' }
  | { kind: 'refused'; issues: readonly Issue[] }
  | { kind: 'unreachable' };

export type SaveState =
  /** `at`: when this tab last saved, ms since 1970; null: nothing was changed yet. */
  | { kind: 'saved'; at: number | null }
  | { kind: 'saving' }
  /** The server cannot be reached; the changes are kept in this browser and tried again. */
  | { kind: 'offline' }
  /** Another tab saved a newer revision. Nothing is sent until the user has chosen. */
  | { kind: 'conflict'; revision: number }
  | { kind: 'deleted' }
  | { kind: 'refused'; issues: readonly Issue[] };

/** The world that autosave works on, passed in so that a test is one too. */
export interface SaveWorld {
  /** `leaving`: the page is going away, the request must outlive it. */
  send: (base: number, casefile: CaseFile, leaving: boolean) => Promise<Sent>;
  /** Keeps a copy in this browser at once, or drops it. */
  keep: (copy: KeptCopy | null) => void;
  now: () => number;
  /** Calls back after some ms; the answer calls it off. */
  later: (wait: number, call: () => void) => () => void;
}

export type Autosave = ReturnType<typeof createAutosave>;

/**
 * Sends finished edits of one open case, each based on the revision before it, one request at a time. Every edit is kept
 * in the browser before it is sent and dropped from there only when the server has it, so that a crash loses nothing;
 * what another tab saved is never written over.
 */
export function createAutosave(world: SaveWorld, opened: { revision: number; casefile: CaseFile }) {
  const state = createStore<{ save: SaveState }>()(() => ({ save: { kind: 'saved', at: null } }));
  const say = (save: SaveState): void => state.setState({ save });
  let base = opened.revision;
  let saved = opened.casefile;
  let latest = opened.casefile;
  let sending: Promise<void> | null = null;
  let failures = 0;
  let callOff = (): void => {};

  const waitsForUser = (): boolean => ['conflict', 'deleted'].includes(state.getState().save.kind);

  const keep = (sent?: CaseFile): void =>
    world.keep({ base, casefile: latest, at: world.now(), ...(sent ? { sent: hashOf(sent) } : {}) });

  const plan = (wait: number): void => {
    callOff();
    callOff = world.later(wait, () => void flush());
  };

  async function send(leaving: boolean): Promise<void> {
    const sent = latest;
    say({ kind: 'saving' });
    keep(sent);
    const reply = await world.send(base, sent, leaving);
    // An answer that was lost on the way leaves our own revision standing there: that is no conflict.
    if (reply.kind === 'conflict' && reply.sha256 === hashOf(sent))
      settle({ kind: 'saved', revision: reply.revision }, sent);
    else settle(reply, sent);
  }

  function settle(reply: Sent, sent: CaseFile): void {
    failures = reply.kind === 'unreachable' ? failures + 1 : 0;
    switch (reply.kind) {
      case 'saved':
        base = reply.revision;
        saved = sent;
        return settled();
      case 'unreachable':
        say({ kind: 'offline' });
        return plan(RETRY[Math.min(failures, RETRY.length) - 1]);
      case 'conflict':
        return say({ kind: 'conflict', revision: reply.revision });
      case 'deleted':
        return say({ kind: 'deleted' });
      case 'refused':
        return say({ kind: 'refused', issues: reply.issues });
    }
  }

  function settled(): void {
    if (latest === saved) {
      world.keep(null);
      say({ kind: 'saved', at: world.now() });
    } else {
      keep();
      plan(0);
    }
  }

  /** Sends what is not saved yet, now. Resolves when nothing is under way any more. */
  async function flush(leaving = false): Promise<void> {
    callOff();
    while (sending) await sending;
    if (latest === saved || waitsForUser()) return;
    sending = send(leaving).finally(() => (sending = null));
    await sending;
  }

  return {
    state,
    flush,
    /** A finished edit. */
    changed(casefile: CaseFile): void {
      if (casefile === latest) return;
      latest = casefile;
      if (latest === saved && !sending && !waitsForUser()) return settledAgain();
      keep();
      if (waitsForUser()) return;
      if (state.getState().save.kind !== 'offline') say({ kind: 'saving' });
      plan(GATHER);
    },
    /** Another document stands now in this tab, and the server has it as `revision`. */
    opened(revision: number, casefile: CaseFile): void {
      callOff();
      base = revision;
      saved = latest = casefile;
      world.keep(null);
      say({ kind: 'saved', at: null });
    },
    /** The user had the deleted case restored: what stands here is sent again. */
    restored(): Promise<void> {
      say({ kind: 'saving' });
      return flush();
    },
    /** What stands here was kept elsewhere: nothing more is sent, the copy in this browser goes. */
    abandon(): void {
      callOff();
      latest = saved;
      world.keep(null);
    },
    /** Whether everything is on the server. */
    isSaved: (): boolean => latest === saved && !sending,
    revision: (): number => base,
  };

  /** Undone back to what the server has. */
  function settledAgain(): void {
    callOff();
    world.keep(null);
    say({ kind: 'saved', at: world.now() });
  }
}
