import { describe, expect, test } from 'vitest';
import { G, legStartSpeedSquared } from '@/lib/mechanics/legs';
import { meanAcceleration, peakAcceleration } from '@/lib/mechanics/pulse';
import { recorderUncertainty } from '@/lib/mechanics/recorder';

/** Travel to rest and pulses, against printed values. */

const MPH = 0.44704; // exact, NIST SP 811
const FOOT = 0.3048;

const startSpeed = (end: number, distance: number, friction: number, share = 1, grade = 0): number =>
  Math.sqrt(legStartSpeedSquared(end * end, distance, friction, share, grade));

/** Retardation along a leg of 1 m in multiples of g. */
const retardation = (friction: number, share: number, degrees: number): number =>
  legStartSpeedSquared(0, 1, friction, share, Math.tan((degrees * Math.PI) / 180)) / (2 * G);

test('standard gravity', () => expect(G).toBe(9.80665)); // exact, NIST SP 811

describe('stopping distances', () => {
  test.each([
    [7, 64.3],
    [5, 90],
  ])('OpenStax College Physics m42099: 30.0 m/s at %d m/s^2 stops in %d m', (a, distance) => {
    // Half a unit of the last digit of the distance is 0.012 m/s.
    expect(Math.abs(startSpeed(0, distance, a / G) - 30)).toBeLessThan(0.012);
  });

  // AASHTO Green Book stopping sight distance, braking part, at 11.2 ft/s^2 (the method: TxDOT Roadway Design Manual 4.11.1;
  // the rows are recalled and reproduce from it).
  test.each([
    [20, 38.4],
    [25, 60],
    [30, 86.4],
    [35, 117.6],
    [40, 153.6],
    [50, 240],
    [55, 290.3],
    [60, 345.5],
    [70, 470.3],
  ])('%d mph brakes in %d ft', (mph, feet) => {
    const found = startSpeed(0, feet * FOOT, (11.2 * FOOT) / G) / MPH;
    expect(Math.abs(found / mph - 1)).toBeLessThan(1.2e-3); // the table's 1.075 V^2/a rounds (22/15)^2 / 2
  });
});

describe('skid to speed', () => {
  // S^2 = 30 d f, S in mph and d in ft, rounds 29.91 (bellsouthpwp.net n5kda/speed): 0.15 % on the speed.
  test.each([
    [40, 0.75],
    [120, 0.6],
    [200, 0.45],
  ])('%d ft at friction %d', (feet, f) => {
    expect(Math.abs(startSpeed(0, feet * FOOT, f) / MPH / Math.sqrt(30 * feet * f) - 1)).toBeLessThan(1.5e-3);
  });

  test('60 ft of skid that ends at 30 mph: 46 to 48 mph for friction 0.7 to 0.8; 40 ft to rest: about 30 (e-z.net/~ts/speedch.htm)', () => {
    expect(Math.abs(startSpeed(30 * MPH, 60 * FOOT, 0.7) / MPH - 46)).toBeLessThan(0.6);
    expect(Math.abs(startSpeed(30 * MPH, 60 * FOOT, 0.8) / MPH - 48)).toBeLessThan(0.6);
    expect(Math.abs(startSpeed(0, 40 * FOOT, 0.75) / MPH - 30)).toBeLessThan(0.1);
  });

  test('braking efficiency multiplies the friction (same page)', () =>
    expect(startSpeed(3, 12, 0.8, 0.5)).toBeCloseTo(startSpeed(3, 12, 0.4, 1), 14));

  test('one leg after another is one leg of the whole length', () => {
    const end = legStartSpeedSquared(4, 5, 0.7, 0.6, 0.03);
    expect(legStartSpeedSquared(end, 7, 0.7, 0.6, 0.03)).toBeCloseTo(legStartSpeedSquared(4, 12, 0.7, 0.6, 0.03), 12);
  });
});

describe('grades', () => {
  // OpenStax College Physics m42139 and University Physics m58304 print the acceleration uphill at 4.00° with g = 9.80,
  // friction 1.0, 0.7, 0.100: friction forward, gravity backward along the slope. Braking downhill has the same two forces.
  test.each([
    [1.0, 1, 9.09],
    [0.7, 1, 6.16],
    [0.1, 1, 0.294],
    [1.0, 0.5, 4.2],
    [0.7, 0.5, 2.74],
    [0.1, 0.5, -0.195],
  ])('friction %d, share %d: %d m/s^2', (friction, share, printed) => {
    const tolerance = Math.abs(printed) > 1 ? 6e-3 : 6e-4;
    expect(Math.abs(9.8 * retardation(friction, share, -4) - printed)).toBeLessThan(tolerance);
  });

  test('a snowboarder with friction 0.20 speeds up by 0.29 m/s^2 at 13° and slows by 0.23 m/s^2 at 10.0°', () => {
    expect(Math.abs(9.8 * retardation(0.2, 1, -13) + 0.29)).toBeLessThan(6e-3);
    expect(Math.abs(9.8 * retardation(0.2, 1, -10) - 0.23)).toBeLessThan(6e-3);
    expect(legStartSpeedSquared(0, 1, 0.2, 1, Math.tan((-13 * Math.PI) / 180))).toBeLessThan(0);
  });
});

describe('pulses', () => {
  test('the peak of a haversine is twice its mean (by summing the pulse)', () => {
    const n = 10_000;
    let sum = 0;
    for (let i = 0; i < n; i++) sum += Math.sin((Math.PI * (i + 0.5)) / n) ** 2;
    expect(peakAcceleration(sum / n)).toBeCloseTo(1, 12);
  });

  test('OpenStax m42159: 4000 N for 0.200 s turn a bumper car of 200 kg from 2.80 m/s to 1.20 m/s the other way', () => {
    expect(meanAcceleration(2.8 + 1.2, 0.2)).toBeCloseTo(4000 / 200, 12);
  });

  test('a sled pulse of 91 ms, triangular with peak 10 g, changes the speed by 16 km/h (whiplash test protocol; recalled, 16.06)', () => {
    expect(Math.abs(meanAcceleration(16 / 3.6, 0.091) / G - 5)).toBeLessThan(0.05);
  });
});

// 49 CFR 563.8, table III: a speed change is recorded in steps of 1 km/h and true to 10 %. A step alone has limits of 0.5
// km/h, rectangular: 0.29 km/h (JCGM 100:2008, 4.3.7); the accuracy alone of 100 km/h is 10 / sqrt 3 = 5.77 km/h.
test.each([
  [0, 0.29],
  [100, Math.hypot(5.77, 0.29)],
])('a recorder that shows %i km/h: standard uncertainty %f km/h', (shown, wanted) =>
  expect(Math.abs(recorderUncertainty(shown / 3.6) * 3.6 - wanted)).toBeLessThan(0.005),
);
