/**
 * Elementary functions in plain arithmetic, so that every engine gives the same bits; the built-in ones differ in the
 * last bit between browsers and Node. Algorithms and coefficients of FDLIBM 5.3 (Sun Microsystems, freely granted):
 * errors below 1 ulp (sin, cos, atan, exp, log), below 2 ulp (tan, atan2). Only + - * /, Math.sqrt, Math.floor,
 * Math.abs and bits are used; ECMAScript defines those exactly.
 */

const float = new Float64Array(1);
const bits = new Uint32Array(float.buffer);
float[0] = 1;
/** Index of the high word: 1 where numbers are stored little-endian. */
const HIGH = bits[1] === 0x3ff00000 ? 1 : 0;

const PIO2_1 = 1.57079632673412561417e0;
const PIO2_1T = 6.07710050650619224932e-11;
const PIO2_2 = 6.0771005063039659591e-11;
const PIO2_2T = 2.02226624879595063154e-21;
const TWO_OVER_PI = 6.36619772367581382433e-1;

/** Reduced argument of the last reduction: y0 + y1 in [-pi/4, pi/4]; the quadrant is returned. Good to |x| < 2^20 pi/2. */
let y0 = 0;
let y1 = 0;
function reduce(x: number): number {
  if (x > -0.7853981633974483 && x < 0.7853981633974483) {
    y0 = x;
    y1 = 0;
    return 0;
  }
  const n = Math.floor(x * TWO_OVER_PI + 0.5);
  let r = x - n * PIO2_1;
  let w = n * PIO2_1T;
  y0 = r - w;
  if (Math.abs(y0) < Math.abs(x) * 1e-5) {
    const t = r;
    w = n * PIO2_2;
    r = t - w;
    w = n * PIO2_2T - (t - r - w);
    y0 = r - w;
  }
  y1 = r - y0 - w;
  return n & 3;
}

function sinKernel(x: number, y: number): number {
  const z = x * x;
  const v = z * x;
  const r =
    8.33333333332248946124e-3 +
    z * (-1.98412698298579493134e-4 + z * (2.75573137070700676789e-6 + z * (-2.50507602534068634195e-8 + z * 1.58969099521155010221e-10)));
  return x - (z * (0.5 * y - v * r) - y - v * -1.66666666666666324348e-1);
}

function cosKernel(x: number, y: number): number {
  const z = x * x;
  const r =
    z *
    (4.16666666666666019037e-2 +
      z *
        (-1.38888888888741095749e-3 +
          z * (2.48015872894767294178e-5 + z * (-2.75573143513906633035e-7 + z * (2.08757232129817482790e-9 + z * -1.13596475577881948265e-11)))));
  const half = 0.5 * z;
  const w = 1 - half;
  return w + (1 - w - half + (z * r - x * y));
}

/** Sine of x rad, |x| below about 1.6e6. */
export function sin(x: number): number {
  switch (reduce(x)) {
    case 0:
      return sinKernel(y0, y1);
    case 1:
      return cosKernel(y0, y1);
    case 2:
      return -sinKernel(y0, y1);
    default:
      return -cosKernel(y0, y1);
  }
}

/** Cosine of x rad, |x| below about 1.6e6. */
export function cos(x: number): number {
  switch (reduce(x)) {
    case 0:
      return cosKernel(y0, y1);
    case 1:
      return -sinKernel(y0, y1);
    case 2:
      return -cosKernel(y0, y1);
    default:
      return sinKernel(y0, y1);
  }
}

/** Square root of x^2 + y^2, for figures of ordinary size: no guard against overflow. */
export const hypot = (x: number, y: number): number => Math.sqrt(x * x + y * y);

const ATAN_HIGH = [4.63647609000806093515e-1, 7.85398163397448278999e-1, 9.82793723247329054082e-1, 1.57079632679489655800];
const ATAN_LOW = [2.26987774529616870924e-17, 3.06161699786838301793e-17, 1.39033110312309984516e-17, 6.12323399573676603587e-17];

