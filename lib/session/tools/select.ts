import type { Vec } from '@/lib/geometry/vector';
import { type Grip, gripAt } from '@/lib/scene/grip';
import { dragEdit, labelOfGrip, thingOf } from '../drag';
import type { Tool } from './tool';

interface Held {
  grip: Grip;
  from: Vec;
}

/** Selects, moves and turns whatever lies under the pointer; on nothing it moves the sheet. */
export const selectTool: Tool<Held> = {
  id: 'select',
  hint: 'Drag a vehicle to move it, a round handle to turn or stretch; drag the sheet to move it',
  step(held, event, { casefile, scene, speeds, reach }) {
    if (event.type === 'down') {
      const grip = gripAt(scene, speeds, event.at, reach);
      if (!grip) return { state: null, acts: [{ do: 'select', thing: null }, { do: 'pan' }] };
      const acts = [
        { do: 'select', thing: thingOf(grip) } as const,
        { do: 'begin', label: labelOfGrip(grip) } as const,
      ];
      return { state: { grip, from: event.at }, acts };
    }
    if (!held) return { state: null, acts: [] };
    if (event.type === 'cancel') return { state: null, acts: [{ do: 'cancel' }] };
    if (event.type === 'up') return { state: null, acts: [{ do: 'commit' }] };
    const edit = dragEdit(casefile, held.grip, held.from, event.at, event.coarse);
    return { state: held, acts: [{ do: 'preview', edit }] };
  },
};
