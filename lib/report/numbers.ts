import type { CaseFile, Spread } from '@/lib/casefile/schema';
import type { Band } from '@/lib/results/result';
import type { Dimension, UnitSystem } from '@/lib/units/dimension';
import { decimalsFor, formatValue, toDisplay, unitOf } from '@/lib/units/format';

/** Which units a report is printed in. */
export const unitsOf = (casefile: CaseFile): UnitSystem => casefile.display?.units ?? 'metric';

export const unitText = (dimension: Dimension, units: UnitSystem): string => unitOf(dimension, units).symbol;

/** A value that was entered in the units shown has no more digits than this; one converted from others has. */
const ENTERED_DIGITS = 6;
/** A converted value without a spread is printed to within this; with one, to within this part of its spread. */
const CONVERTED = 5e-4;
const PART_OF_SPREAD = 0.02;

/** A stated value as it was entered; one that was entered in other units, rounded well inside its spread (SI, 0: none). */
export function stated(si: number, dimension: Dimension, units: UnitSystem, u = 0): string {
  const entered = formatValue(si, dimension, units);
  if (entered.replace(/\D/g, '').replace(/^0+/, '').length <= ENTERED_DIGITS) return entered;
  const shown = toDisplay(si, dimension, units);
  const slack = u > 0 ? PART_OF_SPREAD * toDisplay(u, dimension, units) : CONVERTED;
  const decimals = [0, 1, 2, 3, 4, 5, 6].find((d) => Math.abs(Number(shown.toFixed(d)) - shown) <= slack);
  return formatValue(si, dimension, units, { decimals: decimals ?? ENTERED_DIGITS });
}

/** A band as it is printed: every figure to the place of two digits of the standard uncertainty. */
export interface PrintedBand {
  central: string;
  median: string;
  low: string;
  high: string;
  shortest: [string, string];
  u: string;
}

/** Rounded once from SI; speeds never finer than one decimal. `central` may not exist. */
export function printedBand(
  band: Band,
  central: number | undefined,
  dimension: Dimension,
  units: UnitSystem,
): PrintedBand {
  const decimals = decimalsFor(spreadOf(band), dimension, units, { headline: true });
  const step = wholeStep(toDisplay(spreadOf(band), dimension, units));
  const print = (si: number): string =>
    step === 1
      ? formatValue(si, dimension, units, { decimals })
      : String(Math.round(toDisplay(si, dimension, units) / step) * step).replace('-', '−');
  return {
    central: central === undefined ? NOTHING : print(central),
    median: print(band.median),
    low: print(band.low),
    high: print(band.high),
    shortest: [print(band.shortest[0]), print(band.shortest[1])],
    u: print(band.sd),
  };
}

/** Tens, hundreds … that leave an uncertainty of three digits or more two significant ones; 1 below. */
const wholeStep = (u: number): number => (u < 99.5 ? 1 : 10 ** (Math.floor(Math.log10(u)) - 1));

/** Stands for a figure that does not exist. */
export const NOTHING = '–';

/** The standard uncertainty, or half the interval where a wild tail (a ratio may have no variance) has blown it up. */
const spreadOf = (band: Band): number => Math.min(band.sd, (band.high - band.low) / 2);

/** A magnitude whose interval comes so near to 0 that only its upper end says something. */
export const reachesZero = (band: Band): boolean => band.low >= 0 && band.low < 0.1 * band.high;

/** With a capital in front. */
export const sentence = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1);

/** «95 %». */
export const percent = (share: number): string => `${Number((100 * share).toPrecision(3))}\u00a0%`;

/** How well a value is known, in words and display units. */
export function spreadText(spread: Spread | undefined, dimension: Dimension, units: UnitSystem): string {
  if (!spread || spread.shape === 'fixed') return 'taken as exact';
  if (spread.shape === 'normal') return `normal, u = ${Number(toDisplay(spread.sd, dimension, units).toPrecision(3))}`;
  const width = spread.high - spread.low;
  return `${spread.shape}, ${stated(spread.low, dimension, units, width)} to ${stated(spread.high, dimension, units, width)}`;
}

/** The standard uncertainty of a spread, or enough of its width to round by; 0 for none. */
export function sizeOf(spread: Spread | undefined): number {
  if (!spread || spread.shape === 'fixed') return 0;
  return spread.shape === 'normal' ? spread.sd : (spread.high - spread.low) / 4;
}
