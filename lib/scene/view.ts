import { type Vec, add, distance, scale } from '@/lib/geometry/vector';

/** How the world is seen: pixels per metre, and the pixel where the world's origin lies. y runs up in the world, down on the screen. */
export interface View {
  scale: number;
  originX: number;
  originY: number;
}

export interface Size {
  width: number;
  height: number;
}

export interface Bounds {
  left: number;
  right: number;
  bottom: number;
  top: number;
}

export const toScreen = (view: View, [x, y]: Vec): Vec => [
  view.originX + x * view.scale,
  view.originY - y * view.scale,
];
export const toWorld = (view: View, [px, py]: Vec): Vec => [
  (px - view.originX) / view.scale,
  (view.originY - py) / view.scale,
];

/** From a whole junction to a bumper, pixels per metre. */
const LEAST = 2;
const MOST = 600;
const clamped = (perMetre: number): number => Math.min(MOST, Math.max(LEAST, perMetre));

/** Zooms by a factor; the world point under the pixel stays there. */
export function zoomAbout(view: View, at: Vec, factor: number): View {
  const to = clamped(view.scale * factor);
  const by = to / view.scale;
  return { scale: to, originX: at[0] + (view.originX - at[0]) * by, originY: at[1] + (view.originY - at[1]) * by };
}

/** Two fingers went from one pair of pixels to another: what lay under their middle lies under it still. */
export function pinch(view: View, from: readonly [Vec, Vec], to: readonly [Vec, Vec]): View {
  const apart = ([p, q]: readonly [Vec, Vec]): number => Math.max(1, distance(p, q));
  const middle = ([p, q]: readonly [Vec, Vec]): Vec => scale(add(p, q), 0.5);
  const [before, after] = [middle(from), middle(to)];
  return panBy(zoomAbout(view, before, apart(to) / apart(from)), after[0] - before[0], after[1] - before[1]);
}

export const panBy = (view: View, dx: number, dy: number): View => ({
  ...view,
  originX: view.originX + dx,
  originY: view.originY + dy,
});

export function boundsOf(points: readonly Vec[]): Bounds {
  const [xs, ys] = [points.map(([x]) => x), points.map(([, y]) => y)];
  return { left: Math.min(...xs), right: Math.max(...xs), bottom: Math.min(...ys), top: Math.max(...ys) };
}

/** The view that shows all of the bounds, with a margin in pixels. */
export function fit(bounds: Bounds, size: Size, margin: number): View {
  const width = Math.max(1, bounds.right - bounds.left);
  const height = Math.max(1, bounds.top - bounds.bottom);
  const widest = clamped(
    Math.min(Math.max(1, size.width - 2 * margin) / width, Math.max(1, size.height - 2 * margin) / height),
  );
  const [x, y] = [(bounds.left + bounds.right) / 2, (bounds.bottom + bounds.top) / 2];
  return { scale: widest, originX: size.width / 2 - x * widest, originY: size.height / 2 + y * widest };
}
