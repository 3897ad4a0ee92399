import type { TimedPath, WheelTrace } from '@/lib/geometry/timed-path';
import { type Vec, add, scale } from '@/lib/geometry/vector';

/** A part of a wheel's trace along which its tyre slides, or does not. */
export interface Trace {
  points: Vec[];
  slides: boolean;
}

/** The trace of a wheel in as few parts as can be: neighbours that slide alike are one, and share the point between. */
export function tracesOf({ points, sliding }: WheelTrace): Trace[] {
  const parts: Trace[] = [];
  sliding.forEach((slides, k) => {
    const last = parts[parts.length - 1];
    if (last?.slides === slides) last.points.push(points[k + 1]);
    else parts.push({ points: [points[k], points[k + 1]], slides });
  });
  return parts;
}

export const courseOf = ({ poses }: TimedPath): Vec[] => poses.map(({ x, y }): Vec => [x, y]);

/** Between two poses. */
export const midway = (a: { x: number; y: number }, b: { x: number; y: number }): Vec =>
  scale(add([a.x, a.y], [b.x, b.y]), 0.5);
