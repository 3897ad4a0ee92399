import { type PointerEvent, useEffect, useRef, useState } from 'react';
import type { Vec } from '@/lib/geometry/vector';
import { type View, panBy } from '@/lib/scene/view';

/** Moves the sheet under the pointer. Space or the middle button asks for it whatever tool is in hand. */
export function usePan(pixelOf: (event: PointerEvent) => Vec, setView: (change: (view: View) => View) => void) {
  const last = useRef<Vec | null>(null);
  const isSpaceDown = useSpace();
  const [panning, setPanning] = useState(false);

  return {
    panning,
    isAsked: (event: PointerEvent): boolean => event.button === 1 || (event.button === 0 && isSpaceDown.current),
    start(event: PointerEvent): void {
      last.current = pixelOf(event);
      setPanning(true);
    },
    move(event: PointerEvent): boolean {
      const from = last.current;
      if (!from) return false;
      const to = pixelOf(event);
      last.current = to;
      setView((view) => panBy(view, to[0] - from[0], to[1] - from[1]));
      return true;
    },
    stop(): boolean {
      const was = last.current !== null;
      last.current = null;
      setPanning(false);
      return was;
    },
  };
}

/** Whether Space is held, except where Space presses what has the focus. */
function useSpace() {
  const held = useRef(false);
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      if (event.key !== ' ') return;
      const { target } = event;
      const presses = target instanceof HTMLElement && target.closest('button, input, select, textarea, a') !== null;
      held.current = event.type === 'keydown' && !presses;
      if (held.current) event.preventDefault();
    };
    window.addEventListener('keydown', onKey);
    window.addEventListener('keyup', onKey);
    return () => {
      window.removeEventListener('keydown', onKey);
      window.removeEventListener('keyup', onKey);
    };
  }, []);
  return held;
}
