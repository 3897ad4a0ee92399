import type { Level } from '../result';

/** Combined standard uncertainties beyond which two values disagree, and disagree badly. */
const CAUTION = 2;
const STRONG = 3;

/** A stated value against the answer. */
export interface Compared {
  path: string;
  /** «the recorded forward delta-V of A». */
  name: string;
  stated: number;
  /** Standard uncertainties. */
  u: number;
  answer: number;
  sd: number;
}

/** Difference in combined standard uncertainties (JCGM 100:2008, 5.1.2); NaN or infinite without any. */
export const zetaOf = ({ stated, u, answer, sd }: Compared): number => (stated - answer) / Math.sqrt(u * u + sd * sd);

/** The pair that agrees least, or null where none can be weighed. */
export function leastAgreeing(all: readonly Compared[]): { worst: Compared; zeta: number } | null {
  const weighed = all.map((worst) => ({ worst, zeta: zetaOf(worst) })).filter(({ zeta }) => Number.isFinite(zeta));
  return weighed.sort((p, q) => Math.abs(q.zeta) - Math.abs(p.zeta))[0] ?? null;
}

/** Level, limit and advice for a difference of so many combined standard uncertainties. */
export function verdictOn(zeta: number): { level: Level; value: number; limit: number; advice?: string } {
  const value = Math.abs(zeta);
  if (value > STRONG)
    return {
      level: 'caution',
      value,
      limit: STRONG,
      advice:
        'The two contradict each other: one of them is wrong or belongs to something else. Do not report the answer without settling which.',
    };
  if (value > CAUTION)
    return {
      level: 'caution',
      value,
      limit: CAUTION,
      advice: 'Find out which of the two is off, or whose spread is too narrow.',
    };
  return { level: 'pass', value, limit: CAUTION };
}
