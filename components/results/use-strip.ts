'use client';
import { useEffect, useState } from 'react';

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

const kept = (height: number): number => Math.round(Math.min(HIGHEST, Math.max(LOWEST, height)));

export function useStrip(): Strip {
  const [strip, setStrip] = useState<Remembered>({ height: null, collapsed: false });
  // Not at the first rendering: the server does not know what the browser remembers.
  useEffect(() => {
    const remembered = recalled();
    if (remembered) setStrip(remembered);
  }, []);
  const change = (to: Partial<Remembered>): void => {
    const next = { ...strip, ...to };
    setStrip(next);
    remember(next);
  };
  return {
    ...strip,
    setHeight: (height) => change({ height: kept(height) }),
    setCollapsed: (collapsed) => change({ collapsed }),
  };
}

function recalled(): Remembered | null {
  try {
    const found = JSON.parse(localStorage.getItem(KEY) ?? 'null') as Partial<Remembered> | null;
    if (!found) return null;
    const height = typeof found.height === 'number' && Number.isFinite(found.height) ? kept(found.height) : null;
    return { height, collapsed: found.collapsed === true };
  } catch {
    return null;
  }
}

/** A browser that keeps nothing only forgets a height. */
function remember(strip: Remembered): void {
  try {
    localStorage.setItem(KEY, JSON.stringify(strip));
  } catch {
    return;
  }
}
