import { type PointerEvent, type RefObject, useRef } from 'react';
import type { Vec } from '@/lib/geometry/vector';
import { type View, pinch } from '@/lib/scene/view';

/** Two fingers zoom and move the sheet. Each handler says whether it took the event. */
export function usePinch(pixelOf: (event: PointerEvent) => Vec, setView: (change: (view: View) => View) => void) {
  const fingers: RefObject<Map<number, Vec>> = useRef(new Map());

  const pair = (): [Vec, Vec] | null => {
    const [first, second] = fingers.current.values();
    return first && second ? [first, second] : null;
  };
  return {
    down(event: PointerEvent): boolean {
      if (event.pointerType === 'touch') fingers.current.set(event.pointerId, pixelOf(event));
      return fingers.current.size > 1;
    },
    move(event: PointerEvent): boolean {
      const from = pair();
      if (!from || !fingers.current.has(event.pointerId)) return false;
      fingers.current.set(event.pointerId, pixelOf(event));
      const to = pair();
      if (to) setView((view) => pinch(view, from, to));
      return true;
    },
    up(event: PointerEvent): boolean {
      const wasPair = fingers.current.size > 1;
      fingers.current.delete(event.pointerId);
      return wasPair;
    },
  };
}
