import { expect, test } from 'vitest';
import { markLabelAt } from '@/lib/report/mark-label';

const room = { width: 100, height: 50 };

test('the label stands on the middle of the longest stretch inside the frame', () => {
  expect(
    markLabelAt(
      [
        [-40, 20],
        [60, 20],
        [60, 40],
      ],
      room,
    ),
  ).toEqual([30, expect.closeTo(18.8, 9)]);
});

test('a line wholly outside has no label', () => {
  expect(
    markLabelAt(
      [
        [-40, -20],
        [-10, 80],
      ],
      room,
    ),
  ).toBeNull();
  expect(
    markLabelAt(
      [
        [-40, 60],
        [140, 60],
      ],
      room,
    ),
  ).toBeNull();
});
