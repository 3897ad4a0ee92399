import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { G } from '@/lib/mechanics/legs';
import { type Ground, type SpinVehicle, TyreMotion, fourWheels, travelToRest } from '@/lib/mechanics/spin';
import { invertFrom } from '@/lib/mechanics/spin-backwards';
import type { Wheel } from '@/lib/mechanics/tyre';
import { sideShare } from '@/lib/mechanics/wheel';

/** Travel simulated to rest: its laws on random cases, and constants from outside the project. */

const LEVEL: Ground = { friction: 0.7, frictionAt: null, grade: 0, uphill: 0 };
const FINE = 1e-7;

function car(braking: number[], steer = [0, 0, 0, 0], m = 1400): SpinVehicle {
  const body = { m, wheelbase: 2.66, track: 1.54, frontAxleToMassCentre: 1.18 };
  const wheels = fourWheels(
    body,
    braking.map((share, i) => ({ braking: share, steer: steer[i] })),
  );
  return { m, I: 1.091 * m * 1.18 * 1.48, wheels };
}

const speed = fc.double({ min: 1, max: 12, noNaN: true });
const turnRate = fc.double({ min: -4, max: 4, noNaN: true });
const angle = fc.double({ min: -3, max: 3, noNaN: true });
const share = fc.double({ min: 0.05, max: 1, noNaN: true });
const shares = fc.tuple(share, share, share, share);
const friction = fc.double({ min: 0.3, max: 0.9, noNaN: true });

describe('laws', () => {
  test('all wheels locked and no spin: the distance is v^2 / (2 f g) to 0.1 %', () => {
    fc.assert(
      // From 2 m/s on: below 0.05 m/s the force fades, which lengthens a very short slide by more than that.
      fc.property(fc.double({ min: 2, max: 15, noNaN: true }), friction, angle, (v, f, course) => {
        const motion = new TyreMotion(car([1, 1, 1, 1]), { ...LEVEL, friction: f }, 0);
        const rest = travelToRest(motion, [0, 0, 0.3, v * Math.cos(course), v * Math.sin(course), 0], FINE);
        const wanted = (v * v) / (2 * f * G);
        return rest.outcome === 'rest' && Math.abs(Math.hypot(rest.x, rest.y) - wanted) < 1e-3 * wanted;
      }),
      { seed: 20261201, numRuns: 60 },
    );
  });

  test('kinetic energy never grows on level ground', () => {
    fc.assert(
      fc.property(speed, turnRate, angle, shares, (v, w, course, braking) => {
        const vehicle = car(braking);
        const motion = new TyreMotion(vehicle, LEVEL, 0.2);
        let last = Infinity;
        let grew = false;
        travelToRest(motion, [0, 0, 0, v * Math.cos(course), v * Math.sin(course), w], 1e-6, (_, y) => {
          const energy = (vehicle.m * (y[3] * y[3] + y[4] * y[4]) + vehicle.I * y[5] * y[5]) / 2;
          if (energy > last * (1 + 1e-6) + 1e-6) grew = true;
          last = energy;
        });
        return !grew;
      }),
      { seed: 20261202, numRuns: 60 },
    );
  });

  test('a finer step moves the rest by less than 1 mm and 0.05 degrees', () => {
    fc.assert(
      fc.property(speed, turnRate, angle, shares, (v, w, course, braking) => {
        const motion = new TyreMotion(car(braking), LEVEL, 0);
        const start = [0, 0, 0, v * Math.cos(course), v * Math.sin(course), w];
        const [coarse, fine] = [travelToRest(motion, start, 1e-6), travelToRest(motion, start, 1e-8)];
        const off = Math.hypot(coarse.x - fine.x, coarse.y - fine.y);
        return off < 1e-3 && Math.abs(coarse.heading - fine.heading) < (0.05 * Math.PI) / 180;
      }),
      { seed: 20261203, numRuns: 60 },
    );
  });

  test('turning the scene turns the path', () => {
    fc.assert(
      fc.property(speed, turnRate, angle, angle, shares, (v, w, course, by, braking) => {
        const motion = new TyreMotion(car(braking, [0.1, 0.1, 0, 0]), LEVEL, 0);
        const one = travelToRest(motion, [0, 0, 0, v * Math.cos(course), v * Math.sin(course), w], FINE);
        const two = travelToRest(motion, [0, 0, by, v * Math.cos(course + by), v * Math.sin(course + by), w], FINE);
        const [c, s] = [Math.cos(by), Math.sin(by)];
        const off = Math.hypot(c * one.x - s * one.y - two.x, s * one.x + c * one.y - two.y);
        return off < 1e-4 && Math.abs(one.heading + by - two.heading) < 1e-4;
      }),
      { seed: 20261204, numRuns: 40 },
    );
  });

  test('backwards of forwards is the start, to 1e-6', () => {
    const turnsModestly = fc.double({ min: -2, max: 2, noNaN: true });
    const side = fc.double({ min: -1, max: 1, noNaN: true });
    fc.assert(
      fc.property(speed, turnsModestly, side, shares, (v, w, course, braking) => {
        const motion = new TyreMotion(car(braking), LEVEL, 0);
        const [vx, vy] = [v * Math.cos(course), v * Math.sin(course)];
        const to = travelToRest(motion, [0, 0, 0, vx, vy, w], 1e-9);
        const target = { motion, from: { x: 0, y: 0, heading: 0 }, to, error: 1e-9 };
        const { met, separation } = invertFrom(target, { vx: vx * 1.02, vy: vy + 0.02, w: w + 0.02 }, 1e-8);
        return met && Math.hypot(separation.vx - vx, separation.vy - vy) + Math.abs(separation.w - w) < 1e-6;
      }),
      { seed: 20261205, numRuns: 12 },
    );
  });
});

