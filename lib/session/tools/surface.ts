import { type Vec, distance } from '@/lib/geometry/vector';
import { FEWEST_CORNERS, surfaceAddition } from '../surface-edits';
import type { Act, Tool, ToolContext } from './tool';

/** An outline that is being drawn. */
export interface Outlining {
  corners: Vec[];
  /** Where the pointer is: the next corner would stand there. */
  at: Vec;
  /** Whether the newest corner still follows the pointer. */
  pressed: boolean;
}

type Next = { state: Outlining | null; acts: Act[] };
const stay = (state: Outlining | null): Next => ({ state, acts: [] });

/** Drawn figures are kept to the centimetre. */
const centimetres = ([x, y]: Vec): Vec => [Math.round(x * 100) / 100, Math.round(y * 100) / 100];

function closed({ corners }: Outlining, { casefile }: ToolContext): Next {
  const { label, edit } = surfaceAddition(casefile, corners);
  const index = casefile.scene?.surfaces?.length ?? 0;
  return {
    state: null,
    acts: [
      { do: 'begin', label },
      { do: 'preview', edit },
      { do: 'commit' },
      { do: 'select', thing: `surface.${index}` },
    ],
  };
}

/** A press on the first corner closes, and so does one more on the last: the second of a double click. */
function pressed(state: Outlining | null, at: Vec, context: ToolContext): Next {
  const corners = state?.corners ?? [];
  const isOn = (corner: Vec | undefined): boolean => corner !== undefined && distance(corner, at) <= context.reach;
  const isOnEnd = isOn(corners[0]) || isOn(corners.at(-1));
  if (state && isOnEnd) return corners.length < FEWEST_CORNERS ? stay(state) : closed(state, context);
  return stay({ corners: [...corners, centimetres(at)], at, pressed: true });
}

/** A second finger or another window takes the press away, not the corners before it. */
const letGo = (state: Outlining | null): Next => (state?.pressed ? withoutLast(state) : stay(state));

function withoutLast(state: Outlining): Next {
  const corners = state.corners.slice(0, -1);
  return stay(corners.length === 0 ? null : { ...state, corners, pressed: false });
}

/** Draws the outline of a surface corner by corner. Nothing is in the case before it is closed. */
export const surfaceTool: Tool<Outlining> = {
  id: 'surface',
  hint: 'Click each corner; Enter, a double click or a click on the first corner closes it, Escape takes the last one back',
  follows: true,
  step(state, event, context) {
    if (event.type === 'cancel') return letGo(state);
    if (event.type === 'down') return pressed(state, event.at, context);
    if (!state) return stay(null);
    const { corners } = state;
    const moved = state.pressed ? corners.with(corners.length - 1, centimetres(event.at)) : corners;
    return stay({ corners: moved, at: event.at, pressed: state.pressed && event.type !== 'up' });
  },
  key(state, key, context) {
    if (!state) return null;
    if (key === 'finish') return state.corners.length < FEWEST_CORNERS ? stay(state) : closed(state, context);
    return withoutLast(state);
  },
};
