import { sin } from '@/lib/numerics/elementary';

/** Mean acceleration over the contact, m/s^2: speed change (m/s) over the duration of the contact (s). */
export const meanAcceleration = (deltaV: number, duration: number): number => deltaV / duration;

/** Peak of a haversine pulse, a(t) = peak sin^2(pi t / T): twice its mean (closed form). */
export const peakAcceleration = (mean: number): number => 2 * mean;

/** Share of the speed change that a haversine pulse has given after the share x of its duration (closed form). */
export const haversineShare = (x: number): number => {
  const within = Math.min(1, Math.max(0, x));
  return within - sin(2 * Math.PI * within) / (2 * Math.PI);
};
