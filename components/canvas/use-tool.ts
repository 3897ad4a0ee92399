import { type PointerEvent as ReactPointerEvent, type RefObject, useCallback, useRef, useState } from 'react';
import { useSession, useSessionStore } from '@/components/hooks/use-session';
import type { Vec } from '@/lib/geometry/vector';
import { type Grip, gripAt, isSameGrip } from '@/lib/scene/grip';
import type { Speeds } from '@/lib/scene/scene';
import { type View, toWorld } from '@/lib/scene/view';
import { shownScene } from '@/lib/session/shown-scene';
import type { SessionActions } from '@/lib/session/session';
import { TOOL_OF } from '@/lib/session/tools/all';
import type { Measured } from '@/lib/session/tools/measure';
import type { Outlining } from '@/lib/session/tools/surface';
import type { Act, PointerEvent, Tool, ToolContext, ToolId, ToolKey } from '@/lib/session/tools/tool';
import { usePan } from './use-pan';
import { usePinch } from './use-pinch';

/** How near counts as on a handle, pixels: more for a finger. */
const REACH = { mouse: 11, pen: 14, touch: 24 } as const;
const reachOf = (type: string): number => REACH[type as keyof typeof REACH] ?? REACH.mouse;

interface Board {
  frame: RefObject<HTMLDivElement | null>;
  view: View;
  setView: (change: (view: View) => View) => void;
  speeds: Speeds;
}

/** What tools have drawn that is not in the case. */
export interface InHand {
  measured: Measured | null;
  outlining: Outlining | null;
}

/** What each tool is in the middle of; whoever takes up another one may come back. */
type Doing = Partial<Record<ToolId, unknown>>;
type Next = ReturnType<Tool<unknown>['step']>;

/** Forwards the pointer to the tool in hand and carries out what it wants done. */
export function useTool({ frame, view, setView, speeds }: Board) {
  const session = useSessionStore();
  const inHand = useSession((s) => s.tool);
  const doing = useRef<Doing>({});
  const [hovered, setHovered] = useState<Grip | null>(null);
  const [drawn, setDrawn] = useState<Doing>({});
  const pixelOf = (event: ReactPointerEvent): Vec => {
    const box = frame.current?.getBoundingClientRect();
    return [event.clientX - (box?.left ?? 0), event.clientY - (box?.top ?? 0)];
  };
  const pan = usePan(pixelOf, setView);
  const pinch = usePinch(pixelOf, setView);

  /** Lets the tool in hand take a step; returns what it wants done. */
  const take = useCallback(
    (reach: number, step: (tool: Tool<unknown>, state: unknown, context: ToolContext) => Next | null): Act[] | null => {
      const state = session.getState();
      const casefile = state.gesture?.casefile ?? state.casefile;
      const { tool } = TOOL_OF[state.tool];
      const context = { casefile, scene: shownScene(casefile, state.selection), speeds, reach };
      const next = step(tool, doing.current[tool.id] ?? null, context);
      if (!next) return null;
      doing.current = { ...doing.current, [tool.id]: next.state };
      if (tool.id === 'measure' || tool.id === 'surface') setDrawn(doing.current);
      for (const act of next.acts) carryOut(state, act);
      return next.acts;
    },
    [session, speeds],
  );
  /** Returns whether the tool took hold of the sheet itself. */
  const send = useCallback(
    (event: PointerEvent, reach: number): boolean =>
      take(reach, (tool, state, context) => tool.step(state, event, context))?.some(({ do: act }) => act === 'pan') ??
      false,
    [take],
  );
  /** Returns whether the tool in hand had a use for the key. */
  const key = (pressed: ToolKey): boolean =>
    take(0, (tool, state, context) => tool.key?.(state, pressed, context) ?? null) !== null;
  const cancel = (): void => {
    send({ type: 'cancel', at: [0, 0], coarse: false }, 0);
    pan.stop();
  };
  const pass = (type: PointerEvent['type'], event: ReactPointerEvent): boolean =>
    send({ type, at: toWorld(view, pixelOf(event)), coarse: event.shiftKey }, reachOf(event.pointerType) / view.scale);
  const hover = (event: ReactPointerEvent): void => {
    const at = toWorld(view, pixelOf(event));
    const { casefile, selection } = session.getState();
    const grip = gripAt(shownScene(casefile, selection), speeds, at, reachOf(event.pointerType) / view.scale);
    setHovered((before) => (isSameGrip(before, grip) ? before : grip));
  };

  const handlers = {
    onPointerDown: (event: ReactPointerEvent): void => {
      event.currentTarget.setPointerCapture(event.pointerId);
      if (pinch.down(event)) cancel();
      else if (pan.isAsked(event) || (event.button === 0 && pass('down', event))) pan.start(event);
    },
    onPointerMove: (event: ReactPointerEvent): void => {
      if (pinch.move(event) || pan.move(event)) return;
      const follows = TOOL_OF[session.getState().tool].tool.follows ?? false;
      if (event.buttons === 0) hover(event);
      if (event.buttons !== 0 || follows) pass('move', event);
    },
    onPointerUp: (event: ReactPointerEvent): void => {
      if (pinch.up(event) || pan.stop()) return;
      if (event.button === 0) pass('up', event);
    },
    onPointerCancel: (event: ReactPointerEvent): void => {
      pinch.up(event);
      cancel();
    },
    onPointerLeave: (): void => setHovered(null),
  };
  const drawing: InHand = {
    measured: inHand === 'measure' ? ((drawn.measure ?? null) as Measured | null) : null,
    outlining: inHand === 'surface' ? ((drawn.surface ?? null) as Outlining | null) : null,
  };
  return { hovered, drawing, panning: pan.panning, cancel, key, handlers };
}

function carryOut(session: SessionActions, act: Act): void {
  switch (act.do) {
    case 'begin':
      return session.begin(act.label);
    case 'preview':
      return session.preview(act.edit);
    case 'commit':
      return session.commit();
    case 'cancel':
      return session.cancel();
    case 'select':
      return session.select(act.thing);
    case 'pan':
  }
}
