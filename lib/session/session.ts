import { createStore } from 'zustand/vanilla';
import { type Edit, applyEdit } from '@/lib/casefile/edit';
import type { ThingId } from '@/lib/casefile/fields';
import type { Issue } from '@/lib/casefile/issue';
import type { CaseFile } from '@/lib/casefile/schema';
import type { ToolId } from './tools/tool';

/** A finished gesture: the case as it was before it, and what it was called. */
interface Step {
  label: string;
  casefile: CaseFile;
}

/**
 * One open case in one tab. The document (casefile, past, future) is saved and undoable; the session (selection, tool)
 * is not; the moment (gesture) lives only while a pointer or a key is down.
 */
export interface SessionState {
  casefile: CaseFile;
  past: readonly Step[];
  future: readonly Step[];
  selection: ThingId | null;
  tool: ToolId;
  /** While a gesture is under way: the case at its beginning, from which every preview is computed anew. */
  gesture: Step | null;
  /** Why the last edit was refused; the last good case stays in force. */
  refused: readonly Issue[];
}

export interface SessionActions {
  /** One finished edit. Returns the problems if it was refused. */
  edit(label: string, edit: Edit): readonly Issue[];
  begin(label: string): void;
  /** Shows an edit of the case as it was when the gesture began. */
  preview(edit: Edit): void;
  commit(): void;
  /** Restores exactly what was there when the gesture began. */
  cancel(): void;
  undo(): void;
  redo(): void;
  select(thing: ThingId | null): void;
  use(tool: ToolId): void;
  /** Puts another document in place of this one, as one step that can be undone. */
  replace(label: string, casefile: CaseFile): void;
  /** Opens another document; history starts anew. */
  open(casefile: CaseFile): void;
}

export type Session = ReturnType<typeof createSession>;

const HISTORY = 500;

export function createSession(casefile: CaseFile) {
  return createStore<SessionState & SessionActions>()((set, get) => ({
    casefile,
    past: [],
    future: [],
    selection: null,
    tool: 'select',
    gesture: null,
    refused: [],

    edit(label, edit) {
      get().commit();
      const before = get().casefile;
      const edited = applyEdit(before, edit);
      if (!edited.ok) {
        set({ refused: edited.issues });
        return edited.issues;
      }
      if (edited.casefile !== before)
        set((s) => ({
          casefile: edited.casefile,
          past: pushed(s.past, { label, casefile: before }),
          future: [],
          refused: [],
        }));
      return [];
    },

    begin(label) {
      get().commit();
      set((s) => ({ gesture: { label, casefile: s.casefile } }));
    },

    preview(edit) {
      const { gesture } = get();
      if (!gesture) return;
      const edited = applyEdit(gesture.casefile, edit);
      if (edited.ok) set({ casefile: edited.casefile });
    },

    commit() {
      const { gesture } = get();
      if (!gesture) return;
      const changed = get().casefile !== gesture.casefile;
      set((s) => ({ gesture: null, ...(changed ? { past: pushed(s.past, gesture), future: [] } : {}) }));
    },

    cancel() {
      const { gesture } = get();
      if (gesture) set({ casefile: gesture.casefile, gesture: null });
    },

    undo() {
      const { gesture, past } = get();
      if (gesture) return get().cancel();
      const step = past.at(-1);
      if (!step) return;
      set((s) => ({
        casefile: step.casefile,
        past: s.past.slice(0, -1),
        future: [{ label: step.label, casefile: s.casefile }, ...s.future],
        refused: [],
      }));
    },

    redo() {
      const [step, ...rest] = get().future;
      if (!step || get().gesture) return;
      set((s) => ({
        casefile: step.casefile,
        past: pushed(s.past, { label: step.label, casefile: s.casefile }),
        future: rest,
        refused: [],
      }));
    },

    replace(label, other) {
      get().commit();
      set((s) => ({ casefile: other, past: pushed(s.past, { label, casefile: s.casefile }), future: [], refused: [] }));
    },

    select: (selection) => set({ selection }),
    use: (tool) => set({ tool }),
    open: (opened) => set({ casefile: opened, past: [], future: [], gesture: null, selection: null, refused: [] }),
  }));
}

const pushed = (past: readonly Step[], step: Step): readonly Step[] => [...past.slice(-(HISTORY - 1)), step];
