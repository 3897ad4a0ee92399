import { describe, expect, test } from 'vitest';
import { emptyCase } from '@/lib/casefile/defaults';
import { applyEdit } from '@/lib/casefile/edit';
import { fieldsOf, labelOf } from '@/lib/casefile/fields';
import { sceneOf } from '@/lib/casefile/scene-of';
import type { CaseFile } from '@/lib/casefile/schema';
import { distanceOutside, holds } from '@/lib/geometry/polygon';
import type { Vec } from '@/lib/geometry/vector';
import { gripAt, handlesOf } from '@/lib/scene/grip';
import { insideOf } from '@/lib/scene/inside';
import { surfacePlace } from '@/lib/scene/labels';
import { outlineAt } from '@/lib/scene/scene';
import { boardList } from '@/lib/session/board-list';
import { nudgeEdit } from '@/lib/session/nudge';
import { cornerAddition, cornerRemoval, patchAddition } from '@/lib/session/surface-edits';
import { deletion, duplication } from '@/lib/session/thing-edits';
import { TOOL_OF } from '@/lib/session/tools/all';
import type { Act, PointerEvent, ToolKey } from '@/lib/session/tools/tool';

/** Surfaces as lists of tool events and of edits, without a canvas. */

type Event = [PointerEvent['type'], Vec] | ToolKey;

function played(casefile: CaseFile, tool: 'surface' | 'select', events: Event[]): { acts: Act[]; after: CaseFile } {
  let state: unknown = null;
  let after = casefile;
  const acts: Act[] = [];
  for (const event of events) {
    const context = { casefile, scene: sceneOf(casefile), speeds: {}, reach: 0.2 };
    const taken = TOOL_OF[tool].tool;
    const next =
      typeof event === 'string'
        ? taken.key?.(state, event, context)
        : taken.step(state, { type: event[0], at: event[1], coarse: false }, context);
    if (!next) continue;
    state = next.state;
    acts.push(...next.acts);
    for (const act of next.acts) {
      if (act.do !== 'preview') continue;
      const edited = applyEdit(casefile, act.edit);
      if (!edited.ok) throw new Error(JSON.stringify(edited.issues));
      after = edited.casefile;
    }
  }
  return { acts, after };
}

const click = (x: number, y: number): Event[] => [
  ['move', [x, y]],
  ['down', [x, y]],
  ['up', [x, y]],
];
const fresh: CaseFile = { ...emptyCase(), scene: null };
const outlineOf = ({ scene }: CaseFile, k = 0) => scene?.surfaces?.[k]?.outline;
const triangle: Event[] = [...click(5, 3), ...click(9, 3), ...click(9, 6)];
const CORNERS = [
  [5, 3],
  [9, 3],
  [9, 6],
];
const drawn = played(fresh, 'surface', [...triangle, 'finish']).after;

