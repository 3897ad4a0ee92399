import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { type Edit, applyEdit } from '@/lib/casefile/edit';
import { parseCase } from '@/lib/casefile/parse';
import type { CaseFile, LegsDeparture, VehicleId } from '@/lib/casefile/schema';
import { G } from '@/lib/mechanics/legs';
import { gripOf, tyreForce } from '@/lib/mechanics/wheel';
import { secondContact } from '@/lib/results/checks/second-contact';
import type { CheckContext } from '@/lib/results/checks/check';
import type { Result } from '@/lib/results/result';
import { solveCase } from '@/lib/solve-case';

const q = (value: number) => ({ value });
const set = (path: string, to: unknown): Edit => ({ do: 'set', path, to });

function edited(file: string, ...edits: Edit[]): CaseFile {
  const parsed = parseCase(readFileSync(file));
  if (!parsed.ok) throw new Error(`${file} is not valid`);
  const done = applyEdit(parsed.casefile, { do: 'all', edits });
  if (!done.ok) throw new Error(JSON.stringify(done.issues));
  return done.casefile;
}

async function solved(casefile: CaseFile, draws = 30): Promise<Result> {
  const outcome = await solveCase(casefile, { draws, sensitivity: false });
  if (outcome.kind !== 'solved') throw new Error(JSON.stringify(outcome));
  return outcome.result;
}

const JUNCTION = 'test/cases/lasting-junction.case.json';
const NUDGE = 'public/examples/nudge.case.json';
const rad = (degrees: number): number => (degrees * Math.PI) / 180;

/** Every wheel of a vehicle on legs, as this test reckons them: place, load, friction and braking. */
function wheelsOf(casefile: CaseFile, id: VehicleId) {
  const { mass, wheelbase, track, frontAxleToMassCentre: front } = casefile.vehicles[id];
  const [leg] = (casefile.departure[id] as LegsDeparture).legs;
  return [0, 1, 2, 3].map((i) => ({
    x: i < 2 ? front.value : front.value - wheelbase,
    y: (i % 2 === 0 ? track : -track) / 2,
    load: (mass.value * G * (i < 2 ? wheelbase - front.value : front.value)) / wheelbase / 2,
    friction: leg.friction.value,
    braking: Math.max(leg.share.value, 0.01 / leg.friction.value),
  }));
}

/** Velocity after the contact of one vehicle, by many small plain steps from its approach under the half sine of J. */
function pushedPlainly(casefile: CaseFile, result: Result, id: VehicleId): [number, number, number] {
  const { central, more } = result;
  const at = (key: string): number => central[`${id}.${key}`];
  const m = casefile.vehicles[id].mass.value;
  const I = more[`${id}.yawInertia`] ?? NaN;
  const pose = casefile.impact[id];
  const T = casefile.pulse?.value ?? NaN;
  const { plane } = casefile.impact;
  // Impulse on this vehicle in the world: along the normal from A into B, and along the tangent.
  const G0 = rad(plane.value);
  const away = Math.sin(G0) * (casefile.impact.B.x.value - casefile.impact.A.x.value);
  const side = away - Math.cos(G0) * (casefile.impact.B.y.value - casefile.impact.A.y.value) < 0 ? -1 : 1;
  const [nx, ny] = [side * Math.sin(G0), -side * Math.cos(G0)];
  const Jn = central.impulse / Math.hypot(1, central.impulseRatio);
  const Jt = Jn * central.impulseRatio;
  const sign = id === 'B' ? 1 : -1;
  const [Jx, Jy] = [sign * (Jn * nx - Jt * ny), sign * (Jn * ny + Jt * nx)];
  let [x, y, h] = [pose.x.value, pose.y.value, rad(pose.heading.value)];
  const course = rad(at('approachDirection'));
  let [vx, vy, w] = [
    at('approachSpeed') * Math.cos(course),
    at('approachSpeed') * Math.sin(course),
    rad(at('approachYawRate')),
  ];
  const wheels = wheelsOf(casefile, id);
  const force = { along: 0, across: 0 };
  const N = 60_000;
  for (let i = 0; i < N; i++) {
    const rate = (Math.sin((Math.PI * (i + 0.5)) / N) * Math.PI) / (2 * T);
    let [fx, fy, moment] = [rate * Jx, rate * Jy, 0];
    const [c, s] = [Math.cos(h), Math.sin(h)];
    for (const { x: wx, y: wy, load, friction, braking } of wheels) {
      tyreForce(vx * c + vy * s - w * wy, vy * c - vx * s + w * wx, gripOf(load, friction, braking), force);
      fx += force.along * c - force.across * s;
      fy += force.along * s + force.across * c;
      moment += wx * force.across - wy * force.along;
    }
    const dt = T / N;
    vx += (fx / m) * dt;
    vy += (fy / m) * dt;
    w += (moment / I) * dt;

    x += vx * dt;
    y += vy * dt;
    h += w * dt;
  }
  return [vx, vy, Math.hypot(x - pose.x.value, y - pose.y.value)];
}

