'use client';
import { useMemo, useSyncExternalStore } from 'react';

/** How tall the strip of the answer is, and whether it is folded to one line; remembered by the browser. */
export interface Strip {
  /** px; null until someone has chosen: then it goes by the height of the window. */
  height: number | null;
  collapsed: boolean;
  setHeight: (height: number) => void;
  setCollapsed: (collapsed: boolean) => void;
}

export const LOWEST = 160;
export const HIGHEST = 640;
const KEY = 'retrodict.answer-strip';

interface Remembered {
  height: number | null;
  collapsed: boolean;
}

const listeners = new Set<() => void>();
/** What was chosen in this tab; a browser that keeps nothing only forgets it with the tab. */
let chosen: string | null = null;

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

function recalled(): string | null {
  try {
    return chosen ?? localStorage.getItem(KEY);
  } catch {
    return null;
  }
}

function remember(strip: Remembered): void {
  chosen = JSON.stringify(strip);
  try {
    localStorage.setItem(KEY, chosen);
  } catch {
    // Not allowed to keep anything: `chosen` serves this tab.
  }
  for (const listener of listeners) listener();
}

const kept = (height: number): number => Math.round(Math.min(HIGHEST, Math.max(LOWEST, height)));

/** Whatever stands there may be of another version, or of someone's hand. */
function parsed(text: string | null): Remembered {
  try {
    const found = JSON.parse(text ?? '{}') as Partial<Remembered> | null;
    const height = found?.height;
    return {
      height: typeof height === 'number' && Number.isFinite(height) ? kept(height) : null,
      collapsed: found?.collapsed === true,
    };
  } catch {
    return { height: null, collapsed: false };
  }
}

export function useStrip(): Strip {
  // The server does not know what the browser remembers.
  const text = useSyncExternalStore(subscribe, recalled, () => null);
  return useMemo(() => {
    const strip = parsed(text);
    return {
      ...strip,
      setHeight: (height) => remember({ ...strip, height: kept(height) }),
      setCollapsed: (collapsed) => remember({ ...strip, collapsed }),
    };
  }, [text]);
}
