import type { Solution } from '@/lib/solve/solution';
import type { FitResult } from './result';

/** What the method fit says of itself, with the chi-square of its residuals; null for another method. */
export function fitResult({ fit }: Solution): FitResult | null {
  if (!fit) return null;
  const residuals = Object.values(fit.residuals);
  return {
    ...fit,
    chiSquare: residuals.reduce((sum, r) => sum + r * r, 0),
    degreesOfFreedom: residuals.length,
  };
}
