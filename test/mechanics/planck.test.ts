import * as fc from 'fast-check';
import { Box, Circle, Settings, Vec2, World } from 'planck';
import { describe, expect, test } from 'vitest';
import type { ImpactBefore, MovingBody } from '@/lib/mechanics/impact';
import { between, forward } from '../support/random-impacts';

/**
 * The closed form against planck, a general rigid-body engine that knows no formula of ours: it iterates impulses until the
 * contact is satisfied. One step of a millionth of a second, a plate on A and a small disk on B. Its friction rule is that of
 * the end of the contact (no sliding at the end, or sliding against the final slip), which is the same as ours unless the slip
 * changes its sense on the way; such contacts are left out here and followed in steps in impact.test.ts.
 */
const STEP = 1e-6;
const RADIUS = 0.05;
const OVERLAP = 1e-4;

interface Scene {
  A: Omit<MovingBody, 'x' | 'y'>;
  B: Omit<MovingBody, 'x' | 'y'>;
  /** Where the contact is on the upper face of A's plate, and the mass centre of B seen from the disk. */
  along: number;
  offset: [number, number];
  e: number;
  f: number;
}

const body = fc
  .record({
    m: between(400, 3000),
    gyration: between(0.9, 1.9),
    vx: between(-15, 15),
    vy: between(-15, 15),
    w: between(-3, 3),
  })
  .map(({ m, gyration, ...motion }) => ({ m, I: m * gyration ** 2, ...motion }));

const scenes: fc.Arbitrary<Scene> = fc.record({
  A: body,
  B: body,
  along: between(-1.5, 1.5),
  offset: fc.tuple(between(-1.5, 1.5), between(0.1, 2)),
  e: fc.oneof(between(0, 1), fc.constantFrom(0, 1)),
  f: fc.oneof(between(0, 0.6), fc.constantFrom(0)),
});

interface Stepped {
  point: { x: number; y: number };
  normal: { x: number; y: number };
  centreB: { x: number; y: number };
  A: { vx: number; vy: number; w: number };
  B: { vx: number; vy: number; w: number };
}

/** Lets planck make the impact. */
function byPlanck({ A, B, along, offset, e, f }: Scene): Stepped | null {
  Settings.velocityThreshold = 0;
  const world = new World({ gravity: new Vec2(0, 0) });
  const make = (x: number, y: number, s: Scene['A']) =>
    world.createBody({
      type: 'dynamic',
      position: new Vec2(x, y),
      linearVelocity: new Vec2(s.vx, s.vy),
      angularVelocity: s.w,
    });
  const contactY = 0.5 + RADIUS - OVERLAP;
  const plate = make(0, 0, A);
  const disk = make(along + offset[0], contactY + offset[1], B);
  plate.createFixture({ shape: new Box(2, 0.5), density: 1, restitution: e, friction: f });
  disk.createFixture({
    shape: new Circle(new Vec2(-offset[0], -offset[1]), RADIUS),
    density: 1,
    restitution: e,
    friction: f,
  });
  plate.setMassData({ mass: A.m, center: new Vec2(0, 0), I: A.I });
  disk.setMassData({ mass: B.m, center: new Vec2(0, 0), I: B.I });
  plate.setLinearVelocity(new Vec2(A.vx, A.vy));
  disk.setLinearVelocity(new Vec2(B.vx, B.vy));

  let met: Pick<Stepped, 'point' | 'normal'> | null = null;
  world.on('pre-solve', (contact) => {
    const manifold = contact.getWorldManifold(null);
    if (manifold) met = { point: { ...manifold.points[0] }, normal: { ...manifold.normal } };
  });
  world.step(STEP, 200, 0);
  if (met === null) return null;
  const motion = (b: typeof plate) => ({
    vx: b.getLinearVelocity().x,
    vy: b.getLinearVelocity().y,
    w: b.getAngularVelocity(),
  });
  return {
    ...(met as Pick<Stepped, 'point' | 'normal'>),
    centreB: { x: along + offset[0], y: contactY + offset[1] },
    A: motion(plate),
    B: motion(disk),
  };
}

const beforeOf = ({ A, B, e, f }: Scene, { point, normal, centreB }: Stepped): ImpactBefore => ({
  A: { ...A, x: 0, y: 0 },
  B: { ...B, ...centreB },
  px: point.x,
  py: point.y,
  plane: Math.atan2(normal.x, -normal.y),
  e,
  f,
});

describe('planck', () => {
  test('random contacts, sliding and sticking: velocities agree to 1e-12 of the speeds', () => {
    let [compared, sliding, sticking] = [0, 0, 0];
    for (const scene of fc.sample(scenes, { seed: 20261201, numRuns: 1500 })) {
      const stepped = byPlanck(scene);
      if (stepped === null) continue;
      const before = beforeOf(scene, stepped);
      const { after } = forward(before);
      const turnsBack = after.ut * after.utAfter < -1e-12;
      if (!(after.un > 0.05) || !(after.Jn > 0) || turnsBack) continue;
      const speed = 1 + Math.hypot(scene.A.vx, scene.A.vy) + Math.hypot(scene.B.vx, scene.B.vy);
      for (const id of ['A', 'B'] as const)
        for (const key of ['vx', 'vy', 'w'] as const)
          expect(Math.abs(after[id][key] - stepped[id][key]), `${id}.${key}`).toBeLessThan(1e-12 * speed);
      compared++;
      if (scene.f > 0 && Math.abs(after.utAfter) < 1e-9) sticking++;
      else if (scene.f > 0) sliding++;
    }
    expect(compared).toBeGreaterThan(400);
    expect(sliding).toBeGreaterThan(100);
    expect(sticking).toBeGreaterThan(30);
  });
});
