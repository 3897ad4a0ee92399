import { useSession } from '@/components/hooks/use-session';
import { nextStep } from '@/lib/session/next-step';
import { TOOL_OF } from '@/lib/session/tools/all';
import styles from './board.module.css';

/** One line at the top of the board: why nothing happened, else what the tool in hand does, else what to do next. */
export function BoardHint({ said }: { said: string | null }) {
  const tool = useSession((s) => s.tool);
  const next = useSession((s) => nextStep(s.casefile));
  const text = said ?? (tool === 'select' ? next : TOOL_OF[tool].tool.hint);
  return (
    <p className={styles.hint} role="status" hidden={text === null}>
      {text}
    </p>
  );
}
