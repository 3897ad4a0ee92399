import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { DIMENSIONS, type UnitSystem } from '@/lib/units/dimension';
import { entryText, limitsText } from '@/lib/units/entry';
import { parseEntry } from '@/lib/units/parse';

describe('a value and its spread in one line', () => {
  test.each([
    [1420, { shape: 'normal', sd: 25 }, '1420 ± 25', null],
    [0.6, { shape: 'rectangular', low: 0.5, high: 0.7 }, '0.5 to 0.7', null],
    [0.11, { shape: 'triangular', low: 0.08, high: 0.15 }, '0.11', 'triangle 0.08 to 0.15'],
    [0.6, { shape: 'rectangular', low: 0.5, high: 0.9 }, '0.6', 'limits 0.5 to 0.9'],
    [3, { shape: 'fixed' }, '3', null],
  ] as const)('%f', (value, spread, text, limits) => {
    expect(entryText(value, spread, 'ratio', 'metric')).toBe(text);
    expect(limitsText(value, spread, 'ratio', 'metric')).toBe(limits);
  });

  test('a long tail of a conversion is rounded well below the spread', () => {
    expect(entryText(1510, { shape: 'normal', sd: 20 }, 'mass', 'us')).toBe('3329.0 ± 44.1');
    expect(entryText(3.81, undefined, 'length', 'us')).toBe('12.5');
    expect(entryText(4.62, undefined, 'length', 'us')).toBe('15.157');
    expect(entryText(1 / 3, { shape: 'normal', sd: 1e-9 }, 'ratio', 'metric')).toBe('0.33333333333 ± 0.000000001');
  });

  const figure = fc.double({ min: 0.01, max: 5000, noNaN: true }).map((x) => Number(x.toPrecision(6)));
  const anyUnit = [fc.constantFrom(...DIMENSIONS), fc.constantFrom<UnitSystem>('metric', 'us')] as const;

  test('is read back, to within half a hundredth of its spread', () => {
    fc.assert(
      fc.property(figure, figure, ...anyUnit, (value, sd, dimension, system) => {
        const entry = parseEntry(entryText(value, { shape: 'normal', sd }, dimension, system), dimension, system);
        if (!entry.ok || entry.spread?.shape !== 'normal') return false;
        const most = 0.005 * sd * (1 + 1e-9);
        return Math.abs(entry.value - value) <= most && Math.abs(entry.spread.sd - sd) <= most;
      }),
      { seed: 20261201, numRuns: 500 },
    );
  });

  test('as entered it is read back exactly, as long as the unit is that of SI', () => {
    fc.assert(
      fc.property(figure, figure, (low, wide) => {
        const high = Number((low + wide).toPrecision(6));
        fc.pre(low < high);
        const spread = { shape: 'rectangular', low, high } as const;
        const entry = parseEntry(entryText((low + high) / 2, spread, 'length', 'metric'), 'length', 'metric');
        return (
          entry.ok && entry.spread?.shape === 'rectangular' && entry.spread.low === low && entry.spread.high === high
        );
      }),
      { seed: 20261202, numRuns: 500 },
    );
  });
});
