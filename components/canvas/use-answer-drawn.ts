import { useMemo } from 'react';
import { useAnswer } from '@/components/hooks/use-answer';
import { said } from '@/components/results/result-words';
import type { Travels } from '@/lib/geometry/timed-path';
import { toRadians } from '@/lib/geometry/vector';
import { failuresOf } from '@/lib/report/failures';
import type { Result } from '@/lib/results/result';
import type { RestMiss } from '@/lib/solve-case';
import type { SceneDirection, Speeds, Which } from '@/lib/scene/scene';
import type { UnitSystem } from '@/lib/units/dimension';

/** What the board draws of the newest answer; nothing while the answer is withheld. */
export interface AnswerDrawn {
  /** The medians, m/s: how long the arrows are and where the ghosts stand. */
  speeds: Speeds;
  /** As the answer words them: «26.6 km/h», «at most 4.4 km/h». */
  words: Partial<Record<Which, string>>;
  /** Directions of approach as computed, where they are known well enough to be drawn. */
  directions: Partial<Record<Which, SceneDirection>>;
  /** The simulated travel of the central values. */
  travels: Travels;
  /** Rest poses that no simulated travel met. */
  misses: readonly RestMiss[];
}

/** A fan that opens wider than this to either side points nowhere, deg. */
const WIDEST = 60;

export function useAnswerDrawn(units: UnitSystem): AnswerDrawn {
  const { result, travels, misses } = useAnswer();
  return useMemo(() => {
    const shown: AnswerDrawn = { speeds: {}, words: {}, directions: {}, travels: {}, misses };
    if (!result || failuresOf(result).length > 0) return shown;
    shown.travels = travels;
    for (const which of ['A', 'B'] as const) take(shown, which, result, units);
    return shown;
  }, [result, travels, misses, units]);
}

function take(shown: AnswerDrawn, which: Which, result: Result, units: UnitSystem): void {
  const name = `${which}.approachSpeed` as const;
  const median = result.bands[name]?.median;
  const found = said(result, name, units);
  if (median === undefined || !found) return;
  shown.speeds[which] = median;
  shown.words[which] = `${found.bound ?? ''} ${found.figure}\u00a0${found.unit}`.trim();
  const direction = result.bands[`${which}.approachDirection`];
  if (direction && 2 * direction.sd <= WIDEST)
    shown.directions[which] = { angle: toRadians(direction.median), fan: toRadians(2 * direction.sd) };
}