describe('drawing a surface', () => {
  test('is one finished edit, over the others, and selects what was drawn', () => {
    const { acts, after } = played(drawn, 'surface', [...triangle, 'finish']);
    expect(acts.map((act) => act.do)).toEqual(['begin', 'preview', 'commit', 'select']);
    expect(acts.at(-1)).toEqual({ do: 'select', thing: 'surface.1' });
    expect(after.scene?.surfaces?.map(({ name }) => name)).toEqual(['Surface 1', 'Surface 2']);
    expect(outlineOf(after, 1)).toEqual(CORNERS);
    expect(after.scene?.surfaces?.[1].friction.source).toBe('default, not measured');
  });
  test.each<[string, Event[]]>([
    ['Enter', ['finish']],
    ['a press on the first corner', click(5.05, 3.05)],
    ['a double click, whose second press falls on the last corner', click(9.01, 6)],
  ])('is closed by %s', (_, closing) =>
    expect(outlineOf(played(fresh, 'surface', [...triangle, ...closing]).after)).toEqual(CORNERS),
  );
  test('of two corners is not closed', () => {
    const two = [...click(5, 3), ...click(9, 3)];
    for (const closing of [['finish'], click(5, 3), click(9, 3)] as Event[][])
      expect(played(fresh, 'surface', [...two, ...closing]).acts).toEqual([]);
  });
  test('Escape takes the last corner back, and with none left is not its affair', () => {
    const { after } = played(fresh, 'surface', [...triangle, 'back', ...click(7, 8), 'finish']);
    expect(outlineOf(after)).toEqual([
      [5, 3],
      [9, 3],
      [7, 8],
    ]);
    const context = { casefile: fresh, scene: sceneOf(fresh), speeds: {}, reach: 0.2 };
    expect(TOOL_OF.surface.tool.key?.(null, 'back', context)).toBeNull();
    expect(played(fresh, 'surface', [...click(5, 3), 'back', ...triangle, 'finish']).after).toEqual(drawn);
  });
  test('a corner follows the pointer until it is let go', () => {
    const dragged: Event[] = [
      ['down', [9, 5]],
      ['move', [9, 5.6]],
      ['up', [9, 6]],
    ];
    expect(outlineOf(played(fresh, 'surface', [...click(5, 3), ...click(9, 3), ...dragged, 'finish']).after)).toEqual(
      CORNERS,
    );
  });
  test('a press that is taken away takes its own corner along, not those before', () => {
    const broken: Event[] = [
      ['down', [1, 1]],
      ['cancel', [0, 0]],
    ];
    expect(outlineOf(played(fresh, 'surface', [...triangle, ...broken, 'finish']).after)).toEqual(CORNERS);
  });
});

describe('a surface on the board', () => {
  const drag = (from: Vec, to: Vec) =>
    played(drawn, 'select', [
      ['down', from],
      ['move', to],
      ['up', to],
    ]);

  test('is shaped by its corners', () =>
    expect(outlineOf(drag([9, 6], [8, 7.25]).after)).toEqual([CORNERS[0], CORNERS[1], [8, 7.25]]));
  test('is moved by its edge and by the handle inside', () => {
    const moved = [
      [6, 4.5],
      [10, 4.5],
      [10, 7.5],
    ];
    const inside = surfacePlace(sceneOf(drawn), 0);
    for (const from of [[7, 3] as Vec, inside])
      expect(outlineOf(drag(from, [from[0] + 1, from[1] + 1.5]).after)).toEqual(moved);
  });
  test('is selected by a press anywhere on it, which still moves the sheet', () => {
    const { acts, after } = drag([8.7, 5.3], [12, 9]);
    expect(acts).toEqual([{ do: 'select', thing: 'surface.0' }, { do: 'pan' }]);
    expect(after).toBe(drawn);
  });
  test('of two that overlap, the one that counts is selected', () => {
    const two = played(drawn, 'surface', [...triangle, 'finish']).after;
    expect(played(two, 'select', [['down', [8.7, 5.3]]]).acts[0]).toEqual({ do: 'select', thing: 'surface.1' });
  });
  test('lies under everything else', () => {
    const patch = patchAddition(fresh).edit;
    const under = applyEdit(fresh, patch);
    if (!under.ok) throw new Error('refused');
    expect(gripAt(sceneOf(under.casefile), {}, [-3.5, 0.5], 0.2)).toEqual({ part: 'vehicle', which: 'A' });
    expect(gripAt(sceneOf(under.casefile), {}, [0, 0], 0.2)).toEqual({ part: 'point' });
  });
  test('is nudged, turned, copied and taken away', () => {
    const after = (edit: Parameters<typeof applyEdit>[1] | null | undefined): CaseFile => {
      const edited = edit && applyEdit(drawn, edit);
      if (!edited?.ok) throw new Error('nothing changed');
      return edited.casefile;
    };
    expect(outlineOf(after(nudgeEdit(drawn, 'surface.0', [0.1, -0.1], 0)))).toEqual([
      [5.1, 2.9],
      [9.1, 2.9],
      [9.1, 5.9],
    ]);
    const turned = outlineOf(after(nudgeEdit(drawn, 'surface.0', [0, 0], 90))) ?? [];
    // A quarter turn about the middle of the corners, (23/3, 4): (dx, dy) becomes (-dy, dx).
    turned.forEach(([x, y], k) => {
      expect(x).toBeCloseTo(23 / 3 - (CORNERS[k][1] - 4), 3);
      expect(y).toBeCloseTo(4 + (CORNERS[k][0] - 23 / 3), 3);
    });
    expect(after(duplication(drawn, 'surface.0')?.edit).scene?.surfaces).toHaveLength(2);
    expect(after(deletion(drawn, 'surface.0')?.edit).scene?.surfaces).toEqual([]);
    expect(deletion(drawn, 'surface.7')).toBeNull();
  });
  test('has corners added in the middle of an edge, and none taken below three', () => {
    const more = applyEdit(drawn, cornerAddition(drawn, 0, 2).edit);
    if (!more.ok) throw new Error('refused');
    expect(outlineOf(more.casefile)).toEqual([...CORNERS, [7, 4.5]]);
    expect(cornerRemoval(drawn, 0, 0)).toBeNull();
    const fewer = cornerRemoval(more.casefile, 0, 3);
    const again = fewer && applyEdit(more.casefile, fewer.edit);
    expect(again?.ok && again.casefile).toEqual(drawn);
  });
  test('is said in the list and named in words', () => {
    const say = { length: String, angle: String, ratio: (x: number) => x.toFixed(2) };
    expect(boardList(drawn, say).at(-1)).toMatchObject({
      thing: 'surface.0',
      says: 'Surface 1: Surface 1, 3 corners, friction 0.74',
    });
    const rows = fieldsOf(drawn).filter(({ group }) => group === 'surfaces');
    expect(rows.map(({ label }) => label)).toEqual(['Surface 1: name', 'Surface 1: friction']);
    expect(labelOf(drawn, 'scene.surfaces.0.outline.2')).toBe('Surface 1: corner 3');
    expect(labelOf(drawn, 'scene.surfaces.0.outline')).toBe('Surface 1: corners');
    expect(labelOf(drawn, 'scene.surfaces')).toBe('Surfaces');
  });
});

