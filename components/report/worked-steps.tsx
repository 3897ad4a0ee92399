import type { Chapter, Step } from '@/lib/report/worked/sheet';
import { Maths } from './maths';
import styles from './worked-steps.module.css';

/** The worked calculation: per line what is found, the formula, the numbers put in, the answer. */
export function WorkedSteps({ chapters }: { chapters: Chapter[] }) {
  return chapters.map(({ title, steps }) => (
    <div key={title} className={styles.chapter}>
      <h3>{title}</h3>
      <ol className={styles.steps}>
        {steps.map((step) => (
          <StepLine key={step.number} step={step} />
        ))}
      </ol>
    </div>
  ));
}

function StepLine({ step: { number, what, formula, numbers, answer } }: { step: Step }) {
  return (
    <li className={styles.step} data-step={number}>
      <span className={styles.number}>{number}</span>
      <p className={styles.what}>{what}</p>
      <div className={styles.maths}>
        <p>
          <Maths of={formula} />
        </p>
        {numbers.map((line, k) => (
          <p key={k}>
            <Maths of={k === 0 ? `= ${line}` : `\u2003${line}`} />
          </p>
        ))}
      </div>
      <p className={styles.answer}>
        <Maths of={answer} />
      </p>
    </li>
  );
}
