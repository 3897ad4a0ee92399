import { type Size, type View, toWorld } from './view';

/** Metres in the unit that the grid counts in. */
export const METRES_PER = { metric: 1, us: 0.3048 } as const;

/** The step of 1, 2 or 5 times a power of ten, at least `least` long. */
export function roundStep(least: number): number {
  const power = 10 ** Math.floor(Math.log10(least));
  return [1, 2, 5, 10].map((m) => m * power).find((step) => step >= least * (1 - 1e-12)) as number;
}

export interface GridLines {
  /** Between two thin lines, m. */
  step: number;
  xs: { at: number; strong: boolean }[];
  ys: { at: number; strong: boolean }[];
}

/** Thin lines stand at least this far apart, pixels. */
const THIN = 14;

/** The grid lines that cross the view, in metres; every fifth one strong. `unit`: metres in one unit of the grid. */
export function gridOf(view: View, size: Size, unit: number): GridLines {
  const step = roundStep(THIN / view.scale / unit) * unit;
  const [left, top] = toWorld(view, [0, 0]);
  const [right, bottom] = toWorld(view, [size.width, size.height]);
  const between = (from: number, to: number) => {
    const lines = [];
    for (let k = Math.ceil(from / step); k * step <= to; k++) lines.push({ at: k * step, strong: k % 5 === 0 });
    return lines;
  };
  return { step, xs: between(left, right), ys: between(bottom, top) };
}

/** A scale bar of a round length at most `most` pixels long. */
export function scaleBar(view: View, unit: number, most: number): { units: number; pixels: number } {
  const longest = most / view.scale / unit;
  const up = roundStep(longest);
  const units =
    up <= longest * (1 + 1e-12)
      ? up
      : ([0.5, 0.4, 0.2, 0.1].map((m) => m * up).find((s) => s <= longest * (1 + 1e-12) && isRound(s)) ?? up / 10);
  return { units, pixels: units * unit * view.scale };
}

const isRound = (x: number): boolean => Math.abs(roundStep(x * (1 - 1e-9)) - x) < 1e-9 * x;
