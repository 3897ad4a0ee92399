import { expect, test } from 'vitest';
import { haversineShare } from '@/lib/mechanics/pulse';
import { recorderUncertainty, shareBeforeStart } from '@/lib/mechanics/recorder';

const KMH = 1 / 3.6;

test('a haversine pulse gives half of the speed change in half of its time, and its peak is twice the mean', () => {
  expect(haversineShare(0)).toBe(0);
  expect(haversineShare(0.5)).toBeCloseTo(0.5, 12);
  expect(haversineShare(1)).toBeCloseTo(1, 12);
  expect((haversineShare(0.5001) - haversineShare(0.4999)) / 0.0002).toBeCloseTo(2, 6);
});

// Shares lost before time zero at 8 km/h, computed apart from this program: 0.10 s 0.1 %, 0.15 s 1.8 %, 0.25 s 9 %, 0.40 s never starts.
test.each([
  [0.1, 0.001],
  [0.15, 0.018],
  [0.25, 0.09],
])('8 km/h over %f s', (duration, share) => {
  const found = shareBeforeStart(8 * KMH, duration) ?? NaN;
  expect(Math.abs(found - share)).toBeLessThan(share < 0.01 ? 0.0005 : 0.005);
});

test('a soft pulse never starts it, a hard and short one at once', () => {
  expect(shareBeforeStart(8 * KMH, 0.4)).toBeNull();
  expect(shareBeforeStart(0.7 * KMH, 0.01)).toBeNull();
  expect(shareBeforeStart(40 * KMH, 0.03)).toBe(0);
});

test('from time zero on the speed changes by 0.8 km/h within 20 ms', () => {
  const [deltaV, duration] = [10 * KMH, 0.2];
  const lost = shareBeforeStart(deltaV, duration) ?? NaN;
  // Time zero from the lost share, by stepping through the pulse.
  let t = 0;
  while (haversineShare(t / duration) < lost) t += 1e-6;
  const gained = deltaV * (haversineShare((t + 0.02) / duration) - haversineShare(t / duration));
  expect(gained / KMH).toBeCloseTo(0.8, 3);
});

test('standard uncertainty at 6 km/h: limits of 0.6 and 0.5 km/h, about 0.45 km/h (49 CFR 563.8, table III)', () => {
  expect(recorderUncertainty(6 * KMH) / KMH).toBeCloseTo(Math.sqrt((0.6 ** 2 + 0.5 ** 2) / 3), 12);
  expect(recorderUncertainty(-6 * KMH) / KMH).toBeCloseTo(0.45, 2);
});
