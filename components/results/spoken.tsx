import { useEffect, useState } from 'react';
import type { Answer } from '@/components/hooks/answer';
import { useSessionStore } from '@/components/hooks/use-session';
import { labelOf } from '@/lib/casefile/fields';
import { failuresOf } from '@/lib/report/failures';
import { resultLabel } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import type { UnitSystem } from '@/lib/units/dimension';
import { againstWords } from './against';
import { spokenResult, unitsShown } from './result-words';

const READ_OUT = ['A.approachSpeed', 'B.approachSpeed', 'A.deltaV', 'B.deltaV'] as const;

/** Reads the answer out when it comes to rest; says nothing while it is being changed. */
export function Spoken({ answer }: { answer: Answer }) {
  const [words, setWords] = useState('');
  const { status, result, of, issues } = answer;
  const session = useSessionStore();
  useEffect(() => {
    if (status === 'settled' && result && of) setWords(summary(result, unitsShown(of)));
    else if (status === 'refused' || status === 'unsolved' || status === 'failed')
      setWords(
        `No answer: ${issues.map(({ path, says }) => `${labelOf(session.getState().casefile, path)}, ${says}`).join('; ')}.`,
      );
  }, [status, result, of, issues, session]);
  return (
    <p className="visually-hidden" role="status">
      {words}
    </p>
  );
}

function summary(result: Result, units: UnitSystem): string {
  const reasons = failuresOf(result);
  if (reasons.length > 0) return `Answer withheld: ${reasons.join(' ')}`;
  const figures = READ_OUT.map((name) => `${resultLabel(name)} ${spokenResult(result, name, units)}`);
  return `Answer: ${figures.join('; ')}. Checks: ${againstWords(result)}.`;
}
