import { ChevronDown, ChevronUp } from 'lucide-react';
import { Fragment } from 'react';
import type { Answer } from '@/components/hooks/answer';
import { CommandPalette } from '@/components/panels/command-palette';
import buttons from '@/components/ui/button.module.css';
import { failuresOf } from '@/lib/report/failures';
import { percent, unitText } from '@/lib/report/numbers';
import { METHOD_WORDS } from '@/lib/report/method-section';
import { againstWords } from './against';
import styles from './answer-head.module.css';
import { said, unitsShown } from './result-words';
import type { Strip } from './use-strip';

interface Props {
  answer: Answer;
  strip: Strip;
  isTable: boolean;
  onTable: (isTable: boolean) => void;
}

/** What the answer is and how it stands; folded, the answer itself in one line. */
export function AnswerHead({ answer, strip, isTable, onTable }: Props) {
  return (
    <div className={styles.head}>
      <h2>Answer</h2>
      {strip.collapsed && <OneLine answer={answer} />}
      {!(strip.collapsed && answer.status === 'settled') && (
        <p className={styles.state} data-status={answer.status} data-stale={answer.stale}>
          {stateWords(answer)}
        </p>
      )}
      {answer.progress !== null && (
        <>
          <progress className={styles.progress} value={answer.progress} aria-label="Calculating" />
          <button type="button" className={buttons.quiet} onClick={answer.cancel}>
            Cancel
          </button>
        </>
      )}
      <span className={styles.end}>
        <CommandPalette />
        {!strip.collapsed && (
          <button
            type="button"
            className={buttons.quiet}
            aria-pressed={isTable}
            disabled={!answer.result}
            onClick={() => onTable(!isTable)}
          >
            As table
          </button>
        )}
        <button
          type="button"
          className={buttons.quiet}
          aria-expanded={!strip.collapsed}
          aria-label={strip.collapsed ? 'Unfold the answer' : 'Fold the answer to one line'}
          title={strip.collapsed ? 'Unfold the answer' : 'Fold the answer to one line'}
          onClick={() => strip.setCollapsed(!strip.collapsed)}
        >
          {strip.collapsed ? <ChevronUp size={16} aria-hidden /> : <ChevronDown size={16} aria-hidden />}
        </button>
      </span>
    </div>
  );
}

function stateWords({ status, result, stale }: Answer): string {
  if (status === 'refused') return 'not yet: something is still needed';
  if (status === 'unsolved') return 'none';
  if (status === 'failed') return 'failed';
  if (!result) return status === 'cancelled' ? 'stopped' : 'being worked out…';
  const draws = `${result.draws.toLocaleString('en')} draws`;
  if (status === 'live') return `coarse while you draw: ${draws}`;
  if (status === 'cancelled') return 'stopped: older than the inputs';
  if (stale) return 'being worked out; what is shown is older than the inputs';
  return `${METHOD_WORDS[result.method].toLowerCase()} · ${draws} · ${percent(result.coverage)} intervals`;
}

const SHORT = [
  ['A.approachSpeed', 'approach A'],
  ['B.approachSpeed', 'B'],
  ['A.deltaV', 'delta-V A'],
  ['B.deltaV', 'B'],
] as const;

function OneLine({ answer: { result, of } }: { answer: Answer }) {
  if (!result || !of) return null;
  if (failuresOf(result).length > 0) return <p className={styles.line}>withheld: {againstWords(result)}</p>;
  const units = unitsShown(of);
  const figures = SHORT.flatMap(([name, label]) => {
    const found = said(result, name, units);
    return found ? [{ label, ...found }] : [];
  });
  return (
    <>
      <p className={styles.line}>
        In {unitText('speed', units)}:{' '}
        {figures.map(({ label, bound, figure, interval }, k) => (
          <Fragment key={k}>
            {k > 0 && ' · '}
            <span>
              {label} {bound} <strong>{figure}</strong> ({interval})
            </span>
          </Fragment>
        ))}
      </p>
      <p className={styles.against}>{againstWords(result)}</p>
    </>
  );
}
