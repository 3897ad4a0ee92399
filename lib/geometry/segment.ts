type Point = readonly [number, number];

/** Distance from a point to the segment between two others, m. */
export function distanceToSegment([x, y]: Point, from: Point, to: Point): number {
  const [wx, wy] = [to[0] - from[0], to[1] - from[1]];
  const square = wx * wx + wy * wy;
  const t = square === 0 ? 0 : ((x - from[0]) * wx + (y - from[1]) * wy) / square;
  const along = Math.min(1, Math.max(0, t));
  const [dx, dy] = [from[0] + along * wx - x, from[1] + along * wy - y];
  return Math.sqrt(dx * dx + dy * dy);
}
