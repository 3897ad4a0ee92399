import { type KeyboardEvent, useRef } from 'react';
import { useSessionStore } from '@/components/hooks/use-session';
import type { Vec } from '@/lib/geometry/vector';
import { nudgeEdit } from '@/lib/session/nudge';
import type { NamedEdit } from '@/lib/session/named-edit';
import { deletion, duplication, whyKept } from '@/lib/session/thing-edits';
import { nameOf } from '@/lib/session/thing-names';
import type { ToolKey } from '@/lib/session/tools/tool';

const ARROWS: Record<string, Vec> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, 1], ArrowDown: [0, -1] };
const TURNS: Record<string, number> = { BracketLeft: 1, BracketRight: -1 };
/** One nudge: 0.1 m or 1 degree; ten times with Shift, a tenth with Alt. */
const STEP = { metres: 0.1, degrees: 1 };

const factorOf = (event: KeyboardEvent): number => (event.shiftKey ? 10 : event.altKey ? 0.1 : 1);
const isCommand = (event: KeyboardEvent): boolean => event.ctrlKey || event.metaKey;
const isUndo = (event: KeyboardEvent): boolean =>
  isCommand(event) && !event.shiftKey && event.key.toLowerCase() === 'z';
/** '[' by what is written on the key, or by its place on keyboards that write something else there. */
const turnOf = (event: KeyboardEvent): number =>
  event.key === '[' ? 1 : event.key === ']' ? -1 : (TURNS[event.code] ?? 0);

interface Doing {
  /** Lets go of what the pointer holds. */
  cancel: () => void;
  /** Offers a key to the tool in hand; says whether it took it. */
  key: (key: ToolKey) => boolean;
  /** Says why nothing happened. */
  say: (words: string | null) => void;
  /** Goes to the numbers of the selected thing. */
  openNumbers: () => boolean;
}

/** Enter presses a tool; it must not open the numbers of what is selected instead. */
const isTool = (target: EventTarget): boolean =>
  target instanceof Element && target.closest('[role="toolbar"]') !== null;

/** Keys on the board and on its list of things: nudge, turn, delete, duplicate, step back. A held key is one step of undo. */
export function useBoardKeys({ cancel, key, say, openNumbers }: Doing) {
  const session = useSessionStore();
  const total = useRef<{ step: Vec; turn: number } | null>(null);

  const nudge = (step: Vec, turn: number): boolean => {
    const { selection, casefile, gesture, begin, preview } = session.getState();
    if (!selection || (gesture && !total.current)) return false;
    const sum = total.current ?? { step: [0, 0], turn: 0 };
    const next = { step: [sum.step[0] + step[0], sum.step[1] + step[1]] as const, turn: sum.turn + turn };
    const edit = nudgeEdit(gesture?.casefile ?? casefile, selection, next.step, next.turn);
    if (!total.current && !edit) return false;
    if (!total.current) begin(`nudge ${nameOf(selection)}`);
    total.current = next;
    if (edit) preview(edit);
    return true;
  };

  const finish = (): void => {
    if (!total.current) return;
    total.current = null;
    session.getState().commit();
  };

  const carryOut = (found: NamedEdit | null): boolean => {
    if (found) session.getState().edit(found.label, found.edit);
    return found !== null;
  };

  const stepBack = (): boolean => {
    const state = session.getState();
    total.current = null;
    if (key('back')) return true;
    if (state.gesture) {
      cancel();
      state.cancel();
    } else if (state.tool !== 'select') state.use('select');
    else if (state.selection) state.select(null);
    else return false;
    return true;
  };

  const remove = (): boolean => {
    const { selection, casefile, select } = session.getState();
    if (!selection) return false;
    const done = carryOut(deletion(casefile, selection));
    if (done) select(null);
    say(done ? null : whyKept(selection));
    return true;
  };

  const handled = (event: KeyboardEvent): boolean => {
    const { selection, casefile } = session.getState();
    const arrow = ARROWS[event.key];
    const turn = turnOf(event);
    const by = factorOf(event);
    if (event.key === 'Escape') return stepBack();
    if (isUndo(event) && key('back')) {
      event.stopPropagation();
      return true;
    }
    if (isCommand(event))
      return event.key.toLowerCase() === 'd' && selection !== null && carryOut(duplication(casefile, selection));
    if (arrow) return nudge([arrow[0] * STEP.metres * by, arrow[1] * STEP.metres * by], 0);
    if (turn !== 0) return nudge([0, 0], turn * STEP.degrees * by);
    if (event.key === 'Delete' || event.key === 'Backspace') return key('back') || remove();
    return event.key === 'Enter' && (key('finish') || openNumbers());
  };

  return {
    onKeyDown: (event: KeyboardEvent) => {
      if (event.target instanceof HTMLInputElement || event.target instanceof HTMLSelectElement) return;
      if (event.key === 'Enter' && isTool(event.target)) return;
      say(null);
      if (handled(event)) event.preventDefault();
    },
    onKeyUp: (event: KeyboardEvent) => {
      if (event.key in ARROWS || turnOf(event) !== 0) finish();
    },
    onBlur: finish,
  };
}
