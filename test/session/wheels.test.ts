import { describe, expect, test } from 'vitest';
import { defaultSpin, emptyCase } from '@/lib/casefile/defaults';
import { type Edit, applyEdit } from '@/lib/casefile/edit';
import { fieldsOf } from '@/lib/casefile/fields';
import type { CaseFile, FourWheels } from '@/lib/casefile/schema';
import type { Vec } from '@/lib/geometry/vector';
import { gripAt, handlesOf } from '@/lib/scene/grip';
import { wheelPlaces } from '@/lib/scene/scene';
import { boardList } from '@/lib/session/board-list';
import { commandsOf } from '@/lib/session/commands';
import { nudgeEdit } from '@/lib/session/nudge';
import { shownScene } from '@/lib/session/shown-scene';
import { deletion, whyKept } from '@/lib/session/thing-edits';
import { TOOL_OF } from '@/lib/session/tools/all';
import type { Act, PointerEvent } from '@/lib/session/tools/tool';
import { wheelsSetApart, wheelsSetTogether } from '@/lib/session/wheel-edits';

const after = (casefile: CaseFile, edit: Edit | null | undefined): CaseFile => {
  const edited = edit && applyEdit(casefile, edit);
  if (!edited?.ok) throw new Error(`nothing changed: ${JSON.stringify(edited)}`);
  return edited.casefile;
};
const set = (casefile: CaseFile, path: string, to: unknown): CaseFile => after(casefile, { do: 'set', path, to });

/** A stands at the mass centre (-2.2, 0) and looks along +x until it is turned. */
const simulated = set(emptyCase(), 'departure.A', defaultSpin(3, 4, 30));
const apart = after(simulated, wheelsSetApart(simulated, 'A')?.edit);
const wheelsOf = (casefile: CaseFile): FourWheels => {
  const travel = casefile.departure.A;
  if (travel?.kind !== 'spin' || 'all' in travel.wheels) throw new Error('no wheels of their own');
  return travel.wheels;
};
const FRONT_LEFT = 'departure.A.wheels.frontLeft';

describe('setting each wheel', () => {
  test('says of each what was said of all, and can be taken back', () => {
    const { frontLeft, frontRight, rearLeft, rearRight } = wheelsOf(apart);
    for (const { braking, steer } of [frontLeft, frontRight, rearLeft, rearRight]) {
      expect(braking).toEqual({
        value: 0.5,
        spread: { shape: 'rectangular', low: 0.2, high: 0.8 },
        source: 'default, not measured',
      });
      expect(steer.value).toBe(0);
    }
    expect(after(apart, wheelsSetTogether(apart, 'A')?.edit)).toEqual(simulated);
  });
  test.each<[string, string, unknown]>([
    ['a wheel is steered', `${FRONT_LEFT}.steer.value`, 4],
    ['a steer of 0 is not known exactly', `${FRONT_LEFT}.steer.spread`, { shape: 'normal', sd: 1 }],
    ['a wheel brakes otherwise', `${FRONT_LEFT}.braking.value`, 0.6],
    [
      'a wheel brakes alike, but is known better',
      `${FRONT_LEFT}.braking.spread`,
      { shape: 'rectangular', low: 0.4, high: 0.6 },
    ],
  ])('is not taken back where %s', (_, path, to) => expect(wheelsSetTogether(set(apart, path, to), 'A')).toBeNull());
  test('is a named command, either way', () => {
    const title = (casefile: CaseFile) => commandsOf(casefile).find(({ id }) => id === 'wheels.A')?.title;
    expect(title(simulated)).toBe('Set each wheel of A');
    expect(title(apart)).toBe('One braking for all wheels of A');
    expect(title(set(apart, `${FRONT_LEFT}.steer.value`, 4))).toBeUndefined();
    expect(title(emptyCase())).toBeUndefined();
  });
  test('lists and rows each of them', () => {
    const say = { length: String, angle: (d: number) => `${d}°`, ratio: (x: number) => x.toFixed(2) };
    const said = (casefile: CaseFile) => boardList(casefile, say).filter(({ thing }) => thing.startsWith('wheel.'));
    expect(said(simulated)).toEqual([]);
    expect(said(apart).map(({ says }) => says)[1]).toBe('Wheel of A, front right, braking share 0.50, steer 0°');
    const own = fieldsOf(apart).filter(({ thing }) => thing === 'wheel.A.rearLeft');
    expect(own.map(({ label }) => label)).toEqual(['Braking share, rear left', 'Steer, rear left']);
    expect(deletion(apart, 'wheel.A.rearLeft')).toBeNull();
    expect(whyKept('wheel.A.rearLeft')).toMatch(/not deleted/);
  });
});

