import { Polygon, point } from '@flatten-js/core';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Point, distanceOutside, outlineOf, overlapDepth } from '@/lib/geometry/polygon';

const seeded = { seed: 20261201, numRuns: 300 };
const coordinate = fc.double({ min: -6, max: 6, noNaN: true });
const poses = fc.record({ x: coordinate, y: coordinate, heading: fc.double({ min: -4, max: 4, noNaN: true }) });
const at = ({ x, y, heading }: { x: number; y: number; heading: number }): Point[] =>
  outlineOf(car, [x, y], [Math.cos(heading), Math.sin(heading)]);
const car = { length: 4.4, width: 1.8, frontOverhang: 0.9, frontAxleToMassCentre: 1.15 };

test('the outline has the length and the width, and the mass centre where it belongs', () => {
  expect(at({ x: 0, y: 0, heading: 0 })).toEqual([
    [2.05 - 4.4, -0.9],
    [2.05, -0.9],
    [2.05, 0.9],
    [2.05 - 4.4, 0.9],
  ]);
});

describe('against a general geometry library (@flatten-js/core)', () => {
  const polygon = (points: readonly Point[]): Polygon => new Polygon(points.map(([x, y]) => point(x, y)));

  test('distance of a point outside an outline', () => {
    fc.assert(
      fc.property(poses, coordinate, coordinate, (pose, x, y) => {
        const outline = at(pose);
        const ours = distanceOutside([x, y], outline);
        const theirs = polygon(outline);
        const inside = theirs.contains(point(x, y));
        const [distance] = theirs.distanceTo(point(x, y));
        return inside ? ours <= 1e-9 : Math.abs(ours - distance) < 1e-9;
      }),
      seeded,
    );
  });

  test('apart or overlapping, and how far apart', () => {
    fc.assert(
      fc.property(poses, poses, (p, q) => {
        const [a, b] = [at(p), at(q)];
        const depth = overlapDepth(a, b);
        const [distance] = polygon(a).distanceTo(polygon(b));
        const apart = distance > 1e-9;
        return apart ? Math.abs(-depth - distance) < 1e-6 : depth >= -1e-9;
      }),
      seeded,
    );
  });
});

test('the depth is the shift that parts two outlines', () => {
  const a = at({ x: 0, y: 0, heading: 0 });
  const b = at({ x: 4.2, y: 0.3, heading: 0 });
  expect(overlapDepth(a, b)).toBeCloseTo(0.2, 12);
  const moved = at({ x: 4.2 + 0.2000001, y: 0.3, heading: 0 });
  expect(overlapDepth(a, moved)).toBeLessThanOrEqual(0);
});
