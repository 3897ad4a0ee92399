import { describe, expect, test } from 'vitest';
import { applyEdit } from '@/lib/casefile/edit';
import { emptyCase } from '@/lib/casefile/defaults';
import { sceneOf } from '@/lib/casefile/scene-of';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Vec } from '@/lib/geometry/vector';
import { planeHandle, turnHandle } from '@/lib/scene/grip';
import { nudgeEdit } from '@/lib/session/nudge';
import { TOOL_OF } from '@/lib/session/tools/all';
import type { Act, PointerEvent, ToolId } from '@/lib/session/tools/tool';
import { q } from '../support/build-case';

/** Tools as lists of events, without a canvas. */

function play(
  casefile: CaseFile,
  tool: ToolId,
  events: [PointerEvent['type'], Vec, boolean?][],
): { acts: Act[]; after: CaseFile } {
  let state: unknown = null;
  let after = casefile;
  const acts: Act[] = [];
  for (const [type, at, coarse = false] of events) {
    const context = { casefile, scene: sceneOf(casefile), speeds: {}, reach: 0.2 };
    const next = TOOL_OF[tool].tool.step(state, { type, at, coarse }, context);
    state = next.state;
    acts.push(...next.acts);
    for (const act of next.acts) {
      if (act.do === 'cancel') after = casefile;
      if (act.do !== 'preview') continue;
      const edited = applyEdit(casefile, act.edit);
      if (!edited.ok) throw new Error(JSON.stringify(edited.issues));
      after = edited.casefile;
    }
  }
  return { acts, after };
}

const kinds = (acts: Act[]): string[] => acts.map((act) => act.do);
const fresh = emptyCase();

describe('select', () => {
  test('drags a vehicle: begins, previews from the beginning, commits', () => {
    const { acts, after } = play(fresh, 'select', [
      ['down', [-2.2, 0.3]],
      ['move', [-2, 0.5]],
      ['move', [-1.2, 1.3]],
      ['up', [-1.2, 1.3]],
    ]);
    expect(kinds(acts)).toEqual(['select', 'begin', 'preview', 'preview', 'commit']);
    expect(after.impact.A.x.value).toBe(-1.2);
    expect(after.impact.A.y.value).toBe(1);
    expect(after.impact.A.x.source).toBe('drawn on the board');
  });
  test('a press that hardly moves changes nothing', () => {
    const { acts, after } = play(fresh, 'select', [
      ['down', [-2.2, 0.3]],
      ['move', [-2.18, 0.33]],
      ['up', [-2.18, 0.33]],
    ]);
    expect(kinds(acts)).toEqual(['select', 'begin', 'commit']);
    expect(after).toBe(fresh);
  });
  test('a handle taken off its centre does not jump', () => {
    const [x, y] = planeHandle(sceneOf(fresh));
    const { after } = play(fresh, 'select', [
      ['down', [x + 0.1, y]],
      ['move', [x + 0.1, y + 0.5]],
      ['up', [x + 0.1, y + 0.5]],
    ]);
    expect(after.impact.plane.value).toBe(90);
  });
  test('the handle ahead of the nose turns', () => {
    const handle = turnHandle(sceneOf(fresh), 'A');
    const { after } = play(fresh, 'select', [
      ['down', handle],
      ['move', [-2.2, 3]],
      ['up', [-2.2, 3]],
    ]);
    expect(after.impact.A.heading.value).toBe(90);
  });
  test('with Shift a direction clings to five degrees', () => {
    const { after } = play(fresh, 'select', [
      ['down', turnHandle(sceneOf(fresh), 'A')],
      ['move', [0.8, 1.1], true],
      ['up', [0.8, 1.1], true],
    ]);
    expect(after.impact.A.heading.value % 5).toBe(0);
  });
  test('the plane is a line: its direction stays in [0, 180)', () => {
    const { after } = play(fresh, 'select', [
      ['down', planeHandle(sceneOf(fresh))],
      ['move', [1, -1]],
      ['up', [1, -1]],
    ]);
    expect(after.impact.plane.value).toBe(135);
  });
  test('cancel gives back what was there', () => {
    const { acts, after } = play(fresh, 'select', [
      ['down', [-2.2, 0.3]],
      ['move', [5, 5]],
      ['cancel', [0, 0]],
    ]);
    expect(kinds(acts).at(-1)).toBe('cancel');
    expect(after).toBe(fresh);
  });
  test('on nothing it lets go of the selection and moves the sheet', () => {
    expect(kinds(play(fresh, 'select', [['down', [30, 30]]]).acts)).toEqual(['select', 'pan']);
  });
});