describe('a wheel on the board', () => {
  const turned = set(apart, 'impact.A.heading.value', 90);
  const open = shownScene(turned, 'rest.A');
  const [frontLeft] = wheelPlaces(open.vehicles.A);
  const parts = (scene: typeof open) => new Set(handlesOf(scene, {}).map(({ grip }) => grip.part));

  function dragged(casefile: CaseFile, from: Vec, to: Vec, coarse = false): { acts: Act[]; after: CaseFile } {
    let state: unknown = null;
    let result = casefile;
    const acts: Act[] = [];
    const events: [PointerEvent['type'], Vec][] = [
      ['down', from],
      ['move', to],
      ['up', to],
    ];
    for (const [type, at] of events) {
      const context = { casefile, scene: shownScene(casefile, 'vehicle.A'), speeds: {}, reach: 0.15 };
      const next = TOOL_OF.select.tool.step(state, { type, at, coarse }, context);
      state = next.state;
      acts.push(...next.acts);
      for (const act of next.acts) if (act.do === 'preview') result = after(casefile, act.edit);
    }
    return { acts, after: result };
  }

  test('stands where its vehicle says: A looks up, so left is towards -x', () => {
    expect(frontLeft[0]).toBeCloseTo(-2.2 - 0.75, 12);
    expect(frontLeft[1]).toBeCloseTo(1.15, 12);
  });
  test('can be taken hold of while its vehicle or its rest pose is selected, and set for itself', () => {
    for (const thing of ['vehicle.A', 'rest.A', 'wheel.A.rearLeft'] as const)
      expect(parts(shownScene(apart, thing)).has('steer')).toBe(true);
    for (const thing of ['vehicle.B', 'contact.plane', null] as const)
      expect(parts(shownScene(apart, thing)).has('steer')).toBe(false);
    expect(parts(shownScene(simulated, 'rest.A')).has('steer')).toBe(false);
    expect(gripAt(open, {}, frontLeft, 0.1)).toEqual({ part: 'wheel', which: 'A', wheel: 0 });
    expect(gripAt(shownScene(turned, null), {}, frontLeft, 0.1)).toEqual({ part: 'vehicle', which: 'A' });
  });
  test('points where its handle is dragged, from the heading of the vehicle', () => {
    const handle = handlesOf(open, {}).find(({ grip }) => grip.part === 'steer')?.at as Vec;
    const { acts, after: steered } = dragged(turned, handle, [frontLeft[0] - 1, frontLeft[1] + 1]);
    expect(acts[0]).toEqual({ do: 'select', thing: 'wheel.A.frontLeft' });
    expect(wheelsOf(steered).frontLeft.steer).toEqual({
      value: 45,
      spread: { shape: 'normal', sd: 2 },
      source: 'drawn on the board',
    });
    expect(wheelsOf(steered).frontRight).toEqual(wheelsOf(turned).frontRight);
    const clung = dragged(turned, handle, [frontLeft[0] + 0.3, frontLeft[1] + 1], true).after;
    expect(wheelsOf(clung).frontLeft.steer.value).toBe(-15);
  });
  test('that was steered by a stated amount keeps its spread', () => {
    const stated = set(turned, `${FRONT_LEFT}.steer`, {
      value: 10,
      spread: { shape: 'normal', sd: 0.5 },
      source: 'photo',
    });
    const nudged = after(stated, nudgeEdit(stated, 'wheel.A.frontLeft', [-0.1, 0], 0));
    expect(wheelsOf(nudged).frontLeft.steer).toEqual({
      value: 11,
      spread: { shape: 'normal', sd: 0.5 },
      source: 'photo',
    });
  });
  test('is steered by a degree to either side by the arrows, by a tenth in fine steps', () => {
    const steer = (step: Vec, turn = 0): number =>
      wheelsOf(after(apart, nudgeEdit(apart, 'wheel.A.rearRight', step, turn))).rearRight.steer.value;
    expect([steer([-0.1, 0]), steer([0.1, 0]), steer([0.01, 0]), steer([0, 0], 1)]).toEqual([1, -1, -0.1, 1]);
  });
  test('is braked up to the whole and down to nothing, its limits cut where they end', () => {
    const braked = (by: number) =>
      wheelsOf(after(apart, nudgeEdit(apart, 'wheel.A.rearRight', [0, by], 0))).rearRight.braking;
    expect(braked(0.1)).toMatchObject({
      value: 0.6,
      spread: { low: expect.closeTo(0.3, 9), high: expect.closeTo(0.9, 9) },
    });
    expect(braked(1)).toMatchObject({ value: 1, spread: { low: expect.closeTo(0.7, 9), high: 1 } });
    expect(braked(-1)).toMatchObject({ value: 0, spread: { low: 0, high: expect.closeTo(0.3, 9) } });
  });
});

test('a value outside what can be is still refused, limits or not', () => {
  const path = 'departure.A.wheels.all.braking';
  expect(applyEdit(simulated, { do: 'value', path, value: 1.2 }).ok).toBe(false);
  expect(applyEdit(simulated, { do: 'value', path, value: 0.9 }).ok).toBe(true);
});
