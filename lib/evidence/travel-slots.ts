import type { Slot, VehicleSlots } from './problem';

/** The inputs that the separation velocity of a vehicle depends on: where none of them changes, it need not be found anew. */
export function travelSlots(vehicle: VehicleSlots): Set<Slot> {
  const { departure } = vehicle;
  if (departure.kind === 'legs') {
    const legs = departure.legs.flatMap((leg) => [leg.distance, leg.friction, leg.share, leg.grade]);
    return present([departure.direction, departure.yawRate, departure.endSpeed, ...legs]);
  }
  if (departure.kind === 'observed') return new Set();
  const { rest: pose, friction, onset, grade, uphill, braking, steer, surfaces } = departure;
  const { mass, yawInertia, frontAxleToMassCentre, x, y, heading } = vehicle;
  const rest = [pose?.x ?? null, pose?.y ?? null, pose?.heading ?? null, friction, onset, grade, uphill];
  const wheels = [...braking, ...steer, ...surfaces.map((surface) => surface.friction)];
  return present([mass, yawInertia, frontAxleToMassCentre, x, y, heading, ...rest, ...wheels]);
}

const present = (slots: (Slot | null)[]): Set<Slot> => new Set(slots.filter((slot) => slot !== null));
