'use client';
import { useEffect, useMemo, useRef } from 'react';
import { Stage } from 'react-konva/lib/ReactKonvaCore';
import './shapes';
import { useAnswer } from '@/components/hooks/use-answer';
import { useSession, useSessionStore } from '@/components/hooks/use-session';
import type { ThingId } from '@/lib/casefile/fields';
import { sceneOf } from '@/lib/casefile/scene-of';
import { type Vec, fromBody } from '@/lib/geometry/vector';
import { METRES_PER } from '@/lib/scene/grid';
import { type Scene, type Which, approachTail, noseOf, pathOf } from '@/lib/scene/scene';
import { toScreen } from '@/lib/scene/view';
import { TOOL_OF } from '@/lib/session/tools/all';
import { TOOLS } from '@/lib/session/tools/tool';
import { formatWithUnit } from '@/lib/units/format';
import styles from './board.module.css';
import { BoardHint } from './board-hint';
import { GridLayer } from './grid-layer';
import { MapMarks } from './map-marks';
import { NumberCard } from './number-card';
import { OverlayLayer } from './overlay-layer';
import { SceneLayer } from './scene-layer';
import { useTheme } from './theme';
import { ThingStrip } from './thing-strip';
import { Toolbar } from './toolbar';
import { useBoardKeys } from './use-board-keys';
import { useTool } from './use-tool';
import { useView } from './use-view';

type Speeds = Partial<Record<Which, number>>;

/** Whether typing goes into a field. */
const isTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLInputElement || target instanceof HTMLSelectElement || target instanceof HTMLTextAreaElement;

/** The drawing to scale: the hero of the sheet. */
export function Board() {
  const frame = useRef<HTMLDivElement>(null);
  const casefile = useSession((s) => s.casefile);
  const selection = useSession((s) => s.selection);
  const tool = useSession((s) => s.tool);
  const { result } = useAnswer();
  const theme = useTheme();
  const scene = useMemo(() => sceneOf(casefile), [casefile]);
  const { size, view, setView, fitAll, zoom } = useView(frame, scene);
  const a = result?.central['A.approachSpeed'];
  const b = result?.central['B.approachSpeed'];
  const speeds = useMemo<Speeds>(
    () => ({ ...(a === undefined ? {} : { A: a }), ...(b === undefined ? {} : { B: b }) }),
    [a, b],
  );
  const pointer = useTool({ frame, view, setView, speeds });
  const keys = useBoardKeys(pointer.cancel);
  useToolKeys(fitAll);

  const units = casefile.display?.units ?? 'metric';
  const lengthText = (metres: number): string => formatWithUnit(metres, 'length', units, { decimals: 2 });
  const { hovered, measured, panning, cancel: _cancel, ...handlers } = pointer;

  return (
    <div className={styles.frame} {...keys} role="group" aria-label="Drawing of the collision" tabIndex={-1}>
      <div
        ref={frame}
        className={styles.stage}
        data-testid="board"
        data-scale={view.scale}
        data-origin-x={view.originX}
        data-origin-y={view.originY}
        data-tool={tool}
        data-over={panning ? 'panning' : hovered ? 'grip' : 'sheet'}
        {...handlers}
      >
        {size.width > 0 && (
          <Stage width={size.width} height={size.height} listening={false}>
            <GridLayer view={view} size={size} unit={METRES_PER[units]} theme={theme} />
            <SceneLayer
              scene={scene}
              view={view}
              theme={theme}
              selection={selection}
              speeds={speeds}
              lengthText={lengthText}
            />
            <OverlayLayer
              scene={scene}
              view={view}
              theme={theme}
              speeds={speeds}
              hovered={hovered}
              measured={measured}
              lengthText={lengthText}
            />
          </Stage>
        )}
      </div>
      <Toolbar fitAll={fitAll} zoom={zoom} />
      <BoardHint />
      {selection && tool === 'select' && size.width > 0 && (
        <NumberCard at={cardPlace(toScreen(view, anchorOf(scene, selection, speeds)), size)} />
      )}
      <MapMarks view={view} units={units} north={scene.north} />
      <ThingStrip />
    </div>
  );
}

/** One letter takes up a tool; F shows all. */
function useToolKeys(fitAll: () => void): void {
  const session = useSessionStore();
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      if (event.ctrlKey || event.metaKey || event.altKey || isTyping(event.target)) return;
      const id = TOOLS.find((t) => TOOL_OF[t].key.toLowerCase() === event.key.toLowerCase());
      if (id) session.getState().use(id);
      else if (event.key.toLowerCase() === 'f') fitAll();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [session, fitAll]);
}

/** The place in the world that the card of a thing stands beside. */
function anchorOf(scene: Scene, thing: ThingId, speeds: Speeds): Vec {
  const [kind, which, k] = thing.split('.') as [string, Which, string?];
  if (kind === 'vehicle') return fromBody([noseOf(scene.vehicles[which]) + 0.9, 0], scene.vehicles[which].pose);
  if (kind === 'approach') return approachTail(scene, which, speeds[which]) ?? scene.point.at;
  if (kind === 'departure' || kind === 'rest') return pathOf(scene, which).at(-1) ?? scene.point.at;
  if (kind === 'leg') return pathOf(scene, which)[Number(k) + 1] ?? scene.point.at;
  return scene.point.at;
}

const CARD = { width: 190, height: 120, off: 18 };

/** Beside the anchor, inside the board, clear of tools and strip. */
function cardPlace([x, y]: Vec, size: { width: number; height: number }): Vec {
  const left = x + CARD.off + CARD.width > size.width - 8 ? x - CARD.off - CARD.width : x + CARD.off;
  return [
    Math.min(size.width - CARD.width - 8, Math.max(60, left)),
    Math.min(size.height - CARD.height - 52, Math.max(48, y + CARD.off)),
  ];
}
