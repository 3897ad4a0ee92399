import { type PointerEvent as ReactPointerEvent, type RefObject, useCallback, useRef, useState } from 'react';
import { useSession, useSessionStore } from '@/components/hooks/use-session';
import { sceneOf } from '@/lib/casefile/scene-of';
import type { Vec } from '@/lib/geometry/vector';
import { type Grip, gripAt, isSameGrip } from '@/lib/scene/grip';
import type { Speeds } from '@/lib/scene/scene';
import { type View, toWorld } from '@/lib/scene/view';
import type { SessionActions } from '@/lib/session/session';
import { TOOL_OF } from '@/lib/session/tools/all';
import type { Measured } from '@/lib/session/tools/measure';
import type { Act, PointerEvent, ToolId } from '@/lib/session/tools/tool';
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

/** What a tool is in the middle of; another tool starts afresh. */
interface Doing {
  tool: ToolId;
  state: unknown;
}

/** Forwards the pointer to the tool in hand and carries out what it wants done. */
export function useTool({ frame, view, setView, speeds }: Board) {
  const session = useSessionStore();
  const inHand = useSession((s) => s.tool);
  const doing = useRef<Doing>({ tool: 'select', state: null });
  const [hovered, setHovered] = useState<Grip | null>(null);
  const [measured, setMeasured] = useState<Measured | null>(null);
  const pixelOf = (event: ReactPointerEvent): Vec => {
    const box = frame.current?.getBoundingClientRect();
    return [event.clientX - (box?.left ?? 0), event.clientY - (box?.top ?? 0)];
  };
  const pan = usePan(pixelOf, setView);
  const pinch = usePinch(pixelOf, setView);

  /** Returns whether the tool took hold of the sheet itself. */
  const send = useCallback(
    (event: PointerEvent, reach: number): boolean => {
      const state = session.getState();
      const casefile = state.gesture?.casefile ?? state.casefile;
      const { tool } = TOOL_OF[state.tool];
      const before = doing.current.tool === tool.id ? doing.current.state : null;
      const next = tool.step(before, event, { casefile, scene: sceneOf(casefile), speeds, reach });
      doing.current = { tool: tool.id, state: next.state };
      if (tool.id === 'measure') setMeasured(next.state as Measured | null);
      for (const act of next.acts) carryOut(state, act);
      return next.acts.some((act) => act.do === 'pan');
    },
    [session, speeds],
  );
  const cancel = (): void => {
    send({ type: 'cancel', at: [0, 0], coarse: false }, 0);
    pan.stop();
  };
  const pass = (type: PointerEvent['type'], event: ReactPointerEvent): boolean =>
    send({ type, at: toWorld(view, pixelOf(event)), coarse: event.shiftKey }, reachOf(event.pointerType) / view.scale);
  const hover = (event: ReactPointerEvent): void => {
    const at = toWorld(view, pixelOf(event));
    const grip = gripAt(sceneOf(session.getState().casefile), speeds, at, reachOf(event.pointerType) / view.scale);
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
      if (event.buttons === 0) hover(event);
      else pass('move', event);
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
  return { hovered, measured: inHand === 'measure' ? measured : null, panning: pan.panning, cancel, handlers };
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
