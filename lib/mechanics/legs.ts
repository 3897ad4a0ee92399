/** Standard gravity, m/s^2 (exact, NIST SP 811). */
export const G = 9.80665;

/**
 * Square of the speed (m^2/s^2) at the start of one leg of travel, from that at its end: distance d (m, along the
 * slope), friction f, retardation share q, grade (rise over run along the travel, uphill positive). Work and energy:
 * v^2 = vEnd^2 + 2 g d (f q cos th + sin th), th = atan(grade). Negative where the leg cannot end as stated.
 */
export function legStartSpeedSquared(vEndSquared: number, d: number, f: number, q: number, grade: number): number {
  const slope = Math.sqrt(1 + grade * grade);
  return vEndSquared + (2 * G * d * (f * q + grade)) / slope;
}
