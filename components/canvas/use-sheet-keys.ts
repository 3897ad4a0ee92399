import { useEffect } from 'react';
import { useTakeOn } from '@/components/hooks/use-commands';
import { useSessionStore } from '@/components/hooks/use-session';
import type { Session } from '@/lib/session/session';
import { TOOL_OF } from '@/lib/session/tools/all';
import { TOOLS } from '@/lib/session/tools/tool';

interface Sheet {
  fitAll: () => void;
  zoom: (factor: number) => void;
}

/** Whether typing goes into a field, or a dialogue has the floor. */
const isElsewhere = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement && target.closest('input, select, textarea, [contenteditable], dialog[open]') !== null;

const ZOOMS: Record<string, number> = { '+': 1.25, '=': 1.25, '-': 0.8, _: 0.8 };

/** Keys that act wherever the focus is, except while typing: tools by letter, the view, undo and redo. */
export function useSheetKeys({ fitAll, zoom }: Sheet): void {
  useTakeOn({ 'view.fit': fitAll });
  const session = useSessionStore();
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      if (isElsewhere(event.target)) return;
      const key = event.key.toLowerCase();
      const done = event.ctrlKey || event.metaKey ? history(session, key, event.shiftKey) : single(key, event.altKey);
      if (done) event.preventDefault();
    };
    const single = (key: string, alt: boolean): boolean => {
      const id =
        alt || session.getState().gesture ? undefined : TOOLS.find((t) => TOOL_OF[t].key.toLowerCase() === key);
      if (id) session.getState().use(id);
      else if (key === 'f' && !alt) fitAll();
      else if (key in ZOOMS && !alt) zoom(ZOOMS[key]);
      else return false;
      return true;
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [session, fitAll, zoom]);
}

function history(session: Session, key: string, shift: boolean): boolean {
  const { undo, redo } = session.getState();
  if (key === 'z') (shift ? redo : undo)();
  else if (key === 'y') redo();
  else return false;
  return true;
}
