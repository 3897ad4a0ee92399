import { type Vec, add, distance, subtract } from '@/lib/geometry/vector';
import type { ThingId } from '@/lib/casefile/fields';
import { type Grip, gripAt, handlesOf, isSameGrip, surfaceAt } from '@/lib/scene/grip';
import { dragEdit, labelOfGrip, thingOf } from '../drag';
import type { Tool, ToolContext } from './tool';

interface Held {
  grip: Grip;
  from: Vec;
  /** From the pointer to the handle it took, so that a handle does not jump under the pointer. */
  off: Vec;
  /** How far the pointer must go before anything moves, m: a press alone changes nothing. */
  slack: number;
  moved: boolean;
}

/** Of the reach of a handle. */
const SLACK = 0.3;

function take(grip: Grip, at: Vec, { scene, speeds, reach }: ToolContext): Held {
  const handle = handlesOf(scene, speeds).find((h) => isSameGrip(h.grip, grip));
  return { grip, from: at, off: handle ? subtract(handle.at, at) : [0, 0], slack: reach * SLACK, moved: false };
}

/** Ground is selected by a press anywhere on it, and still moves the sheet: it may cover all of the board. */
function thingUnder(at: Vec, { scene }: ToolContext): ThingId | null {
  const surface = surfaceAt(scene, at);
  return surface === null ? null : `surface.${surface}`;
}

/** Selects, moves and turns whatever lies under the pointer; on nothing it moves the sheet. */
export const selectTool: Tool<Held> = {
  id: 'select',
  hint: 'Drag a vehicle to move it, a round handle to turn or stretch; drag the sheet to move it',
  step(held, event, context) {
    const { casefile, scene, speeds, reach } = context;
    if (event.type === 'down') {
      const grip = gripAt(scene, speeds, event.at, reach);
      if (!grip) return { state: null, acts: [{ do: 'select', thing: thingUnder(event.at, context) }, { do: 'pan' }] };
      return {
        state: take(grip, event.at, context),
        acts: [
          { do: 'select', thing: thingOf(grip, scene) },
          { do: 'begin', label: labelOfGrip(grip) },
        ],
      };
    }
    if (!held) return { state: null, acts: [] };
    if (event.type === 'cancel') return { state: null, acts: [{ do: 'cancel' }] };
    if (event.type === 'up') return { state: null, acts: [{ do: 'commit' }] };
    const moved = held.moved || distance(held.from, event.at) > held.slack;
    if (!moved) return { state: held, acts: [] };
    const [from, to] = [add(held.from, held.off), add(event.at, held.off)];
    return {
      state: { ...held, moved },
      acts: [{ do: 'preview', edit: dragEdit(casefile, held.grip, from, to, event.coarse) }],
    };
  },
};
