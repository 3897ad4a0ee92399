import { describe, expect, test } from 'vitest';
import { applyEdit } from '@/lib/casefile/edit';
import type { ThingId } from '@/lib/casefile/fields';
import { defaultDeparture, drawnQuantity, emptyCase } from '@/lib/casefile/defaults';
import { needsOf } from '@/lib/casefile/needs';
import type { CaseFile } from '@/lib/casefile/schema';
import { boardList, standsFor } from '@/lib/session/board-list';
import { nextStep } from '@/lib/session/next-step';
import { nudgeEdit } from '@/lib/session/nudge';
import type { NamedEdit } from '@/lib/session/named-edit';
import { deletion, duplication, whyKept } from '@/lib/session/thing-edits';

const say = {
  length: (m: number) => `${m.toFixed(2)} m`,
  angle: (d: number) => `${d.toFixed(1)}°`,
  ratio: (x: number) => x.toFixed(2),
};

function after(casefile: CaseFile, change: NamedEdit | null): CaseFile {
  const edited = change && applyEdit(casefile, change.edit);
  if (!edited?.ok) throw new Error('nothing changed');
  return edited.casefile;
}
const set = (casefile: CaseFile, path: string, to: unknown): CaseFile =>
  after(casefile, { label: '', edit: { do: 'set', path, to } });

const fresh = emptyCase();
const kerb = {
  kind: 'kerb',
  label: 'Kerb',
  points: [
    [0, 4],
    [8, 4],
  ],
};
const full = set(
  set(set(fresh, 'approach.A.direction', drawnQuantity(0, 3)), 'departure.A', defaultDeparture(20, 3)),
  'scene.marks',
  [kerb],
);
const legsOf = (casefile: CaseFile): number[] | null => {
  const { A } = casefile.departure;
  return A?.kind === 'legs' ? A.legs.map(({ distance }) => distance.value) : null;
};

describe('delete', () => {
  test('takes away an approach, a travel, a mark', () => {
    expect(after(full, deletion(full, 'approach.A')).approach.A.direction).toBeNull();
    expect(after(full, deletion(full, 'departure.A')).departure.A).toBeNull();
    expect(after(full, deletion(full, 'mark.0')).scene?.marks).toEqual([]);
  });
  test('of several legs takes one, of one the whole travel', () => {
    const two = after(full, duplication(full, 'leg.A.0'));
    expect(legsOf(after(two, deletion(two, 'leg.A.1')))).toEqual([3]);
    expect(after(full, deletion(full, 'leg.A.0')).departure.A).toBeNull();
  });
  test.each<ThingId>(['vehicle.A', 'contact.point', 'contact.plane'])('keeps %s and says why', (thing) => {
    expect(deletion(full, thing)).toBeNull();
    expect(whyKept(thing)).toMatch(/not deleted/);
  });
  test('of what is not there does nothing', () => {
    expect(deletion(fresh, 'approach.A')).toBeNull();
    expect(deletion(fresh, 'departure.B')).toBeNull();
  });
});

describe('duplicate', () => {
  test('puts a leg behind itself', () => expect(legsOf(after(full, duplication(full, 'departure.A')))).toEqual([3, 3]));
  test('puts a mark beside itself', () =>
    expect(after(full, duplication(full, 'mark.0')).scene?.marks?.map(({ points }) => points[0])).toEqual([
      [0, 4],
      [0.5, 3.5],
    ]));
  test('copies no vehicle', () => expect(duplication(full, 'vehicle.A')).toBeNull());
});

describe('what to do next', () => {
  test('leads from an empty board to all that the method needs', () => {
    const said: (string | null)[] = [nextStep(fresh)];
    let casefile = fresh;
    const steps: [ThingId, number, number][] = [
      ['vehicle.A', 0.1, 0],
      ['contact.plane', 0.1, 5],
    ];
    for (const [thing, step, turn] of steps) {
      const edit = nudgeEdit(casefile, thing, [step, 0], turn);
      casefile = after(casefile, edit && { label: '', edit });
      said.push(nextStep(casefile));
    }
    for (let missing = boardList(casefile, say).find((item) => item.add); missing;) {
      casefile = after(casefile, missing.add ?? null);
      said.push(nextStep(casefile));
      missing = boardList(casefile, say).find((item) => item.add);
    }
    expect(
      said.map(
        (words) => words?.match(/drag|line|A came from|B came from|A came to rest|B came to rest/)?.[0] ?? words,
      ),
    ).toEqual(['drag', 'line', 'A came from', 'B came from', 'A came to rest', 'B came to rest', null]);
    expect(needsOf(casefile)).toEqual([]);
  });
});

describe('the list of things', () => {
  test('says every thing with its numbers, in reading order', () => {
    expect(boardList(full, say).map(({ says }) => says)).toEqual([
      'Vehicle A, mass centre at -2.20 m, 0.00 m, heading 0.0°',
      'Vehicle B, mass centre at 2.20 m, 0.00 m, heading 180.0°',
      'Contact point at 0.00 m, 0.00 m',
      'Contact plane, direction 90.0°',
      'Approach of A, direction 0.0°',
      'Add the approach of B, along its heading',
      'Travel of A, direction 20.0°, 3.00 m',
      'Add the travel of B, straight on for 5.00 m',
      'Mark 1: Kerb',
    ]);
  });
  test('a travel of one leg stands for the leg; of two, each for itself', () => {
    const shown = (casefile: CaseFile, selection: ThingId): string[] => {
      const items = boardList(casefile, say);
      return items.filter((item) => standsFor(item, items, selection)).map(({ thing }) => thing);
    };
    expect(shown(full, 'leg.A.0')).toEqual(['departure.A']);
    expect(shown(after(full, duplication(full, 'leg.A.0')), 'leg.A.0')).toEqual(['leg.A.0']);
    expect(shown(full, 'approach.B')).toEqual([]);
  });
});
