import {
  type PointerEvent as ReactPointerEvent,
  type RefObject,
  useCallback,
  useEffect,
  useRef,
  useState,
} from 'react';
import { useSession, useSessionStore } from '@/components/hooks/use-session';
import { sceneOf } from '@/lib/casefile/scene-of';
import type { Vec } from '@/lib/geometry/vector';
import { type Grip, gripAt } from '@/lib/scene/grip';
import type { Which } from '@/lib/scene/scene';
import { type View, panBy, toWorld } from '@/lib/scene/view';
import { TOOL_OF } from '@/lib/session/tools/all';
import type { Measured } from '@/lib/session/tools/measure';
import type { Act, PointerEvent, ToolContext } from '@/lib/session/tools/tool';

/** How near counts as on a handle, pixels: more for a finger. */
const REACH = { mouse: 11, pen: 14, touch: 24 } as const;
const reachOf = (type: string): number => REACH[type as keyof typeof REACH] ?? REACH.mouse;

interface Board {
  frame: RefObject<HTMLDivElement | null>;
  view: View;
  setView: (change: (view: View) => View) => void;
  speeds: Partial<Record<Which, number>>;
}

/** Forwards the pointer to the tool in hand and carries out what it wants done. */
export function useTool({ frame, view, setView, speeds }: Board) {
  const session = useSessionStore();
  const toolId = useSession((s) => s.tool);
  const state = useRef<unknown>(null);
  const pan = useRef<Vec | null>(null);
  const [hovered, setHovered] = useState<Grip | null>(null);
  const [measured, setMeasured] = useState<Measured | null>(null);
  const [panning, setPanning] = useState(false);

  const send = useCallback(
    (event: PointerEvent, reach: number) => {
      const { gesture, casefile } = session.getState();
      const base = gesture?.casefile ?? casefile;
      const context: ToolContext = { casefile: base, scene: sceneOf(base), speeds, reach };
      const { tool } = TOOL_OF[session.getState().tool];
      const next = tool.step(state.current, event, context);
      state.current = next.state;
      if (tool.id === 'measure') setMeasured(next.state as Measured | null);
      for (const act of next.acts) if (act.do !== 'pan') carryOut(session.getState(), act);
      return next.acts.some((act) => act.do === 'pan');
    },
    [session, speeds],
  );

  const cancel = useCallback(() => {
    send({ type: 'cancel', at: [0, 0], coarse: false }, 0);
    state.current = null;
    pan.current = null;
    setPanning(false);
  }, [send]);

  useEffect(() => {
    state.current = null;
    setMeasured(null);
  }, [toolId]);

  const pixelOf = (event: ReactPointerEvent): Vec => {
    const box = frame.current?.getBoundingClientRect();
    return [event.clientX - (box?.left ?? 0), event.clientY - (box?.top ?? 0)];
  };
  const pass = (type: PointerEvent['type'], event: ReactPointerEvent): boolean =>
    send({ type, at: toWorld(view, pixelOf(event)), coarse: event.shiftKey }, reachOf(event.pointerType) / view.scale);
  const startPan = (event: ReactPointerEvent): void => {
    pan.current = pixelOf(event);
    setPanning(true);
  };

  return {
    hovered,
    measured,
    panning,
    cancel,
    onPointerDown: (event: ReactPointerEvent) => {
      event.currentTarget.setPointerCapture(event.pointerId);
      if (event.button === 1 || event.altKey) startPan(event);
      else if (event.button === 0 && pass('down', event)) startPan(event);
    },
    onPointerMove: (event: ReactPointerEvent) => {
      const last = pan.current;
      if (last) {
        const now = pixelOf(event);
        pan.current = now;
        setView((v) => panBy(v, now[0] - last[0], now[1] - last[1]));
      } else if (session.getState().gesture || session.getState().tool === 'measure') pass('move', event);
      else {
        const at = toWorld(view, pixelOf(event));
        const grip = gripAt(sceneOf(session.getState().casefile), speeds, at, reachOf(event.pointerType) / view.scale);
        setHovered((before) => (JSON.stringify(before) === JSON.stringify(grip) ? before : grip));
      }
    },
    onPointerUp: (event: ReactPointerEvent) => {
      if (pan.current) {
        pan.current = null;
        setPanning(false);
      } else pass('up', event);
    },
    onPointerCancel: cancel,
  };
}

function carryOut(
  session: ReturnType<ReturnType<typeof useSessionStore>['getState']>,
  act: Exclude<Act, { do: 'pan' }>,
): void {
  if (act.do === 'begin') session.begin(act.label);
  else if (act.do === 'preview') session.preview(act.edit);
  else if (act.do === 'commit') session.commit();
  else if (act.do === 'cancel') session.cancel();
  else session.select(act.thing);
}
