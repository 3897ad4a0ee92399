import { VEHICLE_IDS, type VehicleId } from '@/lib/casefile/schema';
import type { Pose } from '@/lib/mechanics/spin-backwards';
import type { SpinsFound } from './spin-central';

/** The simulated rest that came nearest to a measured one which no search met. m and rad. */
export interface RestMiss {
  vehicle: VehicleId;
  measured: Pose;
  nearest: Pose;
}

/** For every vehicle whose measured rest pose was missed, where the nearest simulation ended. */
export function restMisses(spins: SpinsFound): RestMiss[] {
  return VEHICLE_IDS.flatMap((vehicle) => {
    const spin = spins[vehicle];
    if (!spin?.nearest || spin.separations.length > 0) return [];
    const { x, y, heading } = spin.nearest.rest;
    return [{ vehicle, measured: spin.target.to, nearest: { x, y, heading } }];
  });
}
