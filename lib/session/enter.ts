import { DEFAULT_SOURCE, DRAWN_SOURCE } from '@/lib/casefile/defaults';
import type { Edit } from '@/lib/casefile/edit';
import type { Quantity, Spread } from '@/lib/casefile/schema';

/** The source given to a value that was typed. */
export const ENTERED_SOURCE = 'entered';

/** A source that only says how a value came to be is replaced by the newest; one that a person wrote stays. */
const isOwn = (source: string | undefined): boolean =>
  source === undefined || source === '' || source === DEFAULT_SOURCE || source === DRAWN_SOURCE;

/** The edit for a typed value (SI, angles: degrees): without a spread the old one keeps its size. */
export function enterQuantity(path: string, quantity: Quantity, typed: { value: number; spread?: Spread }): Edit {
  const source = isOwn(quantity.source) ? ENTERED_SOURCE : quantity.source;
  if (!typed.spread) return { do: 'value', path, value: typed.value, source };
  return { do: 'set', path, to: { value: typed.value, spread: typed.spread, source } };
}

/**
 * The step that a person would take, in the unit shown: the power of ten just below what is uncertain (`width`, 0 where
 * nothing is), else one unit of the third digit.
 */
export function stepOf(value: number, width: number): number {
  const size = width > 0 ? width : Math.abs(value) / 100;
  return size === 0 ? 0.1 : 10 ** Math.floor(Math.log10(size));
}
