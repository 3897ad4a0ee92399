import type { Vec } from '@/lib/geometry/vector';
import type { Tool } from './tool';

export interface Measured {
  from: Vec;
  to: Vec;
  done: boolean;
}

/** Measures from one place to another; nothing is kept in the case. */
export const measureTool: Tool<Measured> = {
  id: 'measure',
  hint: 'Drag from one place to another to read distance and direction',
  step(state, event) {
    if (event.type === 'down') return { state: { from: event.at, to: event.at, done: false }, acts: [] };
    if (!state || event.type === 'cancel') return { state: null, acts: [] };
    if (state.done) return { state, acts: [] };
    return { state: { ...state, to: event.at, done: event.type === 'up' }, acts: [] };
  },
};
