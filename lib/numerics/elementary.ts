/**
 * Elementary functions in plain arithmetic. The built-in Math.sin, exp and so on differ in the last bit between engines;
 * these give the same bits in every one, so that a case and a seed have one answer. Only + - * /, Math.sqrt, Math.floor
 * and Math.abs are used (all of them exact or correctly rounded by the language).
 *
 * Source of the reductions and polynomials: fdlibm (Sun Microsystems, 1993, freely distributable), files k_sin.c, k_cos.c,
 * e_rem_pio2.c, s_atan.c, e_atan2.c, e_exp.c, e_log.c.
 */

const words = new Uint32Array(2);
const double = new Float64Array(words.buffer);
double[0] = 1;
const HIGH = words[1] === 0 ? 0 : 1;

const highWord = (x: number): number => {
  double[0] = x;
  return words[HIGH] | 0;
};

const LEAST_POWER = -1074;
const powers = new Float64Array(1024 - LEAST_POWER);
powers[0] = Number.MIN_VALUE;
for (let k = 1; k < powers.length; k++) powers[k] = 2 * powers[k - 1];

/** 2^k for -1074 <= k <= 1023. From a table: putting bits together and reading them as a number stalls the processor. */
const powerOfTwo = (k: number): number => powers[k - LEAST_POWER];

const QUARTER_PI = 0.7853981633974483;
const TWO_OVER_PI = 0.6366197723675814;
/** pi/2 in pieces of 33 bits, so that multiples up to 2^20 are exact. */
const HALF_PI_1 = 1.5707963267341256;
const HALF_PI_1_REST = 6.077100506506192e-11;
const HALF_PI_2 = 6.077100506303966e-11;
const HALF_PI_2_REST = 2.0222662487959506e-21;
const HALF_PI_3 = 2.0222662487111665e-21;
const HALF_PI_3_REST = 8.4784276603689e-32;

/** The remainder of the last reduction, as the sum of two numbers, within +-pi/4. */
const turn = new Float64Array(2);

/** Takes quarter turns off x; returns how many, modulo 4. Exact to the last bit up to |x| = 8e5 rad; beyond, digits are lost. */
function reduce(x: number): number {
  const turns = Math.floor(x * TWO_OVER_PI + 0.5);
  let rest = x - turns * HALF_PI_1;
  let tail = turns * HALF_PI_1_REST;
  let remainder = rest - tail;
  const size = Math.abs(x);
  if (Math.abs(remainder) < size * 1.52587890625e-5) {
    const before = rest;
    tail = turns * HALF_PI_2;
    rest = before - tail;
    tail = turns * HALF_PI_2_REST - (before - rest - tail);
    remainder = rest - tail;
    if (Math.abs(remainder) < size * 1.7763568394002505e-15) {
      const again = rest;
      tail = turns * HALF_PI_3;
      rest = again - tail;
      tail = turns * HALF_PI_3_REST - (again - rest - tail);
      remainder = rest - tail;
    }
  }
  turn[0] = remainder;
  turn[1] = rest - remainder - tail;
  return turns - 4 * Math.floor(turns / 4);
}

/** sin(x + y) for |x| <= pi/4 and y the tail of x. */
function kernelSin(x: number, y: number): number {
  const z = x * x;
  const w = z * z;
  const r =
    8.33333333332248946124e-3 +
    z * (-1.98412698298579493134e-4 + z * 2.75573137070700676789e-6) +
    z * w * (-2.50507602534068634195e-8 + z * 1.58969099521155010221e-10);
  const v = z * x;
  return x - (z * (0.5 * y - v * r) - y - v * -1.66666666666666324348e-1);
}

/** cos(x + y) for |x| <= pi/4 and y the tail of x. */
function kernelCos(x: number, y: number): number {
  const z = x * x;
  const w = z * z;
  const r =
    z * (4.16666666666666019037e-2 + z * (-1.38888888888741095749e-3 + z * 2.48015872894767294178e-5)) +
    w * w * (-2.75573143513906633035e-7 + z * (2.0875723212981748279e-9 + z * -1.13596475577881948265e-11));
  const half = 0.5 * z;
  const one = 1 - half;
  return one + (1 - one - half + (z * r - x * y));
}

/** Sine of an angle in rad. Within 1 unit in the last place for |x| < 8e5; NaN for an infinite angle. */
export function sin(x: number): number {
  if (Math.abs(x) <= QUARTER_PI) return x === 0 ? x : kernelSin(x, 0);
  const quarter = reduce(x);
  const size = quarter === 0 || quarter === 2 ? kernelSin(turn[0], turn[1]) : kernelCos(turn[0], turn[1]);
  return quarter < 2 ? size : -size;
}

/** Cosine of an angle in rad. Within 1 unit in the last place for |x| < 8e5; NaN for an infinite angle. */
export function cos(x: number): number {
  if (Math.abs(x) <= QUARTER_PI) return kernelCos(x, 0);
  const quarter = reduce(x);
  const size = quarter === 0 || quarter === 2 ? kernelCos(turn[0], turn[1]) : kernelSin(turn[0], turn[1]);
  return quarter === 0 || quarter === 3 ? size : -size;
}

/** Tangent of an angle in rad, within 2 units in the last place for |x| < 8e5. */
export const tan = (x: number): number => sin(x) / cos(x);

const ATAN_HIGH = [
  4.63647609000806093515e-1, 7.85398163397448278999e-1, 9.82793723247329054082e-1, 1.570796326794896558,
];
const ATAN_LOW = [
  2.26987774529616870924e-17, 3.06161699786838301793e-17, 1.39033110312309984516e-17, 6.12323399573676603587e-17,
];

