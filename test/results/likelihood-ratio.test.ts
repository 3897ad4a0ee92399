import { expect, test } from 'vitest';
import { ratioOf } from '@/lib/results/likelihood-ratio';

test('a ratio is said in one digit, with its error, on the verbal scale', () => {
  expect(ratioOf(Math.log(30))).toMatchObject({ ratio: '30', words: 'moderate support' });
  expect(ratioOf(-Math.log(30)).log10).toBeCloseTo(-1.4771, 4);
  expect(ratioOf(Math.log(1.4)).words).toContain('hardly tells them apart');
  expect(ratioOf(Math.log(346)).ratio).toBe('300');
  expect(ratioOf(40).ratio).toBe('more than a million');
  // 0.5 in the natural log.
  expect(ratioOf(1).error).toBeCloseTo(0.217, 3);
});
