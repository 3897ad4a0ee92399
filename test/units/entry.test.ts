import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { DIMENSIONS, type UnitSystem } from '@/lib/units/dimension';
import { entryText, limitsText } from '@/lib/units/entry';
import { parseEntry } from '@/lib/units/parse';

describe('a value and its spread in one line', () => {
  test.each([
    [1420, { shape: 'normal', sd: 25 }, '1420 ± 25', null],
    [0.6, { shape: 'rectangular', low: 0.5, high: 0.7 }, '0.5..0.7', null],
    [0.11, { shape: 'triangular', low: 0.08, high: 0.15 }, '0.11', 'triangle 0.08..0.15'],
    [0.6, { shape: 'rectangular', low: 0.5, high: 0.9 }, '0.6', 'limits 0.5..0.9'],
    [3, { shape: 'fixed' }, '3', null],
  ] as const)('%f', (value, spread, text, limits) => {
    expect(entryText(value, spread, 'ratio', 'metric')).toBe(text);
    expect(limitsText(value, spread, 'ratio', 'metric')).toBe(limits);
  });

  test('is read back as it was', () => {
    const figure = fc.double({ min: 0.01, max: 5000, noNaN: true }).map((x) => Number(x.toPrecision(6)));
    fc.assert(
      fc.property(
        figure,
        figure,
        fc.constantFrom(...DIMENSIONS),
        fc.constantFrom<UnitSystem>('metric', 'us'),
        (value, sd, dimension, system) => {
          const entry = parseEntry(entryText(value, { shape: 'normal', sd }, dimension, system), dimension, system);
          if (!entry.ok || entry.spread?.shape !== 'normal') return false;
          return Math.abs(entry.value - value) < 1e-9 * value && Math.abs(entry.spread.sd - sd) < 1e-9 * sd;
        },
      ),
      { seed: 20261201, numRuns: 500 },
    );
  });
});
