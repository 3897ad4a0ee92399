import { describe, expect, test } from 'vitest';
import { defaultDeparture, emptyCase } from '@/lib/casefile/defaults';
import { sceneOf } from '@/lib/casefile/scene-of';
import { distanceOutside } from '@/lib/geometry/polygon';
import type { Vec } from '@/lib/geometry/vector';
import { inkOf, placeBeside } from '@/lib/scene/beside';
import { legLabelAt, letterAt, restLabelAt, wheelLabelAt } from '@/lib/scene/labels';
import { outlineAt, restPose } from '@/lib/scene/scene';

const base = emptyCase();
const travelled = (direction: number, distance: number) =>
  sceneOf({ ...base, departure: { A: defaultDeparture(direction, distance), B: null } });

describe('words on the drawing', () => {
  test('the letter stands on its vehicle', () => {
    const scene = sceneOf(base);
    for (const which of ['A', 'B'] as const)
      expect(distanceOutside(letterAt(scene, which), outlineAt(scene.vehicles[which]))).toBeLessThan(-0.3);
  });
  test.each([0, 45, 90, 135, 180, 225, 270, 315])(
    'the length of a leg keeps off both vehicles, at %d degrees',
    (direction) => {
      const scene = travelled(direction, 8);
      const at = legLabelAt(scene, 'A', 0, 0.5);
      for (const which of ['A', 'B'] as const)
        expect(distanceOutside(at, outlineAt(scene.vehicles[which]))).toBeGreaterThan(0.3);
    },
  );
  test('the words at rest keep off the vehicles and off the outline at rest', () => {
    const scene = travelled(30, 4);
    const at = restLabelAt(scene, 'A', [0.9, 0.3]) as Vec;
    for (const which of ['A', 'B'] as const)
      expect(distanceOutside(at, outlineAt(scene.vehicles[which]))).toBeGreaterThan(0);
    const rest = outlineAt(scene.vehicles.A, restPose(scene, 'A') ?? undefined);
    expect(distanceOutside(at, rest)).toBeGreaterThan(0.25);
    expect(restLabelAt(scene, 'B', [0.9, 0.3])).toBeNull();
  });
});

describe('the card of numbers', () => {
  const [card, board] = [
    { width: 190, height: 105 },
    { width: 1000, height: 600 },
  ];
  const clear = { left: 64, top: 48, right: 8, bottom: 52 };
  const covers = ([left, top]: Vec, [x, y]: Vec): boolean =>
    x > left && x < left + card.width && y > top && y < top + card.height;

  test('stays inside the board wherever the thing is', () => {
    for (const at of [
      [0, 0],
      [1000, 600],
      [-500, 300],
      [500, 5000],
    ] as Vec[]) {
      const [left, top] = placeBeside(at, card, board, clear, []);
      expect(left >= 64 && top >= 48 && left + 190 <= 992 && top + 105 <= 548).toBe(true);
    }
  });
  test('covers neither the thing nor what lies to its right', () => {
    const ink: Vec[] = [
      [500, 300],
      [560, 330],
      [620, 360],
      [560, 270],
      [620, 240],
    ];
    const put = placeBeside([500, 300], card, board, clear, ink);
    expect(ink.filter((point) => covers(put, point))).toEqual([]);
  });
  test('knows the path, the outlines and the handles as what is to be seen', () => {
    const view = { scale: 40, originX: 500, originY: 300 };
    const ink = inkOf(travelled(90, 6), {}, view);
    const has = ([x, y]: Vec): boolean => ink.some((p) => Math.hypot(p[0] - x, p[1] - y) < 1e-6);
    expect(has([500 - 2.2 * 40, 300 - 6 * 40])).toBe(true);
    expect(has([500, 300])).toBe(true);
  });
});

test('the words about a wheel stand outside its vehicle, each on its own side', () => {
  const scene = sceneOf(base);
  const places = [0, 1, 2, 3].map((wheel) => wheelLabelAt(scene, 'A', wheel, [1, 0.4]));
  // A looks along +x from (-2.2, 0), 1.8 m wide, axles 1.15 m ahead and 1.45 m behind.
  const expected = [
    [-1.05, 1.3],
    [-1.05, -1.3],
    [-3.65, 1.3],
    [-3.65, -1.3],
  ];
  places.forEach(([x, y], k) => {
    expect(x).toBeCloseTo(expected[k][0], 12);
    expect(y).toBeCloseTo(expected[k][1], 12);
  });
});
