import { useState } from 'react';
import type { Answer } from '@/components/hooks/answer';
import { useSession } from '@/components/hooks/use-session';
import { labelOf } from '@/lib/casefile/fields';
import type { CaseFile } from '@/lib/casefile/schema';
import { failuresOf } from '@/lib/report/failures';
import { resultLabel } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import type { UnitSystem } from '@/lib/units/dimension';
import { againstWords } from './against';
import { spokenResult, unitsShown } from './result-words';

const READ_OUT = ['A.approachSpeed', 'B.approachSpeed', 'A.deltaV', 'B.deltaV'] as const;

/** Reads the answer out when it comes to rest; says nothing while it is being changed. */
export function Spoken({ answer }: { answer: Answer }) {
  const casefile = useSession((s) => s.casefile);
  const [words, setWords] = useState('');
  const atRest = wordsAtRest(answer, casefile);
  if (atRest !== null && atRest !== words) setWords(atRest);
  return (
    <p className="visually-hidden" role="status">
      {words}
    </p>
  );
}

/** Null while the answer is on its way. */
function wordsAtRest({ status, result, of, stale, issues }: Answer, casefile: CaseFile): string | null {
  if (status === 'settled' && result && of && !stale) return summary(result, unitsShown(of));
  if (status !== 'refused' && status !== 'unsolved' && status !== 'failed') return null;
  return `No answer: ${issues.map(({ path, says }) => `${labelOf(casefile, path)}, ${says}`).join('; ')}.`;
}

function summary(result: Result, units: UnitSystem): string {
  const reasons = failuresOf(result);
  if (reasons.length > 0) return `Answer withheld: ${reasons.join(' ')}`;
  const figures = READ_OUT.map((name) => `${resultLabel(name)} ${spokenResult(result, name, units)}`);
  return `Answer: ${figures.join('; ')}. Checks: ${againstWords(result)}.`;
}
