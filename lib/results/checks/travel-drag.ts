import { type CaseFile, type Departure, type VehicleId, VEHICLE_IDS } from '@/lib/casefile/schema';
import { brakingWithRolling } from '@/lib/mechanics/wheel';
import { hypot } from '@/lib/numerics/elementary';

/** A stretch of travel after contact, as the case states it. */
export interface Stretch {
  id: VehicleId;
  /** «leg 2 of A». */
  name: string;
  path: string;
  /** m; of simulated travel straight from contact to rest. */
  distance: number;
  /** Friction times the share of it that slows a vehicle rolling straight. */
  drag: number;
  /** Rise over run. */
  grade: number;
}

export const stretchesOf = (casefile: CaseFile): Stretch[] =>
  VEHICLE_IDS.flatMap((id) => {
    const departure = casefile.departure[id];
    if (!departure) return [];
    return departure.kind === 'spin' ? [simulated(casefile, id, departure)] : legsOf(id, departure);
  }).filter(({ distance }) => distance > 0);

const legsOf = (id: VehicleId, { legs }: Extract<Departure, { kind: 'legs' }>): Stretch[] =>
  legs.map(({ distance, friction, share, grade }, k) => ({
    id,
    name: `leg ${k + 1} of ${id}`,
    path: `departure.${id}.legs.${k}`,
    distance: distance.value,
    drag: friction.value * share.value,
    grade: grade.value,
  }));

function simulated(casefile: CaseFile, id: VehicleId, spin: Extract<Departure, { kind: 'spin' }>): Stretch {
  const { rest, friction, wheels, slope } = spin;
  const { x, y } = casefile.impact[id];
  const braking =
    'all' in wheels
      ? wheels.all.braking.value
      : [wheels.frontLeft, wheels.frontRight, wheels.rearLeft, wheels.rearRight].reduce(
          (s, w) => s + w.braking.value / 4,
          0,
        );
  return {
    id,
    name: `the travel of ${id}`,
    path: `departure.${id}`,
    distance: hypot((rest.x?.value ?? x.value) - x.value, (rest.y?.value ?? y.value) - y.value),
    drag: friction.value * brakingWithRolling(braking, friction.value),
    grade: slope?.grade.value ?? 0,
  };
}
