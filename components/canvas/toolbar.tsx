import {
  ArrowRightToLine,
  Maximize,
  MousePointer2,
  Pentagon,
  Ruler,
  Slash,
  Spline,
  ZoomIn,
  ZoomOut,
} from 'lucide-react';
import type { ReactNode } from 'react';
import { useSession } from '@/components/hooks/use-session';
import { TOOL_OF } from '@/lib/session/tools/all';
import { TOOLS, type ToolId } from '@/lib/session/tools/tool';
import styles from './board.module.css';

const ICONS: Record<ToolId, ReactNode> = {
  select: <MousePointer2 />,
  approach: <ArrowRightToLine />,
  travel: <Spline />,
  plane: <Slash />,
  surface: <Pentagon />,
  measure: <Ruler />,
};

/** The few tools at the edge of the board, and the view. */
export function Toolbar({ fitAll, zoom }: { fitAll: () => void; zoom: (factor: number) => void }) {
  const current = useSession((s) => s.tool);
  const use = useSession((s) => s.use);
  return (
    <div className={styles.toolbar} role="toolbar" aria-label="Board tools" aria-orientation="vertical">
      {TOOLS.map((id) => (
        <button
          key={id}
          type="button"
          aria-pressed={current === id}
          aria-keyshortcuts={TOOL_OF[id].key}
          title={`${TOOL_OF[id].title} (${TOOL_OF[id].key}): ${TOOL_OF[id].tool.hint}`}
          aria-label={TOOL_OF[id].title}
          onClick={() => use(id)}
        >
          {ICONS[id]}
          <kbd aria-hidden>{TOOL_OF[id].key}</kbd>
        </button>
      ))}
      <hr />
      <button type="button" aria-label="Zoom in" title="Zoom in (+)" onClick={() => zoom(1.25)}>
        <ZoomIn />
      </button>
      <button type="button" aria-label="Zoom out" title="Zoom out (−)" onClick={() => zoom(0.8)}>
        <ZoomOut />
      </button>
      <button type="button" aria-label="Show all" aria-keyshortcuts="F" title="Show all (F)" onClick={fitAll}>
        <Maximize />
        <kbd aria-hidden>F</kbd>
      </button>
    </div>
  );
}
