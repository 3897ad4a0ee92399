import { useEffect, useState } from 'react';

/** The colours of the board, read from the one table of tokens, since a canvas cannot use CSS. */
export interface Theme {
  paper: string;
  line: string;
  lineStrong: string;
  ink: string;
  inkSoft: string;
  accent: string;
  caution: string;
  A: string;
  ASoft: string;
  B: string;
  BSoft: string;
  font: string;
}

function readTheme(): Theme {
  const style = getComputedStyle(document.documentElement);
  const token = (name: string): string => style.getPropertyValue(name).trim();
  return {
    paper: token('--paper'),
    line: token('--line'),
    lineStrong: token('--line-strong'),
    ink: token('--ink'),
    inkSoft: token('--ink-soft'),
    accent: token('--accent'),
    caution: token('--caution'),
    A: token('--vehicle-a'),
    ASoft: token('--vehicle-a-soft'),
    B: token('--vehicle-b'),
    BSoft: token('--vehicle-b-soft'),
    font: getComputedStyle(document.body).fontFamily,
  };
}

/** Follows the light or dark preference. */
export function useTheme(): Theme {
  const [theme, setTheme] = useState(readTheme);
  useEffect(() => {
    const dark = matchMedia('(prefers-color-scheme: dark)');
    const update = (): void => setTheme(readTheme());
    dark.addEventListener('change', update);
    return () => dark.removeEventListener('change', update);
  }, []);
  return theme;
}
