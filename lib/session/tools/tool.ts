import type { Edit } from '@/lib/casefile/edit';
import type { ThingId } from '@/lib/casefile/fields';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Vec } from '@/lib/geometry/vector';
import type { Scene, Speeds } from '@/lib/scene/scene';

/** The tools at the edge of the board. Each is a small state machine in a file of its own. */
export const TOOLS = ['select', 'approach', 'travel', 'plane', 'surface', 'measure'] as const;
export type ToolId = (typeof TOOLS)[number];

/** A pointer on the board, in the world, m. */
export interface PointerEvent {
  type: 'down' | 'move' | 'up' | 'cancel';
  at: Vec;
  /** Directions cling to whole steps. */
  coarse: boolean;
}

export type ToolKey = 'finish' | 'back';

/** What a tool may look at. */
export interface ToolContext {
  /** As it is now; as it was at the beginning while a gesture is under way. */
  casefile: CaseFile;
  scene: Scene;
  /** Computed approach speeds, m/s, for the arrows. */
  speeds: Speeds;
  /** How far from a handle counts as on it, m. */
  reach: number;
}

/** What a tool wants done; carried out in order. */
export type Act =
  | { do: 'begin'; label: string }
  | { do: 'preview'; edit: Edit }
  | { do: 'commit' }
  | { do: 'cancel' }
  | { do: 'select'; thing: ThingId | null }
  /** The pointer took hold of the sheet itself. */
  | { do: 'pan' };

/** A tool: from a state and an event to the next state and what is to be done. A state of null is idle. */
export interface Tool<State> {
  id: ToolId;
  /** What to do with it, in a line. */
  hint: string;
  step(state: State | null, event: PointerEvent, context: ToolContext): { state: State | null; acts: Act[] };
  /** Whether it is told of a pointer that moves without being pressed. */
  follows?: boolean;
  /** A key while it is in the middle of something: finishes that, or takes back its last part. Null: not its affair. */
  key?(state: State | null, key: ToolKey, context: ToolContext): { state: State | null; acts: Act[] } | null;
}
