import type { Dimension, UnitSystem } from './dimension';
import { formatValue } from './format';

/** A spread as a ledger knows it, SI (angles: degrees). */
export type EntrySpreadShape =
  | { shape: 'fixed' }
  | { shape: 'normal'; sd: number }
  | { shape: 'rectangular' | 'triangular'; low: number; high: number };

/** Rounding of a double about the middle of a range. */
const SAME = 1e-9;

/**
 * A value with its spread in one line that parseEntry reads back: «1420 ± 25», «0.5..0.7», or the value alone where the
 * line cannot say the spread (a triangle, limits that are not even about the value).
 */
export function entryText(
  value: number,
  spread: EntrySpreadShape | undefined,
  dimension: Dimension,
  system: UnitSystem,
): string {
  const text = (si: number): string => formatValue(si, dimension, system);
  if (spread?.shape === 'normal') return `${text(value)} ± ${text(spread.sd)}`;
  if (spread?.shape === 'rectangular' && isEven(value, spread.low, spread.high))
    return `${text(spread.low)}..${text(spread.high)}`;
  return text(value);
}

const isEven = (value: number, low: number, high: number): boolean =>
  Math.abs(value - (low + high) / 2) <= SAME * (high - low);

/** The limits that entryText left unsaid, for the words beside it; null where it said all. */
export function limitsText(
  value: number,
  spread: EntrySpreadShape | undefined,
  dimension: Dimension,
  system: UnitSystem,
): string | null {
  if (!spread || spread.shape === 'fixed' || spread.shape === 'normal') return null;
  if (spread.shape === 'rectangular' && isEven(value, spread.low, spread.high)) return null;
  const limits = `${formatValue(spread.low, dimension, system)}..${formatValue(spread.high, dimension, system)}`;
  return spread.shape === 'triangular' ? `triangle ${limits}` : `limits ${limits}`;
}
