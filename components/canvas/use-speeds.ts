import { useMemo } from 'react';
import { useAnswer } from '@/components/hooks/use-answer';
import { said } from '@/components/results/result-words';
import { failuresOf } from '@/lib/report/failures';
import type { Result } from '@/lib/results/result';
import type { Speeds, Which } from '@/lib/scene/scene';
import type { UnitSystem } from '@/lib/units/dimension';

/** The approach speeds of the newest answer as the board draws them; none while the answer is withheld. */
export interface SpeedsShown {
  /** The medians, m/s: how long the arrows are and where the ghosts stand. */
  speeds: Speeds;
  /** As the answer words them: «26.6 km/h», «at most 4.4 km/h». */
  words: Partial<Record<Which, string>>;
}

export function useSpeeds(units: UnitSystem): SpeedsShown {
  const { result } = useAnswer();
  return useMemo(() => {
    const shown: SpeedsShown = { speeds: {}, words: {} };
    if (!result || failuresOf(result).length > 0) return shown;
    for (const which of ['A', 'B'] as const) take(shown, which, result, units);
    return shown;
  }, [result, units]);
}

function take(shown: SpeedsShown, which: Which, result: Result, units: UnitSystem): void {
  const name = `${which}.approachSpeed` as const;
  const median = result.bands[name]?.median;
  const found = said(result, name, units);
  if (median === undefined || !found) return;
  shown.speeds[which] = median;
  shown.words[which] = `${found.bound ?? ''} ${found.figure}\u00a0${found.unit}`.trim();
}
