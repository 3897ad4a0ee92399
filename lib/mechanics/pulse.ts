/** Mean acceleration over the contact, m/s^2: speed change (m/s) over the duration of the contact (s). */
export const meanAcceleration = (deltaV: number, duration: number): number => deltaV / duration;

/** Peak of a haversine pulse, a(t) = peak sin^2(pi t / T): twice its mean (closed form). */
export const peakAcceleration = (mean: number): number => 2 * mean;
