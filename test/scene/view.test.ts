import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Vec } from '@/lib/geometry/vector';
import { gridOf, roundStep, scaleBar } from '@/lib/scene/grid';
import { type View, fit, panBy, pinch, toScreen, toWorld, zoomAbout } from '@/lib/scene/view';

const pixel = fc.double({ min: -2000, max: 2000, noNaN: true });
const views = fc.record<View>({ scale: fc.double({ min: 2, max: 600, noNaN: true }), originX: pixel, originY: pixel });
const at = fc.tuple(pixel, pixel);
const seeded = { seed: 20261201, numRuns: 300 };

describe('the view', () => {
  test('screen to world and back is where it began', () => {
    fc.assert(
      fc.property(views, at, (view, p) => {
        const [x, y] = toScreen(view, toWorld(view, p));
        return Math.abs(x - p[0]) < 1e-6 && Math.abs(y - p[1]) < 1e-6;
      }),
      seeded,
    );
  });

  test('zooming keeps the world point under the pointer where it is', () => {
    fc.assert(
      fc.property(views, at, fc.double({ min: 0.1, max: 10, noNaN: true }), (view, p, factor) => {
        const before = toWorld(view, p);
        const after = toWorld(zoomAbout(view, p, factor), p);
        return Math.hypot(after[0] - before[0], after[1] - before[1]) < 1e-6 * (1 + Math.hypot(...before));
      }),
      seeded,
    );
  });

  test('fitting shows all of the bounds inside the margin', () => {
    const coordinate = fc.double({ min: -100, max: 100, noNaN: true });
    const extent = fc.double({ min: 0, max: 150, noNaN: true });
    fc.assert(
      fc.property(coordinate, coordinate, extent, extent, (left, bottom, w, h) => {
        const view = fit({ left, bottom, right: left + w, top: bottom + h }, { width: 1000, height: 700 }, 50);
        const [x0, y1] = toScreen(view, [left, bottom]);
        const [x1, y0] = toScreen(view, [left + w, bottom + h]);
        return x0 >= 50 - 1e-6 && y0 >= 50 - 1e-6 && x1 <= 950 + 1e-6 && y1 <= 650 + 1e-6;
      }),
      seeded,
    );
  });

  test('two fingers keep what lies under their middle, and the distance between them', () => {
    const finger = fc.tuple(fc.double({ min: 0, max: 900, noNaN: true }), fc.double({ min: 0, max: 600, noNaN: true }));
    fc.assert(
      fc.property(finger, finger, finger, finger, (a, b, c, d) => {
        const apart = (p: Vec, q: Vec): number => Math.hypot(p[0] - q[0], p[1] - q[1]);
        fc.pre(apart(a, b) > 20 && apart(c, d) > 20);
        const view = { scale: 40, originX: 450, originY: 300 };
        const pinched = pinch(view, [a, b], [c, d]);
        const middle = (p: Vec, q: Vec): Vec => [(p[0] + q[0]) / 2, (p[1] + q[1]) / 2];
        const [before, after] = [toWorld(view, middle(a, b)), toWorld(pinched, middle(c, d))];
        const isLimited = pinched.scale === 2 || pinched.scale === 600;
        return (
          apart(before, after) < 1e-6 &&
          (isLimited || Math.abs(apart(a, b) / view.scale - apart(c, d) / pinched.scale) < 1e-6)
        );
      }),
      seeded,
    );
  });

  test('panning moves every point by as much', () => {
    const view = { scale: 40, originX: 10, originY: 20 };
    expect(toScreen(panBy(view, 7, -3), [1, 1])).toEqual([
      toScreen(view, [1, 1])[0] + 7,
      toScreen(view, [1, 1])[1] - 3,
    ]);
  });
});

describe('the grid', () => {
  test.each([
    [0.9, 1],
    [1, 1],
    [1.1, 2],
    [3, 5],
    [6, 10],
    [0.03, 0.05],
  ])('a step of at least %f is %f', (least, step) => expect(roundStep(least)).toBeCloseTo(step, 12));

  test('lines are far enough apart at any zoom and cover the view', () => {
    fc.assert(
      fc.property(views, (view) => {
        const size = { width: 900, height: 600 };
        const { step, xs } = gridOf(view, size, 1);
        const [left] = toWorld(view, [0, 0]);
        const [right] = toWorld(view, [900, 0]);
        return step * view.scale >= 14 - 1e-6 && xs.length >= Math.floor((right - left) / step) - 1;
      }),
      seeded,
    );
  });

  test('the scale bar is of a round length and no longer than asked', () => {
    fc.assert(
      fc.property(views, fc.constantFrom(1, 0.3048), (view, unit) => {
        const { units, pixels } = scaleBar(view, unit, 160);
        const mantissa = units / 10 ** Math.floor(Math.log10(units * (1 + 1e-9)));
        return pixels <= 160 + 1e-6 && pixels > 30 && [1, 2, 5].some((m) => Math.abs(mantissa - m) < 1e-6);
      }),
      seeded,
    );
  });
});
