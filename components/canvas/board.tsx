'use client';
import { useMemo, useRef, useState } from 'react';
import { Stage } from 'react-konva/lib/ReactKonvaCore';
import './shapes';
import { useSession, useSessionStore } from '@/components/hooks/use-session';
import { endOf } from '@/lib/geometry/timed-path';
import { METRES_PER } from '@/lib/scene/grid';
import { shownScene } from '@/lib/session/shown-scene';
import type { Dimension } from '@/lib/units/dimension';
import { formatWithUnit } from '@/lib/units/format';
import styles from './board.module.css';
import { BoardHint } from './board-hint';
import { GridLayer } from './grid-layer';
import { MapMarks } from './map-marks';
import { NumberCard } from './number-card';
import { OverlayLayer } from './overlay-layer';
import type { Shown } from './scene-labels';
import { SceneLayer } from './scene-layer';
import { SurfaceLayer } from './surface-shape';
import { useTheme } from './theme';
import { createTravelClock } from './travel-clock';
import { TravelLayer } from './travel-layer';
import { TravelScrubber } from './travel-scrubber';
import { ThingStrip } from './thing-strip';
import { Toolbar } from './toolbar';
import { useBoardKeys } from './use-board-keys';
import { useSheetKeys } from './use-sheet-keys';
import { useAnswerDrawn } from './use-answer-drawn';
import { useTool } from './use-tool';
import { useView } from './use-view';

/** The drawing to scale: the hero of the sheet. */
export function Board() {
  const frame = useRef<HTMLDivElement>(null);
  const whole = useRef<HTMLDivElement>(null);
  const session = useSessionStore();
  const casefile = useSession((s) => s.casefile);
  const selection = useSession((s) => s.selection);
  const tool = useSession((s) => s.tool);
  const [said, say] = useState<string | null>(null);
  const theme = useTheme();
  const units = casefile.display?.units ?? 'metric';
  const answer = useAnswerDrawn(units);
  const { speeds, travels } = answer;
  const [clock] = useState(createTravelClock);
  const isSimulated = endOf(travels) > 0;
  const scene = useMemo(() => shownScene(casefile, selection), [casefile, selection]);
  const { size, view, setView, touch, fitAll, zoom } = useView(frame, scene);
  const { hovered, drawing, panning, cancel, key, handlers } = useTool({ frame, view, setView, speeds });

  const openNumbers = (): boolean => {
    if (!session.getState().selection) return false;
    session.getState().use('select');
    // The card may first have to appear.
    requestAnimationFrame(() => whole.current?.querySelector<HTMLInputElement>('[data-numbers] input')?.select());
    return true;
  };
  const keys = useBoardKeys({ cancel, key, say, openNumbers });
  useSheetKeys({ fitAll, zoom });

  const shown = useMemo((): Shown => {
    const as = (dimension: Dimension, decimals: number) => (value: number) =>
      formatWithUnit(value, dimension, units, { decimals });
    return { length: as('length', 2), angle: as('angle', 1), ratio: as('ratio', 2) };
  }, [units]);
  const drawn = { scene, view, theme, selection, shown };

  return (
    <div
      ref={whole}
      className={styles.frame}
      {...keys}
      role="group"
      aria-label="Drawing of the collision"
      tabIndex={-1}
    >
      <div
        ref={frame}
        className={styles.stage}
        data-testid="board"
        data-scale={view.scale}
        data-origin-x={view.originX}
        data-origin-y={view.originY}
        data-tool={tool}
        data-over={panning ? 'panning' : hovered ? 'grip' : 'sheet'}
        onPointerDownCapture={touch}
        {...handlers}
      >
        {size.width > 0 && (
          <Stage width={size.width} height={size.height} listening={false}>
            <GridLayer view={view} size={size} unit={METRES_PER[units]} theme={theme} />
            <SurfaceLayer {...drawn} />
            <SceneLayer {...drawn} answer={answer} />
            {isSimulated && <TravelLayer scene={scene} view={view} theme={theme} travels={travels} clock={clock} />}
            <OverlayLayer {...drawn} speeds={speeds} hovered={hovered} drawing={drawing} misses={answer.misses} />
          </Stage>
        )}
      </div>
      <Toolbar fitAll={fitAll} zoom={zoom} />
      <BoardHint said={said} />
      {selection && tool === 'select' && size.width > 0 && (
        <NumberCard thing={selection} view={view} size={size} speeds={speeds} />
      )}
      <MapMarks view={view} units={units} north={scene.north} />
      {isSimulated && <TravelScrubber travels={travels} clock={clock} />}
      <ThingStrip />
    </div>
  );
}
