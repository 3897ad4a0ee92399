import { CircleAlert, CircleCheck, Info, type LucideIcon, TriangleAlert } from 'lucide-react';
import { useShow } from '@/components/hooks/use-show';
import { labelOf } from '@/lib/casefile/fields';
import type { CaseFile } from '@/lib/casefile/schema';
import { CHECK_TITLES } from '@/lib/report/checks-section';
import { impossibleText } from '@/lib/report/closing-sections';
import type { Check, Level, Result } from '@/lib/results/result';
import styles from './against.module.css';

const LEVELS: Record<Level, { word: string; Icon: LucideIcon }> = {
  fail: { word: 'Fails', Icon: CircleAlert },
  caution: { word: 'Caution', Icon: TriangleAlert },
  note: { word: 'Note', Icon: Info },
  pass: { word: 'Passes', Icon: CircleCheck },
};
const SPEAKING: readonly Level[] = ['fail', 'caution', 'note'];

/** Where the list stands on the page. */
export const AGAINST = 'against';

/** «2 things speak against it» in the fewest words. */
export function againstWords({ checks }: Result): string {
  const count = (level: Level): number => checks.filter((check) => check.level === level).length;
  const parts = [
    count('fail') > 0 && `${count('fail')} failed`,
    count('caution') > 0 && `${count('caution')} caution${count('caution') === 1 ? '' : 's'}`,
    count('note') > 0 && `${count('note')} note${count('note') === 1 ? '' : 's'}`,
  ].filter((part) => part !== false);
  return parts.length > 0 ? parts.join(', ') : 'nothing triggered';
}

/** What speaks against the answer, the gravest first, each with what to do and where. */
export function Against({ result, of }: { result: Result; of: CaseFile }) {
  const speaking = SPEAKING.flatMap((level) => result.checks.filter((check) => check.level === level));
  const passed = result.checks.filter((check) => check.level === 'pass');
  const isAnyImpossible = Object.values(result.impossible).some((count) => count > 0);
  return (
    <div className={styles.against} id={AGAINST} tabIndex={-1}>
      <h3>What speaks against it{speaking.length > 0 && <small>: {againstWords(result)}</small>}</h3>
      {speaking.length === 0 && <p>No screening test was triggered; this is not validation.</p>}
      <ul className={styles.list}>
        {speaking.map((check) => (
          <CheckItem key={check.id} check={check} of={of} />
        ))}
      </ul>
      {isAnyImpossible && <p className={styles.small}>Impossible draws: {impossibleText(result)}.</p>}
      {passed.length > 0 && (
        <details className={styles.small}>
          <summary>{passed.length} checks passed, which is not validation</summary>
          <ul className={styles.list}>
            {passed.map((check) => (
              <CheckItem key={check.id} check={check} of={of} />
            ))}
          </ul>
        </details>
      )}
    </div>
  );
}

function CheckItem({ check, of }: { check: Check; of: CaseFile }) {
  const { word, Icon } = LEVELS[check.level];
  return (
    <li className={styles.item} data-level={check.level}>
      <Icon size={16} aria-hidden className={styles.icon} />
      <div>
        <p>
          <strong className={styles.level}>{word}:</strong> {check.says}
        </p>
        {check.advice && <p className={styles.advice}>{check.advice}</p>}
        <div className={styles.where}>
          {check.level !== 'pass' && <Where paths={check.paths} of={of} />}
          <details>
            <summary>Limit</summary>
            <p>
              {CHECK_TITLES[check.id] ?? check.id}. Where the limit comes from: {check.source}.
            </p>
          </details>
        </div>
      </div>
    </li>
  );
}

/** Buttons that lead to the values. */
export function Where({ paths, of }: { paths: readonly string[]; of: CaseFile }) {
  const { showField } = useShow();
  return paths.map((path) => (
    <button key={path} type="button" className={styles.link} onClick={() => showField(path)}>
      {labelOf(of, path)}
    </button>
  ));
}
