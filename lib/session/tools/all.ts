import { approachTool } from './approach';
import { measureTool } from './measure';
import { planeTool } from './plane';
import { selectTool } from './select';
import type { Tool, ToolId } from './tool';
import { travelTool } from './travel';

/** The tools by name, with the key that takes each up. Whoever drives one hands its own state back to it. */
export const TOOL_OF: Record<ToolId, { tool: Tool<never>; key: string; title: string }> = {
  select: { tool: selectTool as unknown as Tool<never>, key: 'V', title: 'Select and move' },
  approach: { tool: approachTool as unknown as Tool<never>, key: 'A', title: 'Approach' },
  travel: { tool: travelTool as unknown as Tool<never>, key: 'T', title: 'Travel to rest' },
  plane: { tool: planeTool as unknown as Tool<never>, key: 'P', title: 'Contact plane' },
  measure: { tool: measureTool as unknown as Tool<never>, key: 'M', title: 'Measure' },
};
