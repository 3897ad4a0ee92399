import { distanceToSegment } from './segment';

export type Point = readonly [number, number];

/**
 * Corners of a vehicle's outline in the world, m, counter-clockwise from the rear right. `forward` is the unit vector of its
 * heading: whoever asks makes it, the engine from functions that give the same bits everywhere.
 */
export function outlineOf(
  vehicle: { length: number; width: number; frontOverhang: number; frontAxleToMassCentre: number },
  centre: Point,
  forward: Point,
): Point[] {
  const front = vehicle.frontAxleToMassCentre + vehicle.frontOverhang;
  const rear = front - vehicle.length;
  const half = vehicle.width / 2;
  const [c, s] = forward;
  const corners: Point[] = [
    [rear, -half],
    [front, -half],
    [front, half],
    [rear, half],
  ];
  return corners.map(([x, y]) => [centre[0] + c * x - s * y, centre[1] + s * x + c * y]);
}

/** Outward unit normals of the edges of a convex counter-clockwise polygon. */
const edges = (polygon: readonly Point[]) =>
  polygon.map((from, i) => {
    const to = polygon[(i + 1) % polygon.length];
    const [dx, dy] = [to[0] - from[0], to[1] - from[1]];
    const length = Math.sqrt(dx * dx + dy * dy);
    return { from, to, normal: [dy / length, -dx / length] as const };
  });

const along = ([nx, ny]: Point, p: Point, from: Point): number => nx * (p[0] - from[0]) + ny * (p[1] - from[1]);

/** Distance of a point outside a convex polygon, m; inside, minus the distance to the nearest edge. */
export function distanceOutside(point: Point, polygon: readonly Point[]): number {
  const sides = edges(polygon);
  const inside = Math.max(...sides.map(({ normal, from }) => along(normal, point, from)));
  if (inside <= 0) return inside;
  return Math.min(...sides.map(({ from, to }) => distanceToSegment(point, from, to)));
}

/**
 * How deep two convex polygons overlap, m: the least shift that parts them (separating axes). Negative where they are
 * apart: minus the distance between them.
 */
export function overlapDepth(a: readonly Point[], b: readonly Point[]): number {
  const gaps = [...gapsBeyond(a, b), ...gapsBeyond(b, a)];
  const gap = Math.max(...gaps);
  return gap <= 0 ? -gap : -Math.min(...a.map((p) => distanceOutside(p, b)), ...b.map((p) => distanceOutside(p, a)));
}

/** For each edge of `a`, how far all of `b` lies beyond it. */
const gapsBeyond = (a: readonly Point[], b: readonly Point[]): number[] =>
  edges(a).map(({ normal, from }) => Math.min(...b.map((p) => along(normal, p, from))));

/** Whether a polygon of any shape holds a point: an odd number of its edges lie to the right of it. */
export function holds(polygon: readonly Point[], [x, y]: Point): boolean {
  let inside = false;
  for (let i = 0, j = polygon.length - 1; i < polygon.length; j = i++) {
    const [[xi, yi], [xj, yj]] = [polygon[i], polygon[j]];
    if (yi > y !== yj > y && x < ((xj - xi) * (y - yi)) / (yj - yi) + xi) inside = !inside;
  }
  return inside;
}
