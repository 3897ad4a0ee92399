import type { Vec } from '@/lib/geometry/vector';
import { planeEdit } from '../drag';
import type { Tool } from './tool';

/** Draws the contact plane: a press sets the contact point, a drag the direction of the plane. */
export const planeTool: Tool<{ from: Vec }> = {
  id: 'plane',
  hint: 'Press on the contact point and drag along the line in which the bodies met',
  step(state, event) {
    if (event.type === 'down')
      return {
        state: { from: event.at },
        acts: [
          { do: 'begin', label: 'draw the contact plane' },
          { do: 'preview', edit: planeEdit(event.at, event.at, false) },
        ],
      };
    if (!state) return { state: null, acts: [] };
    if (event.type === 'cancel') return { state: null, acts: [{ do: 'cancel' }] };
    if (event.type === 'up') return { state: null, acts: [{ do: 'commit' }, { do: 'select', thing: 'contact.plane' }] };
    return { state, acts: [{ do: 'preview', edit: planeEdit(state.from, event.at, event.coarse) }] };
  },
};
