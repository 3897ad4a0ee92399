import { exp, log } from './elementary';

/** The standard normal distribution. */

/** a0 + x (a1 + x (a2 + ...)) over eight coefficients. */
const poly = (a: readonly number[], x: number): number =>
  ((((((a[7] * x + a[6]) * x + a[5]) * x + a[4]) * x + a[3]) * x + a[2]) * x + a[1]) * x + a[0];

const CENTRE_TOP = [
  3.387132872796366608, 133.14166789178437745, 1971.5909503065514427, 13731.693765509461125, 45921.953931549871457,
  67265.770927008700853, 33430.575583588128105, 2509.0809287301226727,
];
const CENTRE_BOTTOM = [
  1, 42.313330701600911252, 687.1870074920579083, 5394.1960214247511077, 21213.794301586595867, 39307.89580009271061,
  28729.085735721942674, 5226.495278852854561,
];
const MIDDLE_TOP = [
  1.42343711074968357734, 4.6303378461565452959, 5.7694972214606914055, 3.64784832476320460504, 1.27045825245236838258,
  0.24178072517745061177, 0.0227238449892691845833, 7.7454501427834140764e-4,
];
const MIDDLE_BOTTOM = [
  1, 2.05319162663775882187, 1.6763848301838038494, 0.68976733498510000455, 0.14810397642748007459,
  0.0151986665636164571966, 5.475938084995344946e-4, 1.05075007164441684324e-9,
];
const TAIL_TOP = [
  6.6579046435011037772, 5.4637849111641143699, 1.7848265399172913358, 0.29656057182850489123, 0.026532189526576123093,
  0.0012426609473880784386, 2.71155556874348757815e-5, 2.01033439929228813265e-7,
];
const TAIL_BOTTOM = [
  1, 0.59983220655588793769, 0.13692988092273580531, 0.0148753612908506148525, 7.868691311456132591e-4,
  1.8463183175100546818e-5, 1.4215117583164458887e-7, 2.04426310338993978564e-15,
];

/**
 * The z below which a share p of the standard normal distribution lies, 0 < p < 1; relative error about 1e-16 of the method.
 * Source: Wichura (1988), algorithm AS 241, PPND16, Applied Statistics 37-3.
 */
export function normalQuantile(p: number): number {
  const q = p - 0.5;
  if (Math.abs(q) <= 0.425) {
    const r = 0.180625 - q * q;
    return (q * poly(CENTRE_TOP, r)) / poly(CENTRE_BOTTOM, r);
  }
  const size = tailQuantile(Math.sqrt(-log(q < 0 ? p : 1 - p)));
  return q < 0 ? -size : size;
}

const tailQuantile = (r: number): number =>
  r <= 5 ? poly(MIDDLE_TOP, r - 1.6) / poly(MIDDLE_BOTTOM, r - 1.6) : poly(TAIL_TOP, r - 5) / poly(TAIL_BOTTOM, r - 5);

const CUMULATIVE_TOP = [
  220.206867912376, 221.213596169931, 112.079291497871, 33.912866078383, 6.37396220353165, 0.700383064443688,
  3.52624965998911e-2, 0,
];
const CUMULATIVE_BOTTOM = [
  440.413735824752, 793.826512519948, 637.333633378831, 296.564248779674, 86.7807322029461, 16.064177579207,
  1.75566716318264, 8.83883476483184e-2,
];

const SQRT_TWO_PI = 2.5066282746310002;

/**
 * Share of the standard normal distribution below z; relative error below 1e-11. Below z = -37 (5.7e-300) it is taken as 0.
 * Source: Hart (1968), algorithm 5666, as given by West (2005), «Better approximations to cumulative normal functions»;
 * beyond 7 the continued fraction of Laplace (Abramowitz & Stegun 26.2.14).
 */
export function normalCumulative(z: number): number {
  const size = Math.abs(z);
  const tail = size > 37 ? 0 : exp(-0.5 * size * size) * tailFactor(size);
  return z > 0 ? 1 - tail : tail;
}

function tailFactor(size: number): number {
  if (size < 7) return poly(CUMULATIVE_TOP, size) / poly(CUMULATIVE_BOTTOM, size);
  let fraction = size;
  for (let term = 20; term >= 1; term--) fraction = size + term / fraction;
  return 1 / (SQRT_TWO_PI * fraction);
}