export function atan(x: number): number {
  const size = Math.abs(x);
  if (size >= 1e19) return x > 0 ? ATAN_HIGH[3] + ATAN_LOW[3] : -ATAN_HIGH[3] - ATAN_LOW[3];
  let id = -1;
  let r = size;
  if (size >= 2.4375) {
    id = 3;
    r = -1 / size;
  } else if (size >= 1.1875) {
    id = 2;
    r = (size - 1.5) / (1 + 1.5 * size);
  } else if (size >= 0.6875) {
    id = 1;
    r = (size - 1) / (size + 1);
  } else if (size >= 0.4375) {
    id = 0;
    r = (2 * size - 1) / (2 + size);
  }
  const z = r * r;
  const w = z * z;
  const s1 =
    z *
    (3.33333333333329318027e-1 +
      w * (1.42857142725034663711e-1 + w * (9.09088713343650656196e-2 + w * (6.66107313738753120669e-2 + w * (4.97687799461593236017e-2 + w * 1.62858201153657823623e-2)))));
  const s2 =
    w *
    (-1.99999999998764832476e-1 +
      w * (-1.11111104054623557880e-1 + w * (-7.69187620504482999495e-2 + w * (-5.83357013379057348645e-2 + w * -3.65315727442169155270e-2))));
  const found = id < 0 ? r - r * (s1 + s2) : ATAN_HIGH[id] - (r * (s1 + s2) - ATAN_LOW[id] - r);
  return x < 0 ? -found : found;
}

/** Angle of (x, y) from +x, rad in (-pi, pi]; atan2(0, 0) is 0. */
export function atan2(y: number, x: number): number {
  if (x === 0) return y === 0 ? 0 : y > 0 ? Math.PI / 2 : -Math.PI / 2;
  const z = atan(Math.abs(y / x));
  if (x > 0) return y < 0 ? -z : z;
  const turned = Math.PI - (z - 1.2246467991473532e-16);
  return y < 0 ? -turned : turned;
}

const LN2_HIGH = 6.93147180369123816490e-1;
const LN2_LOW = 1.90821492927058770002e-10;

export function exp(x: number): number {
  if (x > 709.782712893384) return Infinity;
  if (x < -745.1332191019411) return 0;
  const k = Math.floor(x * 1.44269504088896338700 + 0.5);
  const high = x - k * LN2_HIGH;
  const low = k * LN2_LOW;
  const r = high - low;
  const t = r * r;
  const c =
    r -
    t * (1.66666666666666019037e-1 + t * (-2.77777777770155933842e-3 + t * (6.61375632143793436117e-5 + t * (-1.65339022054652515390e-6 + t * 4.13813679705723846039e-8))));
  const y = 1 - (low - (r * c) / (2 - c) - high);
  return k >= -1021 ? scaled(y, k) : scaled(y, k + 1000) * 9.33263618503218878990e-302;
}

/** y times 2^k. */
function scaled(y: number, k: number): number {
  if (k === 1024) return y * 2 * 8.98846567431158e307;
  float[0] = y;
  bits[HIGH] += k << 20;
  return float[0];
}

export function log(x: number): number {
  if (!(x > 0)) return x === 0 ? -Infinity : NaN;
  if (x === Infinity) return x;
  let k = 0;
  let y = x;
  if (y < 2.2250738585072014e-308) {
    k -= 54;
    y *= 18014398509481984;
  }
  float[0] = y;
  let high = bits[HIGH];
  k += (high >> 20) - 1023;
  high &= 0xfffff;
  const i = (high + 0x95f64) & 0x100000;
  bits[HIGH] = high | (i ^ 0x3ff00000);
  k += i >> 20;
  const f = float[0] - 1;
  const s = f / (2 + f);
  const z = s * s;
  const w = z * z;
  const t1 = w * (3.999999999940941908e-1 + w * (2.222219843214978396e-1 + w * 1.531383769920937332e-1));
  const t2 = z * (6.666666666666735130e-1 + w * (2.857142874366239149e-1 + w * (1.818357216161805012e-1 + w * 1.479819860511658591e-1)));
  const half = 0.5 * f * f;
  return k * LN2_HIGH - (half - (s * (half + t1 + t2) + k * LN2_LOW) - f);
}
