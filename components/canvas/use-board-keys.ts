import { type KeyboardEvent, useRef } from 'react';
import { useSessionStore } from '@/components/hooks/use-session';
import type { Edit } from '@/lib/casefile/edit';
import { labelOf, type ThingId } from '@/lib/casefile/fields';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Vec } from '@/lib/geometry/vector';
import { nudgeEdit } from '@/lib/session/drag';

const ARROWS: Record<string, Vec> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, 1], ArrowDown: [0, -1] };
const TURNS: Record<string, number> = { '[': 1, ']': -1, '{': 1, '}': -1 };
/** One nudge: 0.1 m or 1 degree; ten times with Shift, a tenth with Alt. */
const STEP = { metres: 0.1, degrees: 1 };

const factorOf = (event: KeyboardEvent): number => (event.shiftKey ? 10 : event.altKey ? 0.1 : 1);

/** What Delete takes away; null for what every case has. */
export function deletion(casefile: CaseFile, thing: ThingId): { label: string; edit: Edit } | null {
  const [kind, which = '', k = ''] = thing.split('.');
  if (kind === 'approach')
    return { label: `delete the approach of ${which}`, edit: { do: 'set', path: `${thing}.direction`, to: null } };
  if (kind === 'departure')
    return { label: `delete the travel of ${which}`, edit: { do: 'set', path: thing, to: null } };
  if (kind !== 'leg') return null;
  const departure = casefile.departure[which as 'A' | 'B'];
  const only = departure?.kind === 'legs' && departure.legs.length === 1;
  return {
    label: `delete leg ${Number(k) + 1} of ${which}`,
    edit: only
      ? { do: 'set', path: `departure.${which}`, to: null }
      : { do: 'remove', path: `departure.${which}.legs`, index: Number(k) },
  };
}

/** What Duplicate copies: a leg, behind itself. */
export function duplication(casefile: CaseFile, thing: ThingId): { label: string; edit: Edit } | null {
  const [kind, which = '', k = ''] = thing.split('.');
  const departure = casefile.departure[which as 'A' | 'B'];
  if ((kind !== 'leg' && kind !== 'departure') || departure?.kind !== 'legs') return null;
  const index = kind === 'leg' ? Number(k) : departure.legs.length - 1;
  return {
    label: `duplicate leg ${index + 1} of ${which}`,
    edit: {
      do: 'insert',
      path: `departure.${which}.legs`,
      index: index + 1,
      entry: structuredClone(departure.legs[index]),
    },
  };
}

/** Keys on the board and on its list of things: nudge, turn, delete, duplicate, step back. A held key is one step of undo. */
export function useBoardKeys(cancel: () => void) {
  const session = useSessionStore();
  const total = useRef<{ step: Vec; turn: number } | null>(null);

  const nudge = (step: Vec, turn: number): boolean => {
    const { selection, casefile, gesture, begin, preview } = session.getState();
    if (!selection) return false;
    if (!total.current) {
      if (!nudgeEdit(casefile, selection, step, turn)) return false;
      begin(`nudge ${labelOf(casefile, selection)}`);
      total.current = { step: [0, 0], turn: 0 };
    }
    const { step: sum, turn: turned } = total.current;
    total.current = { step: [sum[0] + step[0], sum[1] + step[1]], turn: turned + turn };
    const edit = nudgeEdit(gesture?.casefile ?? casefile, selection, total.current.step, total.current.turn);
    if (edit) preview(edit);
    return true;
  };

  const finish = (): void => {
    if (!total.current) return;
    total.current = null;
    session.getState().commit();
  };

  const act = (found: { label: string; edit: Edit } | null): boolean => {
    if (!found) return false;
    session.getState().edit(found.label, found.edit);
    return true;
  };

  const handled = (event: KeyboardEvent): boolean => {
    const { selection, casefile, gesture, select, use, tool } = session.getState();
    const by = factorOf(event);
    const arrow = ARROWS[event.key];
    const plain = !event.ctrlKey && !event.metaKey;
    if (arrow && plain) return nudge([arrow[0] * STEP.metres * by, arrow[1] * STEP.metres * by], 0);
    if (event.key in TURNS && plain) return nudge([0, 0], TURNS[event.key] * STEP.degrees * by);
    if (event.key === 'Escape') {
      total.current = null;
      if (gesture) cancel();
      else if (tool !== 'select') use('select');
      else if (selection) select(null);
      else return false;
      session.getState().cancel();
      return true;
    }
    if (!selection) return false;
    if (event.key === 'Delete' || event.key === 'Backspace') {
      const done = act(deletion(casefile, selection));
      if (done) select(null);
      return done;
    }
    return event.key.toLowerCase() === 'd' && (event.ctrlKey || event.metaKey) && act(duplication(casefile, selection));
  };

  return {
    onKeyDown: (event: KeyboardEvent) => {
      if (event.target instanceof HTMLInputElement || event.target instanceof HTMLSelectElement) return;
      if (handled(event)) event.preventDefault();
    },
    onKeyUp: (event: KeyboardEvent) => {
      if (event.key in ARROWS || event.key in TURNS) finish();
    },
    onBlur: finish,
  };
}
