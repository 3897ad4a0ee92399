import { describe, expect, test } from 'vitest';
import { REGRESSIONS, consistentRestitution } from '@/lib/mechanics/restitution-regression';

const [first, second] = REGRESSIONS;

describe('the regressions, from memory; values computed from the recalled formulas apart from this program', () => {
  test.each([
    [1, 0.4748, 0.4748],
    [2, 0.388, 0.396],
    [3, 0.3246, 0.3451],
    [4, 0.2759, 0.3043],
    [5, 0.2363, 0.2688],
    [6, 0.2025, 0.237],
  ])('at %f m/s', (v, a, b) => {
    expect(first.at(v)).toBeCloseTo(a, 4);
    expect(second.at(v)).toBeCloseTo(b, 4);
  });
  test('nothing outside 1 to 6 m/s', () => {
    for (const { at } of REGRESSIONS) expect([at(0.999), at(6.001), at(NaN)]).toEqual([null, null, null]);
  });
  test('between 2 and 6 m/s within 0.2 to 0.4, as staged tests gave (SAE 931842)', () => {
    for (const { at } of REGRESSIONS)
      for (let v = 2; v <= 6; v += 0.1) {
        expect(at(v)).toBeGreaterThan(0.2);
        expect(at(v)).toBeLessThan(0.4);
      }
  });
});

describe('restitution and closing speed that fit each other', () => {
  test.each([0.5, 0.7, 0.9, 1.1, 1.2])('a speed of parting of %f m/s', (parting) => {
    for (const regression of REGRESSIONS) {
      const both = consistentRestitution(regression, (e) => parting / e);
      expect(both?.e).toBeCloseTo(regression.at(both?.closingSpeed ?? NaN) ?? NaN, 12);
      expect((both?.e ?? NaN) * (both?.closingSpeed ?? NaN)).toBeCloseTo(parting, 9);
    }
  });
  test('a closing speed that does not depend on it is kept', () => {
    expect(consistentRestitution(first, () => 3)?.closingSpeed).toBeCloseTo(3, 12);
    expect(consistentRestitution(first, () => 3)?.e).toBeCloseTo(0.3246, 4);
    expect(consistentRestitution(first, () => 1)?.closingSpeed).toBeCloseTo(1, 12);
    expect(consistentRestitution(first, () => 6)?.closingSpeed).toBeCloseTo(6, 12);
  });
  test('a closing speed that grows with it, as from a known loss of energy: 2 E (1/m) = v^2 (1 - e^2)', () => {
    const both = consistentRestitution(second, (e) => 2 / Math.sqrt(1 - e * e));
    expect((both?.closingSpeed ?? NaN) ** 2 * (1 - (both?.e ?? NaN) ** 2)).toBeCloseTo(4, 9);
  });
  test('nothing where they fit only outside the range', () => {
    expect(consistentRestitution(first, (e) => 0.4 / e)).toBeNull();
    expect(consistentRestitution(first, (e) => 1.3 / e)).toBeNull();
    expect(consistentRestitution(first, () => NaN)).toBeNull();
  });
});
