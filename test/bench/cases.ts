import { readFileSync } from 'node:fs';
import { parseCase } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Problem } from '@/lib/evidence/problem';
import { readEvidence } from '@/lib/evidence/read-evidence';
import { type DrawOf, plainInputs } from '../support/plain-monte-carlo';

/** The case that is timed: twenty-odd uncertain inputs, 28 results. */
export function benchCase(): CaseFile {
  const parsed = parseCase(readFileSync('test/cases/crossing-90.case.json'));
  if (!parsed.ok) throw new Error('the case of the bench is not valid');
  return parsed.casefile;
}

export const benchProblem = (): Problem => readEvidence(benchCase(), 'directions', 1);

/** Draws as a plain program makes them: a fresh figure at every call, by Box and Muller (1958) and inversion. */
export function plainDraws(casefile: CaseFile): DrawOf {
  const quantities = new Map(plainInputs(casefile).map(({ path, quantity }) => [path, quantity]));
  const normal = (): number => Math.sqrt(-2 * Math.log(1 - Math.random())) * Math.cos(2 * Math.PI * Math.random());
  return (path) => {
    const quantity = quantities.get(path);
    const spread = quantity?.spread;
    const value = quantity?.value ?? NaN;
    if (!spread || spread.shape === 'fixed') return value;
    if (spread.shape === 'normal') return value + spread.sd * normal();
    const { low, high } = spread;
    if (spread.shape === 'rectangular') return low + (high - low) * Math.random();
    const u = Math.random();
    const rising = (value - low) / (high - low);
    return u < rising
      ? low + Math.sqrt(u * (high - low) * (value - low))
      : high - Math.sqrt((1 - u) * (high - low) * (high - value));
  };
}
