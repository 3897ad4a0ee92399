import { expect, test } from 'vitest';
import { pushWords } from '@/lib/results/direction-words';

test.each([
  [180, 'from the front, straight ahead'],
  [-180, 'from the front, straight ahead'],
  [0, 'from the rear, straight behind'],
  [-90, 'from the left side, 90° left of straight ahead'],
  [90, 'from the right side, 90° right of straight ahead'],
  [148.5, 'from the right front, 32° right of straight ahead'],
  [-148.5, 'from the left front, 32° left of straight ahead'],
  [-40, 'from the left rear, 40° left of straight behind'],
  [40, 'from the right rear, 40° right of straight behind'],
  [0.3, 'from the rear, straight behind'],
])('a delta-V at %d° means a push %s', (direction, words) => {
  expect(pushWords(direction)).toBe(words);
});

test('directions a whole turn apart read the same', () => {
  for (const d of [-170, -90, 12, 89, 91, 179]) expect(pushWords(d + 360)).toBe(pushWords(d));
});
