import { useSession } from '@/components/hooks/use-session';
import { needsOf } from '@/lib/casefile/needs';
import type { CaseFile } from '@/lib/casefile/schema';
import { TOOL_OF } from '@/lib/session/tools/all';
import styles from './board.module.css';

/** The next thing to draw, from what the method still lacks. */
export function nextStep(casefile: CaseFile): string | null {
  const lacking = needsOf(casefile).map(({ path }) => path);
  if (lacking.length === 0) return null;
  for (const id of ['A', 'B'] as const) {
    if (lacking.includes(`approach.${id}.direction`))
      return `Next: draw where ${id} came from, with the approach tool (A)`;
    if (lacking.includes(`departure.${id}`)) return `Next: draw where ${id} came to rest, with the travel tool (T)`;
  }
  return 'Next: the ledger marks what the method still needs';
}

/** One line at the top of the board: what the tool in hand does, or what to do next. */
export function BoardHint() {
  const tool = useSession((s) => s.tool);
  const next = useSession((s) => nextStep(s.casefile));
  const text = tool !== 'select' ? TOOL_OF[tool].tool.hint : next;
  return text ? (
    <p className={styles.hint} data-hint={tool === 'select' ? 'next' : 'tool'}>
      {text}
    </p>
  ) : null;
}
