import { exp, log } from './elementary';

/** The standard normal distribution. */

/** Ratios of polynomials of AS 241, written out because every draw passes here. */
const centre = (x: number): number =>
  (((((((2509.0809287301226727 * x + 33430.575583588128105) * x + 67265.770927008700853) * x + 45921.953931549871457) *
    x +
    13731.693765509461125) *
    x +
    1971.5909503065514427) *
    x +
    133.14166789178437745) *
    x +
    3.387132872796366608) /
  (((((((5226.495278852854561 * x + 28729.085735721942674) * x + 39307.89580009271061) * x + 21213.794301586595867) *
    x +
    5394.1960214247511077) *
    x +
    687.1870074920579083) *
    x +
    42.313330701600911252) *
    x +
    1);
const middle = (x: number): number =>
  (((((((7.7454501427834140764e-4 * x + 0.0227238449892691845833) * x + 0.24178072517745061177) * x +
    1.27045825245236838258) *
    x +
    3.64784832476320460504) *
    x +
    5.7694972214606914055) *
    x +
    4.6303378461565452959) *
    x +
    1.42343711074968357734) /
  (((((((1.05075007164441684324e-9 * x + 5.475938084995344946e-4) * x + 0.0151986665636164571966) * x +
    0.14810397642748007459) *
    x +
    0.68976733498510000455) *
    x +
    1.6763848301838038494) *
    x +
    2.05319162663775882187) *
    x +
    1);
const farTail = (x: number): number =>
  (((((((2.01033439929228813265e-7 * x + 2.71155556874348757815e-5) * x + 0.0012426609473880784386) * x +
    0.026532189526576123093) *
    x +
    0.29656057182850489123) *
    x +
    1.7848265399172913358) *
    x +
    5.4637849111641143699) *
    x +
    6.6579046435011037772) /
  (((((((2.04426310338993978564e-15 * x + 1.4215117583164458887e-7) * x + 1.8463183175100546818e-5) * x +
    7.868691311456132591e-4) *
    x +
    0.0148753612908506148525) *
    x +
    0.13692988092273580531) *
    x +
    0.59983220655588793769) *
    x +
    1);

/** Beyond this distance from one half the tail formulas hold. */
const CENTRE = 0.425;

function tailQuantile(p: number): number {
  const r = Math.sqrt(-log(Math.min(p, 1 - p)));
  const size = r <= 5 ? middle(r - 1.6) : farTail(r - 5);
  return p < 0.5 ? -size : size;
}

const MOST = 1024;
const tailShares = new Float64Array(MOST);
const tailPlaces = new Uint16Array(MOST);

/**
 * Replaces the shares p[0 .. count - 1], 0 < p < 1 and at most 1024 of them, by the z below which they lie in the standard normal
 * distribution; relative error about 1e-16 of the method. The centre is worked for all and the tails are gathered, so that
 * the processor need not guess which comes next.
 * Source: Wichura (1988), algorithm AS 241, PPND16, Applied Statistics 37-3.
 */
export function normalQuantiles(p: Float64Array, count: number): void {
  if (count > MOST) throw new RangeError(`normalQuantiles takes at most ${MOST} shares, not ${count}`);
  let tails = 0;
  for (let k = 0; k < count; k++) {
    const share = p[k];
    const q = share - 0.5;
    tailShares[tails] = share;
    tailPlaces[tails] = k;
    tails += Math.abs(q) <= CENTRE ? 0 : 1;
    p[k] = q * centre(0.180625 - q * q);
  }
  for (let i = 0; i < tails; i++) p[tailPlaces[i]] = tailQuantile(tailShares[i]);
}

/** Ratio of polynomials of Hart 5666. */
const hart = (x: number): number =>
  ((((((3.52624965998911e-2 * x + 0.700383064443688) * x + 6.37396220353165) * x + 33.912866078383) * x +
    112.079291497871) *
    x +
    221.213596169931) *
    x +
    220.206867912376) /
  (((((((8.83883476483184e-2 * x + 1.75566716318264) * x + 16.064177579207) * x + 86.7807322029461) * x +
    296.564248779674) *
    x +
    637.333633378831) *
    x +
    793.826512519948) *
    x +
    440.413735824752);

const SQRT_TWO_PI = 2.5066282746310002;

/**
 * Share of the standard normal distribution below z; relative error below 1e-13. Below z = -37 (5.7e-300) it is taken as 0.
 * Source: Hart (1968), algorithm 5666, as given by West (2005), «Better approximations to cumulative normal functions»;
 * beyond 3 the continued fraction of Laplace (Abramowitz & Stegun 26.2.14).
 */
export function normalCumulative(z: number): number {
  const size = Math.abs(z);
  const tail = size > 37 ? 0 : exp(-0.5 * size * size) * tailFactor(size);
  return z > 0 ? 1 - tail : tail;
}

function tailFactor(size: number): number {
  if (size < 3) return hart(size);
  let fraction = size;
  for (let term = 100; term >= 1; term--) fraction = size + term / fraction;
  return 1 / (SQRT_TWO_PI * fraction);
}
