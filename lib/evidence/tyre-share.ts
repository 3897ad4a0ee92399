import { G } from '@/lib/mechanics/legs';
import type { Problem } from './problem';

/** Contact duration that is assumed where the case states none, s (bumper contacts 0.08 to 0.15 s, common practice, no source). */
export const ASSUMED_PULSE = 0.12;

/**
 * The most that the tyres can have pushed during contact, over the contact impulse (N s):
 * f (mA + mB) g dt / J with the mass-weighted friction of the first legs. null without an impulse.
 */
export function tyreShareOf(problem: Problem, impulse: number): number | null {
  if (!(impulse > 0)) return null;
  const at = (slot: number): number => problem.inputs[slot].value;
  const pulse = problem.pulse === null ? ASSUMED_PULSE : at(problem.pulse);
  const { A, B } = problem.vehicles;
  const pushed = [A, B].reduce(
    (sum, v) => sum + at((v.departure.kind === 'legs' ? v.departure.legs[0] : v.departure).friction) * at(v.mass),
    0,
  );
  return (pushed * G * pulse) / impulse;
}
