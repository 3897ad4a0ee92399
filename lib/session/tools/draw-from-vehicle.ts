import type { Edit } from '@/lib/casefile/edit';
import type { ThingId } from '@/lib/casefile/fields';
import type { CaseFile } from '@/lib/casefile/schema';
import { type Vec, distance } from '@/lib/geometry/vector';
import { type Scene, type Which, centreOf } from '@/lib/scene/scene';
import { vehicleAt } from '@/lib/scene/grip';
import type { Tool, ToolId } from './tool';

interface Drawing {
  which: Which;
  from: Vec;
  /** Whether the pointer has gone far enough to mean something. */
  drawn: boolean;
}

/** A shorter stroke is a slip of the hand, m. */
const SHORTEST_STROKE = 0.3;
/** A press this near a mass centre counts as on the vehicle, m. */
const NEARBY = 4;

function pressed(scene: Scene, at: Vec): Which | null {
  const on = vehicleAt(scene, at);
  if (on) return on;
  const byDistance = (['A', 'B'] as const).map((which) => ({
    which,
    off: distance(centreOf(scene.vehicles[which]), at),
  }));
  const nearest = byDistance.sort((p, q) => p.off - q.off)[0];
  return nearest.off < NEARBY ? nearest.which : null;
}

/** A tool that is pressed on a vehicle and dragged away from it. */
export function drawFromVehicle(options: {
  id: ToolId;
  hint: string;
  label: (which: Which) => string;
  thing: (which: Which) => ThingId;
  edit: (casefile: CaseFile, which: Which, to: Vec, coarse: boolean) => Edit;
}): Tool<Drawing> {
  return {
    id: options.id,
    hint: options.hint,
    step(drawing, event, { casefile, scene }) {
      if (event.type === 'down') {
        const which = pressed(scene, event.at);
        if (!which) return { state: null, acts: [{ do: 'pan' }] };
        return { state: { which, from: event.at, drawn: false }, acts: [{ do: 'begin', label: options.label(which) }] };
      }
      if (!drawing) return { state: null, acts: [] };
      const { which, from } = drawing;
      if (event.type === 'cancel' || (event.type === 'up' && !drawing.drawn))
        return { state: null, acts: [{ do: 'cancel' }] };
      if (event.type === 'up')
        return { state: null, acts: [{ do: 'commit' }, { do: 'select', thing: options.thing(which) }] };
      const drawn = drawing.drawn || distance(from, event.at) > SHORTEST_STROKE;
      if (!drawn) return { state: drawing, acts: [] };
      return {
        state: { which, from, drawn },
        acts: [{ do: 'preview', edit: options.edit(casefile, which, event.at, event.coarse) }],
      };
    },
  };
}
