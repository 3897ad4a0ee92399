import Decimal from 'decimal.js';
import type { Dimension, UnitSystem } from './dimension';
import { formatValue, toDisplay } from './format';

/** A spread as a ledger knows it, SI (angles: degrees). */
export type EntrySpreadShape =
  | { shape: 'fixed' }
  | { shape: 'normal'; sd: number }
  | { shape: 'rectangular' | 'triangular'; low: number; high: number };

/** Rounding of a double about the middle of a range. */
const SAME = 1e-9;
/** Figures of so many digits are shown as entered; longer ones come from a conversion or a computation. */
const ENTERED_DIGITS = 6;
/** Digits of a longer one that has no spread: a length to a millimetre or finer. */
const PLAIN_DIGITS = 5;
/** Digits that a long figure keeps of the spread beside it: what is left out is below a hundredth of the spread. */
const SPREAD_DIGITS = 3;

/**
 * A value with its spread in one line that parseEntry reads back: «1420 ± 25», «0.5 to 0.7», or the value alone where
 * the line cannot say the spread (a triangle, limits that are not even about the value).
 */
export function entryText(
  value: number,
  spread: EntrySpreadShape | undefined,
  dimension: Dimension,
  system: UnitSystem,
): string {
  const text = (si: number): string => figureText(si, dimension, system, widthOf(spread));
  if (spread?.shape === 'normal') return `${text(value)} ± ${text(spread.sd)}`;
  if (spread?.shape === 'rectangular' && isEven(value, spread.low, spread.high))
    return `${text(spread.low)} to ${text(spread.high)}`;
  return text(value);
}

/**
 * One figure (SI, angles: degrees) in the display unit: as it was entered, or, where that would be a long tail of
 * conversion, rounded well below `width` (SI), the size of what is uncertain about it; without one to five digits.
 */
export function figureText(si: number, dimension: Dimension, system: UnitSystem, width = 0): string {
  const exact = formatValue(si, dimension, system);
  const shown = new Decimal(toDisplay(si, dimension, system));
  if (shown.toSignificantDigits(12).precision() <= ENTERED_DIGITS) return exact;
  const places =
    width > 0 ? SPREAD_DIGITS - 1 - new Decimal(toDisplay(width, dimension, system)).e : PLAIN_DIGITS - 1 - shown.e;
  return formatValue(si, dimension, system, { decimals: Math.max(0, places) });
}

/** The size of a spread, SI; 0 where there is none. */
export function widthOf(spread: EntrySpreadShape | undefined): number {
  if (!spread || spread.shape === 'fixed') return 0;
  return spread.shape === 'normal' ? spread.sd : (spread.high - spread.low) / 2;
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
  const [low, high] = [spread.low, spread.high].map((si) => figureText(si, dimension, system, widthOf(spread)));
  return `${spread.shape === 'triangular' ? 'triangle' : 'limits'} ${low} to ${high}`;
}
