/**
 * Crush energy from residual depths (Campbell 1974, SAE 740565): force per width A + B C over the damaged width, with
 * G = A^2 / (2 B) absorbed before any depth remains. A in N/m, B in N/m^2, depths and widths in m.
 */

/** Work done on a strip of width w (m) along the normal, J, where the depth runs straight from c0 to c1 (m): the exact integral of A C + B C^2/2 + G. */
export const stripWork = (w: number, c0: number, c1: number, A: number, B: number): number =>
  w * ((A * (c0 + c1)) / 2 + (B * (c0 * c0 + c0 * c1 + c1 * c1)) / 6 + (A * A) / (2 * B));

/** Factor from the work along the normal to the whole, for a force off the normal by an angle of this cosine: 1 + tan^2. */
export const obliqueFactor = (cosine: number): number => 1 / (cosine * cosine);

/**
 * Closing speed along the normal, m/s, that the normal work En (J) of both vehicles stands for, taken as the net loss:
 * un = sqrt(2 En (Knn + mu Knt) / (1 - e^2)). NaN where there is none (e >= 1, or no resistance along the normal).
 */
export function closingSpeedFromWork(En: number, Knn: number, Knt: number, e: number, mu: number): number {
  const inverseMass = Knn + mu * Knt;
  return e < 1 && inverseMass > 0 ? Math.sqrt((2 * En * inverseMass) / (1 - e * e)) : NaN;
}
