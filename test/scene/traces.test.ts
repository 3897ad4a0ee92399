import { expect, test } from 'vitest';
import type { Vec } from '@/lib/geometry/vector';
import { midway, tracesOf } from '@/lib/scene/traces';

const points: Vec[] = [
  [0, 0],
  [1, 0],
  [2, 1],
  [3, 1],
];

test('a trace parts where its tyre begins or ceases to slide, and stays whole between', () => {
  expect(tracesOf({ points, sliding: [false, true, true] })).toEqual([
    { points: points.slice(0, 2), slides: false },
    { points: points.slice(1), slides: true },
  ]);
  expect(tracesOf({ points, sliding: [true, false, true] })).toHaveLength(3);
  expect(tracesOf({ points: [[0, 0]], sliding: [] })).toEqual([]);
});

test('midway lies as far from the one as from the other', () => {
  expect(midway({ x: 1, y: 2 }, { x: 4, y: -2 })).toEqual([2.5, 0]);
});
