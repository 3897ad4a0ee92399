import type { Quantity, VehicleId } from '@/lib/casefile/schema';
import { outlineOf } from '@/lib/geometry/polygon';
import { cos, sin } from '@/lib/numerics/elementary';
import { standardUncertainty } from '@/lib/numerics/spread';
import type { CheckContext } from './check';

const RADIANS_PER_DEGREE = Math.PI / 180;

/** The outline of a vehicle at contact, as the case states it, m. */
export function outlineAtContact({ casefile }: CheckContext, id: VehicleId) {
  const { length, width, frontOverhang, frontAxleToMassCentre } = casefile.vehicles[id];
  const { x, y, heading } = casefile.impact[id];
  const turn = heading.value * RADIANS_PER_DEGREE;
  return outlineOf(
    { length, width, frontOverhang, frontAxleToMassCentre: frontAxleToMassCentre.value },
    [x.value, y.value],
    [cos(turn), sin(turn)],
  );
}

/** Combined standard uncertainty of some positions, m. */
export const combined = (...quantities: Quantity[]): number =>
  Math.sqrt(quantities.reduce((sum, q) => sum + standardUncertainty(q.value, q.spread ?? { shape: 'fixed' }) ** 2, 0));
