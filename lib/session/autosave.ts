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

/**
 * Sends finished edits of one open case, each based on the revision before it, one request at a time. Every edit is kept
 * in the browser before it is sent and dropped from there only when the server has it, so that a crash loses nothing;
 * what another tab saved is never written over.
 */
export class Autosave {
  readonly state = createStore<{ save: SaveState }>()(() => ({ save: { kind: 'saved', at: null } }));
  readonly #world: SaveWorld;
  /** The revision that the next save goes over, and the case in it. */
  #base: number;
  #saved: CaseFile;
  #latest: CaseFile;
  #sending: Promise<void> | null = null;
  #failures = 0;
  #callOff = (): void => {};

  constructor(world: SaveWorld, opened: { revision: number; casefile: CaseFile }) {
    this.#world = world;
    this.#base = opened.revision;
    this.#saved = this.#latest = opened.casefile;
  }

  /** Whether everything is on the server. */
  get isSaved(): boolean {
    return this.#latest === this.#saved && !this.#sending;
  }

  get revision(): number {
    return this.#base;
  }

  /** A finished edit. */
  changed(casefile: CaseFile): void {
    if (casefile === this.#latest) return;
    this.#latest = casefile;
    if (this.isSaved && !this.#waitsForUser) return this.#settled();
    this.#keep();
    if (this.#waitsForUser) return;
    if (this.state.getState().save.kind !== 'offline') this.#say({ kind: 'saving' });
    this.#plan(GATHER);
  }

  /** Sends what is not saved yet, now. Resolves when nothing is under way any more. */
  async flush(leaving = false): Promise<void> {
    this.#callOff();
    while (this.#sending) await this.#sending;
    if (this.isSaved || this.#waitsForUser) return;
    this.#sending = this.#send(leaving).finally(() => (this.#sending = null));
    await this.#sending;
  }

  /** Another document stands now in this tab, and the server has it as `revision`. */
  opened(revision: number, casefile: CaseFile): void {
    this.#base = revision;
    this.#saved = this.#latest = casefile;
    this.#settled();
  }

  /** The user had the deleted case restored: what stands here is sent again. */
  restored(): Promise<void> {
    this.#say({ kind: 'saving' });
    return this.flush();
  }

  /** What stands here was kept elsewhere: nothing more is sent, the copy in this browser goes. */
  abandon(): void {
    this.#callOff();
    this.#latest = this.#saved;
    this.#world.keep(null);
  }

  async #send(leaving: boolean): Promise<void> {
    const sent = this.#latest;
    this.#say({ kind: 'saving' });
    this.#keep(sent);
    const reply = await this.#world.send(this.#base, sent, leaving);
    // An answer that was lost on the way leaves our own revision standing there: that is no conflict.
    const ours = reply.kind === 'conflict' && reply.sha256 === hashOf(sent);
    this.#failures = reply.kind === 'unreachable' ? this.#failures + 1 : 0;
    if (reply.kind === 'saved' || ours) this.#sentAs(reply.revision, sent);
    else this.#unsent(reply);
  }

  #sentAs(revision: number, sent: CaseFile): void {
    this.#base = revision;
    this.#saved = sent;
    if (this.#latest === sent) return this.#settled();
    this.#keep();
    this.#plan(0);
  }

  #unsent(reply: Exclude<Sent, { kind: 'saved' }>): void {
    switch (reply.kind) {
      case 'unreachable':
        this.#say({ kind: 'offline' });
        return this.#plan(RETRY[Math.min(this.#failures, RETRY.length) - 1]);
      case 'conflict':
        return this.#say({ kind: 'conflict', revision: reply.revision });
      case 'deleted':
        return this.#say({ kind: 'deleted' });
      case 'refused':
        return this.#say({ kind: 'refused', issues: reply.issues });
    }
  }

  /** What stands here is what the server has. */
  #settled(): void {
    this.#callOff();
    this.#world.keep(null);
    this.#say({ kind: 'saved', at: this.#world.now() });
  }

  get #waitsForUser(): boolean {
    return ['conflict', 'deleted'].includes(this.state.getState().save.kind);
  }

  #say(save: SaveState): void {
    this.state.setState({ save });
  }

  #keep(sent?: CaseFile): void {
    const copy = { base: this.#base, casefile: this.#latest, at: this.#world.now() };
    this.#world.keep(sent ? { ...copy, sent: hashOf(sent) } : copy);
  }

  #plan(wait: number): void {
    this.#callOff();
    this.#callOff = this.#world.later(wait, () => void this.flush());
  }
}
