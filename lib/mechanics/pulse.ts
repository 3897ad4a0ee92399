/** Mean acceleration, m/s^2, of a change of velocity (m/s) over a contact of a duration (s). */
export const meanAcceleration = (deltaV: number, duration: number): number => deltaV / duration;

/** Peak of a haversine pulse with the given mean: twice the mean, in the same unit (closed form). */
export const peakAcceleration = (mean: number): number => 2 * mean;
