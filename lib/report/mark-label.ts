import type { Point } from './plan-sheet';

interface Room {
  width: number;
  height: number;
}

/** Labels stand this far off their line, mm. */
const OFF = 1.2;

/** Where the label of a line stands: on the middle of its longest stretch inside the frame; null if none is inside. */
export function markLabelAt(points: Point[], room: Room): Point | null {
  const stretches = points.slice(1).flatMap((to, k) => clipped(points[k], to, room) ?? []);
  const longest = stretches.sort((a, b) => lengthOf(b) - lengthOf(a))[0];
  if (!longest) return null;
  const [[x0, y0], [x1, y1]] = longest;
  return [(x0 + x1) / 2, (y0 + y1) / 2 - OFF];
}

type Stretch = [Point, Point];

const lengthOf = ([[x0, y0], [x1, y1]]: Stretch): number => Math.hypot(x1 - x0, y1 - y0);

/** The part of a segment inside the frame (Liang & Barsky 1984), as a list of one, or null. */
function clipped([x0, y0]: Point, [x1, y1]: Point, { width, height }: Room): [Stretch] | null {
  const [dx, dy] = [x1 - x0, y1 - y0];
  let [from, to] = [0, 1];
  for (const [p, q] of [
    [-dx, x0],
    [dx, width - x0],
    [-dy, y0],
    [dy, height - y0],
  ]) {
    if (p === 0 && q < 0) return null;
    if (p < 0) from = Math.max(from, q / p);
    if (p > 0) to = Math.min(to, q / p);
  }
  if (from >= to) return null;
  const at = (s: number): Point => [x0 + s * dx, y0 + s * dy];
  return [[at(from), at(to)]];
}