describe('directions with a contact that lasts', () => {
  test('what it answers leads back to the separation: J and the tyres push each vehicle from approach to it', async () => {
    const casefile = edited(JUNCTION);
    const result = await solved(casefile);
    for (const id of ['A', 'B'] as const) {
      const road = result.more[`${id}.roadImpulse`] ?? [NaN, NaN];
      const m = casefile.vehicles[id].mass.value;
      const { central } = result;
      const [before, after] = [`${id}.approach`, `${id}.departure`].map((key) => {
        const [speed, course] = [central[`${key}Speed`], rad(central[`${key}Direction`])];
        return [speed * Math.cos(course), speed * Math.sin(course)];
      });
      // Momentum: m (v' - v) = +-J + road, in both components.
      const J = [0, 1].map((i) => m * (after[i] - before[i]) - road[i]);
      expect(Math.hypot(J[0], J[1]) / central.impulse).toBeCloseTo(1, 5);
      expect(result.more[`${id}.tyreImpulse`]).toBeCloseTo(Math.hypot(...road), 3);
    }
  });

  test('plain steps under the half sine and the tyres, without turning, come to the same separation', async () => {
    // Both vehicles pushed through their mass centres: they do not turn, so the plain steps need no contact point.
    const casefile = edited(JUNCTION, set('vehicles.A.yawInertia', q(1e9)), set('vehicles.B.yawInertia', q(1e9)));
    const result = await solved(casefile, 2);
    for (const id of ['A', 'B'] as const) {
      const [vx, vy] = pushedPlainly(casefile, result, id);
      const [speed, course] = [result.central[`${id}.departureSpeed`], rad(result.central[`${id}.departureDirection`])];
      expect(vx).toBeCloseTo(speed * Math.cos(course), 3);
      expect(vy).toBeCloseTo(speed * Math.sin(course), 3);
    }
  });

  test('a contact that hardly lasts answers as an instant', async () => {
    const instant = await solved(edited(JUNCTION, set('analysis.contact', 'instant')));
    const short = await solved(edited(JUNCTION, set('pulse', q(1e-5))));
    for (const name of ['A.approachSpeed', 'B.approachSpeed', 'A.deltaV', 'closingSpeed', 'restitution'])
      expect(short.central[name]).toBeCloseTo(instant.central[name], 3);
  });

  test('tyreImpulse then says what was included', async () => {
    const check = (result: Result) => result.checks.find(({ id }) => id === 'tyreImpulse');
    const [lasting, instant] = [
      await solved(edited(JUNCTION)),
      await solved(edited(JUNCTION, set('analysis.contact', 'instant'))),
    ];
    expect(check(instant)?.level).toBe('caution');
    expect(check(lasting)?.level).toBe('pass');
    expect(check(lasting)?.says).toContain('the answer includes both');
    expect(check(lasting)?.value).toBeCloseTo(
      Math.max(lasting.more['A.tyreShare'] ?? 0, lasting.more['B.tyreShare'] ?? 0),
      12,
    );
  });

  test('simulated travel begins where the contact ends', async () => {
    const casefile = edited(NUDGE, set('analysis.contact', 'lasting'));
    const result = await solved(casefile, 10);
    expect(result.checks.find(({ id }) => id === 'restPose')?.level).toBe('pass');
    expect(result.more.contactDuration).toBe(casefile.pulse?.value);
    expect(result.more.penetration).toBeGreaterThan(0.05);
  }, 60_000);

  test('a contact longer than the travel after it leaves is refused in words', async () => {
    const outcome = await solveCase(edited(NUDGE, set('analysis.contact', 'lasting'), set('pulse', q(1.2))), {
      draws: 2,
    });
    expect(outcome.kind).toBe('unsolved');
    if (outcome.kind === 'unsolved') expect(outcome.reason.says.length).toBeGreaterThan(20);
  }, 120_000);
});

describe('secondContact', () => {
  const casefile = edited(NUDGE);
  const pathOf = (xs: number[]) => ({
    poses: xs.map((x, time) => ({ time, x, y: 0, heading: 0, speed: 0 })),
    wheels: [],
  });
  const context = (A: number[], B: number[]): CheckContext =>
    ({
      casefile,
      solution: {
        central: { travels: { A: pathOf(A), B: pathOf(B) } },
      },
    }) as unknown as CheckContext;

  test('is on where the outlines meet again, and off where they part for good', () => {
    expect(secondContact.find(context([0, 1, 4.5], [4.5, 7, 7]))?.level).toBe('caution');
    expect(secondContact.find(context([0, 0.2, 0.3], [4.5, 6, 7]))?.level).toBe('pass');
  });

  test('is silent where travel is not simulated', () => {
    expect(secondContact.find({ casefile, solution: { central: { travels: {} } } } as CheckContext)).toBeNull();
  });
});