describe('drawing', () => {
  test('approach: from where it came to the vehicle', () => {
    const { after, acts } = play(fresh, 'approach', [
      ['down', [-2.2, 0]],
      ['move', [-2.2, -5]],
      ['up', [-2.2, -5]],
    ]);
    expect(after.approach.A.direction?.value).toBe(90);
    expect(after.approach.A.direction?.spread).toEqual({ shape: 'normal', sd: 3 });
    expect(acts.at(-1)).toEqual({ do: 'select', thing: 'approach.A' });
  });
  test('approach: also drawn towards the vehicle', () => {
    const { after } = play(fresh, 'approach', [
      ['down', [-2.2, -4]],
      ['move', [-2.2, -3]],
      ['move', [-2.1, -0.1]],
      ['up', [-2.1, -0.1]],
    ]);
    expect(after.approach.A.direction?.value).toBe(90);
  });
  test('travel: from the vehicle to where it came to rest', () => {
    const { after } = play(fresh, 'travel', [
      ['down', [2.2, 0]],
      ['move', [5.2, 4]],
      ['up', [5.2, 4]],
    ]);
    const departure = after.departure.B;
    if (departure?.kind !== 'legs') throw new Error('no legs');
    expect(departure.direction.value).toBeCloseTo(53.1, 9);
    expect(departure.legs.map((leg) => leg.distance.value)).toEqual([5]);
  });
  test('travel with Shift adds a leg along the path', () => {
    const first = play(fresh, 'travel', [
      ['down', [2.2, 0]],
      ['move', [6.2, 0]],
      ['up', [6.2, 0]],
    ]).after;
    const { after } = play(first, 'travel', [
      ['down', [2.2, 0], true],
      ['move', [8.7, 0.4], true],
      ['up', [8.7, 0.4], true],
    ]);
    const departure = after.departure.B;
    if (departure?.kind !== 'legs') throw new Error('no legs');
    expect(departure.direction.value).toBe(0);
    expect(departure.legs.map((leg) => leg.distance.value)).toEqual([4, 2.5]);
    expect(departure.legs[1].friction).toEqual(departure.legs[0].friction);
  });
  test('a slip of the hand draws nothing', () => {
    const { after, acts } = play(fresh, 'travel', [
      ['down', [2.2, 0]],
      ['move', [2.3, 0]],
      ['up', [2.3, 0]],
    ]);
    expect(after).toBe(fresh);
    expect(kinds(acts)).toEqual(['begin', 'cancel']);
  });
  test('plane: the press is the contact point, the drag the line', () => {
    const { after } = play(fresh, 'plane', [
      ['down', [0.5, 0.25]],
      ['move', [1.5, 1.25]],
      ['up', [1.5, 1.25]],
    ]);
    expect([after.impact.point.x.value, after.impact.point.y.value, after.impact.plane.value]).toEqual([0.5, 0.25, 45]);
  });
  test('measure changes nothing', () => {
    const { acts } = play(fresh, 'measure', [
      ['down', [0, 0]],
      ['move', [3, 4]],
      ['up', [3, 4]],
    ]);
    expect(acts).toEqual([]);
  });
});

describe('nudging', () => {
  const nudged = (casefile: CaseFile, thing: Parameters<typeof nudgeEdit>[1], step: Vec, turn: number): CaseFile => {
    const edit = nudgeEdit(casefile, thing, step, turn);
    const edited = edit && applyEdit(casefile, edit);
    if (!edited?.ok) throw new Error('not nudged');
    return edited.casefile;
  };
  test('a vehicle moves and turns', () => {
    expect(nudged(fresh, 'vehicle.B', [0.1, 0], 0).impact.B.x.value).toBe(2.3);
    expect(nudged(fresh, 'vehicle.B', [0, 0], 1).impact.B.heading.value).toBe(-179);
  });
  test('limits go along with the value', () => {
    const stated = applyEdit(fresh, {
      do: 'set',
      path: 'impact.A.x',
      to: { value: -2, spread: { shape: 'rectangular', low: -2.1, high: -1.9 } },
    });
    if (!stated.ok) throw new Error('refused');
    expect(nudged(stated.casefile, 'vehicle.A', [0.5, 0], 0).impact.A.x).toEqual({
      value: -1.5,
      spread: { shape: 'rectangular', low: -1.6, high: -1.4 },
    });
  });
  test('a leg grows, and never below nothing', () => {
    const drawn = applyEdit(fresh, {
      do: 'set',
      path: 'departure.A',
      to: {
        kind: 'legs',
        direction: q(0),
        endSpeed: q(0),
        legs: [{ distance: q(0.3), friction: q(0.7), share: q(0.5), grade: q(0) }],
      },
    });
    if (!drawn.ok) throw new Error('refused');
    const after = nudged(drawn.casefile, 'leg.A.0', [-1, 0], 0).departure.A;
    expect(after?.kind === 'legs' && after.legs[0].distance.value).toBe(0);
  });
  test('what has no place cannot be nudged', () => expect(nudgeEdit(fresh, 'approach.A', [1, 0], 0)).toBeNull());
});
