import { exp, log } from '@/lib/numerics/elementary';

/**
 * Restitution of bumper-to-bumper contacts as a function of the closing speed, m/s: two regressions of staged tests, from
 * memory. Cross-checked: they agree at 1 m/s to 1e-4 and lie within 0.035 of each other up to 6 m/s. To be confirmed
 * against the papers before anything rests on them.
 */
export interface Regression {
  name: string;
  /** null outside the range that they are recalled for. */
  at: (closingSpeed: number) => number | null;
}

/** m/s */
const [SLOWEST, FASTEST] = [1, 6];

const within =
  (law: (v: number) => number) =>
  (v: number): number | null =>
    v >= SLOWEST && v <= FASTEST ? law(v) : null;

function cubicOfLogarithm(v: number): number {
  const decades = log(v) / Math.LN10;
  return 0.47477 + decades * (-0.26139 + decades * (0.03382 - 0.11639 * decades));
}

export const REGRESSIONS: readonly Regression[] = [
  { name: 'SAE 980552', at: within((v) => 0.5992 * exp(v * (-0.2508 + v * (0.01934 - 0.001279 * v)))) },
  { name: 'SAE 2002-01-0540', at: within(cubicOfLogarithm) },
];

const HALVINGS = 60;

/**
 * The restitution and closing speed (m/s) that fit each other where the closing speed itself depends on the restitution, by
 * bisection over the closing speed; null where none is found from 1 to 6 m/s.
 */
export function consistentRestitution(
  { at }: Regression,
  closingSpeedOf: (e: number) => number,
): { e: number; closingSpeed: number } | null {
  const off = (v: number): number => closingSpeedOf(at(v) ?? NaN) - v;
  let [slow, fast] = [SLOWEST, FASTEST];
  const rising = off(slow) < 0;
  if (!(off(slow) * off(fast) <= 0)) return null;
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (slow + fast) / 2;
    if (off(middle) < 0 === rising) slow = middle;
    else fast = middle;
  }
  const closingSpeed = off(slow) === 0 ? slow : fast;
  const e = at(closingSpeed);
  return e === null ? null : { e, closingSpeed };
}
