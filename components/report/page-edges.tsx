'use client';
import { useEffect } from 'react';
import type { Header } from '@/lib/report/report';

const NAMES = { case: '--report-case', hash: '--report-hash', engine: '--report-engine' } as const;

/**
 * Hands the words at the edges of every printed page to the page margins, which can read the custom properties of the
 * document only.
 */
export function PageEdges({ edges }: { edges: Header['edges'] }) {
  useEffect(() => {
    const { style, dataset } = document.documentElement;
    for (const key of Object.keys(NAMES) as (keyof typeof NAMES)[])
      style.setProperty(NAMES[key], JSON.stringify(edges[key]));
    dataset.reportReady = 'true';
    return () => {
      for (const name of Object.values(NAMES)) style.removeProperty(name);
      delete dataset.reportReady;
    };
  }, [edges]);
  return null;
}
