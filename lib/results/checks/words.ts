import type { CaseFile } from '@/lib/casefile/schema';
import type { Dimension } from '@/lib/units/dimension';
import { formatValue, unitOf } from '@/lib/units/format';

/** A value with its unit, in the display units of the case: the way every check speaks of a number. */
export function spoken(casefile: CaseFile, si: number, dimension: Dimension, decimals: number): string {
  const system = casefile.display?.units ?? 'metric';
  const { symbol } = unitOf(dimension, system);
  const figure = formatValue(si, dimension, system, { decimals });
  return symbol === '' ? figure : `${figure} ${symbol}`;
}

export const percent = (share: number): string => `${(100 * share).toFixed(share < 0.1 ? 1 : 0)} %`;

/** A figure with a true minus sign. */
export const figure = (value: number, decimals: number): string => value.toFixed(decimals).replace('-', '\u2212');
