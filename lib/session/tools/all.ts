import { approachTool } from './approach';
import { measureTool } from './measure';
import { planeTool } from './plane';
import { selectTool } from './select';
import { surfaceTool } from './surface';
import type { Tool, ToolId } from './tool';
import { travelTool } from './travel';

/** The tools by name, with the key that takes each up. Whoever drives one hands its own state back to it. */
export const TOOL_OF: Record<ToolId, { tool: Tool<unknown>; key: string; title: string }> = {
  select: { tool: selectTool, key: 'V', title: 'Select and move' },
  approach: { tool: approachTool, key: 'A', title: 'Approach' },
  travel: { tool: travelTool, key: 'T', title: 'Travel to rest' },
  plane: { tool: planeTool, key: 'P', title: 'Contact plane' },
  surface: { tool: surfaceTool, key: 'S', title: 'Surface' },
  measure: { tool: measureTool, key: 'M', title: 'Measure' },
};
