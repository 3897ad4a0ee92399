import Decimal from 'decimal.js';
import type { Dimension, UnitSystem } from './dimension';
import { unitOf } from './unit';

export { unitOf } from './unit';

const MINUS = '\u2212';
/** Digits beyond which an entry is rounding noise of a double. */
const ENTRY_DIGITS = 12;

const shown = (si: number, dimension: Dimension, system: UnitSystem): Decimal =>
  new Decimal(si).div(unitOf(dimension, system).factor);

/** An SI value (angles: degrees) in the display unit. */
export const toDisplay = (si: number, dimension: Dimension, system: UnitSystem): number =>
  shown(si, dimension, system).toNumber();

/** A value in the display unit back to SI (angles: degrees), exact in decimals. */
export const fromDisplay = (value: number, dimension: Dimension, system: UnitSystem): number =>
  new Decimal(value).times(unitOf(dimension, system).factor).toNumber();

/**
 * A value in the display unit, without the unit. With `decimals` rounded half away from zero to that many places; without,
 * every digit that was entered. A true minus sign; never minus zero.
 */
export function formatValue(
  si: number,
  dimension: Dimension,
  system: UnitSystem,
  { decimals }: { decimals?: number } = {},
): string {
  const value = shown(si, dimension, system);
  const rounded =
    decimals === undefined
      ? value.toSignificantDigits(ENTRY_DIGITS)
      : value.toDecimalPlaces(decimals, Decimal.ROUND_HALF_UP);
  const text = decimals === undefined ? rounded.toFixed() : rounded.toFixed(decimals);
  return /^-0*\.?0*$/.test(text) ? text.slice(1) : text.replace('-', MINUS);
}

/** A value with its unit: «26.6 km/h», «19.4°», «0.22». */
export function formatWithUnit(
  si: number,
  dimension: Dimension,
  system: UnitSystem,
  options: { decimals?: number } = {},
): string {
  const { symbol } = unitOf(dimension, system);
  const figure = formatValue(si, dimension, system, options);
  if (symbol === '') return figure;
  return symbol.startsWith('°') ? `${figure}${symbol}` : `${figure}\u00a0${symbol}`;
}

/** The most decimals of a headline speed: two would claim more than such an answer knows. */
const HEADLINE_DECIMALS = 1;
const MOST_DECIMALS = 6;

/** Decimals that leave a standard uncertainty (SI) two significant digits in the display unit (JCGM 100:2008, 7.2.6). */
export function decimalsFor(u: number, dimension: Dimension, system: UnitSystem, { headline = false } = {}): number {
  const most = headline && dimension === 'speed' ? HEADLINE_DECIMALS : MOST_DECIMALS;
  if (!(u > 0) || !Number.isFinite(u)) return Math.min(most, 2);
  const rounded = shown(u, dimension, system).toSignificantDigits(2, Decimal.ROUND_HALF_UP);
  return Math.min(most, Math.max(0, 1 - rounded.e));
}

export interface Estimate {
  value: string;
  u: string;
  low: string;
  high: string;
  unit: string;
}

/** An estimate, its standard uncertainty and interval, rounded once from SI to the same decimal place. */
export function formatEstimate(
  { value, u, low, high }: { value: number; u: number; low: number; high: number },
  dimension: Dimension,
  system: UnitSystem,
  options: { headline?: boolean } = {},
): Estimate {
  const decimals = decimalsFor(u, dimension, system, options);
  const print = (si: number): string => formatValue(si, dimension, system, { decimals });
  return {
    value: print(value),
    u: print(u),
    low: print(low),
    high: print(high),
    unit: unitOf(dimension, system).symbol,
  };
}