describe('ground', () => {
  test('another surface under the wheels counts where it lies', () => {
    const icy: Ground = { ...LEVEL, frictionAt: (x) => (x > 3 ? 0.1 : 0.7) };
    const dry = travelToRest(new TyreMotion(car([1, 1, 1, 1]), LEVEL, 0), [0, 0, 0, 9, 0, 0], FINE);
    const mixed = travelToRest(new TyreMotion(car([1, 1, 1, 1]), icy, 0), [0, 0, 0, 9, 0, 0], FINE);
    expect(mixed.x).toBeGreaterThan(dry.x + 5);
  });
  test('uphill it stops sooner by the grade: v^2 / (2 g (f cos + sin))', () => {
    const grade = 0.08;
    const uphill: Ground = { ...LEVEL, grade };
    const rest = travelToRest(new TyreMotion(car([1, 1, 1, 1]), uphill, 0), [0, 0, 0, 6, 0, 0], FINE);
    const slope = Math.atan(grade);
    expect(rest.x).toBeCloseTo(36 / (2 * G * (0.7 * Math.cos(slope) + Math.sin(slope))), 2);
  });
  test('a vehicle that friction cannot hold does not come to rest', () => {
    const steep: Ground = { ...LEVEL, friction: 0.1, grade: 0.2, uphill: Math.PI };
    expect(travelToRest(new TyreMotion(car([1, 1, 1, 1]), steep, 0), [0, 0, 0, 2, 0, 0], 1e-4).outcome).toBe('noRest');
  });
  test('before the onset the wheels roll freely', () => {
    const late = travelToRest(new TyreMotion(car([1, 1, 1, 1]), LEVEL, 0.5), [0, 0, 0, 6, 0, 0], FINE);
    const rolled = 6 * 0.5 - (0.01 * G * 0.25) / 2;
    const left = 6 - 0.01 * G * 0.5;
    expect(late.x).toBeCloseTo(rolled + (left * left) / (2 * 0.7 * G), 2);
  });
});

describe('coupled sliding and spinning on dry friction (Farkas et al., Phys. Rev. Lett. 90, 248302, 2003)', () => {
  const contacts = (rings: [radius: number, load: number][], spokes: number): Wheel[] =>
    rings.flatMap(([radius, load]) =>
      Array.from({ length: spokes }, (_, k) => {
        const turn = (2 * Math.PI * k) / spokes;
        return { x: radius * Math.cos(turn), y: radius * Math.sin(turn), load: load / spokes, braking: 1, steer: 0 };
      }),
    );
  const R = 1.5;
  const m = 1000;

  test('a ring started at v = R w: effective drag 2/pi of friction (t 1.37294 s, 4.11883 m, 2.74589 rad)', () => {
    const ring: SpinVehicle = { m, I: m * R * R, wheels: contacts([[R, m * G]], 64) };
    const rest = travelToRest(new TyreMotion(ring, LEVEL, 0), [0, 0, 0, 6, 0, 6 / R], 1e-7);
    // Closed form with friction down to nothing; ours ends at 0.01 m/s with a fading force below 0.05 m/s.
    expect(rest.x).toBeCloseTo(4.11883, 2);
    expect(rest.heading).toBeCloseTo(2.74589, 2);
  });

  const terminalRatio = (vehicle: SpinVehicle, v: number, w: number): number => {
    let ratio = NaN;
    travelToRest(new TyreMotion(vehicle, LEVEL, 0), [0, 0, 0, v, 0, w], 1e-7, (_, y) => {
      const size = Math.hypot(y[3], y[4]);
      if (size > 0.06) ratio = size / (R * Math.abs(y[5]));
    });
    return ratio;
  };

  test.each([
    [6, 6],
    [4, 1],
    [3, 4],
  ])('a ring from v %f, w %f: both motions stop together, ratio 1.0', (v, w) => {
    const ring: SpinVehicle = { m, I: m * R * R, wheels: contacts([[R, m * G]], 48) };
    expect(terminalRatio(ring, v, w)).toBeCloseTo(1, 1);
  });

  test('a uniform disk: ratio 0.653', () => {
    const rings = Array.from({ length: 24 }, (_, k): [number, number] => {
      const [inner, outer] = [k / 24, (k + 1) / 24];
      return [R * Math.sqrt((inner * inner + outer * outer) / 2), m * G * (outer * outer - inner * inner)];
    });
    const disk: SpinVehicle = { m, I: (m * R * R) / 2, wheels: contacts(rings, 32) };
    expect(Math.abs(terminalRatio(disk, 6, 6) - 0.653)).toBeLessThan(0.03);
  });
});

describe("Fiala's tyre", () => {
  test('the cubic is f Fz (1 - (1 - t/ts)^3) up to full sliding (published identity)', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1, noNaN: true }), (part) => {
        const [stiffness, most] = [50_000, 3200];
        const limit = (3 * most) / stiffness;
        return Math.abs(sideShare((stiffness * part * limit) / most) - (1 - (1 - part) ** 3)) < 1e-9;
      }),
      { seed: 20261206 },
    );
  });
  test.each([
    [1, 795.81],
    [2, 1447.72],
    [4, 2377.55],
    [8, 3138.39],
    [12, 3200],
  ])('50 kN/rad, f 0.8, 4 kN, at %i degrees: %f N (derived from the published form)', (degrees, force) =>
    expect(3200 * sideShare((50_000 * Math.tan((degrees * Math.PI) / 180)) / 3200)).toBeCloseTo(force, 2),
  );
});
