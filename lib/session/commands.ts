import type { Edit } from '@/lib/casefile/edit';
import { type ThingId, fieldsOf, labelOf } from '@/lib/casefile/fields';
import { type CaseFile, type Method, VEHICLE_IDS, type VehicleId } from '@/lib/casefile/schema';
import type { NamedEdit } from './named-edit';
import { deletion, duplication } from './thing-edits';
import { patchAddition } from './surface-edits';
import { nameOf } from './thing-names';
import { wheelsSetApart, wheelsSetTogether } from './wheel-edits';
import { TOOL_OF } from './tools/all';
import { TOOLS, type ToolId } from './tools/tool';

/** Everything that can be done with an open case, as data: what the palette lists, in its order. */
export interface Command {
  /** Stable, and said in a word or two: «tool.approach», «file.save», «row.impact.plane». */
  id: string;
  title: string;
  group: CommandGroup;
  /** As it is printed on the keyboard. */
  key?: string;
  does: Doing;
}

export type CommandGroup = 'Tools' | 'Case' | 'Analysis' | 'View' | 'Select' | 'Go to the ledger';

/** What the session does itself; `ask` is done by the part of the page that has taken on the command of that id. */
export type Doing =
  | { do: 'use'; tool: ToolId }
  | { do: 'undo' }
  | { do: 'redo' }
  | { do: 'edit'; label: string; edit: Edit }
  /** As edit, of what is selected, which is then selected no more. */
  | { do: 'delete'; label: string; edit: Edit }
  | { do: 'select'; thing: ThingId }
  | { do: 'row'; path: string }
  | { do: 'ask' };

const ask = (id: string, group: CommandGroup, title: string, key?: string): Command => ({
  id,
  title,
  group,
  ...(key ? { key } : {}),
  does: { do: 'ask' },
});

const ASKED: readonly Command[] = [
  ask('file.new', 'Case', 'New case'),
  ask('file.duplicate', 'Case', 'Duplicate this case'),
  ask('file.save', 'Case', 'Save as a file'),
  ask('file.open', 'Case', 'Open a file'),
  ask('case.report', 'Case', 'Report'),
  ask('case.list', 'Case', 'All cases'),
  ask('view.fit', 'View', 'Fit the drawing to the board', 'F'),
  ask('view.table', 'View', 'Answer as table or picture'),
  ask('view.against', 'View', 'What speaks against the answer'),
  ask('view.fold', 'View', 'Fold or unfold the answer'),
];

/** All commands that make sense for the case as it stands, and for what is selected. */
export const commandsOf = (casefile: CaseFile, selection: ThingId | null = null): Command[] => [
  ...TOOLS.map((tool) => toolCommand(tool)),
  { id: 'undo', title: 'Undo', group: 'Case', key: 'Ctrl Z', does: { do: 'undo' } },
  { id: 'redo', title: 'Redo', group: 'Case', key: 'Ctrl Shift Z', does: { do: 'redo' } },
  ...(selection ? selectionCommands(casefile, selection) : []),
  ...ASKED,
  ...analysisCommands(casefile),
  ...selectCommands(casefile),
  ...VEHICLE_IDS.map((id) => travelCommand(casefile, id)),
  ...VEHICLE_IDS.flatMap((id) => wheelsCommand(casefile, id)),
  surfaceCommand(casefile),
  ...fieldsOf(casefile).map(({ path }): Command => ({
    id: `row.${path}`,
    title: labelOf(casefile, path),
    group: 'Go to the ledger',
    does: { do: 'row', path },
  })),
];

const toolCommand = (tool: ToolId): Command => ({
  id: `tool.${tool}`,
  title: `Tool: ${TOOL_OF[tool].title}`,
  group: 'Tools',
  key: TOOL_OF[tool].key,
  does: { do: 'use', tool },
});

const METHODS: [Method, string][] = [
  ['directions', 'two directions of approach'],
  ['restitution', 'restitution and impulse ratio'],
  ['fit', 'all evidence together'],
];

/** Only the choices that would change something. */
function analysisCommands({ analysis, display }: CaseFile): Command[] {
  const units = display?.units === 'us' ? 'metric' : 'us';
  return [
    ...METHODS.filter(([method]) => method !== analysis.method).map(([method, words]) =>
      edits(`method.${method}`, `Method: ${words}`, 'method', { do: 'set', path: 'analysis.method', to: method }),
    ),
    edits(`units.${units}`, units === 'us' ? 'Units: US customary' : 'Units: metric', 'units', {
      do: 'set',
      path: 'display',
      to: { units, paper: display?.paper ?? 'A4' },
    }),
  ];
}

const edits = (id: string, title: string, label: string, edit: Edit): Command => ({
  id,
  title,
  group: 'Analysis',
  does: { do: 'edit', label, edit },
});

/** One per thing on the board that has a row, in the order of the rows. */
function selectCommands(casefile: CaseFile): Command[] {
  const things = new Set(fieldsOf(casefile).map(({ thing }) => thing));
  return [...things].map((thing) => ({
    id: `select.${thing}`,
    title: `Select ${nameOf(thing)}`,
    group: 'Select',
    does: { do: 'select', thing },
  }));
}

/** What can be done with the selected thing. */
function selectionCommands(casefile: CaseFile, selection: ThingId): Command[] {
  const command = (found: NamedEdit | null, key: string, verb: 'delete' | 'edit'): Command[] =>
    found
      ? [{ id: `selected.${verb}`, title: capital(found.label), group: 'Case', key, does: { do: verb, ...found } }]
      : [];
  return [
    ...command(duplication(casefile, selection), 'Ctrl D', 'edit'),
    ...command(deletion(casefile, selection), 'Delete', 'delete'),
  ];
}

const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1);

/** A further leg where there is travel; where there is none, the place to enter it. */
function travelCommand(casefile: CaseFile, id: VehicleId): Command {
  const leg = duplication(casefile, `departure.${id}`);
  if (leg) return edits(`leg.${id}`, `Add a leg to the travel of ${id}`, `add a leg of ${id}`, leg.edit);
  const at = `departure.${id}`;
  return { id: `row.${at}`, title: `Enter the travel of ${id}`, group: 'Analysis', does: { do: 'row', path: at } };
}

/** Wheels set one by one, or one braking for all again: whichever would change something and lose nothing. */
function wheelsCommand(casefile: CaseFile, id: VehicleId): Command[] {
  const apart = wheelsSetApart(casefile, id);
  if (apart) return [edits(`wheels.${id}`, `Set each wheel of ${id}`, apart.label, apart.edit)];
  const together = wheelsSetTogether(casefile, id);
  return together ? [edits(`wheels.${id}`, `One braking for all wheels of ${id}`, together.label, together.edit)] : [];
}

function surfaceCommand(casefile: CaseFile): Command {
  const { label, edit } = patchAddition(casefile);
  return edits('surface.add', 'Add a surface, a rectangle about the contact point', label, edit);
}

/** The commands whose titles hold every word of the query, in any order; those that begin with it first. */
export function matching(commands: readonly Command[], query: string): Command[] {
  const words = query.toLowerCase().split(/\s+/).filter(Boolean);
  const found = commands.filter(({ title, group }) => {
    const text = `${title} ${group}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
  const begins = ({ title }: Command): boolean => words.length > 0 && title.toLowerCase().startsWith(words.join(' '));
  return [...found.filter(begins), ...found.filter((command) => !begins(command))];
}
