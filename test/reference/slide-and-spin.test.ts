import { describe, expect, test } from 'vitest';
import { G } from '@/lib/mechanics/legs';
import { type Ground, TyreMotion, type Wheel, travelToRest } from '@/lib/mechanics/spin';

/**
 * A rigid ring that slides and spins on dry friction, as a locked vehicle with many contacts on a circle (Farkas et al.,
 * Phys. Rev. Lett. 90, 248302, 2003; figures for the ring derived from its integrals). And slopes, by a textbook.
 */

const FRICTION = 0.7;
const LEVEL: Ground = { friction: FRICTION, frictionAt: null, grade: 0, uphill: 0 };
const R = 1.5;
const M = 1000;

/** Equal contacts on a circle of radius R, all locked, under a body with this radius of gyration. */
function ringOf(contacts: number, gyration: number): TyreMotion {
  const wheels = Array.from({ length: contacts }, (_, k): Wheel => {
    const turn = (2 * Math.PI * (k + 0.5)) / contacts;
    return { x: R * Math.cos(turn), y: R * Math.sin(turn), load: (M * G) / contacts, braking: 1, steer: 0 };
  });
  return new TyreMotion({ m: M, I: M * gyration * gyration, wheels }, LEVEL, 0);
}

describe('a ring', () => {
  // v / (R w): share of friction that slows the slide, share of friction times R that slows the spin.
  test.each([
    [0.1, 0.05006, 0.9975],
    [0.25, 0.126, 0.98418],
    [0.5, 0.25866, 0.93422],
    [1, 2 / Math.PI, 2 / Math.PI],
    [2, 0.93422, 0.25866],
    [4, 0.98418, 0.126],
  ])('at v = %f R w: force %f, moment %f', (ratio, force, moment) => {
    const dy = new Float64Array(6);
    const w = 2;
    // At the ratio 1 one point of a true ring stands still; many contacts come near enough to it.
    ringOf(4096, R).derivative(0, Float64Array.of(0, 0, 0.4, ratio * R * w, 0, w), dy);
    expect(Math.abs(-dy[3] / (FRICTION * G) - force)).toBeLessThan(1e-5);
    expect(Math.abs(-dy[5] / ((FRICTION * G) / R) - moment)).toBeLessThan(1e-5);
  });

  test('spinning alone from 4 rad/s it turns 1.74809 rad', () => {
    // Closed form w^2 R / (2 f g); ours ends where the force fades, hence 1 part in 1000.
    const rest = travelToRest(ringOf(64, R), [0, 0, 0, 0, 0, 4], 1e-7);
    expect(Math.abs(rest.heading / 1.74809 - 1)).toBeLessThan(1e-3);
    expect(Math.hypot(rest.x, rest.y)).toBeLessThan(1e-9);
  });

  test('sliding alone from 6 m/s it goes 2.62213 m', () => {
    const rest = travelToRest(ringOf(64, R), [0, 0, 0, 6, 0, 0], 1e-7);
    expect(Math.abs(rest.x / 2.62213 - 1)).toBeLessThan(1e-3);
    expect(Math.abs(rest.heading)).toBeLessThan(1e-9);
  });

  // Both motions end together at a ratio that the radius of gyration alone decides, whatever the start. Watched down to
  // 0.6 m/s only: slower, contacts that nearly stand still come under 0.05 m/s, where the force of ours fades.
  test.each([
    [0.82, 1.274],
    [0.8, 1.367],
    [0.85, 1.179],
    [0.9, 1.083],
    [1, 1],
  ])('radius of gyration %f R: v / (R w) tends to %f', (share, wanted) => {
    let ratio = NaN;
    // Begun at 1.2 times the ratio.
    travelToRest(ringOf(64, share * R), [0, 0, 0, 36 * wanted, 0, 20], 1e-6, (_, y) => {
      const speed = Math.hypot(y[3], y[4]);
      if (speed > 0.6) ratio = speed / (R * Math.abs(y[5]));
    });
    expect(Math.abs(ratio / wanted - 1)).toBeLessThan(0.02);
  });
});

describe('slopes', () => {
  const locked = (friction: number, degrees: number, heading: number): number => {
    const wheels = [1, -1].map((x): Wheel => ({ x, y: 0, load: (M * G) / 2, braking: 1, steer: 0 }));
    const ground = { ...LEVEL, friction, grade: Math.tan((degrees * Math.PI) / 180), uphill: heading };
    const dy = new Float64Array(6);
    new TyreMotion({ m: M, I: M, wheels }, ground, 0).derivative(0, Float64Array.of(0, 0, 0, 5, 0, 0), dy);
    return (dy[3] * 9.8) / G;
  };

  // OpenStax College Physics m42139 and University Physics m58304 print what a car gains uphill at 4.00° with g 9.80 when
  // all its weight is on driven wheels; braked downhill it loses as much, for the same two forces act the other way round.
  test.each([
    [1, 9.09, 6e-3],
    [0.7, 6.16, 6e-3],
    [0.1, 0.294, 6e-4],
  ])('friction %f: %f m/s^2 braked down 4.00°', (friction, printed, tolerance) =>
    expect(Math.abs(-locked(friction, 4, Math.PI) - printed)).toBeLessThan(tolerance),
  );

  // Same source: a snowboarder with friction 0.20 gains 0.29 m/s^2 at 13° and loses 0.23 m/s^2 at 10.0°.
  test.each([
    [13, 0.29],
    [10, -0.23],
  ])('friction 0.20 down %i°: %f m/s^2', (degrees, printed) =>
    expect(Math.abs(locked(0.2, degrees, Math.PI) - printed)).toBeLessThan(6e-3),
  );
});
