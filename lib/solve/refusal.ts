import type { Issue } from '@/lib/casefile/issue';
import { LEAST_RESTITUTION } from '@/lib/mechanics/impact-backwards';
import { VEHICLE_IDS, type VehicleId } from '@/lib/casefile/schema';
import type { Central } from './central';

/** sin of the angle between the approach paths below which they are exactly parallel to the last digits. */
const PARALLEL = 1e-9;

/**
 * Why nothing can be computed from the central values (what the methods refuse, or the travel cannot have been), with
 * the path that it hangs on; null where there is an answer, if perhaps an impossible one that the checks speak of.
 */
export function refusalOf(central: Central): Issue | null {
  const { problem, reason, failingLeg, state, answer } = central;
  const lost = VEHICLE_IDS.find((id) => central.spins[id]?.separations.length === 0);
  if (lost) return restRefusal(lost, central);
  if (failingLeg) {
    const { vehicle, leg } = failingLeg;
    return {
      path: `departure.${vehicle}.legs.${leg}`,
      says: `leg ${leg + 1} of vehicle ${vehicle} cannot end as stated: going back from its end the square of the speed falls below zero, so the vehicle would speed up downhill instead of stopping; look at its grade, friction and retardation share`,
    };
  }
  if (problem.method === 'directions' && Math.abs(answer.sinBetween) < PARALLEL)
    return {
      path: 'approach.B.direction',
      says: 'the approach directions are parallel, so momentum alone cannot part the two speeds: use the method restitution',
    };
  if (problem.method === 'restitution' && state.e < LEAST_RESTITUTION - 1e-12)
    return {
      path: 'impact.restitution',
      says: `the restitution ${Number(state.e.toPrecision(3))} is below 0.05: the speed of parting would be multiplied more than 20 times, so no answer is given`,
    };
  if (reason === 'notParting')
    return {
      path: 'impact.plane',
      says: 'the vehicles do not part at the contact point after contact, so the restitution cannot tell how fast they closed: look at the travel after contact, the yaw rates, the contact point and the plane',
    };
  if (reason === 'neverParts')
    return {
      path: 'pulse',
      says: 'the contact never parts as stated: what the tyres give while it lasts does not settle against the travel after it; look at the contact duration, the braking and the travel, or take the contact as an instant',
    };
  if (reason === 'notFinite')
    return { path: 'vehicles', says: 'the figures are too large or too small to compute with' };
  return null;
}

/** No separation leads to the rest pose: it rolls on, or the wheels as stated cannot bring it there. */
function restRefusal(id: VehicleId, { spins }: Central): Issue {
  const nearest = spins[id]?.nearest;
  if (!nearest)
    return {
      path: `departure.${id}`,
      says: `vehicle ${id} does not come to rest: friction and braking as stated cannot hold it on this slope`,
    };
  return {
    path: `departure.${id}.rest`,
    says: `no separation velocity and yaw rate lead vehicle ${id} to its rest pose under the wheels as stated; the nearest that was found misses it by ${nearest.miss.toFixed(2)} (metres, a turn counted at one metre per radian): look at the braking, the steer, the friction and the rest heading (a full turn more is written as 360° more)`,
  };
}
