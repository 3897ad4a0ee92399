import { describe, expect, test } from 'vitest';
import type { Dimension } from '@/lib/units/dimension';
import { decimalsFor, formatEstimate, formatValue, formatWithUnit, fromDisplay, toDisplay } from '@/lib/units/format';
import { unitSpelled } from '@/lib/units/unit';

describe('conversion factors, exact by definition (NIST SP 811, appendix B)', () => {
  test.each([
    ['speed', 'mph', '0.44704'],
    ['length', 'ft', '0.3048'],
    ['length', 'in', '0.0254'],
    ['mass', 'lb', '0.45359237'],
    ['acceleration', 'g', '9.80665'],
    ['energy', 'ft·lbf', '1.3558179483314004'],
    ['yawInertia', 'slug·ft²', '1.3558179483314004'],
    ['impulse', 'lbf·s', '4.4482216152605'],
    ['forcePerWidth', 'lbf/in', '175.12683524647638'],
    ['stiffnessPerWidth', 'psi', '6894.7572931683613'],
  ] as const)('one %s %s', (dimension: Dimension, spelling, si) => {
    const found = unitSpelled(dimension, spelling);
    expect(found?.factor.toSignificantDigits(17).toString()).toBe(si);
  });
});

describe('shown values', () => {
  test('keep what was entered', () => {
    expect(formatValue(fromDisplay(35, 'speed', 'metric'), 'speed', 'metric')).toBe('35');
    expect(formatValue(fromDisplay(12.5, 'length', 'us'), 'length', 'us')).toBe('12.5');
  });
  test('have a true minus sign and no minus zero', () => {
    expect(formatValue(-3.5, 'angle', 'metric')).toBe('\u22123.5');
    expect(formatValue(-0.001, 'angle', 'metric', { decimals: 1 })).toBe('0.0');
  });
  test('carry their unit', () => {
    expect(formatWithUnit(10, 'speed', 'metric')).toBe('36\u00a0km/h');
    expect(formatWithUnit(19.38, 'angle', 'us', { decimals: 1 })).toBe('19.4°');
    expect(formatWithUnit(0.22, 'ratio', 'us')).toBe('0.22');
  });
  test('round half away from zero', () => {
    expect(formatValue(0.125, 'ratio', 'metric', { decimals: 2 })).toBe('0.13');
    expect(formatValue(-0.125, 'ratio', 'metric', { decimals: 2 })).toBe('\u22120.13');
  });
});

describe('rounding to the uncertainty (JCGM 100:2008, 7.2.6: two digits of u, the estimate to the same place)', () => {
  test.each([
    [0.35, 2],
    [0.0996, 2],
    [3.5, 1],
    [35, 0],
    [350, 0],
  ])('u = %f leaves %i decimals', (u, decimals) => expect(decimalsFor(u, 'ratio', 'metric')).toBe(decimals));

  test('the example of 7.2.6: 10.057 62 ohm with u = 27 milliohm is 10.058', () => {
    expect(formatEstimate({ value: 10.05762, u: 0.027, low: 10, high: 10.1 }, 'ratio', 'metric').value).toBe('10.058');
  });
  test('headline speeds never have two decimals', () => {
    const estimate = formatEstimate({ value: 2, u: 0.001, low: 1.998, high: 2.002 }, 'speed', 'metric', {
      headline: true,
    });
    expect(estimate).toEqual({ value: '7.2', u: '0.0', low: '7.2', high: '7.2', unit: 'km/h' });
  });
  test('a spread of nothing does not fail', () => expect(decimalsFor(0, 'length', 'metric')).toBe(2));
  test('display and back', () => expect(toDisplay(fromDisplay(17.3, 'speed', 'us'), 'speed', 'us')).toBe(17.3));
});
