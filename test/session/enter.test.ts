import { describe, expect, test } from 'vitest';
import { DEFAULT_SOURCE, DRAWN_SOURCE } from '@/lib/casefile/defaults';
import { ENTERED_SOURCE, enterQuantity, stepOf } from '@/lib/session/enter';

describe('a typed value', () => {
  const spread = { shape: 'normal', sd: 20 } as const;

  test('without a spread keeps the old one', () => {
    const edit = enterQuantity('pulse', { value: 1, spread, source: 'scale ticket' }, { value: 2 });
    expect(edit).toEqual({ do: 'value', path: 'pulse', value: 2, source: 'scale ticket' });
  });

  test('with a spread replaces both', () => {
    const edit = enterQuantity('pulse', { value: 1, source: 'scale ticket' }, { value: 2, spread });
    expect(edit).toEqual({ do: 'set', path: 'pulse', to: { value: 2, spread, source: 'scale ticket' } });
  });

  test.each([undefined, '', DEFAULT_SOURCE, DRAWN_SOURCE])('is no longer %s', (source) => {
    expect(enterQuantity('pulse', { value: 1, source }, { value: 2 })).toMatchObject({ source: ENTERED_SOURCE });
  });
});

test.each([
  [1500, 20, 10],
  [0.72, 0.04, 0.01],
  [2.92, 0.1, 0.1],
  [0, 1.5, 1],
  [4.62, 0, 0.01],
  [-62, 0, 0.1],
  [0, 0, 0.1],
])('%f with %f uncertain steps by %f', (value, width, step) => {
  expect(stepOf(value, width)).toBeCloseTo(step, 12);
});
