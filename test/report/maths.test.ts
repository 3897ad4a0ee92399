import { expect, test } from 'vitest';
import { parseMaths } from '@/lib/report/maths';

test('symbols are italic, names and subscripts upright, vectors apart', () => {
  expect(parseMaths('!v_{A}′ = s cos δ_k')).toEqual([
    { kind: 'vector', text: 'v' },
    { kind: 'sub', of: [{ kind: 'text', text: 'A' }] },
    { kind: 'text', text: '′ = ' },
    { kind: 'symbol', text: 's' },
    { kind: 'text', text: ' cos ' },
    { kind: 'symbol', text: 'δ' },
    { kind: 'sub', of: [{ kind: 'symbol', text: 'k' }] },
  ]);
});

test('minus is a minus sign, a product a raised dot, a difference upright', () => {
  expect(parseMaths('Δx - 2 * 3')).toEqual([
    { kind: 'text', text: 'Δ' },
    { kind: 'symbol', text: 'x' },
    { kind: 'text', text: ' − 2 · 3' },
  ]);
});

test('fractions and roots nest', () => {
  expect(parseMaths('frac{root{a}}{"kg"}')).toEqual([
    {
      kind: 'fraction',
      over: [{ kind: 'root', of: [{ kind: 'symbol', text: 'a' }] }],
      under: [{ kind: 'text', text: 'kg' }],
    },
  ]);
});

test.each(['frac{a', 'a}', 'x_{'])('%s is refused', (source) => expect(() => parseMaths(source)).toThrow(/maths:/));
