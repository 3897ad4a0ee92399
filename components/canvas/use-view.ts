import { type RefObject, useCallback, useEffect, useLayoutEffect, useRef, useState } from 'react';
import { type Scene, sceneBounds } from '@/lib/scene/scene';
import { type Size, type View, fit, zoomAbout } from '@/lib/scene/view';

/** Free pixels around what the board must show. */
const MARGIN = 76;
/** Zoom per pixel of a wheel's turn, and of a pinch on a touch pad, which reports smaller turns. */
const NOTCH = { wheel: 1.0015, pinch: 1.01 };
/** Pixels in a line, for wheels that count in lines. */
const LINE = 30;

/** Size and view of the board: fitted at first and on demand, zoomed about the pointer by the wheel. */
export function useView(frame: RefObject<HTMLDivElement | null>, scene: Scene) {
  const [size, setSize] = useState<Size>({ width: 0, height: 0 });
  const [view, setOwnView] = useState<View>({ scale: 40, originX: 0, originY: 0 });
  const latest = useRef(scene);
  /** Until someone takes hold of the board, it is fitted anew whenever its size changes. */
  const untouched = useRef(true);
  useEffect(() => {
    latest.current = scene;
  }, [scene]);

  const touch = useCallback((): void => {
    untouched.current = false;
  }, []);
  const setView = useCallback((change: (view: View) => View): void => {
    untouched.current = false;
    setOwnView(change);
  }, []);
  const fitInto = useCallback((into: Size): void => {
    if (into.width > 0 && into.height > 0) setOwnView(fit(sceneBounds(latest.current), into, MARGIN));
  }, []);
  const fitAll = useCallback((): void => {
    const element = frame.current;
    if (element) fitInto({ width: element.clientWidth, height: element.clientHeight });
  }, [frame, fitInto]);

  useLayoutEffect(() => {
    const element = frame.current;
    if (!element) return;
    const observer = new ResizeObserver(([entry]) => {
      const next = { width: Math.floor(entry.contentRect.width), height: Math.floor(entry.contentRect.height) };
      setSize(next);
      if (untouched.current) fitInto(next);
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, [frame, fitInto]);

  useWheel(frame, setView);

  const zoom = useCallback(
    (factor: number) => setView((v) => zoomAbout(v, [size.width / 2, size.height / 2], factor)),
    [size, setView],
  );
  return { size, view, setView, touch, fitAll, zoom };
}

function useWheel(frame: RefObject<HTMLDivElement | null>, setView: (change: (view: View) => View) => void): void {
  useEffect(() => {
    const element = frame.current;
    if (!element) return;
    const onWheel = (event: WheelEvent): void => {
      event.preventDefault();
      const box = element.getBoundingClientRect();
      const turn = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? event.deltaY * LINE : event.deltaY;
      const factor = (event.ctrlKey ? NOTCH.pinch : NOTCH.wheel) ** -turn;
      setView((v) => zoomAbout(v, [event.clientX - box.left, event.clientY - box.top], factor));
    };
    element.addEventListener('wheel', onWheel, { passive: false });
    return () => element.removeEventListener('wheel', onWheel);
  }, [frame, setView]);
}
