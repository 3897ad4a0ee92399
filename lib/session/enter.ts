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

/** The digits of a step that a person would take: one unit of the second digit that a value shows. */
export function stepOf(value: number): number {
  if (value === 0) return 0.1;
  const exponent = Math.floor(Math.log10(Math.abs(value)));
  return 10 ** (exponent - 1);
}
