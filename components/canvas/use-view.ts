import { type RefObject, useCallback, useEffect, useLayoutEffect, useRef, useState } from 'react';
import { type Scene, sceneBounds } from '@/lib/scene/scene';
import { type Size, type View, fit, zoomAbout } from '@/lib/scene/view';

/** Free pixels around what the board must show. */
const MARGIN = 64;
/** One notch of a wheel. */
const NOTCH = 1.0015;

/** Anyone may ask the board to show all. */
export const FIT_EVENT = 'retrodict:fit';

/** Size and view of the board: fitted at first and on demand, zoomed about the pointer by the wheel. */
export function useView(frame: RefObject<HTMLDivElement | null>, scene: Scene) {
  const [size, setSize] = useState<Size>({ width: 0, height: 0 });
  const [view, setView] = useState<View>({ scale: 40, originX: 0, originY: 0 });
  const latest = useRef(scene);
  const fitted = useRef(false);
  useEffect(() => {
    latest.current = scene;
  }, [scene]);

  useLayoutEffect(() => {
    const element = frame.current;
    if (!element) return;
    const observer = new ResizeObserver(([entry]) => {
      const next = { width: Math.floor(entry.contentRect.width), height: Math.floor(entry.contentRect.height) };
      setSize(next);
      if (!fitted.current && next.width > 0 && next.height > 0) {
        fitted.current = true;
        setView(fit(sceneBounds(latest.current), next, MARGIN));
      }
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, [frame]);

  const fitAll = useCallback(() => {
    const element = frame.current;
    if (element)
      setView(fit(sceneBounds(latest.current), { width: element.clientWidth, height: element.clientHeight }, MARGIN));
  }, [frame]);

  useEffect(() => {
    window.addEventListener(FIT_EVENT, fitAll);
    return () => window.removeEventListener(FIT_EVENT, fitAll);
  }, [fitAll]);

  useEffect(() => {
    const element = frame.current;
    if (!element) return;
    const onWheel = (event: WheelEvent): void => {
      event.preventDefault();
      const box = element.getBoundingClientRect();
      const notches = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? event.deltaY * 30 : event.deltaY;
      setView((v) => zoomAbout(v, [event.clientX - box.left, event.clientY - box.top], NOTCH ** -notches));
    };
    element.addEventListener('wheel', onWheel, { passive: false });
    return () => element.removeEventListener('wheel', onWheel);
  }, [frame]);

  const zoom = useCallback(
    (factor: number) => setView((v) => zoomAbout(v, [size.width / 2, size.height / 2], factor)),
    [size],
  );
  return { size, view, setView, fitAll, zoom };
}
