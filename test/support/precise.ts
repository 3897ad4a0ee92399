import { Decimal } from 'decimal.js';

/** Decimal arithmetic at 50 digits, for oracles that must be right beyond doubt. */
export const Precise = Decimal.clone({ precision: 50 });
export type Precise = Decimal;

/** The value of a double, all its bits: `new Decimal(x)` would take the shortest decimal that reads back as x. */
export function precise(x: number): Decimal {
  if (x === 0 || !Number.isFinite(x)) return new Precise(x);
  const exponent = Math.max(-1074, Math.floor(Math.log2(Math.abs(x))) - 53);
  const half = Math.trunc(exponent / 2);
  return new Precise(x * 2 ** -half * 2 ** (half - exponent)).times(new Precise(2).pow(exponent));
}

/** Distance of a double from the true value, in units in the last place of the true value. */
export function ulpsFrom(found: number, truth: Decimal): number {
  if (truth.isZero()) return found === 0 ? 0 : Infinity;
  const nearest = Math.abs(truth.toNumber());
  const exponent = Math.max(-1022, Math.floor(Math.log2(nearest)));
  return precise(found)
    .minus(truth)
    .abs()
    .div(new Precise(2).pow(exponent - 52))
    .toNumber();
}

export const relativeError = (found: number, truth: Decimal): number =>
  truth.isZero() ? Math.abs(found) : precise(found).minus(truth).div(truth).abs().toNumber();

/** Error function by its series, good to 40 digits for |x| <= 5. */
function erfSeries(x: Decimal): Decimal {
  const squared = x.times(x);
  let term = x;
  let sum = x;
  for (let n = 1; term.abs().gt('1e-60'); n++) {
    term = term.times(squared).neg().div(n);
    sum = sum.plus(term.div(2 * n + 1));
  }
  return sum.times(2).div(Precise.acos(-1).sqrt());
}

/** Standard normal distribution function at many digits: series near the middle, continued fraction in the tails. */
export function preciseNormalCumulative(z: Decimal): Decimal {
  const size = z.abs();
  const tail = size.lt(4)
    ? new Precise(1).minus(erfSeries(size.div(new Precise(2).sqrt()))).div(2)
    : tailFraction(size);
  return z.isNegative() ? tail : new Precise(1).minus(tail);
}

function tailFraction(size: Decimal): Decimal {
  let fraction = size;
  for (let k = 1500; k >= 1; k--) fraction = size.plus(new Precise(k).div(fraction));
  const density = size.times(size).div(-2).exp().div(Precise.acos(-1).times(2).sqrt());
  return density.div(fraction);
}
