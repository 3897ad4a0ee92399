import type { Vector } from './vector';

/** Digits that the worked lines print; they are carried on unrounded. */
export const WORKED_DIGITS = 6;
/** Smaller than this is the rounding of the machine, not a number: printed as 0. */
const NOTHING = 1e-12;

/** A number of the worked lines in the notation of maths.ts: six significant digits, no trailing zeros. */
export function figure(x: number): string {
  if (Math.abs(x) < NOTHING) return '0';
  const short = Number(x.toPrecision(WORKED_DIGITS));
  const size = Math.abs(short);
  if (size >= 1e-3 && size < 1e7) return String(short);
  const [mantissa, exponent] = x.toExponential(WORKED_DIGITS - 1).split('e');
  return `${Number(mantissa)} × 10^{${Number(exponent)}}`;
}

/** A number inside a product or under a power: in parentheses where it would be misread without. */
export function inner(x: number): string {
  const written = figure(x);
  return written.startsWith('-') || written.includes('×') ? `(${written})` : written;
}

/** «- 3», or «+ 3» for a negative number. */
export const minus = (x: number): string => (figure(x).startsWith('-') ? `+ ${figure(-x)}` : `- ${figure(x)}`);

export const pair = (v: Vector): string => `(${figure(v.x)}, ${figure(v.y)})`;

/** An angle below this, deg, is what a search left over. */
const LEFT_OVER = 1e-6;

/** An angle in degrees. */
export const degrees = (x: number): string => `${figure(Math.abs(x) < LEFT_OVER ? 0 : x)}°`;
