'use client';
import { type RefObject, useEffect, useRef, useState } from 'react';

export interface Size {
  width: number;
  height: number;
}

/** The inner size of an element in px, kept up to date; null until it was measured. */
export function useSize<E extends Element>(): [RefObject<E | null>, Size | null] {
  const ref = useRef<E>(null);
  const [size, setSize] = useState<Size | null>(null);
  useEffect(() => {
    if (!ref.current) return;
    const observer = new ResizeObserver(([entry]) => {
      const { width, height } = entry.contentRect;
      setSize({ width, height });
    });
    observer.observe(ref.current);
    return () => observer.disconnect();
  }, []);
  return [ref, size];
}