test('the handle of a surface of any shape lies inside it', () => {
  const angled: Vec[] = [
    [0, 0],
    [10, 0],
    [10, 1],
    [1, 1],
    [1, 10],
    [0, 10],
  ];
  expect(holds(angled, [27 / 6, 22 / 6])).toBe(false); // the middle of its corners is outside
  const anywhere = (): boolean => true;
  expect(holds(angled, insideOf(angled, anywhere))).toBe(true);
  expect(insideOf(angled, ([x]) => x > 8)[0]).toBeGreaterThan(8);
  expect(
    holds(
      angled,
      insideOf(angled, () => false),
    ),
  ).toBe(true);
  const scene = sceneOf(drawn);
  expect(handlesOf(scene, {}).filter(({ grip }) => grip.part === 'corner' || grip.part === 'surface')).toHaveLength(4);
});

test('the name of the ground keeps off the vehicles on it and off what lies over it', () => {
  const road = applyEdit(fresh, {
    do: 'set',
    path: 'scene.surfaces',
    to: [
      {
        name: 'Road',
        friction: { value: 0.7 },
        outline: [
          [-9, -4],
          [9, -4],
          [9, 4],
          [-9, 4],
        ],
      },
      {
        name: 'Ice',
        friction: { value: 0.1 },
        outline: [
          [-9, 0],
          [9, 0],
          [9, 4],
          [-9, 4],
        ],
      },
    ],
  });
  if (!road.ok) throw new Error('refused');
  const scene = sceneOf(road.casefile);
  const at = surfacePlace(scene, 0);
  expect(holds(scene.surfaces[0].outline, at)).toBe(true);
  expect(holds(scene.surfaces[1].outline, at)).toBe(false);
  for (const which of ['A', 'B'] as const)
    expect(distanceOutside(at, outlineAt(scene.vehicles[which]))).toBeGreaterThan(1);
});
