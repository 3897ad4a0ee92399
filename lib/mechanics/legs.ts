/** Standard gravity, m/s^2 (exact by definition: NIST SP 811, appendix B.8). */
export const G = 9.80665;

/**
 * Square of the speed at the start of a leg of travel, m^2/s^2, from that at its end. `distance` m along the slope,
 * `friction` of the surface, `share` of it that slows (1: all wheels locked or sliding sideways), `grade` rise over run,
 * positive uphill. Below zero where the vehicle cannot have come to that end: it would have sped up on the way.
 * v^2 = vEnd^2 + 2 g d (f q cos th + sin th) with tan th = grade (work and energy).
 */
export const legStartSpeedSquared = (
  endSpeedSquared: number,
  distance: number,
  friction: number,
  share: number,
  grade: number,
): number => endSpeedSquared + (2 * G * distance * (friction * share + grade)) / Math.sqrt(1 + grade * grade);
