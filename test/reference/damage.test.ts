import { describe, expect, test } from 'vitest';
import { parseCaseText } from '@/lib/casefile/parse';
import type { Damage } from '@/lib/casefile/schema';
import { stripWork } from '@/lib/mechanics/crush';
import { solveCase } from '@/lib/solve-case';
import { buildCase, leaves, q } from '../support/build-case';

/** Damage energy and what follows from it, against figures from outside. */

// Exact by definition (NIST SP 811): pound 0.45359237 kg, inch 0.0254 m, standard gravity 9.80665 m/s^2.
const INCH = 0.0254;
const POUND = 0.45359237;
const POUND_FORCE = POUND * 9.80665;
const INCH_POUND = POUND_FORCE * INCH;
const MPH = 0.44704;

/** Energy, in lb, of equally spaced depths over a width (in), for A lb/in and B lb/in^2, by the strips of the project. */
function inInchPounds(depths: number[], width: number, A: number, B: number): number {
  const strip = (width / (depths.length - 1)) * INCH;
  const [a, b] = [A * (POUND_FORCE / INCH), B * (POUND_FORCE / INCH ** 2)];
  const works = depths.slice(1).map((depth, i) => stripWork(strip, depths[i] * INCH, depth * INCH, a, b));
  return works.reduce((sum, work) => sum + work, 0) / INCH_POUND;
}

describe('crush profiles', () => {
  // The formula for six depths (trade form of Campbell's integral, recalled; it equals the exact integral of straight
  // pieces): L/5 (A/2 (C1 + 2C2 + 2C3 + 2C4 + 2C5 + C6) + B/6 (C1^2 + 2C2^2 + .. + C6^2 + C1C2 + .. + C5C6) + 5G).
  test('six depths 2 4 6 6 4 2 in over 60 in, A 317, B 56: 172 913.3929 in lb (derived from it)', () =>
    expect(inInchPounds([2, 4, 6, 6, 4, 2], 60, 317, 56)).toBeCloseTo(172_913.3929, 3));

  test.each([2, 4, 6])('%i depths of 8 in are L (A C + B C^2/2 + A^2/(2B)): 313 513.3929 in lb', (count) =>
    expect(inInchPounds(Array<number>(count).fill(8), 60, 317, 56)).toBeCloseTo(313_513.3929, 3),
  );

  test('of a straight profile 2, 4 and 6 depths give the same', () => {
    const straight = (count: number): number[] => Array.from({ length: count }, (_, i) => 1 + (9 * i) / (count - 1));
    const [two, four, six] = [2, 4, 6].map((count) => inInchPounds(straight(count), 60, 317, 56));
    expect(four).toBeCloseTo(two, 6);
    expect(six).toBeCloseTo(two, 6);
  });

  // Stiffness by class, DOT HS 805 732 (about 1981; recalled): the printed G is A^2/(2B) to 2.1 %. Without any depth G is all.
  test.each([
    [302, 47, 967],
    [259, 43, 777],
    [317, 56, 900],
    [356, 34, 1874],
    [325, 37, 1429],
    [383, 126, 580],
    [366, 38, 1755],
    [391, 41, 1874],
    [410, 44, 1931],
    [357, 13, 4986],
    [297, 70, 628],
    [77, 37, 81],
    [140, 67, 148],
    [173, 57, 263],
    [143, 50, 203],
    [177, 47, 331],
  ])('A %i lb/in, B %i lb/in^2: G %i lb', (A, B, G) =>
    expect(Math.abs(inInchPounds([0, 0], 1, A, B) / G - 1)).toBeLessThan(0.021),
  );
});

describe('Campbell 1974 (SAE 740565): V = b0 + b1 C', () => {
  // 4500 lb, 80 in wide, b0 6.85 mph, b1 0.88 mph/in (constants recalled): A = m b0 b1/w, B = m b1^2/w.
  const mass = 4500 * POUND;
  const width = 80 * INCH;
  const [b0, b1] = [6.85 * MPH, (0.88 * MPH) / INCH];
  const [A, B] = [(mass * b0 * b1) / width, (mass * b1 * b1) / width];

  test('A 272.041 lb/in, B 34.9483 lb/in^2 (derived)', () => {
    expect(A / (POUND_FORCE / INCH)).toBeCloseTo(272.041, 3);
    expect(B / (POUND_FORCE / INCH ** 2)).toBeCloseTo(34.9483, 4);
  });

  test.each([
    [0, 6.85],
    [20, 24.45],
    [35, 37.65],
  ])('%i in of crush: the energy gives back %f mph', (inches, mph) => {
    const energy = stripWork(width, inches * INCH, inches * INCH, A, B);
    expect(Math.sqrt((2 * energy) / mass) / MPH).toBeCloseTo(mph, 9);
  });
});

describe('Croft, «Practical Auto Crash Reconstruction in LOSRIC, Part V», Dynamic Chiropractic: 1200 J', () => {
  // 927 kg strikes 850 kg, e 0.6; bumpers took 350 J over a stroke of 22 mm and 850 J over 40 mm. Printed: closing 6.4 mph,
  // speed changes 4.9 and 5.4 mph; its chain truncates: 0.12 mph. Exact: 2.908105, 2.225674 and 2.427294 m/s.
  /** A damage 1 m wide of an even depth C that took the energy: with a = b C it is 2 b C^2. */
  const even = (depth: number, energy: number): Damage => {
    const b = energy / (2 * depth * depth);
    return { depths: [q(depth), q(depth)], width: q(1), forceAngle: q(0), a: q(b * depth), b: q(b) };
  };

  test('from the damage of both, through a whole case', async () => {
    const casefile = buildCase({
      masses: [927, 850],
      approach: [null, null],
      departure: [leaves(2.908105 - 2.225674, 0, 0), leaves(2.427294, 0, 0)],
      method: 'restitution',
      restitution: 0.6,
      impulseRatio: 0,
    });
    const damage = { A: even(0.022, 350), B: even(0.04, 850) };
    const parsed = parseCaseText(JSON.stringify({ ...casefile, damage }));
    if (!parsed.ok) throw new Error(JSON.stringify(parsed.issues));
    const outcome = await solveCase(parsed.casefile);
    if (outcome.kind !== 'solved') throw new Error(JSON.stringify(outcome));
    const { central } = outcome.result;
    expect(central['A.damageEnergy']).toBeCloseTo(350, 9);
    expect(central['B.damageEnergy']).toBeCloseTo(850, 9);
    expect(Math.abs(central.damageClosingSpeed / MPH - 6.4)).toBeLessThan(0.12);
    expect(central.damageClosingSpeed).toBeCloseTo(2.908105, 6);
    // The travel of both vehicles says the same, and the energy lost is that of the bumpers.
    expect(central.closingSpeed).toBeCloseTo(2.908105, 5);
    expect(central.energyLost).toBeCloseTo(1200, 2);
    expect(Math.abs(central['A.deltaV'] / MPH - 4.9)).toBeLessThan(0.12);
    expect(Math.abs(central['B.deltaV'] / MPH - 5.4)).toBeLessThan(0.12);
  });
});
