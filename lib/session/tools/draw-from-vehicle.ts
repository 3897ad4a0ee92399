import type { Edit } from '@/lib/casefile/edit';
import type { ThingId } from '@/lib/casefile/fields';
import type { CaseFile } from '@/lib/casefile/schema';
import { type Vec, distance } from '@/lib/geometry/vector';
import { type Scene, type Which, centreOf } from '@/lib/scene/scene';
import { vehicleAt } from '@/lib/scene/grip';
import type { PointerEvent, Tool, ToolContext, ToolId } from './tool';

export interface Drawing {
  which: Which;
  from: Vec;
  /** Whether Shift was held when the pointer went down. */
  shift: boolean;
  /** Whether the pointer has gone far enough to mean something. */
  drawn: boolean;
}

/** A shorter stroke is a slip of the hand, m. */
const SHORTEST_STROKE = 0.3;
/** A press this near a mass centre counts as on the vehicle, m. */
const NEARBY = 6;

function pressed(scene: Scene, at: Vec): Which | null {
  const off = (which: Which): number => distance(centreOf(scene.vehicles[which]), at);
  const nearest = off('A') <= off('B') ? 'A' : 'B';
  return vehicleAt(scene, at) ?? (off(nearest) < NEARBY ? nearest : null);
}

interface Options {
  id: ToolId;
  hint: string;
  label: (which: Which) => string;
  thing: (which: Which) => ThingId;
  /** The edit for a stroke of this vehicle that has come to `to`. */
  edit: (casefile: CaseFile, drawing: Drawing, to: Vec, coarse: boolean) => Edit;
}

/** A tool that is pressed on a vehicle and dragged away from it. */
export function drawFromVehicle({ id, hint, label, thing, edit }: Options): Tool<Drawing> {
  const press = (event: PointerEvent, { scene }: ToolContext): ReturnType<Tool<Drawing>['step']> => {
    const which = pressed(scene, event.at);
    if (!which) return { state: null, acts: [{ do: 'pan' }] };
    const state = { which, from: event.at, shift: event.coarse, drawn: false };
    return { state, acts: [{ do: 'begin', label: label(which) }] };
  };
  return {
    id,
    hint,
    step(drawing, event, context) {
      if (event.type === 'down') return press(event, context);
      if (!drawing) return { state: null, acts: [] };
      if (event.type === 'cancel' || (event.type === 'up' && !drawing.drawn))
        return { state: null, acts: [{ do: 'cancel' }] };
      if (event.type === 'up')
        return { state: null, acts: [{ do: 'commit' }, { do: 'select', thing: thing(drawing.which) }] };
      const drawn = drawing.drawn || distance(drawing.from, event.at) > SHORTEST_STROKE;
      if (!drawn) return { state: drawing, acts: [] };
      const stroke = edit(context.casefile, drawing, event.at, event.coarse);
      return { state: { ...drawing, drawn }, acts: [{ do: 'preview', edit: stroke }] };
    },
  };
}
