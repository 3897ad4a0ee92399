import type { Decimal } from 'decimal.js';
import * as fc from 'fast-check';
import { expect, test } from 'vitest';
import type { ImpactState } from '@/lib/mechanics/impact-backwards';
import { byDirections, byRestitution, evidenceOf, sinBetween } from '../support/backward';
import { precise } from '../support/precise';
import { preciseDirections, preciseImpact, preciseRestitution } from '../support/precise-impact';
import { forward, impacts } from '../support/random-impacts';

/**
 * The impact against 50-digit decimals, to 1e-12 relative: velocities to the fastest of the scene (one that comes out near
 * zero from large ones has no better relative error than its parts), impulses to the impulse, energies to impulse times
 * speed. Geometry magnifies rounding, and then the limit goes with what it magnifies by: 1/sin of the angle between the
 * approaches and 1/un (directions), 1/e (restitution).
 */
const LIMIT = 1e-12;
const RUNS = { seed: 20261201, numRuns: 250 };

const at = (record: object, path: string): number =>
  path.split('.').reduce<unknown>((node, key) => (node as Record<string, unknown>)[key], record) as number;

function expectPrecise(found: object, truth: Record<string, Decimal>, limit: number): void {
  const speed = sizeOf(found);
  const impulse = Math.hypot(truth.Jn.toNumber(), truth.Jt?.toNumber() ?? 0);
  for (const [path, value] of Object.entries(truth)) {
    const scale = path === 'energyLost' ? impulse * speed : path.startsWith('J') ? impulse : path === 'e' ? 1 : speed;
    const off = precise(at(found, path)).minus(value).abs().toNumber();
    expect(off, path).toBeLessThan(limit * scale);
  }
}

/** The fastest speed about, m/s; a yaw rate counts at 3 m. */
function sizeOf(found: object): number {
  const velocities = (['A', 'B'] as const).map((id) => (found as Record<string, Record<string, number>>)[id]);
  return 1 + Math.max(...velocities.map((v) => Math.hypot(v.vx, v.vy) + 3 * Math.abs(v.w ?? v.wBefore)));
}

test('forward', () => {
  fc.assert(
    fc.property(impacts, (before) => {
      const { after, reason } = forward(before);
      fc.pre(reason === null && after.un > 0.01);
      expectPrecise(after, preciseImpact(before), LIMIT);
    }),
    RUNS,
  );
});

const expectFromPossible = (law: (state: ImpactState, un: number) => void): void =>
  fc.assert(
    fc.property(impacts, (before) => {
      const { after, reason } = forward(before);
      fc.pre(
        reason === null &&
          after.un > 0.1 &&
          Math.hypot(before.A.vx, before.A.vy) > 0.1 &&
          Math.hypot(before.B.vx, before.B.vy) > 0.1,
      );
      law(evidenceOf(before, after), after.un);
    }),
    RUNS,
  );

test('backward by directions', () =>
  expectFromPossible((state, un) => {
    const between = Math.abs(sinBetween(state));
    fc.pre(between > 0.17);
    expectPrecise(byDirections(state).answer, preciseDirections(state), LIMIT / between / Math.min(1, un));
  }));

test('backward by restitution', () =>
  expectFromPossible((state) => {
    fc.pre(state.e >= 0.05);
    expectPrecise(byRestitution(state).answer, preciseRestitution(state), LIMIT / state.e);
  }));
