/** The tools at the edge of the board. Each is a small state machine in a file of its own. */
export const TOOLS = ['select', 'approach', 'travel', 'plane', 'measure'] as const;
export type ToolId = (typeof TOOLS)[number];
