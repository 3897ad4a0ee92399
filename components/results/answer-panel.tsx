'use client';
import { useState } from 'react';
import { useTakeOn } from '@/components/hooks/use-commands';
import { useAnswer } from '@/components/hooks/use-answer';
import type { Answer } from '@/components/hooks/answer';
import { failuresOf } from '@/lib/report/failures';
import { AGAINST, Against } from './against';
import { AnswerHead } from './answer-head';
import styles from './answer-panel.module.css';
import { NoAnswer } from './no-answer';
import { FitPanel, Rivals } from './fit-panel';
import { PairFigures } from './pair-figures';
import { ResultsTable } from './results-table';
import { SpeedRows } from './speed-rows';
import { Spoken } from './spoken';
import { useStrip } from './use-strip';
import { StripEdge } from './strip-edge';

/** The answer to the case as it stands, always in view: speeds, the contact, and what speaks against them. */
export function AnswerPanel() {
  const answer = useAnswer();
  const strip = useStrip();
  const [isTable, setTable] = useState(false);
  const unfolded = (then: () => void) => (): void => {
    strip.setCollapsed(false);
    then();
  };
  useTakeOn({
    'view.table': unfolded(() => setTable(strip.collapsed || !isTable)),
    'view.against': unfolded(() => requestAnimationFrame(() => document.getElementById(AGAINST)?.focus())),
    'view.fold': () => strip.setCollapsed(!strip.collapsed),
  });
  return (
    <div
      className={styles.panel}
      data-status={answer.status}
      data-stale={answer.stale}
      data-collapsed={strip.collapsed}
      style={strip.height === null ? undefined : { ['--strip' as string]: `${strip.height}px` }}
    >
      {!strip.collapsed && <StripEdge strip={strip} />}
      <AnswerHead answer={answer} strip={strip} isTable={isTable} onTable={setTable} />
      {!strip.collapsed && (
        <div className={styles.body} data-stale={answer.stale && answer.result !== null}>
          <Body answer={answer} isTable={isTable} />
        </div>
      )}
      <p className={styles.foot}>
        Decision aid for a qualified person; it does not replace a licensed engineer or qualified reconstructionist. No
        conclusion about injury may be drawn.
      </p>
      <Spoken answer={answer} />
    </div>
  );
}

function Body({ answer, isTable }: { answer: Answer; isTable: boolean }) {
  const { result, of, shapes, status } = answer;
  if (!result || !of) return status === 'working' ? <Skeleton /> : <NoAnswer answer={answer} />;
  const reasons = failuresOf(result);
  const isWithheld = reasons.length > 0;
  return (
    <>
      {(status === 'failed' || status === 'cancelled') && (
        <div className={styles.across}>
          <NoAnswer answer={answer} />
        </div>
      )}
      <div className={styles.blocks} data-table={isTable && !isWithheld}>
        {isWithheld && <Withheld reasons={reasons} />}
        {!isWithheld && isTable && (
          <div>
            <ResultsTable result={result} of={of} />
            <FitPanel result={result} of={of} />
          </div>
        )}
        {!isWithheld && !isTable && (
          <>
            <SpeedRows result={result} shapes={shapes} of={of} />
            <div className={styles.contact}>
              <Rivals result={result} />
              <PairFigures result={result} of={of} />
            </div>
          </>
        )}
        <Against result={result} of={of} />
      </div>
    </>
  );
}

/** In the place of the figures when a check failed. */
function Withheld({ reasons }: { reasons: readonly string[] }) {
  return (
    <div className={styles.withheld}>
      <h3>Withheld</h3>
      <p>The figures are not shown, because the answer cannot be right as it stands:</p>
      <ul>
        {reasons.map((reason) => (
          <li key={reason}>{reason}</li>
        ))}
      </ul>
    </div>
  );
}

/** As large as the answer will be. */
function Skeleton() {
  return (
    <div className={styles.skeleton} aria-hidden>
      {Array.from({ length: 5 }, (_, k) => (
        <span key={k} />
      ))}
    </div>
  );
}
