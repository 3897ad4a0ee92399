import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { applyEdit } from '@/lib/casefile/edit';
import { defaultDeparture, drawnQuantity, emptyCase } from '@/lib/casefile/defaults';
import { sceneOf } from '@/lib/casefile/scene-of';
import type { CaseFile } from '@/lib/casefile/schema';
import { distanceToSegment } from '@/lib/geometry/segment';
import { type Vec, add, scale, unit } from '@/lib/geometry/vector';
import { gripAt, handlesOf, planeHandle, turnHandle, vehicleAt } from '@/lib/scene/grip';
import { approachTail, approachTip } from '@/lib/scene/scene';

function changed(casefile: CaseFile, path: string, to: unknown): CaseFile {
  const edited = applyEdit(casefile, { do: 'set', path, to });
  if (!edited.ok) throw new Error(JSON.stringify(edited.issues));
  return edited.casefile;
}

const marked = changed(emptyCase(), 'scene.marks', [
  {
    kind: 'kerb',
    label: 'Kerb',
    points: [
      [-9, 5],
      [9, 5],
    ],
  },
]);
const approached = changed(marked, 'approach.A.direction', drawnQuantity(0, 3));
const drawn = sceneOf(changed(approached, 'departure.B', defaultDeparture(90, 6)));
const grip = (at: Vec, reach = 0.2) => gripAt(drawn, {}, at, reach);

describe('what lies under the pointer', () => {
  test.each<[string, Vec, unknown]>([
    ['the contact point', [0.02, -0.02], { part: 'point' }],
    ['the handle of the plane', planeHandle(drawn), { part: 'plane' }],
    ['the line of the plane', [0.03, -1.2], { part: 'plane' }],
    ['the handle ahead of the nose', turnHandle(drawn, 'A'), { part: 'turn', which: 'A' }],
    ['a body', [-3.5, 0.5], { part: 'vehicle', which: 'A' }],
    ['the arrow of approach', [-5.4, 0.05], { part: 'approach', which: 'A' }],
    ['the line of a leg', [2.23, 3], { part: 'leg', which: 'B', leg: 0 }],
    ['the end of the travel', [2.2, 6], { part: 'end', which: 'B' }],
    ['a mark', [-5, 5.05], { part: 'mark', index: 0 }],
    ['nothing', [12, 12], null],
  ])('%s', (_, at, expected) => expect(grip(at)).toEqual(expected));

  test('every handle can be taken where it is drawn', () => {
    for (const handle of handlesOf(drawn, {})) expect(grip(handle.at, 1e-6)).toEqual(handle.grip);
  });

  test('a longer reach finds what a shorter one finds, or something smaller', () => {
    const near: Vec = [2.2, 6.15];
    expect(grip(near, 0.1)).not.toEqual({ part: 'end', which: 'B' });
    expect(grip(near, 0.2)).toEqual({ part: 'end', which: 'B' });
  });

  test('of two bodies that overlap, the one whose centre is nearer', () => {
    const over = sceneOf(changed(changed(emptyCase(), 'impact.A.x.value', -1), 'impact.B.x.value', 1));
    expect(vehicleAt(over, [-0.1, 0])).toBe('A');
    expect(vehicleAt(over, [0.1, 0])).toBe('B');
  });
});

test('the arrow of approach points along its direction and ends behind the tail', () => {
  const [tail, tip] = [approachTail(drawn, 'A', 6), approachTip(drawn, 'A')];
  expect(tail?.[1]).toBeCloseTo(0, 12);
  expect(tip?.[0]).toBeLessThan(-2.2 - 2.35);
  expect(Number(tip?.[0]) - Number(tail?.[0])).toBeCloseTo(2, 12);
});

describe('distance to a segment', () => {
  const number = fc.double({ min: -50, max: 50, noNaN: true });
  const point = fc.tuple(number, number);
  test('no point of the segment is nearer, and one is as near', () => {
    fc.assert(
      fc.property(point, point, point, (at, from, to) => {
        const claimed = distanceToSegment(at, from, to);
        const samples = Array.from({ length: 2001 }, (_, k) => {
          const t = k / 2000;
          return Math.hypot(at[0] - (from[0] * (1 - t) + to[0] * t), at[1] - (from[1] * (1 - t) + to[1] * t));
        });
        const least = Math.min(...samples);
        const step = Math.hypot(to[0] - from[0], to[1] - from[1]) / 2000;
        return claimed <= least + 1e-9 && claimed >= least - step - 1e-9;
      }),
      { seed: 20261201, numRuns: 200 },
    );
  });
  test('beyond an end, the distance to that end', () =>
    expect(distanceToSegment(add([1, 1], scale(unit(0.4), 3)), [1, 1], [1 - 2, 1])).toBeCloseTo(3, 12));
});
