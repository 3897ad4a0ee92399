import type { Problem } from '@/lib/evidence/problem';
import type { Central } from './central';
import type { FigureName } from './columns';
import type { SobolIndices } from './sobol';
import type { DrawsDone } from './task';

/** Everything that the draws and the central values of a problem give, before it is put into words. */
export interface Solution {
  problem: Problem;
  central: Central;
  draws: number;
  /** Per figure, the values of the possible draws in order; NaN where the value does not exist. */
  values: Record<FigureName, Float64Array>;
  impossible: Record<string, number>;
  traced: FigureName[];
  sobol: SobolIndices[];
  /** Of the method fit. */
  fit: FitFound | null;
}

/** What the weighing of the evidence came to. */
export interface FitFound {
  logEvidence: number;
  effectiveSize: number;
  acceptance: number;
  temperatures: number;
  /** Observed less predicted at the central state, in standard uncertainties, by path. */
  residuals: Record<string, number>;
  /** 1 less the share of its prior variance that is left of each unknown, by path. */
  contraction: Record<string, number>;
  secondRun: {
    logEvidence: number;
    /** Largest difference of a mean between both runs, over the standard uncertainty. */
    disagreement: number;
  };
}

/** The values of all parts, one after another. */
export function joined(parts: DrawsDone[]): Solution['values'] {
  const names = Object.keys(parts[0].values) as FigureName[];
  return Object.fromEntries(
    names.map((name) => {
      const whole = new Float64Array(parts.reduce((n, part) => n + part.values[name].length, 0));
      let at = 0;
      for (const part of parts) {
        whole.set(part.values[name], at);
        at += part.values[name].length;
      }
      return [name, whole];
    }),
  ) as Solution['values'];
}

/** The counts of all parts together. */
export function counted(parts: DrawsDone[]): Solution['impossible'] {
  const counts: Record<string, number> = {};
  for (const part of parts)
    for (const [reason, count] of Object.entries(part.impossible)) counts[reason] = (counts[reason] ?? 0) + count;
  return counts;
}