/** atan(x) - x + ... : the part of the series that fdlibm writes as x * (s1 + s2). */
function atanSeries(x: number): number {
  const z = x * x;
  const w = z * z;
  const odd =
    z *
    (3.33333333333329318027e-1 +
      w *
        (1.42857142725034663711e-1 +
          w *
            (9.09088713343650656196e-2 +
              w * (6.66107313738753120669e-2 + w * (4.97687799461593236017e-2 + w * 1.62858201153657823623e-2)))));
  const even =
    w *
    (-1.99999999998764832476e-1 +
      w *
        (-1.1111110405462355788e-1 +
          w * (-7.69187620504482999495e-2 + w * (-5.83357013379057348645e-2 + w * -3.6531572744216915527e-2))));
  return x * (odd + even);
}

/** Arc tangent, rad in [-pi/2, pi/2], within 1 unit in the last place. */
export function atan(x: number): number {
  const size = Math.abs(x);
  if (size < 0.4375) return size < 1e-8 ? x : x - atanSeries(x);
  if (Number.isNaN(x)) return NaN;
  const found = atanOfLarge(size);
  return x < 0 ? -found : found;
}

function atanOfLarge(size: number): number {
  if (size > 1e17) return 1.5707963267948966;
  if (size < 0.6875) return atanAbout(0, (2 * size - 1) / (2 + size));
  if (size < 1.1875) return atanAbout(1, (size - 1) / (size + 1));
  if (size < 2.4375) return atanAbout(2, (size - 1.5) / (1 + 1.5 * size));
  return atanAbout(3, -1 / size);
}

const atanAbout = (at: number, x: number): number => ATAN_HIGH[at] - (atanSeries(x) - ATAN_LOW[at] - x);

const PI = 3.141592653589793;
const PI_LOW = 1.2246467991473532e-16;

/** Direction of the vector (x, y), rad in [-pi, pi], within 2 units in the last place; 0 for a vector of no length. */
export function atan2(y: number, x: number): number {
  if (Number.isNaN(x) || Number.isNaN(y)) return NaN;
  if (y === 0) return x < 0 || Object.is(x, -0) ? withSignOf(PI, y) : y;
  if (x === 0) return withSignOf(PI / 2, y);
  if (Math.abs(x) === Infinity) return atan2OfInfinite(y, x);
  const size = atan(Math.abs(y / x));
  return withSignOf(x > 0 ? size : PI - (size - PI_LOW), y);
}

function atan2OfInfinite(y: number, x: number): number {
  if (Math.abs(y) === Infinity) return withSignOf(x > 0 ? PI / 4 : (3 * PI) / 4, y);
  return withSignOf(x > 0 ? 0 : PI, y);
}

const withSignOf = (size: number, y: number): number => (y < 0 || Object.is(y, -0) ? -size : size);

const LN2_HIGH = 6.9314718036912381649e-1;
const LN2_LOW = 1.90821492927058770002e-10;

/** e^x, within 1 unit in the last place. */
export function exp(x: number): number {
  if (Number.isNaN(x)) return NaN;
  if (x > 709.782712893384) return Infinity;
  if (x < -745.1332191019411) return 0;
  const k = Math.floor(x * 1.4426950408889634 + 0.5);
  const high = x - k * LN2_HIGH;
  const low = k * LN2_LOW;
  const r = high - low;
  const t = r * r;
  const c =
    r -
    t *
      (1.66666666666666019037e-1 +
        t *
          (-2.77777777770155933842e-3 +
            t * (6.61375632143793436117e-5 + t * (-1.6533902205465251539e-6 + t * 4.13813679705723846039e-8))));
  const y = 1 + ((r * c) / (2 - c) - low + high);
  if (k === 1024) return y * 2 * powerOfTwo(1023);
  return k < -1000 ? y * powerOfTwo(k + 200) * powerOfTwo(-200) : y * powerOfTwo(k);
}

/** Natural logarithm, within 1 unit in the last place; -Infinity at 0, NaN below. */
export function log(x: number): number {
  if (!(x > 0)) return x === 0 ? -Infinity : NaN;
  if (x === Infinity) return x;
  const tiny = x < 2.2250738585072014e-308;
  const scaled = tiny ? x * 18014398509481984 : x;
  const high = highWord(scaled) + (0x3ff00000 - 0x3fe6a09e);
  const exponent = (high >>> 20) - 0x3ff;
  const k = tiny ? exponent - 54 : exponent;
  const f = scaled * powerOfTwo(-exponent) - 1;
  const half = 0.5 * f * f;
  return logSeries(f, half) + k * LN2_LOW - half + f + k * LN2_HIGH;
}

/** log(1 + f) - f + f^2/2. */
function logSeries(f: number, half: number): number {
  const s = f / (2 + f);
  const z = s * s;
  const w = z * z;
  const even = w * (3.999999999940941908e-1 + w * (2.222219843214978396e-1 + w * 1.531383769920937332e-1));
  const odd =
    z *
    (6.66666666666673513e-1 +
      w * (2.857142874366239149e-1 + w * (1.818357216161805012e-1 + w * 1.479819860511658591e-1)));
  return s * (half + (odd + even));
}

/** Length of the vector (x, y). Plain: squares are formed, so lengths beyond 1e154 overflow, which no scale here nears. */
export const hypot = (x: number, y: number): number => Math.sqrt(x * x + y * y);
