import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { DIMENSIONS, type Dimension, type UnitSystem } from '@/lib/units/dimension';
import { formatValue } from '@/lib/units/format';
import { parseEntry } from '@/lib/units/parse';

const read = (text: string, dimension: Dimension, system: UnitSystem = 'metric') => parseEntry(text, dimension, system);
const value = (text: string, dimension: Dimension, system: UnitSystem = 'metric'): number => {
  const entry = read(text, dimension, system);
  if (!entry.ok) throw new Error(entry.says);
  return entry.value;
};

describe('what people write', () => {
  test.each([
    ['12 ft 6 in', 'length', 3.81],
    [`6'2"`, 'length', 1.8796],
    ['5 1/2 in', 'length', 0.1397],
    ['3/4 in', 'length', 0.01905],
    ['35 mph', 'speed', 15.6464],
    ['36', 'speed', 10],
    ['1 450', 'mass', 1450],
    ['1 450,5 kg', 'mass', 1450.5],
    ['1,5', 'length', 1.5],
    ['.5', 'ratio', 0.5],
    ['5 %', 'ratio', 0.05],
    ['\u22123.5\u00b0', 'angle', -3.5],
    ['110 ms', 'time', 0.11],
    ['1e3', 'mass', 1000],
    ['1.45 t', 'mass', 1450],
  ] as const)('%s', (text, dimension, si) => expect(value(text, dimension)).toBeCloseTo(si, 12));

  test('a plain number is in the unit that is shown', () => {
    expect(value('10', 'speed', 'us')).toBe(4.4704);
    expect(value('10', 'length', 'us')).toBe(3.048);
  });

  test.each([
    ['0.7 ± 0.05', 'ratio', 0.7, { shape: 'normal', sd: 0.05 }],
    ['1420 +- 25', 'mass', 1420, { shape: 'normal', sd: 25 }],
    ['1420 ± 2 %', 'mass', 1420, { shape: 'normal', sd: 28.4 }],
    ['30 mph ± 2', 'speed', 13.4112, { shape: 'normal', sd: 0.89408 }],
    ['30 ± 2 mph', 'speed', 13.4112, { shape: 'normal', sd: 0.89408 }],
    ['0.65..0.75', 'ratio', 0.7, { shape: 'rectangular', low: 0.65, high: 0.75 }],
    ['5 to 6 ft', 'length', 1.6764, { shape: 'rectangular', low: 1.524, high: 1.8288 }],
  ] as const)('%s with its spread', (text, dimension, si, spread) => {
    expect(read(text, dimension)).toEqual({ ok: true, value: expect.closeTo(si, 12), spread });
  });
});

describe('what cannot be read says why and what would be right', () => {
  test.each([
    ['12 furlong', 'length', /«furlong» is no unit known here: write m, cm, mm, ft, in/],
    ['1,450', 'mass', /can be read as 1450 or 1\.450/],
    ['abc', 'mass', /«abc» is not a number in kilograms/],
    ['', 'length', /nothing was entered; write a number in metres/],
    ['0.75..0.65', 'ratio', /first end of a range must be the smaller/],
    ['5 ± 0', 'mass', /must be greater than 0/],
    ['5 ± 1 ± 2', 'mass', /± stands twice/],
    ['6 in 12 ft', 'length', /wrong order/],
    ['1/0 in', 'length', /divides by zero/],
    ['0.65-0.75', 'ratio', /may be a range: write it as 0\.65\.\.0\.75/],
    ['3 kg', 'ratio', /«kg» is no unit known here: write %/],
    ['1.2.3', 'mass', /more than one decimal mark/],
    ['--3', 'angle', /is not a number/],
  ] as const)('%s', (text, dimension, says) => {
    const entry = read(text, dimension);
    expect(entry.ok ? 'was read' : entry.says).toMatch(says);
  });

  test('any text is read or refused in words, never thrown', () => {
    fc.assert(
      fc.property(
        fc.string({ unit: fc.constantFrom(...'0123456789 .,-+±/%°ftinmphkg\'"eE'.split('')) }),
        fc.constantFrom(...DIMENSIONS),
        (text, dimension) => {
          const entry = read(text, dimension);
          return entry.ok ? Number.isFinite(entry.value) : entry.says.length > 5;
        },
      ),
      { seed: 20261201, numRuns: 3000 },
    );
  });
});

test('what is shown is read back as it was, to the last digits of a double', () => {
  fc.assert(
    fc.property(
      fc.double({ min: -1e6, max: 1e6, noNaN: true }).map((x) => Number(x.toPrecision(9))),
      fc.constantFrom(...DIMENSIONS),
      fc.constantFrom<UnitSystem>('metric', 'us'),
      (si, dimension, system) => {
        const back = value(formatValue(si, dimension, system), dimension, system);
        return Math.abs(back - si) <= 1e-11 * Math.abs(si) + 1e-15;
      },
    ),
    { seed: 20261201, numRuns: 2000 },
  );
});
