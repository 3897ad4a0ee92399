import { describe, expect, test } from 'vitest';
import { emptyCase } from '@/lib/casefile/defaults';
import { applyEdit } from '@/lib/casefile/edit';
import { sceneOf } from '@/lib/casefile/scene-of';
import type { CaseFile } from '@/lib/casefile/schema';
import { outlineAt, restPose } from '@/lib/scene/scene';
import { q } from '../support/build-case';

function changed(casefile: CaseFile, path: string, to: unknown): CaseFile {
  const edited = applyEdit(casefile, { do: 'set', path, to });
  if (!edited.ok) throw new Error(JSON.stringify(edited.issues));
  return edited.casefile;
}
const degrees = (radians: number): number => (radians * 180) / Math.PI;
const fresh = emptyCase();

describe('what the board shows of a case', () => {
  test('the outline reaches from nose to tail about the mass centre', () => {
    const xs = outlineAt(sceneOf(fresh).vehicles.A).map(([x]) => x);
    expect(Math.max(...xs)).toBeCloseTo(-2.2 + 1.15 + 0.9, 12);
    expect(Math.min(...xs)).toBeCloseTo(-2.2 + 1.15 + 0.9 - 4.4, 12);
  });

  test.each([
    [{ shape: 'normal', sd: 4 }, 8],
    // Standard uncertainties of the rectangular and triangular distributions: GUM (JCGM 100:2008) 4.3.7 and 4.3.9.
    [{ shape: 'rectangular', low: 7, high: 13 }, 6 / Math.sqrt(3)],
    [{ shape: 'triangular', low: 7, high: 13 }, 6 / Math.sqrt(6)],
    [{ shape: 'fixed' }, 0],
  ])('the fan of a direction is two standard uncertainties: %o', (spread, fan) => {
    const { approach } = sceneOf(changed(fresh, 'approach.A.direction', { value: 10, spread }));
    expect(degrees(approach.A?.fan ?? Number.NaN)).toBeCloseTo(fan, 12);
    expect(degrees(approach.A?.angle ?? Number.NaN)).toBeCloseTo(10, 12);
  });

  test.each([0, 30, 90, 150])('the normal of a plane at %d degrees points from A into B', (plane) => {
    const { plane: shown, vehicles } = sceneOf(changed(changed(fresh, 'impact.plane', q(plane)), 'impact.B.y', q(-3)));
    const [dx, dy] = [vehicles.B.pose.x - vehicles.A.pose.x, vehicles.B.pose.y - vehicles.A.pose.y];
    expect(Math.cos(shown.normal) * dx + Math.sin(shown.normal) * dy).toBeGreaterThan(0);
    expect(Math.cos(shown.normal - shown.angle)).toBeCloseTo(0, 12);
  });

  test('a known rest pose is shown as it is known', () => {
    const braking = { all: { braking: q(0.5) } };
    const rest = { x: q(4), y: q(-1), heading: q(90) };
    const spin = { kind: 'spin', rest, friction: q(0.7), wheels: braking };
    const pose = restPose(sceneOf(changed(fresh, 'departure.A', spin)), 'A');
    expect(pose).toEqual({ x: 4, y: -1, heading: Math.PI / 2 });
    const partly = changed(fresh, 'departure.A', { ...spin, rest: { x: q(4) } });
    expect(restPose(sceneOf(partly), 'A')).toBeNull();
  });
});
