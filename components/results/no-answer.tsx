import type { Answer } from '@/components/hooks/answer';
import { useSession } from '@/components/hooks/use-session';
import { useShow } from '@/components/hooks/use-show';
import buttons from '@/components/ui/button.module.css';
import { labelOf } from '@/lib/casefile/fields';
import type { Issue } from '@/lib/casefile/issue';
import type { Method } from '@/lib/casefile/schema';
import type { ToolId } from '@/lib/session/tools/tool';
import styles from './no-answer.module.css';

const TITLES: Partial<Record<Answer['status'], string>> = {
  refused: 'Still needed for an answer',
  unsolved: 'These values have no answer',
  failed: 'The solver failed; this is our mistake, not yours',
  cancelled: 'The calculation was stopped',
};

/** Paths that a tool of the board can draw. */
const DRAWN: [pattern: RegExp, tool: ToolId, says: string][] = [
  [/^approach\.[AB]\.direction/, 'approach', 'Draw it'],
  [/^departure\.[AB]$/, 'travel', 'Draw the travel'],
  [/^impact\.plane/, 'plane', 'Draw it'],
];

/** Why there is no answer, and the way to one. */
export function NoAnswer({ answer }: { answer: Answer }) {
  const title = TITLES[answer.status];
  if (!title) return null;
  return (
    <div className={styles.none} data-status={answer.status}>
      <h3>{title}</h3>
      <ul className={styles.list}>
        {answer.issues.map((issue) => (
          <IssueItem key={issue.path + issue.says} issue={issue} />
        ))}
      </ul>
      {(answer.status === 'failed' || answer.status === 'cancelled') && (
        <button type="button" className={buttons.button} onClick={answer.again}>
          Solve again
        </button>
      )}
    </div>
  );
}

function IssueItem({ issue: { path, says } }: { issue: Issue }) {
  const casefile = useSession((s) => s.casefile);
  const takeUp = useSession((s) => s.use);
  const { showField } = useShow();
  const edit = useSession((s) => s.edit);
  const toRestitution = (): void =>
    void edit('method', { do: 'set', path: 'analysis.method', to: 'restitution' satisfies Method });
  const drawn = DRAWN.find(([pattern]) => pattern.test(path));
  const take = (tool: ToolId): void => {
    takeUp(tool);
    document.getElementById('board')?.focus();
  };
  return (
    <li className={styles.item}>
      <span>
        <strong>{labelOf(casefile, path)}</strong>: {says}
      </span>
      {drawn && (
        <button type="button" className={buttons.button} onClick={() => take(drawn[1])}>
          {drawn[2]}
        </button>
      )}
      {/use the method restitution/.test(says) && (
        <button type="button" className={buttons.button} onClick={toRestitution}>
          Use the method restitution
        </button>
      )}
      <button type="button" className={buttons.quiet} onClick={() => showField(path)}>
        Show in the ledger
      </button>
    </li>
  );
}
